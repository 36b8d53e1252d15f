import { costOf, type OrderModel } from "./model-order";

/** A search that can be run a while, looked at, and run on. */
export interface Search {
  best: Int32Array;
  bestCost: number;
  /** @param kicks how many times to disturb the order and mend it again; stops early where `isEnough()` */
  run(kicks: number, isEnough: () => boolean): void;
}

/** Kicks of one walk, and how much worse (in shares of a mean arc) it may go at its start. */
const WALK = 400;
const HEAT = 1.5;
/** Blocks in the longest stretch a kick moves. */
const STRETCH = 30;

/**
 * Looks for a cheap sequence of blocks: iterated local search. The moves are the ones that keep most arcs the way they run — two neighbouring
 * stretches change places (3-opt without reversal; Or 1976), with either stretch turned round as well, a stretch turned round in place
 * (2-opt), and, round pinned blocks, two blocks of one size change places. Pinned blocks never move.
 * @param model any size
 * @param cost the model's costs with forbidden neighbours as a large finite figure
 * @param start a sequence that keeps the pins
 * @param random numbers in 0…1
 */
export function makeSearch(model: OrderModel, cost: Float64Array, start: Int32Array, random: () => number): Search {
  const m = model.blocks.length;
  const width = m + 1;
  const isPinned = Uint8Array.from(model.start, (position) => (position >= 0 ? 1 : 0));
  const hasPins = isPinned.includes(1);
  // Rounding of the running sums must never look like a gain.
  const tiny = Math.max(1e-9, cost.reduce((a, b) => Math.max(a, b), 0) * width * 1e-13);
  // tour[0] and tour[m + 1] are the stage.
  const tour = new Int32Array(m + 2);
  const forward = new Float64Array(m + 2);
  const backward = new Float64Array(m + 2);
  const scratch = new Int32Array(m + 2);
  const isStale = new Uint8Array(m + 1).fill(1);
  load(start);
  mend();
  let current = tourCost();
  let sinceBest = 0;
  const held = tour.slice();
  const search: Search = { best: tour.slice(1, m + 1), bestCost: tourCost(), run };

  function run(kicks: number, isEnough: () => boolean): void {
    for (let kick = 0; kick < kicks && !isEnough(); kick += 1) {
      if (!disturb()) return;
      mend();
      const next = tourCost();
      if (next < search.bestCost - tiny) {
        search.bestCost = next;
        search.best = tour.slice(1, m + 1);
        sinceBest = 0;
      } else sinceBest += 1;
      // A little worse is let through now and then, less the longer this walk has gone on; a stale walk begins again from the best.
      const heat = (HEAT * search.bestCost * (WALK - (sinceBest % WALK))) / (WALK * width);
      if (next <= current - heat * Math.log(1 - random()) + tiny) {
        current = next;
        held.set(tour);
      } else {
        tour.set(held);
        measure();
      }
      if (sinceBest > 0 && sinceBest % WALK === 0) {
        load(search.best);
        held.set(tour);
        current = search.bestCost;
      }
    }
  }

  function load(sequence: Int32Array): void {
    tour[0] = m;
    tour[m + 1] = m;
    tour.set(sequence, 1);
    measure();
  }

  function tourCost(): number {
    return forward[m + 1]!;
  }

  function measure(): void {
    for (let k = 1; k <= m + 1; k += 1) {
      const a = tour[k - 1]!;
      const b = tour[k]!;
      forward[k] = forward[k - 1]! + cost[a * width + b]!;
      backward[k] = backward[k - 1]! + (a === m || b === m ? 0 : cost[b * width + a]!);
    }
  }

  /** What turning tour[a…b] round adds to the cost inside it. */
  function turnCost(a: number, b: number): number {
    return backward[b]! - backward[a]! - (forward[b]! - forward[a]!);
  }

  function touch(...positions: number[]): void {
    for (const k of positions) isStale[tour[k]!] = 1;
  }

  /** tour[i+1…j] and tour[j+1…k] change places, each turned round where asked. */
  function exchange(i: number, j: number, k: number, turnFirst: boolean, turnSecond: boolean): void {
    let at = i + 1;
    for (let p = j + 1; p <= k; p += 1) scratch[at++] = tour[turnSecond ? k + j + 1 - p : p]!;
    for (let p = i + 1; p <= j; p += 1) scratch[at++] = tour[turnFirst ? j + i + 1 - p : p]!;
    const join = i + (k - j);
    for (let p = i + 1; p <= k; p += 1) tour[p] = scratch[p]!;
    touch(i, i + 1, join, join + 1, k, k + 1);
    measure();
  }

  function turn(i: number, k: number): void {
    for (let a = i + 1, b = k; a < b; a += 1, b -= 1) [tour[a], tour[b]] = [tour[b]!, tour[a]!];
    touch(i, i + 1, k, k + 1);
    measure();
  }

  /** Improves until no move helps; only arcs near a change are looked at again. */
  function mend(): void {
    for (let again = true; again; ) {
      again = false;
      for (let i = 0; i <= m; i += 1) {
        if (!isStale[tour[i]!]) continue;
        let better = true;
        let wasBetter = false;
        while (better) {
          better = improveAt(i);
          wasBetter ||= better;
        }
        if (wasBetter) again = true;
        else isStale[tour[i]!] = 0;
      }
      if (hasPins && improveSwaps()) again = true;
    }
  }

  /** The best move whose first cut, second cut or last cut is after tour[at]. */
  function improveAt(at: number): boolean {
    return improveFrom(at) || improveTo(at);
  }

  function improveFrom(i: number): boolean {
    const a = tour[i]!;
    const b = tour[i + 1]!;
    if (b === m || isPinned[b]) return false;
    const ab = cost[a * width + b]!;
    let gain = -tiny;
    let move = 0;
    let moveJ = 0;
    let moveK = 0;
    for (let k = i + 2; k <= m; k += 1) {
      const e = tour[k]!;
      if (isPinned[e]) break;
      const f = tour[k + 1]!;
      const change = cost[a * width + e]! + cost[b * width + f]! - ab - cost[e * width + f]! + turnCost(i + 1, k);
      if (change < gain) [gain, move, moveK] = [change, 1, k];
    }
    for (let j = i + 1; j < m; j += 1) {
      const c = tour[j]!;
      if (isPinned[c]) break;
      const d = tour[j + 1]!;
      if (isPinned[d]) break;
      const cd = cost[c * width + d]!;
      const base = -ab - cd;
      const ad = cost[a * width + d]!;
      const db = cost[d * width + b]!;
      const turnFirst = turnCost(i + 1, j);
      for (let k = j + 1; k <= m; k += 1) {
        const e = tour[k]!;
        if (isPinned[e]) break;
        const f = tour[k + 1]!;
        const ef = cost[e * width + f]!;
        const cf = cost[c * width + f]!;
        const plain = base - ef + ad + cost[e * width + b]! + cf;
        if (plain < gain) [gain, move, moveJ, moveK] = [plain, 2, j, k];
        const first = base - ef + ad + cost[e * width + c]! + cost[b * width + f]! + turnFirst;
        if (first < gain) [gain, move, moveJ, moveK] = [first, 3, j, k];
        const second = base - ef + cost[a * width + e]! + db + cf + turnCost(j + 1, k);
        if (second < gain) [gain, move, moveJ, moveK] = [second, 4, j, k];
      }
    }
    if (move === 0) return false;
    if (move === 1) turn(i, moveK);
    else exchange(i, moveJ, moveK, move === 3, move === 4);
    return true;
  }

  /** The same plain exchange seen from its last cut, so that a change late in the set is met as well. */
  function improveTo(k: number): boolean {
    if (k === 0) return false;
    const e = tour[k]!;
    if (isPinned[e]) return false;
    const f = tour[k + 1]!;
    const ef = cost[e * width + f]!;
    let gain = -tiny;
    let moveI = -1;
    let moveJ = 0;
    for (let j = k - 1; j >= 1; j -= 1) {
      const c = tour[j]!;
      const d = tour[j + 1]!;
      if (isPinned[d] || isPinned[c]) break;
      const base = cost[c * width + f]! - cost[c * width + d]! - ef;
      for (let i = j - 1; i >= 0; i -= 1) {
        const b = tour[i + 1]!;
        if (isPinned[b]) break;
        const a = tour[i]!;
        const change = base + cost[a * width + d]! + cost[e * width + b]! - cost[a * width + b]!;
        if (change < gain) [gain, moveI, moveJ] = [change, i, j];
      }
    }
    if (moveI < 0) return false;
    exchange(moveI, moveJ, k, false, false);
    return true;
  }

  function improveSwaps(): boolean {
    for (let p = 1; p < m; p += 1) {
      for (let q = p + 1; q <= m; q += 1) {
        if (!maySwap(p, q)) continue;
        const before = costAround(p, q);
        [tour[p], tour[q]] = [tour[q]!, tour[p]!];
        if (costAround(p, q) < before - tiny) {
          touch(p - 1, p, p + 1, q - 1, q, q + 1);
          measure();
          return true;
        }
        [tour[p], tour[q]] = [tour[q]!, tour[p]!];
      }
    }
    return false;
  }

  function maySwap(p: number, q: number): boolean {
    const a = tour[p]!;
    const b = tour[q]!;
    return !isPinned[a] && !isPinned[b] && model.size[a] === model.size[b];
  }

  function costAround(p: number, q: number): number {
    const arc = (k: number) => cost[tour[k]! * width + tour[k + 1]!]!;
    return arc(p - 1) + arc(p) + (q > p + 1 ? arc(q - 1) : 0) + arc(q);
  }

  /** A random exchange of two short stretches, or of two blocks where pins leave no stretch; false where nothing can move. */
  function disturb(): boolean {
    for (let tries = 0; tries < 50; tries += 1) {
      if (hasPins && tries % 2 === 1) {
        const p = 1 + Math.floor(random() * m);
        const q = 1 + Math.floor(random() * m);
        if (p === q || !maySwap(p, q)) continue;
        [tour[p], tour[q]] = [tour[q]!, tour[p]!];
        touch(p - 1, p, p + 1, q - 1, q, Math.min(q + 1, m));
        measure();
        return true;
      }
      const i = Math.floor(random() * (m - 1));
      const j = i + 1 + Math.floor(random() * Math.min(STRETCH, m - i - 1));
      const k = j + 1 + Math.floor(random() * Math.min(STRETCH, m - j));
      if (j >= m || k > m) continue;
      let isFree = true;
      for (let p = i + 1; p <= k && isFree; p += 1) isFree = !isPinned[tour[p]!];
      if (!isFree) continue;
      exchange(i, j, k, false, false);
      return true;
    }
    return false;
  }
  return search;
}

/** Whether a sequence meets no forbidden neighbour. */
export function isAllowed(model: OrderModel, sequence: ArrayLike<number>): boolean {
  return Number.isFinite(costOf(model, sequence));
}
