import { makeAscent } from "./bound-order";
import { explainConflict } from "./explain-conflict";
import { findFeasible } from "./find-feasible";
import { findPlainConflicts, sayRule } from "./find-plain-conflicts";
import { findOrderIssues } from "./find-order-issues";
import { costOf, keepsPins, modelOrder, rulesOf, type OrderModel } from "./model-order";
import { isAllowed, makeSearch } from "./search-order";
import { seededRandom } from "./seeded-random";
import { MOST_EXACT_BLOCKS, solveExact } from "./solve-exact";
import type { OrderOptions, OrderOutcome, OrderRequest } from "./types";
import { tightenBound } from "./tighten-bound";

/** A gap below this share of the total is not worth more search. */
const CLOSE_ENOUGH = 1e-9;
/** Share of the effort spent on finding orders before the bound is worked on. */
const SEARCH_SHARE = 0.25;
/** Kicks of local search, and parts of branch and bound (at 60 songs), in one round. */
const KICKS = 50;
const PARTS = 40;

/**
 * The order of songs with the least total changeover. Proven optimal (Held–Karp) where at most 20 blocks remain after songs that must
 * follow each other are joined; above, the best found by local search, with a lower bound that no order can beat.
 * Among equally good orders the exact method gives the one that comes first in the performer's order; the search keeps the performer's own
 * order unless it has found a better one.
 * @param request as `findOrderIssues` accepts it; seconds 0 or more
 * @param options how long to look and how to stop; without a clock the effort is a fixed number of rounds and the answer always the same
 * @returns the order; or, where the rules cannot all hold, sentences naming those that clash
 * @throws RangeError when `findOrderIssues` names anything
 */
export function orderSet(request: OrderRequest, options: OrderOptions = {}): OrderOutcome {
  const [issue] = findOrderIssues(request);
  if (issue) throw new RangeError(`${issue.path.join(".")}: ${issue.message}`);
  const rules = rulesOf(request);
  const plain = findPlainConflicts(request.songs, rules);
  if (plain.length > 0) return { ok: false, conflicts: [...new Set(plain.map(({ text }) => text))], undecided: false };
  const model = modelOrder(request, rules);

  if (model.blocks.length <= MOST_EXACT_BLOCKS) {
    const sequence = solveExact(model);
    if (!sequence) return { ok: false, conflicts: [explainConflict(request, rules)], undecided: false };
    const answer = present(request, model, sequence);
    return { ok: true, ...answer, lowerBoundS: answer.totalS, provenOptimal: true };
  }

  const start = findStart(model);
  if (start === "impossible") return { ok: false, conflicts: [explainConflict(request, rules)], undecided: false };
  const found = start === "undecided" ? null : look(model, start, options);
  if (!found) {
    const named = rules.map((rule) => sayRule(rule, request.songs)).slice(0, 20).join("; ");
    return { ok: false, conflicts: [`No order was found that keeps all of these, though it is not proved that there is none: ${named}.`], undecided: true };
  }
  const answer = present(request, model, found.sequence);
  const bound = Math.min(found.boundS + model.insideS, answer.totalS);
  const isProven = bound >= answer.totalS - CLOSE_ENOUGH * Math.max(1, answer.totalS);
  return { ok: true, ...answer, lowerBoundS: isProven ? answer.totalS : Math.max(bound, 0), provenOptimal: isProven };
}

/** A sequence that keeps the pins, and the rest of the rules if one is quickly found: the performer's own order first. */
function findStart(model: OrderModel): Int32Array | "impossible" | "undecided" {
  const own = Int32Array.from(model.blocks, (_, index) => index);
  if (keepsPins(model, own) && isAllowed(model, own)) return own;
  const strict = findFeasible(model);
  if (strict.kind === "possible") return strict.sequence;
  if (strict.kind === "impossible") return "impossible";
  // Pins alone; the search then looks for neighbours that are allowed.
  const pinsOnly = findFeasible({ ...model, cost: new Float64Array(model.cost.length) });
  return pinsOnly.kind === "possible" ? pinsOnly.sequence : pinsOnly.kind;
}

interface Found {
  sequence: Int32Array;
  boundS: number;
}

function look(model: OrderModel, start: Int32Array, options: OrderOptions): Found | null {
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

function present(request: OrderRequest, model: OrderModel, sequence: ArrayLike<number>): { order: string[]; totalS: number } {
  const songs = Array.from(sequence).flatMap((block) => model.blocks[block]!);
  return { order: songs.map((song) => request.songs[song]!), totalS: totalOf(request, songs) };
}

function totalOf(request: OrderRequest, songs: number[]): number {
  const first = request.setupS[request.songs[songs[0]!]!]!;
  return songs.reduce((sum, song, k) => (k === 0 ? sum : sum + request.changeoverS[songs[k - 1]!]![song]!), first);
}
