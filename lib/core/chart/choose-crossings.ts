import { jackHeights, type Net } from "./group-nets";

const LANES = [0, 1, 2, 3] as const;
/** Heights weighed in each lane: enough to find a near one, few enough to weigh every pair of lanes. */
const MOST_CHOICES = 16;

export interface Crossings {
  /** Net → lane → the height at which it crosses that lane's cards, measured from the cards' top. */
  at: Map<string, Map<number, number>>;
  /** Rows needed above and below all cards. */
  rows: { top: number; bottom: number };
}

/**
 * Chooses where leads cross the lanes between their ends: through a gap between two cards, or over or under all of them,
 * whichever makes the net's upright runs shortest. A height is given to one net only, in its lane and in the lanes beside it,
 * because its line reaches into both gutters there. Nets that cross fewest lanes choose first.
 * @param free heights between the cards of each lane.
 * @param cardsHeight height of the longest lane.
 * @param rowPitch distance between two rows above or below the cards.
 */
export function chooseCrossings(nets: readonly Net[], free: readonly (readonly number[])[], cardsHeight: number, rowPitch: number): Crossings {
  const at: Crossings["at"] = new Map();
  const rows = { top: 0, bottom: 0 };
  const taken = LANES.map(() => new Set<number>());
  const isFree = (lane: number, height: number) => !taken[lane]?.has(height) && !taken[lane - 1]?.has(height) && !taken[lane + 1]?.has(height);
  const above = (row: number) => -(row + 1) * rowPitch;
  const below = (row: number) => cardsHeight + (row + 1) * rowPitch;

  for (const net of [...nets].filter((item) => item.last > item.first).sort((a, b) => a.last - a.first - (b.last - b.first))) {
    const lanes = LANES.filter((lane) => lane >= net.first && lane < net.last);
    // One row more than is used is free in every lane.
    const outer = [...Array.from({ length: rows.top + 1 }, (_, row) => above(row)), ...Array.from({ length: rows.bottom + 1 }, (_, row) => below(row))];
    const heights = shortest(net, lanes.map((lane) => nearest(net, [...(free[lane] ?? []), ...outer], (height) => isFree(lane, height))));
    at.set(net.id, new Map(lanes.map((lane, index) => [lane, heights[index] as number])));
    for (const [index, lane] of lanes.entries()) {
      const height = heights[index] as number;
      taken[lane]?.add(height);
      if (height < 0) rows.top = Math.max(rows.top, Math.round(-height / rowPitch));
      if (height > cardsHeight) rows.bottom = Math.max(rows.bottom, Math.round((height - cardsHeight) / rowPitch));
    }
  }
  return { at, rows };
}

/** The choices worth weighing: free ones nearest to the net's own jacks. */
function nearest(net: Net, heights: readonly number[], isFree: (height: number) => boolean): number[] {
  const own = [net.out.y, ...net.ins.map((jack) => jack.y)];
  const [low, high] = [Math.min(...own), Math.max(...own)];
  const middle = (low + high) / 2;
  return heights
    .filter(isFree)
    .map((height) => ({ height, away: Math.max(low - height, height - high, 0), off: Math.abs(height - middle) }))
    .sort((a, b) => a.away - b.away || a.off - b.off || a.height - b.height)
    .slice(0, MOST_CHOICES)
    .map(({ height }) => height);
}

interface Way {
  height: number;
  length: number;
  before: Way | null;
}

/** One height a lane, so that the upright runs in all the gutters are shortest together; the sum is separable, so lane by lane. */
function shortest(net: Net, choices: readonly (readonly number[])[]): number[] {
  const own = Array.from({ length: choices.length + 1 }, (_, index) => {
    const { left, right } = jackHeights(net, net.first + index);
    return [...left, ...right];
  });
  let ways: Way[] = (choices[0] ?? []).map((height) => ({ height, length: runLength(own[0] ?? [], height), before: null }));
  for (let index = 1; index < choices.length; index += 1) {
    ways = (choices[index] ?? []).map((height) => best(ways.map((before) => ({ height, length: before.length + runLength(own[index] ?? [], height, before.height), before }))));
  }
  const end = best(ways.map((way) => ({ ...way, length: way.length + runLength(own[choices.length] ?? [], way.height) })));
  const heights: number[] = [];
  for (let way: Way | null = end; way !== null; way = way.before) heights.unshift(way.height);
  return heights;
}

function best(ways: readonly Way[]): Way {
  return ways.reduce((a, b) => (b.length < a.length ? b : a));
}

function runLength(own: readonly number[], ...crossings: number[]): number {
  let [low, high] = [Infinity, -Infinity];
  for (const y of own) { if (y < low) low = y; if (y > high) high = y; }
  for (const y of crossings) { if (y < low) low = y; if (y > high) high = y; }
  return high - low;
}
