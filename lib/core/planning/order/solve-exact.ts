import type { OrderModel } from "./model-order";

/** Blocks the exact method takes; 20 need 2^19 · 20 figures. */
export const MOST_EXACT_BLOCKS = 20;
const NO_WAY = 2 ** 30;

/**
 * The cheapest sequence of blocks, proven: dynamic programming over sets (Held and Karp 1962; Bellman 1962; from memory),
 * run from the end of the set so that among equally cheap sequences the one that comes first in the performer's order is read off.
 * Pins are exact: a block may come next only where the songs still to play put it at its position.
 * Figures are held as 32-bit whole numbers where the costs are such (after a decimal shift), as doubles otherwise.
 * @param model at most 20 blocks
 * @returns the sequence, or null where no sequence keeps the rules
 */
export function solveExact(model: OrderModel): Int32Array | null {
  const m = model.blocks.length;
  if (m > MOST_EXACT_BLOCKS) throw new RangeError(`the exact method takes at most ${MOST_EXACT_BLOCKS} blocks, got ${m}`);
  const scale = findScale(model);
  const width = m + 1;
  const whole = (seconds: number) => (seconds === Infinity ? (scale ? NO_WAY : Infinity) : scale ? Math.round(seconds * scale) : seconds);
  const cost = scale ? new Int32Array(width * width) : new Float64Array(width * width);
  model.cost.forEach((seconds, at) => (cost[at] = whole(seconds)));
  const noWay = scale ? NO_WAY : Infinity;
  const slack = scale ? 0 : 1e-12;

  // tail[j][set without bit j]: the least cost of playing `set` after block j.
  const half = 1 << Math.max(m - 1, 0);
  const tail = Array.from({ length: m }, () => (scale ? new Int32Array(half) : new Float64Array(half)));
  const songsIn = countSongs(model);
  const members = new Int32Array(m);
  const onward = new Float64Array(m);
  const full = 2 ** m - 1;
  for (let j = 0; j < m; j += 1) tail[j]![0] = cost[j * width + m]!;
  for (let set = 1; set < full; set += 1) {
    const position = model.songs - songsIn[set]!;
    let count = 0;
    for (let j = 0; j < m; j += 1) {
      if (!((set >> j) & 1) || (model.start[j]! >= 0 && model.start[j] !== position)) continue;
      members[count] = j;
      onward[count] = tail[j]![squeeze(set, j)]!;
      count += 1;
    }
    for (let i = 0; i < m; i += 1) {
      if ((set >> i) & 1) continue;
      const row = i * width;
      let best = noWay;
      for (let k = 0; k < count; k += 1) {
        const sum = cost[row + members[k]!]! + onward[k]!;
        if (sum < best) best = sum;
      }
      tail[i]![squeeze(set, i)] = best;
    }
  }

  const sequence = new Int32Array(m);
  let last = m;
  let set = full;
  for (let k = 0; k < m; k += 1) {
    const position = model.songs - songsIn[set]!;
    const total = (j: number) =>
      ((set >> j) & 1) && (model.start[j]! < 0 || model.start[j] === position) ? cost[last * width + j]! + tail[j]![squeeze(set, j)]! : noWay;
    let best = noWay;
    for (let j = 0; j < m; j += 1) best = Math.min(best, total(j));
    if (best >= noWay) return null;
    const ceiling = best + slack * Math.abs(best);
    let chosen = 0;
    while (total(chosen) > ceiling) chosen += 1;
    sequence[k] = chosen;
    last = chosen;
    set &= ~(1 << chosen);
  }
  return sequence;
}

/** The set without block j, its bit closed up. */
function squeeze(set: number, j: number): number {
  return ((set >> (j + 1)) << j) | (set & ((1 << j) - 1));
}

function countSongs(model: OrderModel): Uint8Array {
  const m = model.blocks.length;
  const songsIn = new Uint8Array(2 ** m);
  for (let set = 1; set < songsIn.length; set += 1) {
    const lowest = 31 - Math.clz32(set & -set);
    songsIn[set] = songsIn[set & (set - 1)]! + model.size[lowest]!;
  }
  return songsIn;
}

/** The power of ten that makes every cost a whole number small enough for 32-bit sums; 0 where there is none. */
function findScale(model: OrderModel): number {
  const costs = [...model.cost].filter(Number.isFinite);
  const most = costs.reduce((a, b) => Math.max(a, b), 0);
  for (const scale of [1, 10, 100, 1000]) {
    if (most * scale * (model.blocks.length + 1) >= NO_WAY) return 0;
    if (costs.every((cost) => Math.abs(cost * scale - Math.round(cost * scale)) <= 1e-9 * Math.max(1, cost * scale))) return scale;
  }
  return 0;
}
