import { buildTrace } from "./build-trace";
import type { Circuit, Solution } from "./conditioner-types";
import { solveOutput } from "./solve-output";
import { solveShaper } from "./solve-shaper";
import { wantedLevels } from "./wanted-levels";

/**
 * Solves one conditioner for one strike, as a circuit: the coupling network loads the divider, the clamp and envelope
 * diodes and the follower are devices, the comparator has one current limit for its whole load.
 * @param whole true: to the very end, with the signals over time, how far the input goes below 0 V, and where a full envelope
 *   would be; false: as far as levels, pulses and envelope need.
 */
export function solveCircuit(circuit: Circuit, whole = false): Solution {
  // At rest the comparator sees 0 V; a threshold at or below that is no threshold.
  const restsHigh = circuit.tripV <= 0;
  const shaped = solveShaper(circuit, restsHigh, whole);
  const flips = restsHigh ? [] : shaped.flips;
  const last = flips.at(-1);
  const stretches = wantedLevels(circuit, restsHigh, flips, shaped.startS, shaped.endS);
  const output = solveOutput(circuit, restsHigh, stretches, last && !last.high ? last.timeS : null, whole);
  const fires = !restsHigh && output.pulses.length > 0;
  // A pad that falls when it is struck (lower leg, or a resistance that rises) has its extreme below.
  const isUp = (circuit.leg === "upper") === circuit.hitOhm <= circuit.restOhm;
  return {
    fires,
    restsHigh,
    padRestV: shaped.padRestV,
    padHitV: isUp ? shaped.padMostV : shaped.padLeastV,
    shapedPeakV: shaped.peakV,
    shapedLeastV: shaped.leastV,
    thresholdV: circuit.thresholdV,
    latches: last?.high === true,
    pulses: restsHigh ? [] : output.pulses,
    restV: output.restV,
    activeV: fires ? output.highestV : output.settledV,
    sourceOhm: 1 / (1 / circuit.seriesOhm + 1 / circuit.shuntOhm),
    envelope: output.envelope,
    tripped: flips.length > 0,
    trace: whole ? buildTrace(circuit, shaped, stretches, output) : null,
  };
}
