import type { Circuit } from "./conditioner-types";

/** The pad's conductance over time: straight between its corners, constant outside them. */
export interface Conductance {
  /** Corner times, s, rising; the first is where everything is still settled. */
  times: number[];
  /** Siemens at each corner. */
  siemens: number[];
}

/** Conductance of a pad is close to proportional to force, so it is taken to rise and fall straight. */
export function strikeConductance({ strike, restOhm, hitOhm }: Pick<Circuit, "strike" | "restOhm" | "hitOhm">): Conductance {
  if ("samples" in strike) return { times: strike.samples.map(([s]) => s), siemens: strike.samples.map(([, ohm]) => 1 / ohm) };
  const [rest, hit] = [1 / restOhm, 1 / hitOhm];
  const { riseS, holdS, fallS } = strike;
  // An edge of no length is taken as a nanosecond: no circuit here can tell the two apart.
  const rise = Math.max(riseS, 1e-9);
  const fall = Math.max(fallS, 1e-9);
  return { times: [0, rise, rise + holdS, rise + holdS + fall], siemens: [rest, hit, hit, rest] };
}
