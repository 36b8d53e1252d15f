"use client";
import { useId, useState } from "react";
import useSWR from "swr";
import { Field } from "@/components/ui/field";
import { TextInput } from "@/components/ui/inputs";
import { fetchJson, ProblemError } from "@/lib/client/fetch-json";
import type { ConnectionCheck } from "@/lib/core/electrics/connection-types";
import { paths } from "@/lib/paths";
import { BOXES, exampleRequest, figureAt, FIGURES, START } from "./example-lead";
import { ExampleOutcome } from "./example-outcome";
import { useSettled } from "./use-settled";

const FIRST = JSON.stringify(exampleRequest(START));

/** One lead, checked by the same open calculator that anyone may call. `first` is its answer to the figures it starts with. */
export function LiveExample({ first }: { first: ConnectionCheck }) {
  const id = useId();
  const [figures, setFigures] = useState(START);
  const asked = useSettled(JSON.stringify(exampleRequest(figures)), 250);
  const { data, error } = useSWR<ConnectionCheck, unknown>(
    asked === FIRST ? null : [paths.api.connection(), asked],
    () => fetchJson(paths.api.connection(), { body: JSON.parse(asked) as unknown }),
    { keepPreviousData: true, revalidateOnFocus: false, shouldRetryOnError: false },
  );
  const problem = error instanceof ProblemError ? error.problem : undefined;
  const faults = (problem?.errors ?? []).map((fault) => ({ key: figureAt(fault.field), text: fault.detail }));
  const strays = faults.filter((fault) => fault.key === undefined);
  const listener = (asked === FIRST ? first : (data ?? first)).listeners[0];
  return (
    <div className="grid gap-6 md:grid-cols-[20rem_1fr]">
      <div className="flex flex-col gap-5">
        {BOXES.map((box) => (
          <fieldset key={box}>
            <legend className="mb-1.5 border-b-2 border-ink font-tape text-2xl leading-tight font-bold">{box}</legend>
            <div className="grid grid-cols-2 gap-3">
              {FIGURES.filter((figure) => figure.box === box).map(({ key, label, unit }) => {
                const fault = faults.find((item) => item.key === key)?.text;
                return (
                  <Field key={key} id={`${id}-${key}`} label={`${label} (${unit})`} error={fault}>
                    <TextInput
                      id={`${id}-${key}`} className="font-mono" autoComplete="off" aria-invalid={fault !== undefined} aria-describedby={fault ? `${id}-${key}-error` : undefined}
                      value={figures[key]} onChange={(event) => setFigures((before) => ({ ...before, [key]: event.target.value }))}
                    />
                  </Field>
                );
              })}
            </div>
          </fieldset>
        ))}
      </div>
      <div aria-live="polite" className="flex min-w-0 flex-col gap-3">
        {/* A verdict on other figures than those on screen would mislead, so a refusal takes its place. */}
        {error ? (
          <>
            <p className="text-lg font-semibold">No verdict on these figures.</p>
            {faults.length === 0 ? <p>{problem?.detail ?? "The server did not answer. Try again in a moment."}</p> : null}
            {faults.length > strays.length ? <p className="text-ink-soft">Mend what is said under the figures, and the lead is checked again.</p> : null}
            {strays.map((fault) => <p key={fault.text}>{fault.text}</p>)}
          </>
        ) : listener ? <ExampleOutcome listener={listener} /> : null}
      </div>
    </div>
  );
}
