import { formatQuantity } from "@/lib/core/units/format-quantity";
import { toRange } from "@/lib/core/units/spread";
import type { Reason } from "../jacks";
import { isAbove, isBelow } from "./compare";
import type { Scene } from "./scene";

/** Share of the safe range kept free at either end. */
const SAFE_SHARE = 0.03;

/** Below this a diode that conducts is rounding, not current. */
const LEAST_CURRENT_A = 1e-12;

/** `hot`, and the `tight` that belongs to it: can the level, or the current through the clamp, harm the input? */
export function judgeLimits(scene: Scene): Reason[] {
  return scene.input.clamp ? judgeClamp(scene) : judgeSafeRange(scene);
}

function judgeClamp({ input, clampA }: Scene): Reason[] {
  if (!input.clamp || clampA === null || clampA < LEAST_CURRENT_A) return [];
  const maxA = input.clamp.maxA;
  const numbers = { measured: clampA, limit: maxA, unit: "A" as const };
  return isAbove(clampA, maxA)
    ? [{ verdict: "hot", text: `The protection diodes would carry ${formatQuantity(clampA, "A")}; they stand ${formatQuantity(maxA, "A")}.`, ...numbers }]
    : [{ verdict: "tight", text: `The protection diodes conduct: ${formatQuantity(clampA, "A")} of the ${formatQuantity(maxA, "A")} they stand.`, ...numbers }];
}

function judgeSafeRange({ input, extremeV }: Scene): Reason[] {
  if (!input.safeV || !extremeV) return [];
  const safe = toRange(input.safeV);
  const spare = SAFE_SHARE * (safe.max - safe.min);
  const reasons: Reason[] = [];
  const high = { measured: extremeV.max, limit: safe.max, unit: "V" as const };
  const low = { measured: extremeV.min, limit: safe.min, unit: "V" as const };
  const [most, least] = [formatQuantity(extremeV.max, "V"), formatQuantity(extremeV.min, "V")];
  const [upper, lower] = [formatQuantity(safe.max, "V"), formatQuantity(safe.min, "V")];
  if (isAbove(extremeV.max, safe.max)) reasons.push({ verdict: "hot", text: `Up to ${most} can reach an input that stands ${upper} at most.`, ...high });
  if (isBelow(extremeV.min, safe.min)) reasons.push({ verdict: "hot", text: `The level can go down to ${least} at an input that stands no less than ${lower}.`, ...low });
  if (!isAbove(extremeV.max, safe.max) && isAbove(extremeV.max, safe.max - spare)) {
    reasons.push({ verdict: "tight", text: `Up to ${most} arrives, close under the ${upper} the input stands.`, ...high });
  }
  if (!isBelow(extremeV.min, safe.min) && isBelow(extremeV.min, safe.min + spare)) {
    reasons.push({ verdict: "tight", text: `The level goes down to ${least}, close to the ${lower} the input stands.`, ...low });
  }
  return reasons;
}
