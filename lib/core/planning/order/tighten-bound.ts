import { makeAscent } from "./bound-order";

interface Part {
  boundS: number;
  prices: Float64Array;
  /** 1 where an arc may not be used in this part. */
  isOut: Uint8Array;
}

export interface Tightened {
  boundS: number;
  /** A tour cheaper than the one given, if the relaxation met one: the nodes from the stage on, the stage left out. */
  sequence: Int32Array | null;
  parts: number;
}

interface TightenOptions {
  isOver: () => boolean;
  /** Every tour's cost is a multiple of this many seconds; 0: not known. */
  grain: number;
  /** Parts to look at, at most; default 20,000. */
  mostParts?: number;
  /** Refuses a tour that breaks a rule the costs do not show, such as a pin. */
  isGood?: (sequence: Int32Array) => boolean;
  /** Called now and then with the bound so far and the share of `mostParts` used. */
  onBound?: (boundS: number, done: number) => void;
}

/** Steps of ascent spent on each part. */
const STEPS = 30;

/**
 * Raises the ascent's bound by best-first branch and bound: the part with the lowest bound is split on an arc of its relaxed answer, out of
 * a node that has more than one — once with the arc left out, once with it the only one — and each half bounded anew from its parent's
 * prices. Arcs that cannot be in a tour cheaper than `upperS` are left out as soon as their reduced cost shows it.
 * Stopped at any time, the least bound among the open parts still bounds every tour from below.
 * @param n nodes, the stage last @param cost row-major, finite @param prices from the root's ascent @param upperS the best tour known
 */
export function tightenBound(n: number, cost: Float64Array, prices: Float64Array, upperS: number, options: TightenOptions): Tightened {
  const { isOver, grain, mostParts = 20_000, isGood = () => true, onBound } = options;
  const tooMuch = cost.reduce((a, b) => Math.max(a, b), 0) * (n + 1) + 1;
  const working = new Float64Array(n * n);
  const ascent = makeAscent(n, working);
  const parentOf = new Int32Array(n);
  const added = new Float64Array(n * n);
  const outs = new Int32Array(n);
  const heap: Part[] = [];
  let upper = upperS;
  let sequence: Int32Array | null = null;
  let parts = 0;
  const roundUp = (value: number) => (grain > 0 ? Math.ceil(value / grain - 1e-6) * grain : value);
  const isWorth = (value: number) => roundUp(value) < upper - 1e-9 * Math.max(1, upper);

  open({ boundS: -Infinity, prices, isOut: new Uint8Array(n * n) }, 0.2);
  while (heap.length > 0 && isWorth(heap[0]!.boundS) && parts < mostParts && !isOver()) {
    if (parts % 64 < 2) onBound?.(heap[0]!.boundS, parts / mostParts);
    split(takeLowest());
  }
  const boundS = Math.min(upper, heap.length > 0 ? heap[0]!.boundS : Infinity);
  return { boundS, sequence, parts };

  /** Bounds a part and, if a cheaper tour may be in it, keeps it. */
  function open(part: Part, stretch: number): void {
    parts += 1;
    fill(part);
    ascent.restart(part.prices, stretch);
    ascent.run(upper, STEPS);
    if (ascent.isTour) {
      ascent.answer(parentOf);
      if (takeTour()) return;
    }
    const boundS = Math.max(part.boundS, ascent.boundS);
    if (!isWorth(boundS)) return;
    push({ boundS, prices: ascent.prices.slice(), isOut: part.isOut });
  }

  function fill({ isOut }: Part): void {
    for (let at = 0; at < working.length; at += 1) working[at] = isOut[at] ? tooMuch : cost[at]!;
  }

  /** Reads `parentOf` as a tour; false where it is none, or one that `isGood` refuses. */
  function takeTour(): boolean {
    const tour = new Int32Array(n - 1);
    let sum = working[parentOf[n - 1]! * n + n - 1]!;
    for (let k = n - 2, node = parentOf[n - 1]!; k >= 0; k -= 1, node = parentOf[node]!) {
      if (node === n - 1) return false;
      tour[k] = node;
      sum += working[parentOf[node]! * n + node]!;
    }
    if (!isGood(tour)) return false;
    if (sum < upper - 1e-9) {
      upper = sum;
      sequence = tour;
    }
    return true;
  }

  function split(part: Part): void {
    fill(part);
    ascent.restart(part.prices, 0.1);
    const value = ascent.answer(parentOf, added);
    for (let at = 0; at < added.length; at += 1) if (!part.isOut[at] && value + added[at]! > upper + 1e-6) part.isOut[at] = 1;
    outs.fill(0);
    for (let j = 0; j < n; j += 1) outs[parentOf[j]!]! += 1;
    const isTour = outs.every((count) => count === 1);
    if (isTour && takeTour()) return;
    // The arc whose target has the dearest second choice, out of a node with arcs to spare; of a tour that is refused, any arc not yet forced.
    let from = -1;
    let to = -1;
    let dearest = -1;
    for (let j = 0; j < n; j += 1) {
      const i = parentOf[j]!;
      if (!isTour && outs[i]! < 2) continue;
      let second = Infinity;
      for (let k = 0; k < n; k += 1) if (k !== i && k !== j && !part.isOut[k * n + j]) second = Math.min(second, added[k * n + j]!);
      if (isTour && second === Infinity) continue;
      const score = Math.min(second, 1e12) + 1e-6 * outs[i]!;
      if (score > dearest) [dearest, from, to] = [score, i, j];
    }
    // Every arc is forced and the one tour left is refused: the part is empty.
    if (from < 0) return;
    const without = { boundS: part.boundS, prices: part.prices, isOut: part.isOut.slice() };
    without.isOut[from * n + to] = 1;
    const only = { boundS: part.boundS, prices: part.prices, isOut: part.isOut };
    for (let k = 0; k < n; k += 1) {
      if (k !== to) only.isOut[from * n + k] = 1;
      if (k !== from) only.isOut[k * n + to] = 1;
    }
    open(without, 0.1);
    open(only, 0.1);
  }

  function push(part: Part): void {
    heap.push(part);
    let at = heap.length - 1;
    while (at > 0) {
      const above = (at - 1) >> 1;
      if (heap[above]!.boundS <= heap[at]!.boundS) break;
      [heap[above], heap[at]] = [heap[at]!, heap[above]!];
      at = above;
    }
  }

  function takeLowest(): Part {
    const top = heap[0]!;
    const end = heap.pop()!;
    if (heap.length > 0) {
      heap[0] = end;
      for (let at = 0; ; ) {
        const left = 2 * at + 1;
        const right = left + 1;
        let least = at;
        if (left < heap.length && heap[left]!.boundS < heap[least]!.boundS) least = left;
        if (right < heap.length && heap[right]!.boundS < heap[least]!.boundS) least = right;
        if (least === at) break;
        [heap[least], heap[at]] = [heap[at]!, heap[least]!];
        at = least;
      }
    }
    return top;
  }
}
