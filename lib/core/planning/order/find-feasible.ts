import { MOST_EXACT_BLOCKS } from "./solve-exact";
import type { OrderModel } from "./model-order";

export type Feasibility = { kind: "possible"; sequence: Int32Array } | { kind: "impossible" } | { kind: "undecided" };

const MOST_TRIES = 200_000;

/**
 * Whether any sequence of blocks keeps every rule, costs aside. Up to 20 blocks over all sets, exactly; above, depth-first with the
 * blocks of fewest neighbours first, which gives up after 200,000 tries.
 */
export function findFeasible(model: OrderModel): Feasibility {
  const m = model.blocks.length;
  return m <= MOST_EXACT_BLOCKS ? overAllSets(model) : depthFirst(model);
}

function overAllSets(model: OrderModel): Feasibility {
  const m = model.blocks.length;
  const width = m + 1;
  const follows = new Int32Array(width);
  for (let i = 0; i <= m; i += 1) for (let j = 0; j < m; j += 1) if (model.cost[i * width + j] !== Infinity) follows[i]! |= 1 << j;
  // opens[set]: blocks that may begin some way to play exactly `set` as the rest of the show.
  const opens = new Int32Array(2 ** m);
  const songsIn = new Uint8Array(2 ** m);
  for (let set = 1; set < opens.length; set += 1) {
    const lowest = 31 - Math.clz32(set & -set);
    songsIn[set] = songsIn[set & (set - 1)]! + model.size[lowest]!;
    const position = model.songs - songsIn[set]!;
    let found = 0;
    for (let rest = set; rest !== 0; rest &= rest - 1) {
      const j = 31 - Math.clz32(rest & -rest);
      if (model.start[j]! >= 0 && model.start[j] !== position) continue;
      const left = set & ~(1 << j);
      const ok = left === 0 ? model.cost[j * width + m] !== Infinity : (follows[j]! & opens[left]!) !== 0;
      if (ok) found |= 1 << j;
    }
    opens[set] = found;
  }
  const sequence = new Int32Array(m);
  let set = 2 ** m - 1;
  let last = m;
  for (let k = 0; k < m; k += 1) {
    const may = follows[last]! & opens[set]!;
    if (may === 0) return { kind: "impossible" };
    last = 31 - Math.clz32(may & -may);
    sequence[k] = last;
    set &= ~(1 << last);
  }
  return { kind: "possible", sequence };
}

function depthFirst(model: OrderModel): Feasibility {
  const m = model.blocks.length;
  const width = m + 1;
  const blockAt = new Map<number, number>();
  for (let j = 0; j < m; j += 1) if (model.start[j]! >= 0) blockAt.set(model.start[j]!, j);
  const nextPin = new Int32Array(model.songs + 1).fill(model.songs);
  for (let position = model.songs - 1; position >= 0; position -= 1) nextPin[position] = blockAt.has(position) ? position : nextPin[position + 1]!;
  const freedom = Int32Array.from({ length: m }, (_, j) => {
    let ways = 0;
    for (let i = 0; i < m; i += 1) ways += Number(model.cost[i * width + j] !== Infinity) + Number(model.cost[j * width + i] !== Infinity);
    return ways;
  });
  // Long blocks first while gaps are whole, then those with the fewest possible neighbours; otherwise the performer's order.
  const byNeed = Array.from({ length: m }, (_, j) => j).sort((a, b) => model.size[b]! - model.size[a]! || freedom[a]! - freedom[b]! || a - b);
  if (m > 1 && byNeed.some((j) => freedom[j] === 0)) return { kind: "impossible" };
  const isUsed = new Uint8Array(m);
  const sequence = new Int32Array(m);
  let tries = 0;

  const place = (k: number, position: number, last: number): boolean | null => {
    if (k === m) return model.cost[last * width + m] !== Infinity;
    if ((tries += 1) > MOST_TRIES) return null;
    const pinned = blockAt.get(position);
    const room = nextPin[position]! - position;
    for (const j of pinned === undefined ? byNeed : [pinned]) {
      if (isUsed[j] || model.cost[last * width + j] === Infinity) continue;
      if (pinned === undefined && (model.start[j]! >= 0 || model.size[j]! > room)) continue;
      isUsed[j] = 1;
      sequence[k] = j;
      const found = place(k + 1, position + model.size[j]!, j);
      if (found !== false) return found;
      isUsed[j] = 0;
    }
    return false;
  };
  const found = place(0, 0, m);
  if (found === null) return { kind: "undecided" };
  return found ? { kind: "possible", sequence } : { kind: "impossible" };
}
