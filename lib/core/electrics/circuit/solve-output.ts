import type { Circuit, Pulse } from "./conditioner-types";
import { diodeCurrent, follower } from "./devices";
import type { Flip, ShapedSignal } from "./solve-shaper";

export interface OutputSignal {
  restV: number;
  highestV: number;
  pulses: Pulse[];
  envelope: null | { peakV: number; decayS: number };
  timeS: number[];
  outputV: number[];
  envelopeV: number[];
}

const TOLERANCE_V = 1e-5;
const MOST_STEPS = 20_000;
const SETTLED_V = 2e-6;

/** Comparator output, current limit, trigger output and envelope, for the flips that the shaped signal gave. */
export function solveOutput(circuit: Circuit, shaped: ShapedSignal): OutputSignal {
  const { envelope, seriesOhm, loadOhm, outHighV, outLowV } = circuit;
  const share = loadOhm === Infinity ? 1 : loadOhm / (loadOhm + seriesOhm);
  const halfV = ((outHighV + outLowV) / 2) * share;
  const siemens = loadOhm === Infinity ? 0 : 1 / (seriesOhm + loadOhm);

  function drawn(outV: number, capacitorV: number): number {
    return outV * siemens + (envelope ? diodeCurrent(outV - capacitorV, envelope.seriesOhm) : 0);
  }

  /** The comparator's output: where it wants to be, or where its one current limit lets it get to. */
  function comparatorV(isHigh: boolean, capacitorV: number): number {
    const target = isHigh ? outHighV : outLowV;
    const asked = drawn(target, capacitorV);
    const limit = asked > 0 ? circuit.limitA : -circuit.sinkA;
    if (Math.abs(asked) <= Math.abs(limit)) return target;
    // Current grows with the output's level: halve between a level that draws too little and the target.
    let [inside, outside] = asked > 0 ? [Math.min(0, capacitorV, target) - 1, target] : [Math.max(0, capacitorV, target) + 1, target];
    for (let i = 0; i < 34; i += 1) {
      const middle = (inside + outside) / 2;
      if (Math.abs(drawn(middle, capacitorV)) <= Math.abs(limit) || Math.sign(drawn(middle, capacitorV)) !== Math.sign(limit)) inside = middle;
      else outside = middle;
    }
    return (inside + outside) / 2;
  }

  function rate(isHigh: boolean, capacitorV: number): number {
    if (!envelope) return 0;
    const into = diodeCurrent(comparatorV(isHigh, capacitorV) - capacitorV, envelope.seriesOhm);
    return (into - capacitorV / envelope.ohm - follower(capacitorV, circuit.highV, envelope.emitterOhm).baseA) / envelope.farad;
  }

  function settledV(isHigh: boolean): number {
    if (!envelope) return 0;
    let [low, high] = [Math.min(0, outLowV) - 1, Math.max(outHighV, 0) + 1];
    for (let i = 0; i < 36; i += 1) {
      const middle = (low + high) / 2;
      if (rate(isHigh, middle) > 0) low = middle;
      else high = middle;
    }
    return (low + high) / 2;
  }

  const startS = shaped.timeS[0] as number;
  let isHigh = shaped.restsHigh;
  let capacitorV = settledV(isHigh);
  const outV = () => comparatorV(isHigh, capacitorV) * share;
  const result: OutputSignal = { restV: outV(), highestV: outV(), pulses: [], envelope: null, timeS: [], outputV: [], envelopeV: [] };
  let pulseStartS: number | null = null;
  let peakE = emitter();
  let lastHighS: number | null = isHigh ? shaped.endS : null;

  function emitter(): number {
    return envelope ? follower(capacitorV, circuit.highV, envelope.emitterOhm).emitterV : 0;
  }

  function note(timeS: number): void {
    result.timeS.push(timeS);
    result.outputV.push(outV());
    const level = emitter();
    result.envelopeV.push(level);
    peakE = Math.max(peakE, level);
    result.highestV = Math.max(result.highestV, outV());
  }

  function watchHalf(timeS: number): void {
    if (pulseStartS === null && outV() >= halfV) pulseStartS = timeS;
    else if (pulseStartS !== null && outV() < halfV) {
      result.pulses.push({ startS: pulseStartS, widthS: timeS - pulseStartS });
      pulseStartS = null;
    }
  }

  /** Runs to `untilS`, or to where `stop` says so; returns the time reached. */
  function run(fromS: number, untilS: number, stop?: () => boolean): number {
    let timeS = fromS;
    if (!envelope) return untilS;
    const goalV = settledV(isHigh);
    let step = Math.min(untilS - fromS, 0.02 / (Math.abs(rate(isHigh, capacitorV)) + 1e-9));
    for (let i = 0; i < MOST_STEPS && timeS < untilS; i += 1) {
      if (Math.abs(capacitorV - goalV) < SETTLED_V) {
        capacitorV = goalV;
        note(timeS);
        return untilS;
      }
      step = Math.min(step, untilS - timeS);
      const { next, error } = bogackiShampine((v) => rate(isHigh, v), capacitorV, step);
      const scale = error / (TOLERANCE_V * (1 + Math.abs(capacitorV)));
      if (scale > 1) {
        step *= Math.max(0.2, 0.9 * scale ** (-1 / 3));
        continue;
      }
      const before = { timeS, capacitorV, below: outV() < halfV };
      capacitorV = next;
      timeS += step;
      if (before.below !== outV() < halfV) {
        // Within one short step the capacitor moves straight enough to place the crossing.
        const after = capacitorV;
        let [low, high] = [0, 1];
        for (let j = 0; j < 40; j += 1) {
          const middle = (low + high) / 2;
          capacitorV = before.capacitorV + (after - before.capacitorV) * middle;
          if (outV() < halfV === before.below) low = middle;
          else high = middle;
        }
        capacitorV = before.capacitorV + (after - before.capacitorV) * high;
        watchHalf(before.timeS + step * high);
        capacitorV = after;
      }
      note(timeS);
      if (stop?.()) return timeS;
      step *= Math.min(4, Math.max(0.3, 0.9 * Math.max(scale, 1e-6) ** (-1 / 3)));
    }
    return timeS;
  }

  note(startS);
  let timeS = startS;
  const flips: Flip[] = shaped.restsHigh ? [] : shaped.flips;
  for (const flip of flips) {
    run(timeS, flip.timeS);
    timeS = flip.timeS;
    note(timeS);
    isHigh = flip.high;
    if (!isHigh) lastHighS = timeS;
    watchHalf(timeS);
    note(timeS);
  }
  const decayS = envelope && !isHigh && lastHighS !== null ? decayFrom() : null;
  if (!envelope || timeS < shaped.endS) {
    run(timeS, shaped.endS);
    timeS = Math.max(timeS, shaped.endS);
    note(timeS);
  }
  if (pulseStartS !== null && !shaped.restsHigh) result.pulses.push({ startS: pulseStartS, widthS: timeS - pulseStartS });
  if (envelope) result.envelope = { peakV: peakE, decayS: decayS ?? 0 };
  return result;

  /** From the last moment the comparator is high until the emitter has fallen to peak/e. */
  function decayFrom(): number {
    const goal = peakE / Math.E;
    const beganS = timeS;
    if (emitter() <= goal || !envelope) return 0;
    const longestS = 60 * envelope.farad * envelope.ohm;
    let previous = { timeS, level: emitter() };
    let reached: number | null = null;
    timeS = run(timeS, timeS + longestS, () => {
      const now = { timeS: result.timeS.at(-1) as number, level: result.envelopeV.at(-1) as number };
      if (now.level <= goal) {
        // An exponential between two steps.
        const share = Math.log(previous.level / goal) / Math.log(previous.level / Math.max(now.level, 1e-12));
        reached = previous.timeS + (now.timeS - previous.timeS) * share;
        return true;
      }
      previous = now;
      return false;
    });
    return (reached ?? timeS) - beganS;
  }
}

/** One Bogacki–Shampine 3(2) step of an autonomous equation. Source: Appl. Math. Lett. 2 (1989), coefficients from memory. */
function bogackiShampine(f: (y: number) => number, y: number, h: number): { next: number; error: number } {
  const k1 = f(y);
  const k2 = f(y + (h * k1) / 2);
  const k3 = f(y + (3 * h * k2) / 4);
  const next = y + h * ((2 / 9) * k1 + (1 / 3) * k2 + (4 / 9) * k3);
  const k4 = f(next);
  return { next, error: Math.abs(h * ((-5 / 72) * k1 + (1 / 12) * k2 + (1 / 9) * k3 - (1 / 8) * k4)) };
}
