import { nearestPreferred } from "@/lib/core/units/e-series";
import type { Finding } from "../conditioner-types";
import { amperes, isSound, ohms, percent, trySettled, volts, type Scene } from "./scene";

/** Swing lost to the divider's resistor before it is worth a word: our choice. */
const WORTH_SAYING = 0.1;
/** How far below its lower rail many comparators' inputs may go, V (electrics §3). */
const BELOW_RAIL_V = 0.3;
/** In front of the input; our choice. */
const INPUT_OHM = 10e3;

/** The divider's resistor against the best for swing, √(rest·hit). Source: calculus; sources §2. */
export function findDividerOff(scene: Scene): Finding[] {
  const { restOhm, hitOhm, dividerOhm, highV } = scene.circuit;
  const swing = (ohm: number) => highV * Math.abs(ohm / (ohm + hitOhm) - ohm / (ohm + restOhm));
  const best = Math.sqrt(restOhm * hitOhm);
  const lost = 1 - swing(dividerOhm) / swing(best);
  if (!(lost > WORTH_SAYING)) return [];
  const text = `With ${ohms(dividerOhm)} the divider swings ${volts(swing(dividerOhm))}; with √(rest × hit) = ${ohms(best)} it would swing ${volts(swing(best))}, so ${percent(lost)} is lost.`;
  const ohm = nearestPreferred(best, "E12");
  const tried = trySettled(scene, { dividerOhm: ohm });
  if (!isSound(tried) || tried.shapedPeakV <= scene.solution.shapedPeakV) return [{ code: "divider-off", text }];
  return [{ code: "divider-off", text, fix: { text: `${ohms(ohm)} raises the peak at the comparator from ${volts(scene.solution.shapedPeakV)} to ${volts(tried.shapedPeakV)}.`, divider: { ohm } } }];
}

/** Threshold or signal outside the comparator's stated common-mode range. */
export function findOutOfRange({ spec, circuit, solution }: Scene): Finding[] {
  const range = spec.comparator.commonMode;
  if (!range) return [];
  const outside = (level: number) => level < range.lowV || level > range.highV;
  const faults = [
    ...(outside(circuit.thresholdV) ? [`the threshold is ${volts(circuit.thresholdV)}`] : []),
    ...(solution.shapedPeakV > range.highV ? [`the signal comes to ${volts(solution.shapedPeakV)}`] : []),
    ...(range.lowV > 0 ? ["the signal rests at 0 V"] : []),
    ...(solution.shapedLeastV < range.lowV && range.lowV <= 0 ? [`the signal goes down to ${volts(solution.shapedLeastV)}`] : []),
  ];
  if (faults.length === 0) return [];
  return [{ code: "input-out-of-range", text: `The comparator's inputs work from ${volts(range.lowV)} to ${volts(range.highV)}, and ${faults.join(", ")}.` }];
}

/** The clamp is a plain diode: it lets the input further below the rail than many parts stand. */
export function findBelowRail({ circuit, solution }: Scene): Finding[] {
  const least = solution.shapedLeastV;
  if (!(least < circuit.lowV - BELOW_RAIL_V)) return [];
  const beyondV = circuit.lowV - BELOW_RAIL_V - least;
  return [{
    code: "input-below-rail",
    text: `As the pad lets go the (+) input goes to ${volts(least)}; many parts stand ${volts(circuit.lowV - BELOW_RAIL_V)} at most.`,
    fix: { text: `${ohms(INPUT_OHM)} in series with the (+) input leaves ${amperes(beyondV / INPUT_OHM)} for its own protection; or a Schottky diode as the clamp (BAT85: 0.32 V at 1 mA at most).`, inputOhm: INPUT_OHM },
  }];
}
