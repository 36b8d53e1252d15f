import type { Circuit, Trace } from "./conditioner-types";
import { hermite } from "./hermite";
import type { OutputSignal } from "./output-signal";
import { limitedLevel } from "./solve-output";
import type { Shaped } from "./solve-shaper";
import type { Stretch } from "./wanted-levels";

const GRID = 260;
const MOST_NODES = 100;

/** The signals at about 400 common moments: an even grid, the solver's own steps, and both sides of every jump. */
export function buildTrace(circuit: Circuit, shaped: Shaped, stretches: readonly Stretch[], output: OutputSignal): Trace {
  const nodes = shaped.nodes as NonNullable<Shaped["nodes"]>;
  const endS = drawnUntil(circuit, shaped, output);
  const beforeS = shaped.startS - 0.02 * (endS - shaped.startS);
  const timeS = moments(beforeS, shaped, stretches, output, endS);
  const envelope = output.nodes;
  const drawn: Trace = { timeS, padV: [], shapedV: [], thresholdV: [], outV: [], envelopeV: envelope ? [] : null };
  let shaperAt = 0;
  let stretchAt = 0;
  let envelopeAt = 0;
  let previousS = -Infinity;
  for (const t of timeS) {
    while (shaperAt + 2 < nodes.timeS.length && (nodes.timeS[shaperAt + 1] as number) <= t) shaperAt += 1;
    drawn.padV.push(along(nodes.timeS, nodes.padV, nodes.padRate, shaperAt, t));
    drawn.shapedV.push(along(nodes.timeS, nodes.shapedV, nodes.shapedRate, shaperAt, t));
    drawn.thresholdV.push(circuit.thresholdV);
    // Of two moments at one time the first is before the jump, the second after it.
    const again = t === previousS;
    while (stretchAt + 1 < stretches.length && isPast(stretches[stretchAt] as Stretch, t, again)) stretchAt += 1;
    if (envelope && drawn.envelopeV) {
      while (envelopeAt + 2 < envelope.timeS.length && ((envelope.timeS[envelopeAt + 1] as number) < t || (again && (envelope.timeS[envelopeAt + 1] as number) <= t))) envelopeAt += 1;
      drawn.outV.push(straight(envelope.timeS, envelope.outV, envelopeAt, t) * circuit.triggerShare);
      drawn.envelopeV.push(straight(envelope.timeS, envelope.emitterV, envelopeAt, t));
    } else {
      const { fromS, volt, rate, untilS } = stretches[stretchAt] as Stretch;
      drawn.outV.push(limitedLevel(circuit, volt + rate * (Math.min(Math.max(t, fromS), untilS) - fromS)) * circuit.triggerShare);
    }
    previousS = t;
  }
  return drawn;
}

function isPast({ untilS }: Stretch, t: number, again: boolean): boolean {
  return untilS < t || (again && untilS <= t);
}

/** The strike, its pulses and their tail; not the forty time constants that the solver may follow. */
function drawnUntil(circuit: Circuit, shaped: Shaped, output: OutputSignal): number {
  const tauS = (circuit.couplingOhm + 1 / (1 / circuit.dividerOhm + 1 / circuit.restOhm)) * circuit.couplingF;
  const strikeS = shaped.strikeEndS - shaped.startS;
  const lastS = output.pulses.reduce((most, { startS, widthS }) => Math.max(most, startS + widthS), shaped.strikeEndS);
  const fall = output.envelope?.decayS ?? 0;
  const settledS = Math.min(4 * tauS, Math.max(strikeS, 1e-6));
  return Math.min(Math.max(shaped.strikeEndS + settledS, lastS * 1.05, lastS + 1.4 * fall), Math.max(shaped.endS, lastS + 1.4 * fall));
}

function moments(beforeS: number, shaped: Shaped, stretches: readonly Stretch[], output: OutputSignal, endS: number): number[] {
  const wanted: number[] = [];
  for (let i = 0; i <= GRID; i += 1) wanted.push(beforeS + ((endS - beforeS) * i) / GRID);
  for (const times of [shaped.nodes?.timeS ?? [], output.nodes?.timeS ?? []]) {
    const stride = Math.ceil(times.length / MOST_NODES);
    for (let i = 0; i < times.length; i += stride) wanted.push(times[i] as number);
  }
  const plain = [...new Set(wanted)];
  const jumps = stretches.slice(1, 40).flatMap(({ fromS }) => [fromS, fromS]);
  return [...plain.filter((t) => !jumps.includes(t)), ...jumps].filter((t) => t <= endS).sort((a, b) => a - b);
}

function along(times: readonly number[], values: readonly number[], rates: readonly number[], i: number, t: number): number {
  const [t0, t1] = [times[i] as number, times[i + 1] ?? (times[i] as number)];
  const [v0, v1] = [values[i] as number, values[i + 1] ?? (values[i] as number)];
  if (t <= t0 || t1 <= t0) return v0;
  if (t >= t1) return v1;
  return hermite(v0, rates[i] as number, v1, rates[i + 1] as number, t1 - t0, (t - t0) / (t1 - t0));
}

function straight(times: readonly number[], values: readonly number[], i: number, t: number): number {
  const [t0, t1] = [times[i] as number, times[i + 1] ?? (times[i] as number)];
  const [v0, v1] = [values[i] as number, values[i + 1] ?? (values[i] as number)];
  if (t <= t0 || t1 <= t0) return v0;
  return t >= t1 ? v1 : v0 + ((v1 - v0) * (t - t0)) / (t1 - t0);
}
