import type { Circuit, ConditionerSpec, Finding, Solution } from "../conditioner-types";

/** What a builder should know of this circuit. */
export function findFindings(_spec: ConditionerSpec, _circuit: Circuit, _solution: Solution, _weakestHitOhm: number | null): Finding[] {
  return [];
}
