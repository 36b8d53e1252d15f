import type { Circuit } from "./conditioner-types";
import { hermite, meetingOf } from "./hermite";
import type { OutputMoment } from "./output-moment";
import type { EnvelopeNodes, OutputSignal } from "./output-signal";
import { meets, PulseWatch } from "./pulse-watch";
import { nextStep, Step, stepRosenbrock } from "./step-rosenbrock";
import type { Stretch } from "./wanted-levels";

const STEP_TOLERANCE = 6e-5;
const MOST_STEPS = 20_000;
/** Time constants after which a fall that has not come to peak/e never will. */
const LONGEST_FALL = 60;

/** Comparator, trigger branch and envelope over the comparator's decisions; then the fall to peak/e. */
export function chargeEnvelope(circuit: Circuit, at: OutputMoment, restsHigh: boolean, stretches: readonly Stretch[], lastHighS: number | null, keepNodes: boolean): OutputSignal {
  const { outHighV, outLowV, triggerShare, highV } = circuit;
  const envelope = circuit.envelope as NonNullable<Circuit["envelope"]>;
  const tolerance = STEP_TOLERANCE * highV;
  const halfV = (outHighV + outLowV) / 2;
  const halfCapacitorV = at.capacitorReaching(halfV);
  const step = new Step();

  let capacitorV = at.settledV(restsHigh ? outHighV : outLowV);
  const restOut = at.outV;
  const restEmitterV = at.follower.emitterV;
  const watch = new PulseWatch(restOut >= halfV);
  const nodes: EnvelopeNodes | null = keepNodes ? { timeS: [], capacitorV: [], outV: [], emitterV: [] } : null;
  let highest = restOut;
  let peakV = restEmitterV;
  let timeS = stretches[0]?.fromS ?? 0;

  function note(): void {
    if (at.outV > highest) highest = at.outV;
    if (at.follower.emitterV > peakV) peakV = at.follower.emitterV;
    nodes?.timeS.push(timeS);
    nodes?.capacitorV.push(capacitorV);
    nodes?.outV.push(at.outV);
    nodes?.emitterV.push(at.follower.emitterV);
  }

  /** One stretch; ends early, and says true, where the emitter has fallen to `goalV`. */
  function run(stretch: Stretch, goalV: number): boolean {
    const { untilS } = stretch;
    timeS = stretch.fromS;
    at.want(stretch.fromS, stretch.volt, stretch.rate);
    at.look(timeS, capacitorV);
    note();
    watch.see(timeS, at.outV >= halfV);
    let h = Math.min(untilS - timeS, 0.3 / -at.slope, (0.02 * highV) / (Math.abs(at.f) + 1e-9));
    // Here the limit lets go and the rate bends: a step that ends just there is longer than one that finds it by trial.
    const bendV = stretch.rate === 0 ? at.capacitorReaching(stretch.volt) : -Infinity;
    for (let i = 0; i < MOST_STEPS && timeS < untilS; i += 1) {
      if (capacitorV < bendV && at.f > 0) h = Math.min(h, (bendV - capacitorV + tolerance) / at.f);
      if (h > 0.999 * (untilS - timeS)) h = untilS - timeS;
      const { f, slope, drift } = at;
      const { emitterV: emitterBefore, gain: gainBefore } = at.follower;
      stepRosenbrock(at, timeS, capacitorV, h, f, slope, drift, step);
      if (!(step.error <= tolerance) && h > 1e-15) {
        h = nextStep(h, step.error, tolerance);
        at.f = f;
        at.slope = slope;
        at.drift = drift;
        at.follower.emitterV = emitterBefore;
        at.follower.gain = gainBefore;
        continue;
      }
      const before = capacitorV;
      const error = step.error;
      const next = h === untilS - timeS ? untilS : timeS + h;
      at.look(next, step.y);
      const after = step.y;
      watchHalf(stretch, next, before < halfCapacitorV && after >= halfCapacitorV ? timeS + meetingOf(before, f, after, at.f, h, halfCapacitorV) * h : null);
      const emitterV = at.follower.emitterV;
      if (emitterV <= goalV && emitterBefore > goalV) {
        // The emitter follows the base smoothly; its own rate is the base's times how much of it gets through.
        const share = meetingOf(emitterBefore, f * gainBefore, emitterV, at.f * at.follower.gain, h, goalV);
        capacitorV = hermite(before, f, after, at.f, h, share);
        timeS += share * h;
        return true;
      }
      capacitorV = after;
      timeS = next;
      note();
      h = nextStep(h, error, tolerance);
    }
    return false;
  }

  /** The output crosses upwards when both its wanted level and what the limit leaves of it are there; it falls with the wanted level alone. */
  function watchHalf(stretch: Stretch, nowS: number, filledS: number | null): void {
    const wanted = stretch.rate !== 0 ? meets(stretch, halfV) : null;
    const wantedS = wanted !== null && wanted <= nowS ? wanted : null;
    const above = at.outV >= halfV;
    if (above) watch.see(wantedS === null && filledS === null ? nowS : Math.max(wantedS ?? -Infinity, filledS ?? -Infinity), true);
    else watch.see(wantedS ?? nowS, false);
  }

  let decayS = 0;
  stretches.forEach((stretch, i) => {
    const goalV = peakV / Math.E;
    if (lastHighS === null || i < stretches.length - 1 || stretch.high || at.follower.emitterV <= goalV) {
      run(stretch, -Infinity);
      return;
    }
    const longestS = LONGEST_FALL * envelope.farad * envelope.ohm;
    if (!run({ ...stretch, untilS: stretch.fromS + longestS }, goalV)) return;
    decayS = timeS - lastHighS;
    if (keepNodes) run({ ...stretch, fromS: timeS, untilS: timeS + decayS / 2 }, -Infinity);
  });
  const pulses = watch.close(stretches.at(-1)?.untilS ?? 0);
  // Where a pulse without end would go: asked for only where there is none to see, or everything is wanted.
  if (keepNodes || pulses.length === 0) at.settledV(outHighV);
  return {
    restV: restOut * triggerShare,
    settledV: at.outV * triggerShare,
    highestV: highest * triggerShare,
    pulses,
    envelope: { restV: restEmitterV, peakV, fullV: at.follower.emitterV, decayS },
    nodes,
  };
}
