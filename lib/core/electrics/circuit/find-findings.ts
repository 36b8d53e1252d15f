import { formatQuantity } from "@/lib/core/units/format-quantity";
import type { Circuit, ConditionerSpec, Finding, Solution } from "./conditioner-types";
import { firesQuickly, solveCircuit } from "./solve-circuit";

/** The pulse length practice asks for: common practice, no source. */
const PRACTICE_S = { min: 1e-3, max: 5e-3 };
/** How far off a slipped decade looks. */
const SLIP = { least: 3, most: 30 };
/** Swing lost to a divider resistor before it is worth saying. */
const SWING_LOST = 0.1;
/** What many comparators' inputs stand below their lower rail, V. */
const BELOW_RAIL_V = 0.3;

/** What a builder should hear about this circuit, each with its numbers and, where one exists, a fix that was solved first. */
export function findFindings(spec: ConditionerSpec, circuit: Circuit, solution: Solution): Finding[] {
  return [
    ...restsHigh(circuit, solution),
    ...decadeSlip(circuit),
    ...slowHit(circuit, solution),
    ...outOfReach(spec, circuit, solution),
    ...dividerOff(circuit),
    ...doubleTrigger(solution),
    ...restsNegative(circuit, solution),
    ...underfilled(circuit, solution),
    ...inputs(spec, circuit, solution),
    ...noise(spec, solution),
  ];
}

function restsHigh(circuit: Circuit, solution: Solution): Finding[] {
  if (!solution.restsHigh) return [];
  return [{ code: "rests-high", text: `The threshold stands at ${formatQuantity(circuit.tripV, "V")}, at or below the level at rest: the output stays high and no hit can raise it.` }];
}

function decadeSlip(circuit: Circuit): Finding[] {
  const rc = circuit.couplingF * circuit.couplingOhm;
  const off = rc < PRACTICE_S.min ? PRACTICE_S.min / rc : rc / PRACTICE_S.max;
  if (off < SLIP.least || off > SLIP.most) return [];
  const factor = rc < PRACTICE_S.min ? 10 : 0.1;
  const mended = rc * factor;
  if (mended < PRACTICE_S.min || mended > PRACTICE_S.max) return [];
  const farad = circuit.couplingF * factor;
  const after = solveCircuit({ ...circuit, couplingF: farad });
  const text = `${formatQuantity(circuit.couplingF, "F")} with ${formatQuantity(circuit.couplingOhm, "Ohm")} is ${formatQuantity(rc, "s")}, outside the usual 1–5 ms by just about one decade: a slip that is easily made.`;
  const width = after.pulses[0]?.widthS;
  return [{
    code: "decade-slip",
    text,
    ...(after.fires && width !== undefined ? { fix: { text: `${formatQuantity(farad, "F")} makes it ${formatQuantity(mended, "s")}; solved with it, this hit gives ${formatQuantity(width, "s")}.`, couplingFarad: farad } } : {}),
  }];
}

function slowHit(circuit: Circuit, solution: Solution): Finding[] {
  if ("samples" in circuit.strike) return [];
  const rc = circuit.couplingF * circuit.couplingOhm;
  const { riseS } = circuit.strike;
  if (riseS <= rc) return [];
  const swing = Math.abs(solution.padHitV - solution.padRestV);
  const share = swing > 0 ? solution.shapedPeakV / swing : 0;
  return [{ code: "slow-hit", text: `The hit takes ${formatQuantity(riseS, "s")} to rise, longer than the ${formatQuantity(rc, "s")} of the coupling: ${Math.round(share * 100)} % of the pad's swing gets through. A larger coupling capacitor lets more through, and makes the pulse longer.` }];
}

function outOfReach(spec: ConditionerSpec, circuit: Circuit, solution: Solution): Finding[] {
  if (solution.tripped || solution.restsHigh) return [];
  const lowest = { ...circuit, tripV: circuit.tripV - circuit.thresholdV + atTurn(spec, circuit, 0), releaseV: circuit.releaseV - circuit.thresholdV + atTurn(spec, circuit, 0) };
  const anywhere = firesQuickly(lowest).fires;
  const levels = `This hit raises ${formatQuantity(solution.shapedPeakV, "V")}; the threshold stands at ${formatQuantity(circuit.tripV, "V")}`;
  return [{
    code: "threshold-out-of-reach",
    text: anywhere ? `${levels}. Turned down it would fire.` : `${levels}, and ${formatQuantity(atTurn(spec, circuit, 0), "V")} with the pot all the way down: this hit cannot fire it.`,
    ...(anywhere ? { fix: { text: `At the pot's lowest the threshold is ${formatQuantity(atTurn(spec, circuit, 0), "V")}, and this hit fires.`, turn: 0 } } : {}),
  }];
}

