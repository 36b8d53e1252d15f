import { formatQuantity } from "@/lib/core/units/format-quantity";
import { nominalOf } from "@/lib/core/units/spread";
import { checkBare } from "../check-bare";
import type { Connection, ListenerCheck, PulseWidthFix } from "../connection-types";
import { capacitorLists } from "../fixes/part-lists";
import { isFit } from "../fixes/try-lead";
import type { ConditionerQuestion } from "../patch-types";
import { askedOf } from "./ask-conditioner";
import type { PatchNode } from "./index-patch";
import type { NodeContext } from "./node-context";

/** Each try solves the circuit anew; the nearest values are the ones that would do. */
const MOST_TRIES = 8;
const CAPACITOR_TOL = 0.1;

/**
 * For a pulse of the wrong length from a conditioner whose parts are known: the coupling capacitor that makes it right,
 * found by solving the circuit again — a finite strike does not stretch a pulse in proportion to R·C.
 */
export function findCircuitPulse(context: NodeContext, node: PatchNode, connection: Connection, place: number, listener: ListenerCheck): PulseWidthFix[] {
  const brief = listener.reasons.some((reason) => reason.verdict === "brief");
  const long = listener.reasons.some((reason) => reason.verdict === "long");
  const from = node.outputs[0];
  if (brief === long || context.fixOptions.fixes === false || node.outputs.length !== 1 || from?.jack.role !== "trigger-out" || !context.simulate) return [];
  const question = askedOf(context.index, from.gear);
  if (!question) return [];
  const now = nominalOf(question.circuit.coupling.farad);
  const list = (capacitorLists(context.fixOptions)[0] ?? []).filter((value) => (brief ? value > now : value < now));
  let tight: PulseWidthFix | null = null;
  for (const farad of (brief ? list : list.reverse()).slice(0, MOST_TRIES)) {
    const fix = tryCapacitor(context, question, connection, place, farad, now);
    if (fix?.verdict === "good") return [fix];
    tight ??= fix;
  }
  return tight ? [tight] : [];
}

function tryCapacitor(context: NodeContext, question: ConditionerQuestion, connection: Connection, place: number, farad: number, now: number): PulseWidthFix | null {
  const tol = context.fixOptions.capacitorTol ?? CAPACITOR_TOL;
  const circuit = { ...question.circuit, coupling: { ...question.circuit.coupling, farad: { nominal: farad, tol } } };
  const outcome = context.simulate?.({ ...question, circuit });
  if (!outcome || (outcome.verdict !== "good" && outcome.verdict !== "tight")) return null;
  const output = { ...connection.outputs[0], ...outcome.trigger };
  const check = checkBare({ outputs: [output], inputs: connection.inputs }).listeners[place] ?? null;
  if (!isFit(check) || !check.pulseS) return null;
  const text = `${formatQuantity(farad, "F")} in place of ${formatQuantity(now, "F")} as the coupling capacitor: the pulse then lasts ${formatQuantity(check.pulseS.min, "s")} to ${formatQuantity(check.pulseS.max, "s")}.`;
  return { kind: "pulse-width", part: "farad", value: farad, tol, pulseS: check.pulseS, text, verdict: check.verdict, highV: check.highV, lowV: check.lowV };
}
