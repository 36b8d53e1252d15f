import clsx from "clsx";
import { StyledLine } from "@/components/chart/styled-line";
import { VERDICT_TONE } from "@/components/chart/verdict-tone";
import { Tape } from "@/components/ui/tape";
import type { Verdict } from "@/lib/core/electrics/jacks";

/** Longer than any screen is wide; what is too long is cut off. */
const LINE = [{ x: 0, y: 9 }, { x: 2400, y: 9 }];

interface LeadDrawingProps {
  verdict: Verdict;
  ground: "bench" | "raised";
  /** What is soldered into the lead. */
  part?: string;
}

/** The example's lead between its two boxes. It only repeats what the words beside it say. */
export function LeadDrawing({ verdict, ground, part }: LeadDrawingProps) {
  const track = (
    <span className={clsx("min-w-4 flex-1", VERDICT_TONE[verdict])}>
      <svg width="100%" height="18" className="block"><StyledLine points={LINE} verdict={verdict} ground={`var(--${ground})`} /></svg>
    </span>
  );
  return (
    <div aria-hidden="true" className="flex items-center overflow-hidden">
      <Tape className="shrink-0">9 V box</Tape>
      {track}
      {part ? <><span className="shrink-0 border-2 border-ink px-2 text-sm font-semibold">{part}</span>{track}</> : null}
      <Tape className="shrink-0">5 V input</Tape>
    </div>
  );
}
