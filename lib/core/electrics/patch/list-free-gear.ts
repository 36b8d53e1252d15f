import type { FreeGear } from "../connection-types";
import type { Output } from "../jacks";
import type { GearModel, JackModel } from "../patch-types";
import type { PatchIndex } from "./index-patch";
import { resolveInput } from "./resolve-jacks";

/** Shapers with nothing plugged in this song, each by its first plain input and output whose driving figures are known. */
export function listFreeGear(index: PatchIndex): FreeGear[] {
  return index.rig.gear.flatMap((gear): FreeGear[] => {
    if (gear.kind !== "shaper" || !isUnplugged(index, gear)) return [];
    const input = gear.jacks.find((jack) => jack.direction === "input" && jack.role === "plain" && jack.input);
    const output = gear.jacks.find((jack) => jack.direction === "output" && isComplete(jack));
    if (!input || !output) return [];
    return [{ gearId: gear.id, name: gear.name, input: resolveInput({ jack: input, gear }), output: output.output as Output, through: { inputId: input.id, outputId: output.id } }];
  });
}

export function isUnplugged(index: PatchIndex, gear: GearModel): boolean {
  return !gear.jacks.some((jack) => index.nodeOfJack.has(jack.id));
}

/** Boxes that a fix may lead through. */
export function freeGearIds(index: PatchIndex): string[] {
  return index.rig.gear.filter((gear) => (gear.kind === "shaper" || gear.kind === "conditioner") && isUnplugged(index, gear)).map((gear) => gear.id);
}

function isComplete({ output }: JackModel): boolean {
  return output?.signal !== undefined && output.restV !== undefined && output.activeV !== undefined && output.sourceOhm !== undefined;
}
