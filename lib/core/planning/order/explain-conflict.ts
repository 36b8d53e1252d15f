import { findFeasible } from "./find-feasible";
import { findPlainConflicts, sayRule } from "./find-plain-conflicts";
import { modelOrder, type Rule } from "./model-order";
import type { OrderRequest } from "./types";

/**
 * A smallest set of rules that cannot all hold, in words: dropping any one of them would leave a way. Found by halving
 * (QuickXplain, Junker 2004; from memory) over an exact test of whether any order is left.
 * @param rules known to be impossible together, none contradicting another plainly
 * @returns a sentence that names each rule of that set
 */
export function explainConflict(request: OrderRequest, rules: Rule[]): string {
  const isPossible = (kept: Rule[]) =>
    findPlainConflicts(request.songs, kept).length === 0 && findFeasible(modelOrder(request, kept)).kind !== "impossible";
  const core = findCore([], [], rules, isPossible);
  return `These cannot all hold: ${core.map((rule) => sayRule(rule, request.songs)).join("; ")}.`;
}

function findCore(kept: Rule[], added: Rule[], rules: Rule[], isPossible: (kept: Rule[]) => boolean): Rule[] {
  if (added.length > 0 && !isPossible(kept)) return [];
  if (rules.length <= 1) return rules;
  const half = Math.floor(rules.length / 2);
  const first = rules.slice(0, half);
  const second = rules.slice(half);
  const inSecond = findCore([...kept, ...first], first, second, isPossible);
  const inFirst = findCore([...kept, ...inSecond], inSecond, first, isPossible);
  return [...inFirst, ...inSecond];
}
