import { preferredAbove } from "@/lib/core/units/e-series";
import type { Finding } from "../conditioner-types";
import { isSound, ohms, percent, times, travel, tryFigures, tryTurn, turnFor, volts, type Scene } from "./scene";

/** Threshold under so many times the noise, as a peak, is near: our choice. */
const NOISE_MARGIN = 3;
/** Where a threshold is set for a hit: half its peak leaves as much room to both sides. */
const MIDDLE = 0.5;

/** The comparator is high at rest, or stays high after a hit. */
export function findRestsHigh(scene: Scene): Finding[] {
  const { circuit, solution, spec } = scene;
  const offsetV = spec.comparator.offsetV ?? 0;
  if (solution.latches) {
    return [{ code: "rests-high", text: `After the hit the comparator stays high: with a hysteresis of ${volts(spec.comparator.hysteresisV ?? 0)} it lets go at ${volts(circuit.releaseV)} only, and the signal comes back to 0 V.`, ...turnUp(scene) }];
  }
  if (!solution.restsHigh) return [];
  const beside = offsetV === 0 ? "at the level of the resting signal" : `not above the comparator's offset of ${volts(offsetV)}`;
  return [{ code: "rests-high", text: `The threshold of ${volts(circuit.thresholdV)} lies ${beside}: the output is high without a hit, and no hit can fire it.`, ...turnUp(scene) }];
}

/** A pot position that gives one pulse and lets go again. */
function turnUp(scene: Scene): Pick<Finding, "fix"> {
  const turn = turnFor(scene, Math.max(scene.solution.shapedPeakV * MIDDLE, 0.01));
  for (const tried of turn === null ? [1, 0.75, 0.5, 0.25] : [turn, 1]) {
    const { circuit, solution } = tryTurn(scene, tried);
    if (isSound(solution)) return { fix: { text: `With the pot at ${travel(tried)} the threshold is ${volts(circuit.thresholdV)}, and this hit gives one pulse.`, threshold: { turn: tried } } };
  }
  return {};
}

/** This hit, or the whole travel of the pot, cannot fire it. */
export function findOutOfReach(scene: Scene): Finding[] {
  const { circuit, solution, spec } = scene;
  if (solution.tripped || solution.restsHigh) return [];
  const peakV = solution.shapedPeakV;
  const levels = `This hit comes to ${volts(peakV)} at the comparator, ${percent(peakV / circuit.tripV)} of the ${volts(circuit.tripV)} it takes`;
  const lowest = tryTurn(scene, 0);
  const turn = turnFor(scene, peakV * MIDDLE) ?? (lowest.circuit.tripV > 0 && lowest.circuit.tripV < peakV ? 0 : null);
  if (turn !== null) {
    const tried = tryTurn(scene, turn);
    const text = `${levels}.`;
    if (!isSound(tried.solution)) return [{ code: "threshold-out-of-reach", text }];
    return [{ code: "threshold-out-of-reach", text, fix: { text: `With the pot at ${travel(turn)} the threshold is ${volts(tried.circuit.thresholdV)}, and it fires.`, threshold: { turn } } }];
  }
  const text = `${levels}, and nowhere on the pot's travel does it fire: turned right down it still takes ${volts(lowest.circuit.tripV)}.`;
  const [pot, bottom] = [tryFigures(scene, {}).circuit, spec.threshold];
  const below = pot.thresholdV / pot.highV;
  const wanted = (peakV * MIDDLE) / pot.highV;
  if (!(wanted > 0) || !(below > 0)) return [{ code: "threshold-out-of-reach", text }];
  // The divider's ratio goes with its total: a larger resistor at the top.
  const totalOhm = ["threshold.topOhm", "threshold.potOhm", "threshold.bottomOhm"].reduce((sum, path) => sum + nominalOhm(bottom, path), 0);
  const topOhm = preferredAbove(Math.min(1e8, Math.max(1, (totalOhm * below) / wanted - (totalOhm - nominalOhm(bottom, "threshold.topOhm")))), "E12");
  const tried = tryFigures(scene, { "threshold.topOhm": topOhm });
  if (!isSound(tried.solution)) return [{ code: "threshold-out-of-reach", text }];
  return [{ code: "threshold-out-of-reach", text, fix: { text: `${ohms(topOhm)} at the top of the threshold divider brings it down to ${volts(tried.circuit.thresholdV)}, and this hit fires.`, threshold: { topOhm } } }];
}

function nominalOhm(threshold: Scene["spec"]["threshold"], path: string): number {
  const spread = threshold[path.slice("threshold.".length) as "topOhm" | "potOhm" | "bottomOhm"];
  return typeof spread === "number" ? spread : "nominal" in spread ? spread.nominal : (spread.min + spread.max) / 2;
}

/** Noise at the input, taken as a peak, beside the threshold and the hysteresis. */
export function findNoise(scene: Scene): Finding[] {
  const { circuit, solution, spec } = scene;
  const noiseV = spec.comparator.noiseV ?? 0;
  if (!(noiseV > 0) || solution.restsHigh || circuit.tripV >= NOISE_MARGIN * noiseV) return [];
  const text = `Noise of ${volts(noiseV)} stands beside a threshold of ${volts(circuit.tripV)}, ${times(circuit.tripV / noiseV)} as much: ${circuit.tripV <= noiseV ? "it fires by itself" : "a little more and it fires by itself"}.`;
  const least = 1.05 * NOISE_MARGIN * noiseV;
  const turn = [Math.max(least, MIDDLE * solution.shapedPeakV), least].map((wanted) => turnFor(scene, wanted)).find((found) => found !== null) ?? null;
  const tried = turn === null ? null : tryTurn(scene, turn);
  if (turn === null || !tried || !isSound(tried.solution) || tried.circuit.tripV > 0.9 * solution.shapedPeakV) return [{ code: "noise-near-threshold", text }];
  return [{ code: "noise-near-threshold", text, fix: { text: `With the pot at ${travel(turn)} the threshold is ${volts(tried.circuit.thresholdV)}, ${times(tried.circuit.tripV / noiseV)} the noise, and this hit still fires.`, threshold: { turn } } }];
}
