import { explainConflict } from "./explain-conflict";
import { findFeasible } from "./find-feasible";
import { findPlainConflicts, sayRule } from "./find-plain-conflicts";
import { findOrderIssues } from "./find-order-issues";
import { keepsPins, modelOrder, rulesOf, type OrderModel } from "./model-order";
import { CLOSE_ENOUGH, searchAndBound } from "./search-and-bound";
import { isAllowed } from "./search-order";
import { MOST_EXACT_BLOCKS, solveExact } from "./solve-exact";
import type { OrderOptions, OrderOutcome, OrderRequest } from "./types";

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
  const found = start === "undecided" ? null : searchAndBound(model, start, options);
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

function present(request: OrderRequest, model: OrderModel, sequence: ArrayLike<number>): { order: string[]; totalS: number } {
  const songs = Array.from(sequence).flatMap((block) => model.blocks[block]!);
  return { order: songs.map((song) => request.songs[song]!), totalS: totalOf(request, songs) };
}

function totalOf(request: OrderRequest, songs: number[]): number {
  const first = request.setupS[request.songs[songs[0]!]!]!;
  return songs.reduce((sum, song, k) => (k === 0 ? sum : sum + request.changeoverS[songs[k - 1]!]![song]!), first);
}
