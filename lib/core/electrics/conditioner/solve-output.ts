import type { Circuit } from "./conditioner-types";
import { OutputMoment } from "./output-moment";
import { chargeEnvelope } from "./charge-envelope";
import type { OutputSignal } from "./output-signal";
import { meets, PulseWatch } from "./pulse-watch";
import type { Stretch } from "./wanted-levels";

/** Comparator output behind its current limit, without an envelope: the trigger branch is a resistor. */
export function limitedLevel({ triggerS, limitA, sinkA }: Circuit, wantedV: number): number {
  const asked = wantedV * triggerS;
  if (asked > limitA) return limitA / triggerS;
  return asked < -sinkA ? -sinkA / triggerS : wantedV;
}

/** The comparator's output behind its one current limit, the trigger output and the envelope, over the comparator's decisions. */
export function solveOutput(circuit: Circuit, restsHigh: boolean, stretches: readonly Stretch[], lastHighS: number | null, keepNodes: boolean): OutputSignal {
  const { envelope, outHighV, outLowV, triggerShare } = circuit;
  if (envelope) return chargeEnvelope(circuit, new OutputMoment(circuit, envelope), restsHigh, stretches, lastHighS, keepNodes);
  const halfV = (outHighV + outLowV) / 2;
  const canReach = limitedLevel(circuit, outHighV) >= halfV;
  const restV = limitedLevel(circuit, restsHigh ? outHighV : outLowV);
  const watch = new PulseWatch(restV >= halfV);
  let highest = restV;
  for (const stretch of stretches) {
    if (canReach) {
      watch.see(stretch.fromS, limitedLevel(circuit, stretch.volt) >= halfV);
      const crossing = meets(stretch, halfV);
      if (crossing !== null) watch.see(crossing, stretch.rate > 0);
    }
    const end = stretch.volt + stretch.rate * (stretch.untilS - stretch.fromS);
    highest = Math.max(highest, limitedLevel(circuit, Math.max(stretch.volt, end)));
  }
  const pulses = watch.close(stretches.at(-1)?.untilS ?? 0);
  return { restV: restV * triggerShare, settledV: limitedLevel(circuit, outHighV) * triggerShare, highestV: highest * triggerShare, pulses, envelope: null, nodes: null };
}
