import type { Pulse } from "../conditioner/conditioner-types";
import { meetingOf } from "../conditioner/hermite";
import { nextStep, Step, stepRosenbrock } from "../conditioner/step-rosenbrock";
import { DiscMoment } from "./disc-moment";
import { oneShotS } from "./one-shot";
import type { PiezoResult, PiezoSpec } from "./piezo-types";

/** Share of the disc's peak that one step may be wrong by. */
const STEP_TOLERANCE = 1e-5;
/** Longest step, as a share of the ring's period, so that no swing falls between two. */
const LONGEST = 0.05;
const MOST_STEPS = 200_000;
/** Decays after which nothing is left. */
const ENOUGH = 8;

/**
 * What one hit on a piezo disc comes to at a comparator: every swing above the threshold is a pulse of its own, which is why
 * a one-shot usually follows.
 * @throws RangeError naming a figure that cannot be meant.
 * Source: circuit theory; Shockley diodes as in electrics §3; 555 timing as in `oneShotS`.
 * Limits: a disc as one capacitance and one ring (a struck plate has many); an ideal comparator that draws no current.
 */
export function simulatePiezo(spec: PiezoSpec): PiezoResult {
  requireFigures(spec);
  const { disc, comparator, oneShot } = spec;
  const at = new DiscMoment(spec);
  const step = new Step();
  const tolerance = STEP_TOLERANCE * Math.max(disc.peakV, 1e-3);
  const tripV = comparator.thresholdV + comparator.hysteresisV / 2;
  const releaseV = comparator.thresholdV - comparator.hysteresisV / 2;
  const endS = ENOUGH * (disc.decayS + spec.bleedOhm * disc.farad);
  const longestS = LONGEST / disc.ringHz;
  const result: PiezoResult = { fires: false, inputPeakV: 0, inputLeastV: 0, clampA: 0, pulses: [], oneShotPulses: null, cornerHz: 1 / (2 * Math.PI * spec.bleedOhm * disc.farad), trace: { timeS: [], inputV: [] } };
  let sinceS: number | null = null;
  let [timeS, v] = [0, 0];
  let h = longestS / 10;
  at.look(0, 0);
  for (let i = 0; i < MOST_STEPS && timeS < endS; i += 1) {
    // When the ring is over only the bleed is left, and steps may grow.
    h = Math.min(h, timeS > ENOUGH * disc.decayS ? endS : longestS, endS - timeS);
    const { f, slope, drift, inputV: before, inputRate: rate } = at;
    stepRosenbrock(at, timeS, v, h, f, slope, drift, step);
    const { y, error } = step;
    if (!(error <= tolerance) && h > 1e-13) {
      at.look(timeS, v);
      h = nextStep(h, error, tolerance);
      continue;
    }
    at.look(timeS + h, y);
    const level: number = sinceS === null ? tripV : releaseV;
    if (sinceS === null ? at.inputV > level : at.inputV < level) {
      const crossS: number = timeS + meetingOf(before, rate, at.inputV, at.inputRate, h, level) * h;
      if (sinceS === null) sinceS = crossS;
      else {
        result.pulses.push({ startS: sinceS, widthS: crossS - sinceS });
        sinceS = null;
      }
    }
    timeS += h;
    v = y;
    result.inputPeakV = Math.max(result.inputPeakV, at.inputV);
    result.inputLeastV = Math.min(result.inputLeastV, at.inputV);
    result.clampA = Math.max(result.clampA, Math.abs(at.clampA));
    result.trace.timeS.push(timeS);
    result.trace.inputV.push(at.inputV);
    h = nextStep(h, error, tolerance);
  }
  if (sinceS !== null) result.pulses.push({ startS: sinceS, widthS: timeS - sinceS });
  result.fires = result.pulses.length > 0;
  if (oneShot) result.oneShotPulses = retimed(result.pulses, oneShotS(oneShot.ohm, oneShot.farad));
  return result;
}

/** A one-shot answers a rise that meets it at rest, and no other; a pulse still there at its end holds a 555 up. */
function retimed(pulses: readonly Pulse[], lengthS: number): Pulse[] {
  const shots: Pulse[] = [];
  for (const { startS, widthS } of pulses) {
    const last = shots.at(-1);
    if (last && startS < last.startS + last.widthS) continue;
    shots.push({ startS, widthS: Math.max(lengthS, widthS) });
  }
  return shots;
}

function requireFigures({ disc, bleedOhm, clamp, comparator, oneShot }: PiezoSpec): void {
  const within = (name: string, value: number, least: number, most: number) => {
    if (!(value >= least && value <= most)) throw new RangeError(`${name} must lie between ${least} and ${most}: ${value}`);
  };
  within("disc.farad", disc.farad, 1e-12, 1e-3);
  within("disc.peakV", disc.peakV, 0, 1e4);
  within("disc.ringHz", disc.ringHz, 1, 1e5);
  within("disc.decayS", disc.decayS, 1e-5, 10);
  within("disc.ringHz × disc.decayS", disc.ringHz * disc.decayS, 0.01, 1000);
  within("bleedOhm", bleedOhm, 1, 1e12);
  if (clamp) {
    within("clamp.seriesOhm", clamp.seriesOhm, 0, 1e12);
    within("clamp.highV", clamp.highV, 0, 1e4);
  }
  within("comparator.thresholdV", comparator.thresholdV, 1e-6, 1e4);
  within("comparator.hysteresisV", comparator.hysteresisV, 0, 2 * comparator.thresholdV);
  if (oneShot) oneShotS(oneShot.ohm, oneShot.farad);
}
