"use client";
import { useId, useMemo, useState } from "react";
import useSWR from "swr";
import { VerdictWord } from "@/components/chart/verdict-word";
import { Field } from "@/components/ui/field";
import { TextInput } from "@/components/ui/inputs";
import { fetchJson, ProblemError } from "@/lib/client/fetch-json";
import type { ConnectionCheck } from "@/lib/core/electrics/connection-types";
import { formatRange } from "@/lib/core/units/format-quantity";
import { paths } from "@/lib/paths";

const FIELDS = [
  { key: "activeV", label: "Trigger when struck", unit: "V", start: "4.5–8.1", at: "outputs.0.activeV" },
  { key: "sourceOhm", label: "In series with it", unit: "Ω", start: "1k", at: "outputs.0.sourceOhm" },
  { key: "onV", label: "Input fires within", unit: "V", start: "0.8–2", at: "inputs.0.onV" },
  { key: "safeMax", label: "Input stands up to", unit: "V", start: "5.5", at: "inputs.0.safeV.max" },
  { key: "loadOhm", label: "Input’s own load", unit: "Ω", start: "100k", at: "inputs.0.loadOhm" },
] as const;
type Key = (typeof FIELDS)[number]["key"];

/** One lead, checked by the same open calculator that anyone may call. */
export function LiveExample() {
  const id = useId();
  const [figures, setFigures] = useState(Object.fromEntries(FIELDS.map((field) => [field.key, field.start])) as Record<Key, string>);
  const body = useMemo(() => JSON.stringify({
    outputs: [{ signal: "trigger", restV: 0, activeV: figures.activeV, sourceOhm: figures.sourceOhm }],
    inputs: [{ id: "input", accepts: ["trigger", "gate"], onV: figures.onV, offV: "0.8", safeV: { min: -0.5, max: figures.safeMax }, loadOhm: figures.loadOhm }],
  }), [figures]);
  const { data, error } = useSWR<ConnectionCheck, unknown>([paths.api.connection(), body], () => fetchJson(paths.api.connection(), { body: JSON.parse(body) as unknown }), { keepPreviousData: true, revalidateOnFocus: false, shouldRetryOnError: false });
  const faults = error instanceof ProblemError ? (error.problem.errors ?? []) : [];
  const listener = data?.listeners[0];
  return (
    <div className="grid gap-6 md:grid-cols-[18rem_1fr]">
      <div className="flex flex-col gap-3">
        {FIELDS.map((field) => {
          const fault = faults.find((item) => item.field === field.at)?.detail;
          return (
            <Field key={field.key} id={`${id}-${field.key}`} label={`${field.label} (${field.unit})`} error={fault}>
              <TextInput
                id={`${id}-${field.key}`} className="font-mono" autoComplete="off" aria-invalid={fault !== undefined} aria-describedby={fault ? `${id}-${field.key}-error` : undefined}
                value={figures[field.key]} onChange={(event) => setFigures((before) => ({ ...before, [field.key]: event.target.value }))}
              />
            </Field>
          );
        })}
      </div>
      <div aria-live="polite" className="flex flex-col gap-3">
        {error && faults.length === 0 ? <p>The server did not answer; the example rests.</p> : null}
        {listener ? (
          <>
            <VerdictWord verdict={listener.verdict} className="text-4xl" />
            <ul className="flex flex-col gap-1.5">{listener.reasons.map((reason) => <li key={reason.text}><strong>{reason.verdict}</strong>: {reason.text}</li>)}</ul>
            {listener.highV ? <p>It sees <span className="font-mono">{formatRange(listener.highV, "V")}</span> when struck.</p> : null}
            {listener.fixes[0] ? <div className="border-l-8 border-mark bg-raised px-4 py-2"><p className="font-bold">What would mend it</p><p>{listener.fixes[0].text}</p><p className="mt-1 flex items-center gap-2">checked: <VerdictWord verdict={listener.fixes[0].verdict} /></p></div> : null}
            {listener.fixNote && listener.fixes.length === 0 ? <p>{listener.fixNote}</p> : null}
          </>
        ) : null}
      </div>
    </div>
  );
}
