import { formatQuantity, formatRange } from "@/lib/core/units/format-quantity";
import { toRange, type Range, type Spread } from "@/lib/core/units/spread";
import type { Reason } from "../jacks";
import type { ConditionerOutcome, ConditionerQuestion, ConditionerSimulator, PadModel } from "../patch-types";
import type { ConditionerSpec, Solution } from "./conditioner-types";
import { cornerCircuits } from "./corner-circuits";
import { partRange } from "./part-tolerances";
import { solveCircuit } from "./solve-circuit";

/** Strike taken where the pad states none: common practice, no source. */
const STRIKE = { riseS: 1e-3, holdS: 5e-3, fallS: 3e-2 };
/** A contact: open and closed, ohm. A switch is a pad that goes all the way. */
const CONTACT = { restOhm: 10e6, hitOhm: 1 };
const MOST_KEPT = 500;
const kept = new Map<string, ConditionerOutcome>();

/** Output resistance of the follower: its own 26 mV/I_e to what the base's source adds. Common practice, no source. */
const FOLLOWER_OHM: Range = { min: 10, max: 500 };

/**
 * What a conditioner does with the pad plugged into it, over the corners of every spread; the same question is
 * answered once and remembered.
 */
export const simulateForPatch: ConditionerSimulator = (question) => {
  const key = JSON.stringify(question);
  const known = kept.get(key);
  if (known) return known;
  const outcome = answer(question);
  if (kept.size >= MOST_KEPT) kept.clear();
  kept.set(key, outcome);
  return outcome;
};

function answer(question: ConditionerQuestion): ConditionerOutcome {
  const pad = contactOf(question.pad);
  if ("missing" in pad) return { verdict: "unproven", reasons: [{ verdict: "unproven", text: pad.missing, ...(pad.figure ? { figure: pad.figure } : {}) }], trigger: {} };
  const spec = specOf(question, pad);
  const solutions = cornerCircuits(spec).map((circuit) => ({ circuit, solution: solveCircuit(circuit) }));
  const all = solutions.map(({ solution }) => solution);
  const firing = all.filter((solution) => solution.fires);
  const reasons = reasonsOf(solutions.map(({ circuit, solution }) => ({ solution, marginV: solution.shapedPeakV - circuit.tripV, thresholdV: circuit.tripV })));
  const trigger = openTrigger(spec, all);
  const pulses = firing.flatMap((solution) => solution.pulses.slice(0, 1).map((pulse) => pulse.widthS));
  const verdict = reasons[0]?.verdict as ConditionerOutcome["verdict"];
  return {
    verdict,
    reasons,
    trigger: firing.length > 0 && pulses.length > 0 ? { ...trigger, pulseS: hull(pulses) } : trigger,
    ...(spec.envelope ? { envelope: openEnvelope(spec, all, firing) } : {}),
  };
}

function specOf({ circuit, turn, loadOhm }: ConditionerQuestion, pad: Contact): ConditionerSpec {
  return {
    supply: circuit.supply,
    pad: { kind: "resistive", restOhm: pad.restOhm, hitOhm: pad.hitOhm, leg: circuit.padLeg },
    strike: pad.strike,
    divider: circuit.divider,
    coupling: circuit.coupling,
    threshold: { ...circuit.threshold, turn },
    comparator: { ...circuit.comparator, limitA: toRange(circuit.comparator.limitA).min },
    output: circuit.output,
    envelope: circuit.envelope,
    load: { ohm: loadOhm },
  };
}

interface Contact {
  restOhm: Spread;
  hitOhm: Spread;
  strike: { riseS: number; holdS: number; fallS: number };
}

function contactOf(pad: PadModel): Contact | { missing: string; figure?: string } {
  const strike = { riseS: pad.riseS ?? STRIKE.riseS, holdS: pad.holdS ?? STRIKE.holdS, fallS: pad.fallS ?? STRIKE.fallS };
  if (pad.sensor === "switch") return { restOhm: pad.restOhm ?? CONTACT.restOhm, hitOhm: pad.hitOhm ?? CONTACT.hitOhm, strike };
  if (pad.sensor === "piezo") return { missing: "What a piezo disc gives is not computed yet: play the pad on this box and record what comes out of it." };
  if (pad.restOhm === undefined) return { missing: "The pad’s resistance at rest is not known: measure it with a meter, nothing touching the pad.", figure: "pad.restOhm" };
  if (pad.hitOhm === undefined) return { missing: "The pad’s resistance when hit is not known: press it as hard as a hit and read a meter.", figure: "pad.hitOhm" };
  return { restOhm: pad.restOhm, hitOhm: pad.hitOhm, strike };
}

interface Margin {
  solution: Solution;
  marginV: number;
  thresholdV: number;
}

