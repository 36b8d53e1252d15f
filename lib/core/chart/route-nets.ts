import { assignTracks, orderTracks, type Span, type Stubs } from "./assign-tracks";
import type { Net, NetEnd } from "./group-nets";
import type { ChartMetrics } from "./types";

const GUTTERS = 5;
/** Beyond every card: where runs that leave for a corridor are taken to end. */
const FAR = 1e9;

export interface Routing {
  /** `gutter:net` → track in that gutter. */
  tracks: Map<string, number>;
  trackCounts: number[];
  /** Nets that pass over or under the lanes, with their row there. */
  corridors: Map<string, { side: "top" | "bottom"; row: number }>;
  rows: { top: number; bottom: number };
}

/** Chooses corridors and tracks for every net. Heights are measured from the cards' top. */
export function routeNets(nets: readonly Net[], cardsHeight: number, metrics: ChartMetrics): Routing {
  const sides = new Map(nets.filter((net) => net.gutters.length > 1).map((net) => [net.id, sideOf(net, cardsHeight)]));
  const corridors: Routing["corridors"] = new Map();
  const rows = { top: 0, bottom: 0 };
  for (const side of ["top", "bottom"] as const) {
    const spans = nets.flatMap((net): Span[] => {
      if (sides.get(net.id) !== side) return [];
      return [{ net: net.id, from: net.gutters[0] as number, to: net.gutters.at(-1) as number }];
    });
    // Spans are whole gutters here: two that end in the same gutter must not share a row.
    for (const [net, row] of assignTracks(spans, 0.5)) {
      corridors.set(net, { side, row });
      rows[side] = Math.max(rows[side], row + 1);
    }
  }
  const tracks: Routing["tracks"] = new Map();
  const trackCounts: number[] = [];
  for (let gutter = 0; gutter < GUTTERS; gutter += 1) {
    const stubs = nets.flatMap((net) => stubsIn(net, gutter, sides.get(net.id)));
    const assigned = orderTracks(stubs, assignTracks(stubs.map((item) => item.span), metrics.jackPitch / 4));
    for (const [net, track] of assigned) tracks.set(`${gutter}:${net}`, track);
    trackCounts.push(Math.max(-1, ...assigned.values()) + 1);
  }
  return { tracks, trackCounts, corridors, rows };
}

/** The nearer way round. */
function sideOf(net: Net, cardsHeight: number): "top" | "bottom" {
  const ys = [...net.ends.values()].map((end) => end.jack.y);
  const middle = ys.reduce((sum, y) => sum + y, 0) / ys.length;
  return middle <= cardsHeight / 2 ? "top" : "bottom";
}

function stubsIn(net: Net, gutter: number, side: "top" | "bottom" | undefined): Stubs[] {
  if (!net.gutters.includes(gutter)) return [];
  const ends = endsIn(net, gutter);
  const left = ends.filter((end) => end.jack.side === "out").map((end) => end.jack.y);
  const right = ends.filter((end) => end.jack.side === "in").map((end) => end.jack.y);
  const ys = [...left, ...right, ...(side === "top" ? [-FAR] : side === "bottom" ? [FAR] : [])];
  return [{ net: net.id, left, right, span: { net: net.id, from: Math.min(...ys), to: Math.max(...ys) } }];
}

export function endsIn(net: Net, gutter: number): NetEnd[] {
  return [...net.ends.values()].filter((end) => end.gutter === gutter);
}
