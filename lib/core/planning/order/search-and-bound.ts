import { makeAscent } from "./bound-order";
import { costOf, keepsPins, type OrderModel } from "./model-order";
import { isAllowed, makeSearch } from "./search-order";
import { seededRandom } from "./seeded-random";
import { tightenBound } from "./tighten-bound";
import type { OrderOptions } from "./types";

/** A gap below this share of the total is not worth more search. */
export const CLOSE_ENOUGH = 1e-9;
/** Share of the effort spent on finding orders before the bound is worked on. */
const SEARCH_SHARE = 0.25;
/** Kicks of local search, and parts of branch and bound (at 60 songs), in one round. */
const KICKS = 50;
const PARTS = 40;

export interface Found {
  sequence: Int32Array;
  boundS: number;
}

/**
 * The best sequence found and a bound no sequence can beat: local search for a quarter of the effort, with the ascent beside it, then branch and
 * bound on the ascent's relaxation, which tightens the bound and often proves or improves the sequence.
 * @param model any number of blocks; the exact method is better up to 20
 * @param start a sequence that keeps the pins
 * @returns null where every sequence met breaks a rule; costs of block to block only (`insideS` not counted)
 */
export function searchAndBound(model: OrderModel, start: Int32Array, options: OrderOptions): Found | null {
  const { rounds = 60, seed = 1, shouldStop, onProgress, now, budgetMs } = options;
  const m = model.blocks.length;
  const cost = withFigures(model);
  const startedMs = now?.() ?? 0;
  const isOver = () => (shouldStop?.() ?? false) || (now !== undefined && budgetMs !== undefined && now() - startedMs >= budgetMs);
  const search = makeSearch(model, cost, start, seededRandom(seed));
  const ascent = makeAscent(m + 1, cost);
  const grain = grainOf(model);
  let boundS = 0;
  const isClosed = () => search.bestCost - boundS <= CLOSE_ENOUGH * Math.max(1, search.bestCost);
  const raise = (valueS: number) => {
    // Every order's cost is a multiple of the grain: the bound may be rounded up to the next.
    boundS = Math.max(boundS, grain > 0 ? Math.ceil(valueS / grain - 1e-6) * grain : valueS);
  };
  const report = (done: number) => onProgress?.({ bestS: search.bestCost + model.insideS, lowerBoundS: boundS + model.insideS, done });
  const isSearched = () => isOver() || isClosed() || (now !== undefined && budgetMs !== undefined && now() - startedMs >= SEARCH_SHARE * budgetMs);
  for (let round = 0; round < rounds && !isSearched(); round += 1) {
    search.run(KICKS, isOver);
    if (round < 10) {
      ascent.run(search.bestCost, 60);
      raise(ascent.boundS);
    }
    report((SEARCH_SHARE * (round + 1)) / rounds);
  }
  if (!isClosed() && !isOver()) {
    const tight = tightenBound(m + 1, cost, ascent.prices, search.bestCost, {
      isOver,
      grain,
      // A part costs some n² steps: the same effort for every size.
      mostParts: Math.ceil(rounds * PARTS * (61 / (m + 1)) ** 2),
      isGood: (sequence) => keepsPins(model, sequence) && isAllowed(model, sequence),
      onBound: (valueS, share) => {
        raise(valueS);
        report(SEARCH_SHARE + (1 - SEARCH_SHARE) * share);
      },
    });
    raise(tight.boundS);
    if (tight.sequence) {
      search.best = tight.sequence;
      search.bestCost = costOf(model, tight.sequence);
    }
  }
  return isAllowed(model, search.best) ? { sequence: search.best, boundS } : null;
}

/** Forbidden arcs as a figure no allowed order reaches. */
function withFigures(model: OrderModel): Float64Array {
  const most = model.cost.reduce((a, b) => (b === Infinity ? a : Math.max(a, b)), 0);
  const tooMuch = (most + 1) * (model.blocks.length + 2);
  return model.cost.map((seconds) => (seconds === Infinity ? tooMuch : seconds));
}

/** The longest time, in whole milliseconds, that every cost is a multiple of, in seconds; 0 where there is none. */
function grainOf(model: OrderModel): number {
  let shared = 0;
  for (const seconds of model.cost) {
    if (seconds === Infinity) continue;
    const thousandths = Math.round(seconds * 1000);
    if (Math.abs(seconds * 1000 - thousandths) > 1e-6) return 0;
    shared = gcd(shared, thousandths);
  }
  return shared / 1000;
}

function gcd(a: number, b: number): number {
  while (b > 0) [a, b] = [b, a % b];
  return a;
}
