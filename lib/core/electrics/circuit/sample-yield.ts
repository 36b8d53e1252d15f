import { nominalOf } from "@/lib/core/units/spread";
import type { ConditionerSpec } from "./conditioner-types";
import { partRange } from "./part-tolerances";
import { settleCircuit } from "./settle-circuit";
import { firesQuickly } from "./solve-circuit";

const SAMPLES = 200;
const SEED = 0x6b6e6f63;

/**
 * Share of builds that fire, from a seeded sample of part values, each spread evenly over its range.
 * The pad, its hit and the supply stay at their nominal values: it is the parts that are drawn.
 * @returns 0…1; the same for the same circuit.
 */
export function sampleYield(spec: ConditionerSpec, samples: number = SAMPLES): number {
  const random = mulberry32(SEED);
  let firing = 0;
  for (let i = 0; i < samples; i += 1) {
    const circuit = settleCircuit(spec, (spread, path) => {
      if (/^(pad|supply|comparator|load)\./.test(path)) return nominalOf(spread);
      const { min, max } = partRange(spread, path);
      return min + (max - min) * random();
    });
    if (firesQuickly(circuit).fires) firing += 1;
  }
  return firing / samples;
}

/** A small seeded generator (mulberry32, public domain). */
function mulberry32(seed: number): () => number {
  let state = seed;
  return () => {
    state = (state + 0x6d2b79f5) | 0;
    let t = Math.imul(state ^ (state >>> 15), 1 | state);
    t = (t + Math.imul(t ^ (t >>> 7), 61 | t)) ^ t;
    return ((t ^ (t >>> 14)) >>> 0) / 4294967296;
  };
}
