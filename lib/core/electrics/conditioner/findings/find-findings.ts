import type { Finding } from "../conditioner-types";
import { findDecadeSlip, findDoubleTrigger, findSlowHit } from "./find-coupling-faults";
import { findLowestSupply } from "./find-lowest-supply";
import { findRestsNegative, findUnderfilled } from "./find-output-faults";
import { findBelowRail, findDividerOff, findOutOfRange } from "./find-pad-faults";
import { findReStrike } from "./find-re-strike";
import type { Scene } from "./scene";
import { findNoise, findOutOfReach, findRestsHigh } from "./find-threshold-faults";

/** What a builder should know of this circuit, what keeps it from working first. */
export function findFindings(scene: Scene): Finding[] {
  return [
    findRestsHigh, findOutOfReach, findUnderfilled, findDoubleTrigger, findDecadeSlip, findSlowHit, findDividerOff, findNoise,
    findRestsNegative, findOutOfRange, findBelowRail, findLowestSupply, findReStrike,
  ].flatMap((find) => find(scene));
}
