import { checkPatch, type PatchCheck } from "@/lib/core/electrics";
import type { Gear } from "@/lib/schemas/gear";
import type { Patch } from "@/lib/schemas/patch";
import { simulateForPatch } from "@/lib/core/electrics/conditioner/simulate-for-patch";
import { toRigModel } from "./to-rig-model";

/** The server's check of a patch against stored gear. */
export function checkGearPatch(gear: readonly Gear[], patch: Patch): PatchCheck {
  return checkPatch(toRigModel(gear), patch, simulateForPatch);
}
