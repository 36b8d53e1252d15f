import type { Finding } from "../conditioner-types";
import { strikeConductance } from "../strike-conductance";
import { isSound, seconds, trySettled, type Scene } from "./scene";

const ROUNDS = 16;
const EDGE_S = 1e-9;
const MOST_SAMPLES = 2000;

/** Shortest time from one hit to the next that still fires, as in a roll. */
export function findReStrike(scene: Scene): Finding[] {
  const { circuit, solution } = scene;
  const strike = strikeConductance(circuit);
  if (!isSound(solution) || strike.times.length > MOST_SAMPLES) return [];
  const startS = strike.times[0] as number;
  const lengthS = (strike.times.at(-1) as number) - startS;
  const tauS = (circuit.couplingOhm + circuit.dividerOhm) * circuit.couplingF;
  const bare = { envelope: null };
  const fires = (gapS: number) => trySettled(scene, { ...bare, strike: { samples: twice(strike, gapS) } }).pulses.length >= 2;
  let high = lengthS + 12 * tauS;
  if (!fires(high)) return [];
  let low = 0;
  for (let i = 0; i < ROUNDS; i += 1) {
    const middle = (low + high) / 2;
    if (fires(middle)) high = middle;
    else low = middle;
  }
  const limit = high < lengthS ? "the pad itself has hardly let go by then" : "the coupling needs that long to recover";
  return [{ code: "re-strike", text: `A second hit like this one fires from ${seconds(high)} after the first, up to ${Number((1 / high).toPrecision(2))} hits a second; ${limit}.` }];
}

/** The same strike twice: of two hands on one pad the firmer counts. Resistances at its corners and where the two cross. */
function twice({ times: given, siemens }: ReturnType<typeof strikeConductance>, gapS: number): [number, number][] {
  // A jump as a nanosecond, so that each time has one value.
  const times = given.map((t, i) => t + i * EDGE_S);
  const at = (t: number) => {
    if (t <= (times[0] as number)) return siemens[0] as number;
    let i = times.findLastIndex((time) => time <= t);
    if (i >= times.length - 1) return siemens.at(-1) as number;
    if (i < 0) i = 0;
    const [t0, t1] = [times[i] as number, times[i + 1] as number];
    return (siemens[i] as number) + ((siemens[i + 1] as number) - (siemens[i] as number)) * ((t - t0) / (t1 - t0));
  };
  const corners = [...new Set([...times, ...times.map((t) => t + gapS)])].sort((a, b) => a - b);
  const points: [number, number][] = [];
  corners.forEach((t, i) => {
    const [first, second] = [at(t), at(t - gapS)];
    const t0 = corners[i - 1];
    if (t0 !== undefined) {
      const [before, now] = [at(t0) - at(t0 - gapS), first - second];
      if (before * now < 0) {
        const cross = t0 + ((t - t0) * before) / (before - now);
        points.push([cross, 1 / at(cross)]);
      }
    }
    points.push([t, 1 / Math.max(first, second)]);
  });
  return points;
}
