import type { FixOptions } from "../connection-types";
import type { ConditionerSimulator, GearModel } from "../patch-types";
import type { ConditionerAnswer } from "./ask-conditioner";
import type { PatchIndex } from "./index-patch";

/** What checking any node of one patch needs. */
export interface NodeContext {
  index: PatchIndex;
  ask: (gear: GearModel) => ConditionerAnswer;
  simulate: ConditionerSimulator | undefined;
  fixOptions: FixOptions;
}
