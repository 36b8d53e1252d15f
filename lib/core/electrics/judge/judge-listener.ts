import type { Range } from "@/lib/core/units/spread";
import type { Reason, Verdict } from "../jacks";
import { judgeAudio } from "./judge-audio";
import { judgeDrive } from "./judge-drive";
import { judgeLevels } from "./judge-levels";
import { judgeLimits } from "./judge-limits";
import { judgeMissing } from "./judge-missing";
import { judgePulse } from "./judge-pulse";
import { orderReasons } from "./order-verdicts";
import { sayGood } from "./say-good";
import type { Scene } from "./scene";

/** Every reason that applies to one listener, in the table's order; the first is its verdict. */
export function judgeListener(scene: Scene): { verdict: Verdict; reasons: Reason[]; pulseS: Range | null } {
  const pulse = judgePulse(scene);
  const reasons = orderReasons([
    ...judgeLimits(scene),
    ...judgeDrive(scene),
    ...judgeLevels(scene),
    ...pulse.reasons,
    ...judgeMissing(scene),
    ...judgeAudio(scene),
  ]);
  if (reasons.length === 0) reasons.push(sayGood(scene));
  return { verdict: reasons[0]?.verdict ?? "good", reasons, pulseS: pulse.pulseS };
}
