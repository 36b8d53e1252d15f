import { VerdictWord } from "@/components/chart/verdict-word";
import type { Fix, ListenerCheck } from "@/lib/core/electrics/connection-types";
import { formatRange } from "@/lib/core/units/format-quantity";
import { LeadDrawing } from "./lead-drawing";

const PART_WORDS: Partial<Record<Fix["kind"], string>> = { divider: "divider", "diode-divider": "diode, divider", "series-resistor": "resistor", "series-diode": "diode" };

/** What the lead does to the input, and what would mend it. */
export function ExampleOutcome({ listener }: { listener: ListenerCheck }) {
  const fix = listener.fixes[0];
  return (
    <>
      <LeadDrawing verdict={listener.verdict} ground="bench" />
      <VerdictWord verdict={listener.verdict} className="text-4xl" />
      <ul className="flex flex-col gap-1.5">{listener.reasons.map((reason) => <li key={reason.text}><strong>{reason.verdict}</strong>: {reason.text}</li>)}</ul>
      {listener.highV ? <p>It sees <span className="font-mono">{formatRange(listener.highV, "V")}</span> when struck.</p> : null}
      {fix ? (
        <div className="mt-2 flex flex-col gap-2 border-l-8 border-mark bg-raised px-4 py-3">
          <p className="font-bold">What would mend it</p>
          <LeadDrawing verdict={fix.verdict} ground="raised" part={PART_WORDS[fix.kind]} />
          <p>{fix.text}</p>
          <p className="flex items-center gap-2">checked: <VerdictWord verdict={fix.verdict} /></p>
        </div>
      ) : null}
      {listener.fixNote && !fix ? <p>{listener.fixNote}</p> : null}
    </>
  );
}
