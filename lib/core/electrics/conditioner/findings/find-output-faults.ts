import { preferredBelow, preferredAbove } from "@/lib/core/units/e-series";
import type { Finding } from "../conditioner-types";
import { DIODE_A, DIODE_OHM, DiodeBranch } from "../junctions";
import { solveCircuit } from "../solve-circuit";
import { amperes, farads, isSound, ohms, percent, seconds, trySettled, volts, type Scene } from "./scene";

const NEGATIVE_V = -0.1;
/** Pull-down for an output that would hang on a blocked diode; our choice. */
const PULL_DOWN_OHM = 100e3;
/** An envelope filled to this share of where it could go is full enough: our choice. */
const FULL = 0.8;
const WELL_FILLED = 0.9;

/** On a split supply the output rests far below 0 V. */
export function findRestsNegative({ circuit, solution }: Scene): Finding[] {
  if (!(circuit.lowV < 0) || !(solution.restV < NEGATIVE_V)) return [];
  const text = `On a split supply the trigger output rests at ${volts(solution.restV)}; nothing keeps that from a voice that stands no negative level.`;
  const pull = circuit.loadOhm === Infinity ? PULL_DOWN_OHM : circuit.loadOhm;
  const diode = new DiodeBranch();
  diode.solve(circuit.outHighV, circuit.seriesOhm + pull + DIODE_OHM);
  const activeV = Math.min(diode.ampere, circuit.limitA) * pull;
  const restV = -DIODE_A * pull;
  if (restV < NEGATIVE_V) return [{ code: "rests-negative", text }];
  const pullText = circuit.loadOhm === Infinity ? `, with ${ohms(PULL_DOWN_OHM)} to 0 V behind it` : "";
  return [{ code: "rests-negative", text, fix: { text: `A 1N4148 in series with the output${pullText} leaves it at 0 V at rest and ${volts(activeV)} when it fires.`, seriesDiode: "1N4148", ...(pullText ? { pullDownOhm: PULL_DOWN_OHM } : {}) } }];
}

/** Pulse too short, or limit too low, for the envelope's capacitor. */
export function findUnderfilled(scene: Scene): Finding[] {
  const { circuit, solution } = scene;
  const { envelope } = circuit;
  if (!solution.tripped || solution.restsHigh) return [];
  if (!envelope || !solution.envelope) {
    if (solution.fires) return [];
    return [{ code: "envelope-underfilled", text: `The comparator trips, but ${amperes(circuit.limitA)} into its load of ${ohms(1 / circuit.triggerS)} does not lift the trigger output to half its level.` }];
  }
  const { peakV, fullV } = solution.envelope;
  if (solution.fires && peakV >= FULL * fullV) return [];
  const unlimited = trySettled(scene, { limitA: 1e3 });
  const byLimit = (unlimited.envelope?.peakV ?? 0) > peakV + 0.1 * (fullV - peakV) || !solution.fires;
  const cause = byLimit ? `${amperes(circuit.limitA)} is all the comparator gives` : `its pulse lasts ${seconds(solution.pulses[0]?.widthS ?? 0)}`;
  const held = solution.fires ? "" : ", and filling it holds the trigger output below half its level all the while";
  const text = `The envelope comes to ${volts(peakV)} of the ${volts(fullV)} it could: ${cause}, too ${byLimit ? "little" : "short"} for ${farads(envelope.farad)}${held}.`;
  for (let farad = preferredBelow(envelope.farad * 0.7, "E6"); farad >= envelope.farad / 1000 && farad > 1e-11; farad = preferredBelow(farad * 0.7, "E6")) {
    // The fall keeps its length where R grows as C shrinks.
    const ohm = preferredAbove((envelope.ohm * envelope.farad) / farad, "E12");
    const tried = solveCircuit({ ...circuit, envelope: { ...envelope, farad, ohm } }, true);
    if (isSound(tried) && tried.envelope && tried.envelope.peakV >= WELL_FILLED * tried.envelope.fullV) {
      return [{ code: "envelope-underfilled", text, fix: { text: `${farads(farad)} with ${ohms(ohm)} fills to ${volts(tried.envelope.peakV)} (${percent(tried.envelope.peakV / tried.envelope.fullV)}) and falls in ${seconds(tried.envelope.decayS)}.`, envelope: { farad, ohm } } }];
    }
  }
  return [{ code: "envelope-underfilled", text }];
}
