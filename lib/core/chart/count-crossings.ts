import { groupNets } from "./group-nets";
import { stackCards } from "./place-cards";
import { GUTTERS, routeNets, type Run } from "./route-nets";
import type { ChartLead, ChartMetrics, LaneIndex } from "./types";

/** A card whose place in its lane may change. */
export interface TidyCard {
  id: string;
  lane: LaneIndex;
  jacks: readonly { id: string; side: "in" | "out" }[];
}

/** Usual proportions; how leads cross hardly depends on them. */
const PROPORTIONS: ChartMetrics = { cardWidth: 196, tapeHeight: 26, jackPitch: 28, cardGap: 10, trackPitch: 12, outTagWidth: 34, inTagWidth: 152, gutterMin: 110, tagHeight: 20 };

/** What a reader of the chart has to follow with the eye. */
export interface Effort {
  crossings: number;
  /** Length of all upright runs, in rows. */
  rows: number;
}

/** Points at which lines cross on the drawn chart, cards all unfolded. */
export function countCrossings(cards: readonly TidyCard[], leads: readonly ChartLead[]): number {
  return measureEffort(cards, leads).crossings;
}

/** How hard a board of these cards, all unfolded, would be to read: counted on the routed tracks, without drawing them. */
export function measureEffort(cards: readonly TidyCard[], leads: readonly ChartLead[]): Effort {
  const stack = stackCards(cards.map(({ id, lane, jacks }) => ({ id, lane, jacks, folded: false })), PROPORTIONS);
  const { runs } = routeNets(groupNets(leads, stack.jacks), stack, PROPORTIONS);
  const effort: Effort = { crossings: 0, rows: 0 };
  for (let gutter = 0; gutter < GUTTERS; gutter += 1) {
    const here = [...runs.values()].flatMap((byGutter) => byGutter.get(gutter) ?? []);
    const stubs = stubsOf(here);
    for (const run of here) {
      effort.rows += (run.span.to - run.span.from) / PROPORTIONS.jackPitch;
      if (run.track === null) continue;
      for (const stub of stubs) {
        if (stub.y <= run.span.from || stub.y >= run.span.to || stub.from >= run.track || stub.to <= run.track) continue;
        // Its own stub, or the row of an input it feeds as well: a branch, not a crossing.
        if (run.left.includes(stub.y) || run.right.includes(stub.y)) continue;
        effort.crossings += 1;
      }
    }
  }
  return effort;
}

/** Level lines in a gutter, from track to track; leads into one input share theirs, from the first that comes onto it. */
function stubsOf(runs: readonly Run[]): { y: number; from: number; to: number }[] {
  const right = new Map<number, number>();
  const stubs: { y: number; from: number; to: number }[] = [];
  for (const run of runs) {
    for (const y of run.left) stubs.push({ y, from: -1, to: run.track ?? Infinity });
    if (run.track === null) continue;
    for (const y of run.right) right.set(y, Math.min(right.get(y) ?? Infinity, run.track));
  }
  return [...stubs, ...[...right].map(([y, from]) => ({ y, from, to: Infinity }))];
}
