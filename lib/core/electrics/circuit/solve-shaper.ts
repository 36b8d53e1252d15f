import type { Circuit } from "./conditioner-types";
import { diodeCurrent } from "./devices";
import { strikeConductance } from "./strike-conductance";

/** A moment at which the comparator changes its mind. */
export interface Flip {
  timeS: number;
  high: boolean;
}

export interface ShapedSignal {
  padRestV: number;
  /** Extreme reached: the highest pad level for a pad in the upper leg, the lowest for one in the lower. */
  padHitV: number;
  peakV: number;
  leastV: number;
  restsHigh: boolean;
  flips: Flip[];
  endS: number;
  timeS: number[];
  padV: number[];
  shapedV: number[];
}

/** Conductance from 0 V: the diode conducts once the shaped level is this far below it. */
const DIODE_ASLEEP_V = -0.15;
/** Error of a step on the capacitor: fine for an answer, coarse for one of many samples. */
const FINE_V = 2e-7;
export const COARSE_V = 5e-5;
const MOST_STEPS = 200_000;

/** Divider, coupling capacitor and clamp, from the settled rest through the strike until it has died away. */
export function solveShaper(circuit: Circuit, toleranceV: number = FINE_V): ShapedSignal {
  const { couplingF, couplingOhm, highV, dividerOhm, leg, tripV, releaseV } = circuit;
  const { times, siemens } = strikeConductance(circuit);
  const fixed = 1 / dividerOhm;
  let segment = 0;

  function padSource(timeS: number): { volt: number; ohm: number } {
    while (segment + 2 < times.length && timeS > (times[segment + 1] as number)) segment += 1;
    while (segment > 0 && timeS < (times[segment] as number)) segment -= 1;
    const [t0, t1] = [times[segment] as number, times[segment + 1] ?? (times[segment] as number)];
    const [g0, g1] = [siemens[segment] as number, siemens[segment + 1] ?? (siemens[segment] as number)];
    const share = t1 > t0 ? Math.min(1, Math.max(0, (timeS - t0) / (t1 - t0))) : timeS > t0 ? 1 : 0;
    const g = g0 + (g1 - g0) * share;
    return { volt: (highV * (leg === "upper" ? g : fixed)) / (g + fixed), ohm: 1 / (g + fixed) };
  }

  /** Shaped level for the capacitor's voltage; the pad's divider, the capacitor and the clamp solved together. */
  function shapedAt(source: { volt: number; ohm: number }, capacitorV: number): number {
    const open = ((source.volt - capacitorV) * couplingOhm) / (source.ohm + couplingOhm);
    if (open > DIODE_ASLEEP_V) return open;
    const gain = 1 / source.ohm + 1 / couplingOhm;
    let low = open;
    let high = 0;
    let level = Math.max(open, -0.6);
    for (let i = 0; i < 60; i += 1) {
      const excess = (source.volt - capacitorV) / source.ohm - level * gain + diodeCurrent(-level, 0);
      if (excess > 0) low = level;
      else high = level;
      const slope = -gain - (diodeCurrent(-level + 1e-6, 0) - diodeCurrent(-level, 0)) / 1e-6;
      let next = level - excess / slope;
      if (!(next > low && next < high)) next = (low + high) / 2;
      if (Math.abs(next - level) < 1e-12) break;
      level = next;
    }
    return level;
  }

  const slope = (timeS: number, capacitorV: number): number => {
    const source = padSource(timeS);
    return (source.volt - capacitorV - shapedAt(source, capacitorV)) / source.ohm / couplingF;
  };

  const startS = times[0] as number;
  const strikeEndS = times.at(-1) as number;
  const settled = padSource(startS);
  let capacitorV = settled.volt;
  const last = padSource(strikeEndS);
  const tailS = 14 * (last.ohm + couplingOhm) * couplingF;
  const endS = strikeEndS + tailS;
  const result: ShapedSignal = {
    padRestV: settled.volt, padHitV: settled.volt, peakV: 0, leastV: 0, restsHigh: tripV <= 0, flips: [], endS, timeS: [startS], padV: [settled.volt], shapedV: [0],
  };
  let isHigh = result.restsHigh;

  function look(timeS: number, volt: number): { padV: number; shapedV: number } {
    const source = padSource(timeS);
    const shapedV = shapedAt(source, volt);
    const padV = volt + shapedV;
    if (leg === "upper" ? padV > result.padHitV : padV < result.padHitV) result.padHitV = padV;
    result.peakV = Math.max(result.peakV, shapedV);
    result.leastV = Math.min(result.leastV, shapedV);
    return { padV, shapedV };
  }

  const corners = [...times.slice(1), endS];
  let timeS = startS;
  let steps = 0;
  for (const cornerS of corners) {
    const length = cornerS - timeS;
    if (!(length > 0)) continue;
    let step = length / 8;
    while (timeS < cornerS - length * 1e-12 && steps < MOST_STEPS) {
      steps += 1;
      step = Math.min(step, cornerS - timeS);
      const { next, error, k1, k7 } = dormandPrince(slope, timeS, capacitorV, step);
      const scale = error / (toleranceV * (1 + Math.abs(capacitorV)));
      if (scale > 1 && step > length * 1e-9) {
        step *= Math.max(0.2, 0.9 * scale ** -0.2);
        continue;
      }
      const from = { timeS, volt: capacitorV, rate: k1 };
      const to = { timeS: timeS + step, volt: next, rate: k7 };
      findFlips(from, to);
      timeS += step;
      capacitorV = next;
      const seen = look(timeS, capacitorV);
      result.timeS.push(timeS);
      result.padV.push(seen.padV);
      result.shapedV.push(seen.shapedV);
      step *= Math.min(4, Math.max(0.3, 0.9 * Math.max(scale, 1e-6) ** -0.2));
    }
    timeS = cornerS;
  }
  return result;

  interface Knot { timeS: number; volt: number; rate: number }

  /** Looks inside one accepted step, on its cubic, for crossings of the comparator's levels. */
  function findFlips(from: Knot, to: Knot): void {
    const at = (share: number) => {
      const t = from.timeS + (to.timeS - from.timeS) * share;
      return { t, level: look(t, hermite(from, to, share)).shapedV };
    };
    const PARTS = 4;
    let before = 0;
    for (let part = 1; part <= PARTS; part += 1) {
      const share = part / PARTS;
      const level = at(share).level;
      const wanted = isHigh ? level < releaseV : level > tripV;
      if (wanted) {
        let [low, high] = [before, share];
        for (let i = 0; i < 40; i += 1) {
          const middle = (low + high) / 2;
          const crossed = isHigh ? at(middle).level < releaseV : at(middle).level > tripV;
          if (crossed) high = middle;
          else low = middle;
        }
        isHigh = !isHigh;
        result.flips.push({ timeS: from.timeS + (to.timeS - from.timeS) * high, high: isHigh });
      }
      before = share;
    }
  }
}

