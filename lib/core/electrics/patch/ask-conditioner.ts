import { toRange, type Spread } from "@/lib/core/units/spread";
import type { ConditionerOutcome, ConditionerQuestion, ConditionerSimulator, GearModel } from "../patch-types";
import type { PatchIndex, PatchNode, PlacedJack } from "./index-patch";

/** What stands between a conditioner and an answer, where there is none. */
export type NoAnswer = "no-pad" | "several-pads" | "shared-pad" | "no-circuit" | "no-simulator";

export type ConditionerAnswer = { outcome: ConditionerOutcome; pad: GearModel } | { missing: NoAnswer };

/** Asks each conditioner once: its parts, the pad plugged into it in this song, its knob, and what hangs on its trigger output. */
export function conditionerAsker(index: PatchIndex, simulate: ConditionerSimulator | undefined): (gear: GearModel) => ConditionerAnswer {
  const answers = new Map<string, ConditionerAnswer>();
  return (gear) => {
    const known = answers.get(gear.id);
    if (known) return known;
    const answer = ask(index, simulate, gear);
    answers.set(gear.id, answer);
    return answer;
  };
}

function ask(index: PatchIndex, simulate: ConditionerSimulator | undefined, gear: GearModel): ConditionerAnswer {
  if (!gear.circuit) return { missing: "no-circuit" };
  const nodes = padNodes(index, gear);
  const pads = nodes.flatMap((node) => node.outputs).filter(({ gear: from }) => from.pad !== undefined);
  const pad = pads[0]?.gear;
  if (!pad?.pad) return { missing: "no-pad" };
  if (pads.length > 1) return { missing: "several-pads" };
  if (nodes.some((node) => node.inputs.length > 1)) return { missing: "shared-pad" };
  if (!simulate) return { missing: "no-simulator" };
  const outcome = simulate({ circuit: gear.circuit, pad: pad.pad, turn: turnOf(index, gear), loadOhm: loadOf(index, gear) });
  return { outcome, pad };
}

/** The question this song puts to a conditioner, or null where it cannot be put. */
export function askedOf(index: PatchIndex, gear: GearModel): ConditionerQuestion | null {
  const pad = padNodes(index, gear).flatMap((node) => node.outputs).find(({ gear: from }) => from.pad !== undefined)?.gear.pad;
  if (!gear.circuit || !pad) return null;
  return { circuit: gear.circuit, pad, turn: turnOf(index, gear), loadOhm: loadOf(index, gear) };
}

/** The nodes at a conditioner's pad inputs. */
export function padNodes(index: PatchIndex, gear: GearModel): PatchNode[] {
  return nodesAt(index, gear, (placed) => placed.jack.role === "pad-in");
}

/** The nodes its computed outputs drive. */
export function drivenNodes(index: PatchIndex, gear: GearModel): PatchNode[] {
  return nodesAt(index, gear, (placed) => placed.jack.role === "trigger-out" || placed.jack.role === "envelope-out");
}

function nodesAt(index: PatchIndex, gear: GearModel, wanted: (placed: PlacedJack) => boolean): PatchNode[] {
  const nodes = gear.jacks.filter((jack) => wanted({ jack, gear })).map((jack) => index.nodeOfJack.get(jack.id));
  return [...new Set(nodes.filter((node): node is PatchNode => node !== undefined))];
}

/** The knob that turns the threshold; midway where the song says nothing. */
export function turnOf(index: PatchIndex, gear: GearModel): number {
  const knob = gear.knobs?.find((k) => k.turns === "threshold");
  const set = index.patch.knobs.find((k) => k.gearId === gear.id && k.knobId === knob?.id);
  return set?.position ?? 0.5;
}

/** All loads on the trigger output in parallel; null where nothing draws. */
function loadOf(index: PatchIndex, gear: GearModel): Spread | null {
  const triggers = gear.jacks.filter((jack) => jack.role === "trigger-out");
  const nodes = [...new Set(triggers.map((jack) => index.nodeOfJack.get(jack.id)))];
  const loads = nodes.flatMap((node) => node?.inputs ?? []).flatMap(({ jack }) => {
    const loadOhm = jack.input?.loadOhm ?? null;
    return loadOhm === null ? [] : [toRange(loadOhm)];
  });
  if (loads.length === 0) return null;
  const parallel = (end: "min" | "max") => 1 / loads.reduce((sum, load) => sum + 1 / load[end], 0);
  return { min: parallel("min"), max: parallel("max") };
}
