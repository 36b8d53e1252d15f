import { memo } from "react";
import type { ChartLayout } from "@/lib/core/chart";
import type { Verdict } from "@/lib/core/electrics/jacks";
import { ChartLines } from "./chart-lines";

interface ChartTracksProps {
  layout: ChartLayout;
  verdicts: Readonly<Record<string, Verdict | undefined>>;
  /** Leads to bring forward; the rest is dimmed. Absent: none is dimmed. */
  chain?: ReadonlySet<string> | null;
  onPick?: (leadId: string) => void;
}

/** Every lead of a chart, laid under its cards. What they say in words stands in the tags and lists beside it, so the drawing is hidden from screen readers. */
export const ChartTracks = memo(function ChartTracks({ layout, verdicts, chain, onPick }: ChartTracksProps) {
  return (
    <svg width={layout.width} height={layout.height} aria-hidden="true" className="pointer-events-none absolute inset-0">
      <ChartLines layout={layout} verdicts={verdicts} chain={chain} />
      {onPick ? layout.tracks.map((track) => (
        <polyline
          key={track.leadId} data-lead={track.leadId} points={track.points.map(({ x, y }) => `${x},${y}`).join(" ")}
          fill="none" stroke="transparent" strokeWidth="10" className="pointer-events-auto cursor-pointer" onClick={() => onPick(track.leadId)}
        />
      )) : null}
    </svg>
  );
});