function hermite(from: { timeS: number; volt: number; rate: number }, to: typeof from, share: number): number {
  const length = to.timeS - from.timeS;
  const [s, r] = [share, 1 - share];
  return r * r * (1 + 2 * s) * from.volt + s * s * (1 + 2 * r) * to.volt + s * r * (r * from.rate - s * to.rate) * length;
}

/** One Dormand–Prince 5(4) step. Source: J. Dormand and P. Prince, J. Comp. Appl. Math. 6 (1980), coefficients from memory. */
function dormandPrince(f: (t: number, y: number) => number, t: number, y: number, h: number) {
  const k1 = f(t, y);
  const k2 = f(t + h / 5, y + h * (k1 / 5));
  const k3 = f(t + (3 * h) / 10, y + h * ((3 / 40) * k1 + (9 / 40) * k2));
  const k4 = f(t + (4 * h) / 5, y + h * ((44 / 45) * k1 - (56 / 15) * k2 + (32 / 9) * k3));
  const k5 = f(t + (8 * h) / 9, y + h * ((19372 / 6561) * k1 - (25360 / 2187) * k2 + (64448 / 6561) * k3 - (212 / 729) * k4));
  const k6 = f(t + h, y + h * ((9017 / 3168) * k1 - (355 / 33) * k2 + (46732 / 5247) * k3 + (49 / 176) * k4 - (5103 / 18656) * k5));
  const next = y + h * ((35 / 384) * k1 + (500 / 1113) * k3 + (125 / 192) * k4 - (2187 / 6784) * k5 + (11 / 84) * k6);
  const k7 = f(t + h, next);
  const error = Math.abs(h * ((71 / 57600) * k1 - (71 / 16695) * k3 + (71 / 1920) * k4 - (17253 / 339200) * k5 + (22 / 525) * k6 - (1 / 40) * k7));
  return { next, error, k1, k7 };
}
