import { toRange, type Spread } from "@/lib/core/units/spread";
import type { Issue } from "../find-connection-issues";
import type { ConditionerSpec } from "./conditioner-types";

/** Bounds inside which no sum or product overflows; every real bench figure lies far inside. */
const MOST = { volt: 1e4, ohm: 1e15, farad: 1, ampere: 1e3, second: 86_400 };
const LEAST = { ohm: 1e-3, farad: 1e-15, ampere: 1e-9 };
const MOST_SAMPLES = 10_000;

/**
 * Names every figure of a conditioner that cannot be meant: not finite, zero or negative where something must be there,
 * upside down, or beyond any bench; captures that do not rise in time.
 * @returns an empty list where `simulateConditioner` may be called.
 */
export function findConditionerIssues(spec: ConditionerSpec): Issue[] {
  const issues: Issue[] = [];
  const say = (path: string, message: string) => issues.push({ path: path.split(".").map((step) => (/^\d+$/.test(step) ? Number(step) : step)), message });
  const within = (path: string, spread: Spread, least: number, most: number, unit: string) => {
    try {
      const { min, max } = toRange(spread);
      if (min < least || max > most) say(path, `Must lie between ${least} and ${most} ${unit}.`);
    } catch (cause) {
      say(path, cause instanceof RangeError ? cause.message : "Not a figure.");
    }
  };
  const part = (path: string, spread: Spread | null) => {
    if (spread !== null) within(path, spread, LEAST.ohm, MOST.ohm, "Ω");
  };
  const maybe = (path: string, value: number | undefined, least: number, most: number, unit: string) => {
    if (value !== undefined) within(path, value, least, most, unit);
  };
  const { supply, pad, divider, coupling, threshold, comparator, output, envelope, load } = spec;
  within("supply.highV", supply.highV, 1e-3, MOST.volt, "V");
  within("supply.lowV", supply.lowV, -MOST.volt, 0, "V");
  part("pad.restOhm", pad.restOhm);
  part("pad.hitOhm", pad.hitOhm);
  part("divider.ohm", divider.ohm);
  within("coupling.farad", coupling.farad, LEAST.farad, MOST.farad, "F");
  part("coupling.ohm", coupling.ohm);
  for (const name of ["topOhm", "potOhm", "bottomOhm"] as const) within(`threshold.${name}`, threshold[name], 0, MOST.ohm, "Ω");
  within("threshold.turn", threshold.turn, 0, 1, "of the travel");
  if (issues.length === 0 && toRange(threshold.topOhm).min + toRange(threshold.potOhm).min + toRange(threshold.bottomOhm).min <= 0) {
    say("threshold.topOhm", "The threshold divider needs some resistance, or it shorts the supply.");
  }
  within("comparator.highDropV", comparator.highDropV, 0, MOST.volt, "V");
  within("comparator.lowDropV", comparator.lowDropV, 0, MOST.volt, "V");
  within("comparator.limitA", comparator.limitA, LEAST.ampere, MOST.ampere, "A");
  maybe("comparator.sinkA", comparator.sinkA, LEAST.ampere, MOST.ampere, "A");
  maybe("comparator.slewVperS", comparator.slewVperS, 1e-3, 1e15, "V/s");
  maybe("comparator.offsetV", comparator.offsetV, -MOST.volt, MOST.volt, "V");
  maybe("comparator.hysteresisV", comparator.hysteresisV, 0, MOST.volt, "V");
  maybe("comparator.noiseV", comparator.noiseV, 0, MOST.volt, "V");
  if (comparator.commonMode) within("comparator.commonMode", { min: comparator.commonMode.lowV, max: comparator.commonMode.highV }, -MOST.volt, MOST.volt, "V");
  within("output.seriesOhm", output.seriesOhm, 0, MOST.ohm, "Ω");
  part("output.shuntOhm", output.shuntOhm);
  if (envelope) {
    within("envelope.seriesOhm", envelope.seriesOhm, 0, MOST.ohm, "Ω");
    within("envelope.farad", envelope.farad, LEAST.farad, MOST.farad, "F");
    part("envelope.ohm", envelope.ohm);
    part("envelope.emitterOhm", envelope.emitterOhm);
  }
  part("load.ohm", load.ohm);
  if (issues.length === 0 && toRange(supply.highV).min - toRange(comparator.highDropV).max <= toRange(supply.lowV).max + toRange(comparator.lowDropV).max) {
    say("comparator.highDropV", "The drops leave the comparator's output no room between the supplies.");
  }
  strikeIssues(spec.strike, say, (path, value) => within(path, value, 0, MOST.second, "s"));
  return issues;
}

function strikeIssues(strike: ConditionerSpec["strike"], say: (path: string, message: string) => void, time: (path: string, value: number) => void): void {
  if (!("samples" in strike)) {
    time("strike.riseS", strike.riseS);
    time("strike.holdS", strike.holdS);
    time("strike.fallS", strike.fallS);
    return;
  }
  const { samples } = strike;
  if (samples.length < 2 || samples.length > MOST_SAMPLES) say("strike.samples", `Must be 2 to ${MOST_SAMPLES} samples.`);
  let earlier = -Infinity;
  for (const [i, [s, ohm]] of samples.slice(0, MOST_SAMPLES).entries()) {
    if (!(Math.abs(s) <= MOST.second)) return say(`strike.samples.${i}.0`, "Must be a time in seconds.");
    if (!(s > earlier)) return say(`strike.samples.${i}.0`, "Sample times must rise from one to the next.");
    if (!(ohm >= LEAST.ohm && ohm <= MOST.ohm)) return say(`strike.samples.${i}.1`, `Must lie between ${LEAST.ohm} and ${MOST.ohm} Ω.`);
    earlier = s;
  }
}
