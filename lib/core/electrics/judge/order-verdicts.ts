import { VERDICTS, type Reason, type Verdict } from "../jacks";

/** Place from fine (0) to worst. */
export function severityOf(verdict: Verdict): number {
  return VERDICTS.indexOf(verdict);
}

/**
 * Place in the table's order of asking, first asked first. It differs from severity
 * in two rows that one line of the table holds: dead before weak, brief before long.
 */
const ASKED: readonly Verdict[] = [
  "hot", "clash", "overload", "reversed", "wrong-kind", "stuck", "dead", "weak", "brief", "long", "unproven", "tight", "good",
];

/** The reasons in the table's order; those of one verdict keep theirs. */
export function orderReasons(reasons: readonly Reason[]): Reason[] {
  return [...reasons].sort((a, b) => ASKED.indexOf(a.verdict) - ASKED.indexOf(b.verdict));
}

/** The first verdict of the table's order among these; `good` for none. */
export function worstVerdict(verdicts: readonly Verdict[]): Verdict {
  return ASKED.find((verdict) => verdicts.includes(verdict)) ?? "good";
}
