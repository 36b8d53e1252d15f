import { makeArborescenceFinder } from "./find-arborescence";

/** An ascent that can be run a while, looked at, and run on. */
export interface Ascent {
  /** Best bound so far. */
  boundS: number;
  /** The multipliers that gave it. */
  prices: Float64Array;
  /** Whether the relaxed answer is itself a tour (then the bound is the optimum). */
  isTour: boolean;
  /** @param upperS the best order known, which sets the step's length @param steps at most this many */
  run(upperS: number, steps: number): void;
  /** Forgets the bound and begins again from other prices, for costs that have been changed in place. */
  restart(prices: Float64Array, stretch: number): void;
  /**
   * The relaxed answer at the best prices: the node each node's arc comes from (the stage's included), and where `addedCost` is given what
   * forcing each arc in would add to the bound at least (0 for the arcs of the answer).
   */
  answer(parentOf: Int32Array, addedCost?: Float64Array): number;
}

/**
 * A lower bound on the cheapest tour through all nodes by the 1-arborescence relaxation and Lagrangean subgradient ascent (Held and Karp
 * 1971; for directed tours as in Fischetti and Toth 1992; from memory): every node has exactly one arc in and all hang from the root;
 * one arc out of each is asked for by a price on its outgoing arcs. Its best value equals the subtour bound of the linear programme.
 * @param n nodes, 2 or more; the root is the last (the stage before and after the set)
 * @param cost row-major n × n, finite; forbidden arcs as a figure larger than any tour
 */
export function makeAscent(n: number, cost: Float64Array): Ascent {
  const root = n - 1;
  const finder = makeArborescenceFinder(n, root);
  const prices = new Float64Array(n);
  const priced = new Float64Array(n * n);
  const parentOf = new Int32Array(n);
  const outs = new Int32Array(n);
  const lastOuts = new Int32Array(n).fill(1);
  let stretch = 1;
  let sinceBetter = 0;
  let last = 0;
  const ascent: Ascent = { boundS: -Infinity, prices: prices.slice(), isTour: false, run, restart, answer };

  function run(upperS: number, steps: number): void {
    for (let step = 0; step < steps; step += 1) {
      const value = relax();
      let norm = 0;
      let crossed = 0;
      for (let i = 0; i < n; i += 1) {
        const off = outs[i]! - 1;
        crossed += Math.abs(off);
        const turn = 0.7 * off + 0.3 * (lastOuts[i]! - 1);
        norm += turn * turn;
      }
      if (value > ascent.boundS) {
        if (value > ascent.boundS + 1e-7 * Math.max(1, Math.abs(value))) sinceBetter = 0;
        ascent.boundS = value;
        ascent.prices.set(prices);
      } else sinceBetter += 1;
      if (crossed === 0) {
        // Its cost is the relaxation's highest value, so these are the best prices even where an earlier value came as near as rounding allows.
        ascent.isTour = true;
        ascent.prices.set(prices);
        return;
      }
      if (sinceBetter > 12) {
        stretch *= 0.85;
        sinceBetter = 0;
        prices.set(ascent.prices);
      }
      if (norm === 0 || stretch < 1e-6) return;
      const length = (stretch * Math.max(upperS - value, 1e-6 * Math.max(1, Math.abs(upperS)))) / norm;
      for (let i = 0; i < n; i += 1) {
        prices[i]! += length * (0.7 * (outs[i]! - 1) + 0.3 * (lastOuts[i]! - 1));
        lastOuts[i] = outs[i]!;
      }
    }
  }

  function restart(from: Float64Array, size: number): void {
    prices.set(from);
    ascent.prices.set(from);
    ascent.boundS = -Infinity;
    ascent.isTour = false;
    stretch = size;
    sinceBetter = 0;
    lastOuts.fill(1);
  }

  function answer(into: Int32Array, addedCost?: Float64Array): number {
    prices.set(ascent.prices);
    const value = relax();
    into.set(parentOf);
    into[root] = last;
    if (addedCost) {
      finder.priceArcs(priced, addedCost);
      for (let i = 0; i < root; i += 1) addedCost[i * n + root] = priced[i * n + root]! - priced[last * n + root]!;
    }
    return value;
  }

  /** The relaxed problem at the current prices; fills `outs` and `last`. */
  function relax(): number {
    let priceSum = 0;
    for (let i = 0; i < n; i += 1) {
      const price = prices[i]!;
      priceSum += price;
      const row = i * n;
      for (let j = 0; j < n; j += 1) priced[row + j] = cost[row + j]! + price;
    }
    const tree = finder.find(priced, parentOf);
    outs.fill(0);
    for (let i = 0; i < root; i += 1) outs[parentOf[i]!]! += 1;
    let home = Infinity;
    for (let i = 0; i < root; i += 1) {
      if (priced[i * n + root]! < home) {
        home = priced[i * n + root]!;
        last = i;
      }
    }
    outs[last]! += 1;
    return tree + home - priceSum;
  }
  return ascent;
}
