import clsx from "clsx";
import type { Verdict } from "@/lib/core/electrics/jacks";
import { StyledLine } from "./styled-line";
import { VERDICT_TONE } from "./verdict-tone";

const SAMPLE = [{ x: 1, y: 6 }, { x: 29, y: 6 }];

/** A verdict's word beside a sample of its line. */
export function VerdictWord({ verdict, className }: { verdict: Verdict; className?: string }) {
  return (
    <span className={clsx("inline-flex items-center gap-1.5 font-bold whitespace-nowrap", VERDICT_TONE[verdict], className)}>
      <svg width="30" height="12" viewBox="0 0 30 12" aria-hidden="true" className="shrink-0">
        <StyledLine points={SAMPLE} verdict={verdict} thin={1.4} ground="var(--bench)" />
      </svg>
      {verdict}
    </span>
  );
}
