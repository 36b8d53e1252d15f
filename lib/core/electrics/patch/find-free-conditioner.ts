import { checkBare } from "../check-bare";
import type { Connection, ListenerCheck, ThroughGearFix } from "../connection-types";
import { isFit } from "../fixes/try-lead";
import { worstVerdict } from "../judge/order-verdicts";
import type { GearModel } from "../patch-types";
import { turnOf } from "./ask-conditioner";
import type { PatchNode } from "./index-patch";
import { isUnplugged } from "./list-free-gear";
import type { NodeContext } from "./node-context";
import { conditionerOutput } from "./resolve-jacks";

/** A circuit takes its time to solve; so many free ones are tried. */
const MOST_TRIES = 6;

/** For a bare pad on an input that wants a signal: a free conditioner that this pad fires and that suits the input. */
export function findFreeConditioner(context: NodeContext, node: PatchNode, connection: Connection, place: number, listener: ListenerCheck): ThroughGearFix[] {
  const pad = node.outputs[0]?.gear.pad;
  const wrongKind = listener.reasons.some((reason) => reason.verdict === "wrong-kind");
  if (!pad || node.outputs.length !== 1 || !wrongKind || !context.simulate || context.fixOptions.fixes === false) return [];
  const free = context.index.rig.gear.filter((gear) => gear.kind === "conditioner" && gear.circuit && isUnplugged(context.index, gear));
  let tight: ThroughGearFix | null = null;
  for (const gear of free.slice(0, MOST_TRIES)) {
    const fix = tryConditioner(context, gear, pad, connection, place);
    if (fix?.verdict === "good") return [fix];
    tight ??= fix;
  }
  return tight ? [tight] : [];
}

function tryConditioner({ index, simulate }: NodeContext, gear: GearModel, pad: NonNullable<GearModel["pad"]>, connection: Connection, place: number): ThroughGearFix | null {
  const input = connection.inputs[place];
  if (!input || !gear.circuit || !simulate) return null;
  const into = gear.jacks.find((jack) => jack.role === "pad-in");
  const outcome = simulate({ circuit: gear.circuit, pad, turn: turnOf(index, gear), loadOhm: input.loadOhm });
  if (outcome.verdict !== "good" && outcome.verdict !== "tight") return null;
  for (const jack of gear.jacks) {
    const output = conditionerOutput(jack, outcome);
    const check = output && (checkBare({ outputs: [output], inputs: [input] }).listeners[0] ?? null);
    if (!check || !isFit(check)) continue;
    return {
      kind: "conditioner", gearId: gear.id, name: gear.name, feedVerdict: outcome.verdict, verdict: worstVerdict([outcome.verdict, check.verdict]),
      highV: check.highV, lowV: check.lowV, text: `Lead the pad through ${gear.name}, which is free in this song, from its jack ${jack.name}.`,
      ...(into ? { through: { inputId: into.id, outputId: jack.id } } : {}),
    };
  }
  return null;
}