/** Threshold at another position of the pot, V. */
function atTurn(spec: ConditionerSpec, circuit: Circuit, turn: number): number {
  const of = (spread: ConditionerSpec["threshold"]["topOhm"]) => (typeof spread === "number" ? spread : "nominal" in spread ? spread.nominal : (spread.min + spread.max) / 2);
  const [top, pot, bottom] = [of(spec.threshold.topOhm), of(spec.threshold.potOhm), of(spec.threshold.bottomOhm)];
  return (circuit.highV * (bottom + turn * pot)) / (top + pot + bottom);
}

function dividerOff(circuit: Circuit): Finding[] {
  const { restOhm, hitOhm, dividerOhm } = circuit;
  const swing = (ohm: number) => Math.abs(ohm / (ohm + hitOhm) - ohm / (ohm + restOhm));
  const best = Math.sqrt(restOhm * hitOhm);
  const lost = 1 - swing(dividerOhm) / swing(best);
  if (!(lost > SWING_LOST)) return [];
  return [{ code: "divider-off", text: `With ${formatQuantity(dividerOhm, "Ohm")} beside this pad ${Math.round(lost * 100)} % of the possible swing is lost; the best resistor is √(rest × hit) = ${formatQuantity(best, "Ohm")}.` }];
}

function doubleTrigger(solution: Solution): Finding[] {
  if (solution.pulses.length < 2) return [];
  return [{ code: "double-trigger", text: `One hit gives ${solution.pulses.length} pulses: the shaped level crosses the threshold more than once.` }];
}

function restsNegative(circuit: Circuit, solution: Solution): Finding[] {
  if (circuit.lowV >= 0 || solution.restV >= -0.1) return [];
  return [{ code: "rests-negative", text: `On a split supply the output rests at ${formatQuantity(solution.restV, "V")}: a voice that stands no negative level needs a diode in series with this output.` }];
}

function underfilled(circuit: Circuit, solution: Solution): Finding[] {
  const { envelope } = circuit;
  if (!envelope || !solution.tripped || solution.restsHigh) return [];
  const asked = circuit.outHighV / (envelope.seriesOhm + 1);
  const reached = solution.envelope?.peakV ?? 0;
  const could = Math.max(0, circuit.outHighV - 1.3);
  if (solution.fires && reached > 0.8 * could) return [];
  const why = asked > circuit.limitA ? `${formatQuantity(circuit.limitA, "A")} is all the comparator gives` : "the pulse is too short";
  return [{ code: "envelope-underfilled", text: `The envelope gets to ${formatQuantity(reached, "V")} of about ${formatQuantity(could, "V")}: ${why} for ${formatQuantity(envelope.farad, "F")}${solution.fires ? "." : ", and it holds the trigger output down while it fills."}` }];
}

function inputs(spec: ConditionerSpec, circuit: Circuit, solution: Solution): Finding[] {
  const found: Finding[] = [];
  const range = spec.comparator.commonMode;
  if (range && (circuit.thresholdV < range.lowV || circuit.thresholdV > range.highV || solution.shapedPeakV > range.highV)) {
    found.push({ code: "input-out-of-range", text: `The comparator's inputs work from ${formatQuantity(range.lowV, "V")} to ${formatQuantity(range.highV, "V")}; here the threshold is ${formatQuantity(circuit.thresholdV, "V")} and the signal reaches ${formatQuantity(solution.shapedPeakV, "V")}.` });
  }
  if (solution.shapedLeastV < circuit.lowV - BELOW_RAIL_V) {
    found.push({ code: "input-below-rail", text: `After the hit the (+) input goes to ${formatQuantity(solution.shapedLeastV, "V")}; many parts stand no more than ${formatQuantity(BELOW_RAIL_V, "V")} below their lower rail. A resistor of 10 kΩ in front of the input, or a Schottky diode for the clamp, keeps it safe.` });
  }
  return found;
}

function noise(spec: ConditionerSpec, solution: Solution): Finding[] {
  const noiseV = spec.comparator.noiseV ?? 0;
  if (noiseV <= 0 || noiseV < solution.thresholdV / 3) return [];
  return [{ code: "noise-near-threshold", text: `Noise of ${formatQuantity(noiseV, "V")} stands close to the threshold of ${formatQuantity(solution.thresholdV, "V")}: it may fire without a hit.` }];
}
