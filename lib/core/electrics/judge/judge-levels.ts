import { formatQuantity, formatRange } from "@/lib/core/units/format-quantity";
import { toRange, type Range } from "@/lib/core/units/spread";
import type { Reason } from "../jacks";
import { isAbove, isAtOrAbove, isBelow } from "./compare";
import { isFalling, mirror, type Scene } from "./scene";

/** Least margin to a threshold: a tenth of it, and never less than this. */
const LEAST_MARGIN_V = 0.2;

/** `stuck`, `dead`, `weak`, and the `tight` that belongs to them: does the level cross the thresholds both ways? */
export function judgeLevels(scene: Scene): Reason[] {
  const { input } = scene;
  if (input.onV === undefined && input.offV === undefined) return [];
  const falling = isFalling(input);
  const off = input.offV ?? input.onV;
  return [
    ...(off !== undefined && scene.lowV ? judgeRest(scene.lowV, toRange(off), falling) : []),
    ...(input.onV !== undefined && scene.highV ? judgeActive(scene, scene.highV, toRange(input.onV), falling) : []),
  ];
}

function judgeRest(lowV: Range, offV: Range, falling: boolean): Reason[] {
  const rest = mirror(lowV, falling).max;
  const release = mirror(offV, falling).min;
  const numbers = { measured: unmirror(rest, falling), limit: unmirror(release, falling), unit: "V" as const };
  const [at, from] = [formatQuantity(numbers.measured, "V"), formatQuantity(numbers.limit, "V")];
  if (isAtOrAbove(rest, release)) {
    return [{ verdict: "stuck", text: `At rest the level can stay at ${at}; the input may let go only ${falling ? "above" : "below"} ${from}, so it may never let go.`, ...numbers }];
  }
  if (isAbove(rest, release - needed(release))) {
    return [{ verdict: "tight", text: `At rest the level comes to ${at}, close to the ${from} at which the input lets go.`, ...numbers }];
  }
  return [];
}

function judgeActive(scene: Scene, highV: Range, onV: Range, falling: boolean): Reason[] {
  const on = mirror(onV, falling);
  const most = mirror(highV, falling).max;
  const least = mirror(scene.weakestV ?? highV, falling).min;
  const side = falling ? "down to" : "up to";
  if (isBelow(most, on.min)) {
    const numbers = { measured: unmirror(most, falling), limit: unmirror(on.min, falling), unit: "V" as const };
    return [{ verdict: "dead", text: `The level gets only ${side} ${formatQuantity(numbers.measured, "V")}; the input cannot fire before ${formatQuantity(numbers.limit, "V")}.`, ...numbers }];
  }
  const numbers = { measured: unmirror(least, falling), limit: unmirror(on.max, falling), unit: "V" as const };
  const [at, sure] = [formatQuantity(numbers.measured, "V"), formatQuantity(numbers.limit, "V")];
  if (isBelow(least, on.max)) {
    return [{ verdict: "weak", text: `The level may get only ${side} ${at}; the input is sure to fire only from ${sure} (${formatRange(onV, "V")}).`, ...numbers }];
  }
  if (isBelow(least, on.max + needed(on.max))) {
    return [{ verdict: "tight", text: `The level is sure to get ${side} ${at}, close to the ${sure} the input needs.`, ...numbers }];
  }
  return [];
}

function needed(threshold: number): number {
  return Math.max(0.1 * Math.abs(threshold), LEAST_MARGIN_V);
}

function unmirror(value: number, falling: boolean): number {
  return falling ? 0 - value : value;
}
