import { memo } from "react";
import clsx from "clsx";
import type { ChartLayout, Track } from "@/lib/core/chart";
import { severityOf } from "@/lib/core/electrics/judge/order-verdicts";
import type { Verdict } from "@/lib/core/electrics/jacks";
import { StyledLine } from "./styled-line";
import { VERDICT_TONE } from "./verdict-tone";

interface ChartTracksProps {
  layout: ChartLayout;
  verdicts: Readonly<Record<string, Verdict | undefined>>;
  /** Leads to bring forward; the rest is dimmed. Absent: none is dimmed. */
  chain?: ReadonlySet<string> | null;
  onPick?: (leadId: string) => void;
}

/** Every lead of a chart. What they say in words stands in the tags and lists beside it, so the drawing is hidden from screen readers. */
export const ChartTracks = memo(function ChartTracks({ layout, verdicts, chain, onPick }: ChartTracksProps) {
  const verdictOf = (track: Track) => verdicts[track.leadId] ?? "unproven";
  // The worse a lead, the later it is drawn, so that it lies on top where a net shares its trunk.
  const tracks = [...layout.tracks].sort((a, b) => severityOf(verdictOf(a)) - severityOf(verdictOf(b)));
  const isDim = (leadId: string) => !!chain && !chain.has(leadId);
  const netLeads = new Map<string, string[]>();
  for (const track of layout.tracks) netLeads.set(track.net, [...(netLeads.get(track.net) ?? []), track.leadId]);
  return (
    <svg width={layout.width} height={layout.height} aria-hidden="true" className="pointer-events-none absolute inset-0">
      {tracks.map((track) => (
        <g key={track.leadId} data-lead={track.leadId} className={clsx(VERDICT_TONE[verdictOf(track)], isDim(track.leadId) && "opacity-20")}>
          {onPick ? (
            <polyline
              points={track.points.map((point) => `${point.x},${point.y}`).join(" ")}
              fill="none" stroke="transparent" strokeWidth="10" className="pointer-events-auto cursor-pointer" onClick={() => onPick(track.leadId)}
            />
          ) : null}
          <StyledLine points={track.points} verdict={verdictOf(track)} />
          {track.backward ? <Arrowhead track={track} /> : null}
        </g>
      ))}
      {layout.junctions.map((dot) => (
        <circle key={`${dot.net}:${dot.x}:${dot.y}`} cx={dot.x} cy={dot.y} r="4" className={clsx("fill-ink", netLeads.get(dot.net)?.every(isDim) && "opacity-20")} />
      ))}
    </svg>
  );
});

function Arrowhead({ track }: { track: Track }) {
  const end = track.points.at(-1);
  if (!end) return null;
  return <path d={`M${end.x - 10} ${end.y - 5}L${end.x} ${end.y}L${end.x - 10} ${end.y + 5}Z`} fill="currentColor" />;
}
