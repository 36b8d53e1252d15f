import type { Circuit } from "./conditioner-types";
import { hermite, meetingOf, turnOf } from "./hermite";
import { DIODE_A } from "./junctions";
import { BLOCKED_V, ShaperMoment } from "./shaper-moment";
import { nextStep, Step, stepRosenbrock } from "./step-rosenbrock";
import { strikeConductance } from "./strike-conductance";

/** A moment at which the comparator changes its mind. */
export interface Flip {
  timeS: number;
  high: boolean;
}

/** Values and slopes at the solver's own steps, for drawing. */
export interface Nodes {
  timeS: number[];
  padV: number[];
  padRate: number[];
  shapedV: number[];
  shapedRate: number[];
}

export interface Shaped {
  padRestV: number;
  padMostV: number;
  padLeastV: number;
  peakV: number;
  leastV: number;
  flips: Flip[];
  startS: number;
  strikeEndS: number;
  /** Where the simulation stopped. */
  endS: number;
  nodes: Nodes | null;
}

/** Share of the supply that one step may be wrong by. */
const STEP_TOLERANCE = 2.5e-5;
/** A level far enough above where the clamp begins to be worth a closed form, V. */
const CLOSED_FORM_V = 1.2 * BLOCKED_V;
const MOST_STEPS = 400_000;
/** Time constants after the strike in which everything has died away. */
const TAIL = 40;

/**
 * Divider, coupling capacitor and clamp, from the settled rest through the strike, and the comparator's decisions on it.
 * Where the open divider's level falls or stands, the shaped one cannot rise above 0 V; so once the comparator is low and
 * nothing rises any more, there is no more to decide, and the rest is left out unless it is asked for.
 * @param whole true: follow everything to its end and record the steps; else `leastV` is as far as was followed.
 */
