import clsx from "clsx";
import { useMemo } from "react";
import { shareTracks, type ChartLayout, type Point } from "@/lib/core/chart";
import { severityOf } from "@/lib/core/electrics/judge/order-verdicts";
import type { Verdict } from "@/lib/core/electrics/jacks";
import { StyledLine } from "./styled-line";
import { VERDICT_TONE } from "./verdict-tone";

interface ChartLinesProps {
  layout: ChartLayout;
  verdicts: Readonly<Record<string, Verdict | undefined>>;
  /** Leads to bring forward; the rest is dimmed. Absent: none is dimmed. */
  chain?: ReadonlySet<string> | null;
}

/** Tracks, arrowheads and junction dots, for inside an `svg`. What several leads share is drawn once, in the worst of their verdicts. */
export function ChartLines({ layout, verdicts, chain }: ChartLinesProps) {
  const stretches = useMemo(() => shareTracks(layout.tracks), [layout]);
  const verdictOf = (leadId: string) => verdicts[leadId] ?? "unproven";
  const isForward = (leadId: string) => !chain || chain.has(leadId);
  const drawn = stretches
    .map(({ points, leadIds }) => {
      const forward = leadIds.filter(isForward);
      const verdict = (forward.length > 0 ? forward : leadIds).map(verdictOf).reduce((a, b) => (severityOf(b) > severityOf(a) ? b : a));
      return { points, verdict, isDim: forward.length === 0 };
    })
    // Where lines cross, what is brought forward and what is worse lies on top.
    .sort((a, b) => Number(b.isDim) - Number(a.isDim) || severityOf(a.verdict) - severityOf(b.verdict));
  return (
    <>
      {drawn.map(({ points, verdict, isDim }) => (
        <g key={points.map(({ x, y }) => `${x},${y}`).join(" ")} className={clsx(VERDICT_TONE[verdict], isDim && "opacity-20")}>
          <StyledLine points={points} verdict={verdict} />
        </g>
      ))}
      {layout.tracks.map(({ leadId, points, backward }) => {
        const end = points.at(-1);
        return backward && end ? <path key={leadId} d={arrowhead(end)} fill="currentColor" className={clsx(VERDICT_TONE[verdictOf(leadId)], !isForward(leadId) && "opacity-20")} /> : null;
      })}
      {layout.junctions.map((dot) => (
        <circle key={`${dot.x}:${dot.y}`} cx={dot.x} cy={dot.y} r="4" className={clsx("fill-ink", !dot.leadIds.some(isForward) && "opacity-20")} />
      ))}
    </>
  );
}

function arrowhead({ x, y }: Point): string {
  return `M${x - 10} ${y - 5}L${x} ${y}L${x - 10} ${y + 5}Z`;
}
