import type { Choice } from "../tolerance/find-corners";
import type { ConditionerSpec, Solution } from "./conditioner-types";
import { nominal, settleCircuit } from "./settle-circuit";
import { solveCircuit } from "./solve-circuit";

/** The circuit with some parts off their nominal values, solved. */
export function solveChoice(spec: ConditionerSpec, choice: Choice): Solution {
  return solveCircuit(settleCircuit(spec, (spread, path) => choice[path] ?? nominal(spread, path)));
}
