import { checkPatch, simulateForPatch, type CheckPatchOptions, type PatchCheck } from "@/lib/core/electrics";
import type { Gear } from "@/lib/schemas/gear";
import type { Patch } from "@/lib/schemas/patch";
import { toRigModel } from "./to-rig-model";

/** How the server checks: conditioners solved from their parts, fixes from preferred numbers. */
export const CHECK_OPTIONS: CheckPatchOptions = { simulate: simulateForPatch };

/** The server's check of a patch against stored gear. */
export function checkGearPatch(gear: readonly Gear[], patch: Patch): PatchCheck {
  return checkPatch(toRigModel(gear), patch, CHECK_OPTIONS);
}