export function solveShaper(circuit: Circuit, restsHigh: boolean, whole: boolean): Shaped {
  const { times, siemens } = strikeConductance(circuit);
  const { tripV, releaseV } = circuit;
  const corners = times.length;
  const tolerance = STEP_TOLERANCE * circuit.highV;
  const at = new ShaperMoment(circuit);
  const step = new Step();
  const startS = times[0] as number;
  const strikeEndS = times[corners - 1] as number;
  at.enter(startS, siemens[0] as number, 0);
  const padRestV = at.openV();
  let capacitorV = padRestV;
  const nodes: Nodes | null = whole ? { timeS: [startS], padV: [padRestV], padRate: [0], shapedV: [0], shapedRate: [0] } : null;
  const flips: Flip[] = [];
  let isHigh = restsHigh;
  let padMostV = padRestV;
  let padLeastV = padRestV;
  let peakV = 0;
  let leastV = 0;
  let steps = 0;
  let endS = strikeEndS;
  let t = startS;
  const lastRise = lastRising(siemens, circuit.leg);
  const risesWhenHit = (circuit.leg === "upper") === circuit.hitOhm <= circuit.restOhm;

  for (let corner = 0; corner < corners; corner += 1) {
    const isTail = corner === corners - 1;
    const from = times[corner] as number;
    const siemensFrom = siemens[corner] as number;
    let until = isTail ? Infinity : (times[corner + 1] as number);
    if (!isTail && until <= from) continue;
    at.enter(from, siemensFrom, isTail ? 0 : ((siemens[corner + 1] as number) - siemensFrom) / (until - from));
    t = from;
    at.look(t, capacitorV);
    if (isTail) {
      until = from + TAIL * (at.sourceOhm + circuit.couplingOhm) * circuit.couplingF;
      endS = until;
      // Where the pad is left for good the capacitor takes in all that is between, and the pad's level comes to the open one.
      padMostV = Math.max(padMostV, at.openV());
      padLeastV = Math.min(padLeastV, at.openV());
    }
    const falls = circuit.leg === "upper" ? at.siemensRate < 0 : at.siemensRate > 0;
    const mayStop = !whole && (isTail || (risesWhenHit && falls && corner > lastRise));
    let h = Math.min(until - from, 0.25 * at.sourceScaleS(), -0.3 / at.slope);
    let mayCut = true;
    for (;;) {
      const s0 = at.shapedV;
      if (isHigh ? s0 < releaseV : s0 > tripV) {
        // A jump of the pad, or a level that the last step ended on.
        isHigh = !isHigh;
        flips.push({ timeS: t, high: isHigh });
      }
      if (at.padV > padMostV) padMostV = at.padV;
      if (at.padV < padLeastV) padLeastV = at.padV;
      if (s0 > peakV) peakV = s0;
      if (s0 < leastV) leastV = s0;
      nodes?.timeS.push(t);
      nodes?.padV.push(at.padV);
      nodes?.padRate.push(at.padRate);
      nodes?.shapedV.push(s0);
      nodes?.shapedRate.push(at.shapedRate);
      if (t >= until || steps > MOST_STEPS || (mayStop && !isHigh && (isTail || at.padRate <= 0))) break;

      if (at.siemensRate === 0 && s0 > CLOSED_FORM_V) {
        // The clamp blocks and nothing moves: an exponential, up to the next thing that happens.
        steps += 1;
        const tauS = -1 / at.slope;
        const floorV = -DIODE_A * circuit.couplingOhm;
        let length = Math.min(until - t, tauS * Math.log((s0 - floorV) / (BLOCKED_V - floorV)));
        if (whole) length = Math.min(length, tauS / 2);
        // A hair below the level, so that it counts as passed.
        const releaseS = tauS * Math.log((s0 - floorV) / (releaseV - floorV)) + 1e-9 * tauS;
        const passes = isHigh && releaseS < length;
        if (passes) length = Math.max(releaseS, 0);
        capacitorV += at.f * tauS * (1 - Math.exp(-length / tauS));
        t = until - t <= length ? until : t + length;
        at.look(t, capacitorV);
        if (passes) {
          isHigh = false;
          flips.push({ timeS: t, high: false });
        }
        h = Math.min(until - t, 0.3 * tauS);
        continue;
      }
      const { f, slope, drift, shapedRate: d0, padV: p0, padRate: q0 } = at;
      let error = Infinity;
      for (;;) {
        steps += 1;
        const left = until - t;
        if (h > 0.999 * left) h = left;
        stepRosenbrock(at, t, capacitorV, h, f, slope, drift, step);
        error = step.error;
        if (!(error <= tolerance) && h > 1e-14 * (1e-9 + Math.abs(t)) && steps < MOST_STEPS) {
          h = nextStep(h, error, tolerance);
          continue;
        }
        at.look(t + h, step.y);
        const d1 = at.shapedRate;
        if (mayCut && d0 * d1 < 0) {
          // The level turns inside: end the step where it does, so that between step ends it only rises or only falls.
          const share = turnOf(s0, d0, at.shapedV, d1, h);
          mayCut = false;
          if (share > 0.02 && share < 0.98) {
            h *= share;
            continue;
          }
        } else mayCut = true;
        break;
      }
      const next = h === until - t ? until : t + h;
      const s1 = at.shapedV;
      const d1 = at.shapedRate;
      const end = step.y;
      if (q0 * at.padRate < 0) {
        // The pad's level turns inside: one step to about there, and a cubic over what is left of the doubt.
        const [p1, q1] = [at.padV, at.padRate];
        const rough = turnOf(p0, q0, p1, q1, h) * h;
        stepRosenbrock(at, t, capacitorV, rough, f, slope, drift, step);
        at.look(t + rough, step.y);
        const [pm, qm] = [at.padV, at.padRate];
        const turned = q0 * qm < 0 ? hermite(p0, q0, pm, qm, rough, turnOf(p0, q0, pm, qm, rough)) : hermite(pm, qm, p1, q1, h - rough, turnOf(pm, qm, p1, q1, h - rough));
        padMostV = Math.max(padMostV, pm, q0 > 0 ? turned : pm);
        padLeastV = Math.min(padLeastV, pm, q0 < 0 ? turned : pm);
        at.look(next, end);
      }
      if (isHigh ? s1 < releaseV : s1 > tripV) {
        const level = isHigh ? releaseV : tripV;
        const rough = meetingOf(s0, d0, s1, d1, h, level) * h;
        // The cubic is a good guess; a step of that length says exactly.
        stepRosenbrock(at, t, capacitorV, rough, f, slope, drift, step);
        at.look(t + rough, step.y);
        const fine = at.shapedRate !== 0 ? rough - (at.shapedV - level) / at.shapedRate : rough;
        isHigh = !isHigh;
        flips.push({ timeS: t + Math.min(h, Math.max(0, fine)), high: isHigh });
        at.look(next, end);
      }
      capacitorV = end;
      t = next;
      h = nextStep(h, error, tolerance);
    }
  }
  return { padRestV, padMostV, padLeastV, peakV, leastV, flips, startS, strikeEndS, endS, nodes };
}

/** The last stretch in which the open divider's level rises; −1 where none does. */
function lastRising(siemens: readonly number[], leg: Circuit["leg"]): number {
  for (let i = siemens.length - 2; i >= 0; i -= 1) {
    const change = (siemens[i + 1] as number) - (siemens[i] as number);
    if (leg === "upper" ? change > 0 : change < 0) return i;
  }
  return -1;
}
