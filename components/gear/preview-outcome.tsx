import type { ConditionerOutcome } from "@/lib/core/electrics/patch-types";
import { VerdictWord } from "@/components/chart/verdict-word";
import { showFigure } from "./figure-text";

interface PreviewOutcomeProps {
  outcome: ConditionerOutcome | null;
  unreadable: boolean;
  onSupply: string;
}

/** Volts, width and verdict, with the reason in words. */
export function PreviewOutcome({ outcome, unreadable, onSupply }: PreviewOutcomeProps) {
  if (unreadable) return <p role="status" className="text-ink-soft">As soon as every part can be read, the pulse is worked out here.</p>;
  if (!outcome) return <p role="status" className="text-ink-soft">Working it out…</p>;
  const { trigger, envelope, reasons, verdict } = outcome;
  const rows = [
    ["Trigger at rest", showFigure(trigger.restV, "V")],
    ["Trigger when it fires", showFigure(trigger.activeV, "V")],
    ["Pulse length", showFigure(trigger.pulseS, "s")],
    ...(envelope ? [["Envelope peak", showFigure(envelope.activeV, "V")], ["Envelope fall to 37 %", showFigure(envelope.decayS, "s")]] : []),
  ] as const;
  return (
    <div role="status" className="flex flex-col gap-2">
      <p><VerdictWord verdict={verdict} /></p>
      <dl className="grid grid-cols-1 gap-x-8 sm:grid-cols-3">
        {rows.map(([label, text]) => (
          <div key={label} className="flex items-baseline justify-between gap-3 border-b border-line-soft py-1.5">
            <dt className="text-ink-soft">{label}</dt>
            <dd className="font-mono tabular-nums">{text}</dd>
          </div>
        ))}
      </dl>
      {reasons.length > 0 ? <ul className="list-disc pl-5">{reasons.map((reason) => <li key={reason.text}>{reason.text}</li>)}</ul> : null}
      <p className="text-sm text-ink-soft">On {onSupply}, nothing patched into its output. Each song’s board checks it with the load it really has.</p>
    </div>
  );
}
