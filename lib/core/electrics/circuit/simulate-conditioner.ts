import type { Range } from "@/lib/core/units/spread";
import type { ConditionerResult, ConditionerSpec, Solution } from "./conditioner-types";
import { cornerCircuits } from "./corner-circuits";
import { findFindings } from "./find-findings";
import { sampleYield } from "./sample-yield";
import { settleCircuit } from "./settle-circuit";
import { firesQuickly, solveCircuit } from "./solve-circuit";

/**
 * What a trigger conditioner makes of one hit on one pad.
 *
 * Solved as a circuit (electrics §3): the coupling network loads the divider, clamp and envelope diodes are 1N4148 by
 * Shockley's equation, the follower a Gummel–Poon transistor, the comparator has one current limit for its whole load.
 * Checked against ngspice on random circuits (tests/reference/conditioner.test.ts).
 *
 * @param spec SI; the main answer is for nominal values, `spread` for the corners of all spreads (parts stated as one
 *   number take their usual tolerance), `yield` for a seeded sample.
 * @throws RangeError naming a figure that is not positive and finite where it must be.
 * Limits: resistive pads; the comparator switches at once (no slew, no delay); no supply droop; 27 °C.
 */
export function simulateConditioner(spec: ConditionerSpec): ConditionerResult {
  const circuit = settleCircuit(spec);
  const main = solveCircuit(circuit, true);
  const corners = cornerCircuits(spec).map((corner) => solveCircuit(corner));
  return {
    fires: main.fires,
    pad: { restV: main.padRestV, hitV: main.padHitV },
    shaped: { peakV: main.shapedPeakV },
    thresholdV: main.thresholdV,
    pulses: main.pulses,
    trigger: { restV: main.restV, activeV: main.activeV, sourceOhm: main.sourceOhm },
    envelope: main.envelope,
    ruleOfThumbS: circuit.couplingOhm * circuit.couplingF,
    weakestHitOhm: findWeakestHit(spec),
    findings: findFindings(spec, circuit, main),
    trace: main.trace ?? { timeS: [], padV: [], shapedV: [], outputV: [], envelopeV: null },
    spread: spreadOf([main, ...corners]),
    yield: sampleYield(spec),
    assumptions: assumptionsOf(spec),
  };
}

function spreadOf(solutions: readonly Solution[]): ConditionerResult["spread"] {
  const range = (values: readonly number[]): Range | null => (values.length === 0 ? null : { min: Math.min(...values), max: Math.max(...values) });
  const all = (of: (solution: Solution) => number) => range(solutions.map(of)) as Range;
  return {
    activeV: all((solution) => solution.activeV),
    restV: all((solution) => solution.restV),
    shapedPeakV: all((solution) => solution.shapedPeakV),
    pulseS: range(solutions.flatMap((solution) => solution.pulses.map((pulse) => pulse.widthS))),
    envelopePeakV: range(solutions.flatMap((solution) => (solution.envelope ? [solution.envelope.peakV] : []))),
  };
}

/** Greatest struck resistance between the hit and the rest that still fires, ohm, to 0.5 %; null where the hit itself does not. */
function findWeakestHit(spec: ConditionerSpec): number | null {
  if ("samples" in spec.strike) return null;
  const at = (hitOhm: number) => firesQuickly({ ...settleCircuit(spec), hitOhm }).fires;
  const { hitOhm, restOhm } = settleCircuit(spec);
  if (!at(hitOhm)) return null;
  let [fires, silent] = [hitOhm, restOhm];
  if (fires >= silent || at(silent)) return fires;
  while (silent / fires > 1.005) {
    const middle = Math.sqrt(fires * silent);
    if (at(middle)) fires = middle;
    else silent = middle;
  }
  return fires;
}

function assumptionsOf({ comparator }: ConditionerSpec): string[] {
  return [
    comparator.slewVperS === undefined ? "The comparator switches at once; its slew rate is taken as endless." : "The stated slew rate is not in the traces yet; the comparator is taken to switch at once.",
    ...(comparator.offsetV === undefined ? ["No offset at the comparator's inputs."] : []),
    ...(comparator.hysteresisV === undefined ? ["No hysteresis."] : []),
    ...(comparator.noiseV === undefined ? ["No noise."] : []),
    ...(comparator.commonMode === undefined ? ["Inputs work over the whole supply."] : []),
    "The supply holds its voltage whatever is drawn.",
  ];
}
