import type { Circuit } from "./conditioner-types";

/** The pad's conductance over time: straight between its corners, constant outside them. */
export interface Conductance {
  /** Corner times, s, not falling; the first is where everything is still settled. Two at one time are a jump. */
  times: readonly number[];
  /** Siemens at each corner. */
  siemens: readonly number[];
}

/** Conductance of a pad is close to proportional to force, so it is taken to rise and fall straight. */
export function strikeConductance({ strike, restOhm, hitOhm }: Pick<Circuit, "strike" | "restOhm" | "hitOhm">): Conductance {
  if ("samples" in strike) return { times: strike.samples.map(([s]) => s), siemens: strike.samples.map(([, ohm]) => 1 / ohm) };
  const rest = 1 / restOhm;
  const hit = 1 / hitOhm;
  const { riseS, holdS, fallS } = strike;
  return { times: [0, riseS, riseS + holdS, riseS + holdS + fallS], siemens: [rest, hit, hit, rest] };
}
