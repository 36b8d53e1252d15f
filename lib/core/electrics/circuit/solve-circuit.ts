import type { Circuit, Solution, Trace } from "./conditioner-types";
import { solveOutput } from "./solve-output";
import { COARSE_V, solveShaper, type ShapedSignal } from "./solve-shaper";

/**
 * Solves one conditioner for one strike, as a circuit: the coupling network loads the divider, the clamp and envelope
 * diodes and the follower are devices, the comparator has one current limit for its whole load.
 * @param withTrace also the signals over time.
 */
export function solveCircuit(circuit: Circuit, withTrace = false): Solution {
  const shaped = solveShaper(circuit);
  const output = solveOutput(circuit, shaped);
  const { seriesOhm, shuntOhm } = circuit;
  const fires = !shaped.restsHigh && output.pulses.length > 0;
  return {
    fires,
    restsHigh: shaped.restsHigh,
    padRestV: shaped.padRestV,
    padHitV: shaped.padHitV,
    shapedPeakV: shaped.peakV,
    shapedLeastV: shaped.leastV,
    thresholdV: circuit.thresholdV,
    pulses: fires ? output.pulses : [],
    restV: output.restV,
    activeV: fires ? output.highestV : output.restV,
    sourceOhm: shuntOhm === Infinity ? seriesOhm : (seriesOhm * shuntOhm) / (seriesOhm + shuntOhm),
    envelope: output.envelope,
    tripped: shaped.flips.length > 0,
    trace: withTrace ? traceOf(shaped, output) : null,
  };
}

/**
 * Whether the circuit fires at all, quickly: for searches and samples.
 * @returns the highest level over the threshold too, V.
 */
export function firesQuickly(circuit: Circuit): { fires: boolean; marginV: number; pulses: number } {
  const shaped = solveShaper(circuit, COARSE_V);
  const marginV = shaped.peakV - circuit.tripV;
  if (shaped.restsHigh || shaped.flips.length === 0) return { fires: false, marginV, pulses: 0 };
  // An envelope matters to firing only where filling it takes the comparator to its limit.
  const fill = circuit.envelope ? (circuit.outHighV - 0.5) / (circuit.envelope.seriesOhm + 1) + circuit.outHighV / (circuit.seriesOhm + circuit.loadOhm) : 0;
  const output = solveOutput(fill > circuit.limitA ? circuit : { ...circuit, envelope: null }, shaped);
  return { fires: output.pulses.length > 0, marginV, pulses: output.pulses.length };
}

const MOST_POINTS = 400;

/** The signals at common times: the shaper's own steps with the output's merged in. */
function traceOf(shaped: ShapedSignal, output: ReturnType<typeof solveOutput>): Trace {
  const all = [...new Set([...shaped.timeS, ...output.timeS.filter((t) => t <= shaped.endS)])].sort((a, b) => a - b);
  const stride = Math.ceil(all.length / MOST_POINTS);
  const timeS = all.filter((_, i) => i % stride === 0 || i === all.length - 1);
  return {
    timeS,
    padV: sample(shaped.timeS, shaped.padV, timeS),
    shapedV: sample(shaped.timeS, shaped.shapedV, timeS),
    outputV: sample(output.timeS, output.outputV, timeS),
    envelopeV: output.envelope ? sample(output.timeS, output.envelopeV, timeS) : null,
  };
}

/** Straight between known points, held outside them; of two points at one time the later counts. */
function sample(times: readonly number[], values: readonly number[], at: readonly number[]): number[] {
  let i = 0;
  return at.map((t) => {
    while (i + 1 < times.length && (times[i + 1] as number) <= t) i += 1;
    const [t0, v0] = [times[i] as number, values[i] as number];
    const [t1, v1] = [times[i + 1] ?? t0, values[i + 1] ?? v0];
    return t1 > t0 && t > t0 ? v0 + ((v1 - v0) * (t - t0)) / (t1 - t0) : v0;
  });
}
