import type { ChangeoverView } from "@/lib/paper/list-changeover";
import { sayDuration } from "@/lib/paper/say-date";
import { End } from "./lead-words";

export function SheetChangeover({ changeover }: { changeover: ChangeoverView }) {
  const { endMoves, knobTurns, seconds, steps, stays } = changeover;
  return (
    <>
      <p className="mb-2">
        <strong>{endMoves} end{endMoves === 1 ? "" : "s"}{knobTurns > 0 ? `, ${knobTurns} knob${knobTurns === 1 ? "" : "s"}` : ""}, about {sayDuration(seconds)} at typical pace.</strong>{" "}
        {steps.length === 0 ? "Nothing moves." : "Desk down; pull every end below, inputs first; plug, inputs last; knobs; desk up."}
        {stays.length > 0 ? ` Lead${stays.length === 1 ? "" : "s"} ${stays.join(", ")} stay${stays.length === 1 ? "s" : ""}.` : ""}
      </p>
      <ol className="gap-x-6 sm:columns-2 print:columns-2">
        {steps.map((step, index) => (
          <li key={index} className="mb-1.5 flex break-inside-avoid gap-2">
            <span aria-hidden="true" className="mt-1 size-3.5 shrink-0 border-2 border-ink" />
            <span className="w-6 shrink-0 font-tape text-[1.4em] font-extrabold leading-none">{step.number}</span>
            <span>
              {step.parts.map((part) => (
                <span key={part.lead} className="block">
                  <strong>{part.lead}</strong> {part.ends.map((end, at) => <span key={at}>{at > 0 ? " → " : ""}<End end={end} /></span>)}{part.text}
                </span>
              ))}
            </span>
          </li>
        ))}
      </ol>
    </>
  );
}
