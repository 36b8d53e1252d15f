import { formatQuantity } from "@/lib/core/units/format-quantity";
import { toRange, type Range } from "@/lib/core/units/spread";
import type { Reason } from "../jacks";
import { isAbove, isBelow } from "./compare";
import { nameOutput, type Scene } from "./scene";
import { seePulse } from "./see-pulse";

/** Room a pulse needs on either side of the input's limits. */
const PULSE_MARGIN = 1.2;

/** `brief`, `long`, and the `tight` that belongs to them: does the pulse last as the input wants it? */
export function judgePulse(scene: Scene): { reasons: Reason[]; pulseS: Range | null } {
  const { pulseS: limits } = scene.input;
  const reasons: Reason[] = [];
  let seen: Range | null = null;
  for (const index of scene.driving) {
    reasons.push(...judgeDecay(scene, index));
    const width = seePulse(scene, index);
    if (!width) continue;
    seen = seen ? { min: Math.min(seen.min, width.min), max: Math.max(seen.max, width.max) } : width;
    if (limits?.min !== undefined) reasons.push(...judgeShortest(nameOutput(scene, index), width.min, limits.min));
    if (limits?.max !== undefined) reasons.push(...judgeLongest(nameOutput(scene, index), width.max, limits.max));
  }
  return { reasons, pulseS: seen };
}

function judgeShortest(name: string, shortest: number, min: number): Reason[] {
  const numbers = { measured: Math.min(shortest, Number.MAX_VALUE), limit: min, unit: "s" as const };
  if (isBelow(shortest, min)) {
    return [{ verdict: "brief", text: `The pulse from ${name} can be as short as ${formatQuantity(shortest, "s")}; the input needs ${formatQuantity(min, "s")}.`, ...numbers }];
  }
  return isBelow(shortest, PULSE_MARGIN * min)
    ? [{ verdict: "tight", text: `The pulse from ${name} can be as short as ${formatQuantity(shortest, "s")}, little over the ${formatQuantity(min, "s")} the input needs.`, ...numbers }]
    : [];
}

function judgeLongest(name: string, longest: number, max: number): Reason[] {
  if (longest === Infinity) {
    return [{ verdict: "long", text: `The envelope from ${name} may never fall back below the input's threshold; the input takes ${formatQuantity(max, "s")} at most.`, limit: max, unit: "s" }];
  }
  const numbers = { measured: longest, limit: max, unit: "s" as const };
  if (isAbove(longest, max)) {
    return [{ verdict: "long", text: `The pulse from ${name} can last ${formatQuantity(longest, "s")}; the input takes ${formatQuantity(max, "s")} at most.`, ...numbers }];
  }
  return isAbove(longest, max / PULSE_MARGIN)
    ? [{ verdict: "tight", text: `The pulse from ${name} can last ${formatQuantity(longest, "s")}, little under the ${formatQuantity(max, "s")} the input takes.`, ...numbers }]
    : [];
}

function judgeDecay(scene: Scene, index: number): Reason[] {
  const output = scene.outputs[index];
  const min = scene.input.decayS?.min;
  if (min === undefined || output?.signal !== "envelope" || output.decayS === undefined) return [];
  const shortest = toRange(output.decayS).min;
  if (!isBelow(shortest, min)) return [];
  const text = `The envelope from ${nameOutput(scene, index)} can fall in ${formatQuantity(shortest, "s")}; the input wants ${formatQuantity(min, "s")} or more.`;
  return [{ verdict: "brief", text, measured: shortest, limit: min, unit: "s" }];
}
