import { formatQuantity } from "@/lib/core/units/format-quantity";
import type { Circuit, ConditionerSpec, Solution } from "../conditioner-types";
import { nominal, settleCircuit } from "../settle-circuit";
import { solveCircuit } from "../solve-circuit";

/** One solved circuit, and ways to try another. */
export interface Scene {
  spec: ConditionerSpec;
  circuit: Circuit;
  solution: Solution;
}

export const volts = (value: number) => formatQuantity(value, "V");
export const seconds = (value: number) => formatQuantity(value, "s");
export const ohms = (value: number) => formatQuantity(value, "Ohm");
export const farads = (value: number) => formatQuantity(value, "F");
export const amperes = (value: number) => formatQuantity(value, "A");
export const percent = (share: number) => `${Number((share * 100).toPrecision(share < 0.1 ? 1 : 2))} %`;
export const times = (ratio: number) => `${Number(ratio.toPrecision(2))} ×`;

/** The same circuit with some values changed. */
export function trySettled({ circuit }: Scene, change: Partial<Circuit>): Solution {
  return solveCircuit({ ...circuit, ...change });
}

/** The same circuit with figures of the request changed, by path. */
export function tryFigures({ spec }: Scene, figures: Readonly<Record<string, number>>): { circuit: Circuit; solution: Solution } {
  const circuit = settleCircuit(spec, (spread, path) => figures[path] ?? nominal(spread, path));
  return { circuit, solution: solveCircuit(circuit) };
}

export function tryTurn({ spec }: Scene, turn: number): { circuit: Circuit; solution: Solution } {
  const circuit = settleCircuit({ ...spec, threshold: { ...spec.threshold, turn } });
  return { circuit, solution: solveCircuit(circuit) };
}

/** What a conditioner is for: one pulse a strike, and then quiet. */
export function isSound(solution: Solution): boolean {
  return solution.fires && solution.pulses.length === 1 && !solution.latches;
}

/** The pot's position for a trip level, V; null outside its travel. */
export function turnFor({ spec, circuit }: Scene, tripV: number): number | null {
  const low = settleCircuit({ ...spec, threshold: { ...spec.threshold, turn: 0 } }).tripV;
  const high = settleCircuit({ ...spec, threshold: { ...spec.threshold, turn: 1 } }).tripV;
  if (!(high > low)) return null;
  const turn = (tripV - low) / (high - low);
  return turn >= 0 && turn <= 1 ? Math.round(turn * 1000) / 1000 : circuit.tripV === tripV ? spec.threshold.turn : null;
}

export const travel = (turn: number) => percent(turn) + " of its travel";

/** Length of the edge whose level goes up at the coupling, s: the strike's own for a pad in the upper leg, its release in the lower. */
export function risingEdgeS({ spec, circuit }: Scene): number {
  const isUp = (circuit.leg === "upper") === circuit.hitOhm <= circuit.restOhm;
  if (!("samples" in spec.strike)) return isUp ? spec.strike.riseS : spec.strike.fallS;
  // Of a capture: from a tenth to nine tenths of its depth, as an edge that is straight all the way.
  const samples = isUp ? spec.strike.samples : [...spec.strike.samples].reverse();
  const siemens = samples.map(([, ohm]) => 1 / ohm);
  const rest = siemens[0] ?? 0;
  const depth = siemens.reduce((most, g) => Math.max(most, g), rest) - rest;
  if (!(depth > 0)) return 0;
  const reach = (share: number) => {
    const i = siemens.findIndex((g) => g >= rest + share * depth);
    const [before, after] = [Math.max(0, i - 1), Math.max(0, i)];
    const [g0, g1, t0, t1] = [siemens[before] ?? 0, siemens[after] ?? 0, samples[before]?.[0] ?? 0, samples[after]?.[0] ?? 0];
    return g1 > g0 ? t0 + ((rest + share * depth - g0) / (g1 - g0)) * (t1 - t0) : t1;
  };
  return Math.abs(reach(0.9) - reach(0.1)) / 0.8;
}