/** Least room over the threshold: a tenth of it, and never less than this. */
const LEAST_MARGIN_V = 0.2;

function reasonsOf(corners: readonly Margin[]): Reason[] {
  const peak = hull(corners.map(({ solution }) => solution.shapedPeakV));
  const threshold = hull(corners.map(({ thresholdV }) => thresholdV));
  const numbers = { measured: peak.min, limit: threshold.max, unit: "V" as const };
  const levels = `A hit raises ${formatRange(peak, "V")} against a threshold of ${formatRange(threshold, "V")}`;
  if (corners.some(({ solution }) => solution.restsHigh)) {
    return [{ verdict: "stuck", text: "The threshold can stand at or below the level at rest: turn it up, or the output may stay high.", ...numbers }];
  }
  const firing = corners.filter(({ solution }) => solution.fires);
  if (firing.length === 0) {
    const text = corners.some(({ solution }) => solution.tripped) ? `${levels}, and the comparator trips, but its output never gets up: filling the envelope takes all it gives.` : `${levels}: no hit of this pad can fire it.`;
    return [{ verdict: "dead", text, ...numbers }];
  }
  if (firing.length < corners.length) return [{ verdict: "weak", text: `${levels}: the weakest hit may not fire it.`, ...numbers }];
  const widths = hull(firing.map(({ solution }) => solution.pulses[0]?.widthS ?? 0));
  const pulse = `a pulse of ${formatRange(widths, "s")}`;
  if (corners.some(({ solution }) => solution.pulses.length > 1)) {
    return [{ verdict: "tight", text: `${levels}: ${pulse}, but one hit can fire it twice.`, ...numbers }];
  }
  const worst = corners.reduce((least, corner) => (corner.marginV < least.marginV ? corner : least));
  if (worst.marginV < Math.max(0.1 * worst.thresholdV, LEAST_MARGIN_V)) {
    return [{ verdict: "tight", text: `${levels}: it fires, ${pulse}, with ${formatQuantity(worst.marginV, "V")} to spare at the weakest.`, ...numbers }];
  }
  return [{ verdict: "good", text: `${levels}: ${pulse}.`, ...numbers }];
}

/** The trigger output before any load: what `Output` wants. The comparator's limit is kept beside it. */
function openTrigger(spec: ConditionerSpec, solutions: readonly Solution[]): ConditionerOutcome["trigger"] {
  const range = (spread: Spread, path: string) => partRange(spread, path);
  const series = range(spec.output.seriesOhm, "output.seriesOhm");
  const shunt = spec.output.shuntOhm === null ? null : range(spec.output.shuntOhm, "output.shuntOhm");
  const share = shunt ? { min: shunt.min / (shunt.min + series.max), max: shunt.max / (shunt.max + series.min) } : { min: 1, max: 1 };
  const supply = toRange(spec.supply.highV);
  const [highDrop, lowDrop, lowRail] = [toRange(spec.comparator.highDropV), toRange(spec.comparator.lowDropV), toRange(spec.supply.lowV)];
  const high = times({ min: supply.min - highDrop.max, max: supply.max - highDrop.min }, share);
  const low = times({ min: lowRail.min + lowDrop.min, max: lowRail.max + lowDrop.max }, share);
  const restsHigh = solutions.some((solution) => solution.restsHigh);
  return {
    signal: "trigger",
    polarity: "rising",
    restV: restsHigh ? { min: low.min, max: high.max } : low,
    activeV: high,
    sourceOhm: shunt ? { min: parallel(series.min, shunt.min), max: parallel(series.max, shunt.max) } : series,
    limitA: spec.comparator.limitA,
  };
}

function openEnvelope(spec: ConditionerSpec, all: readonly Solution[], firing: readonly Solution[]): ConditionerOutcome["envelope"] {
  const peaks = (firing.length === all.length ? firing : all).flatMap((solution) => (solution.envelope ? [solution.envelope.peakV] : []));
  const decays = firing.flatMap((solution) => (solution.envelope && solution.envelope.decayS > 0 ? [solution.envelope.decayS] : []));
  return {
    signal: "envelope",
    polarity: "rising",
    restV: { min: 0, max: 0.05 },
    activeV: peaks.length > 0 ? hull(peaks) : 0,
    sourceOhm: FOLLOWER_OHM,
    ...(decays.length > 0 ? { decayS: hull(decays) } : {}),
  };
}

function hull(values: readonly number[]): Range {
  return { min: Math.min(...values), max: Math.max(...values) };
}

function times(volt: Range, share: Range): Range {
  const ends = [volt.min * share.min, volt.min * share.max, volt.max * share.min, volt.max * share.max];
  return hull(ends);
}

function parallel(a: number, b: number): number {
  return (a * b) / (a + b);
}
