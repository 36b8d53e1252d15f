import type { Circuit } from "./conditioner-types";
import type { Flip } from "./solve-shaper";

/** A stretch of time in which the comparator wants a level that changes at one rate. */
export interface Stretch {
  fromS: number;
  untilS: number;
  volt: number;
  rate: number;
  /** What the comparator has decided, whether or not its output is there yet. */
  high: boolean;
}

/** The comparator's decisions as wanted levels: jumps where it is ideal, ramps where its slew is known. */
export function wantedLevels(circuit: Circuit, restsHigh: boolean, flips: readonly Flip[], startS: number, endS: number): Stretch[] {
  const { outHighV, outLowV, slewVperS } = circuit;
  const stretches: Stretch[] = [];
  let volt = restsHigh ? outHighV : outLowV;
  const add = (fromS: number, untilS: number, high: boolean) => {
    const goal = high ? outHighV : outLowV;
    if (slewVperS < Infinity && volt !== goal) {
      const rampEndS = fromS + Math.abs(goal - volt) / slewVperS;
      const rate = goal > volt ? slewVperS : -slewVperS;
      if (rampEndS > untilS) {
        stretches.push({ fromS, untilS, volt, rate, high });
        volt += rate * (untilS - fromS);
        return;
      }
      stretches.push({ fromS, untilS: rampEndS, volt, rate, high });
      volt = goal;
      stretches.push({ fromS: rampEndS, untilS, volt, rate: 0, high });
      return;
    }
    volt = goal;
    stretches.push({ fromS, untilS, volt, rate: 0, high });
  };
  let timeS = startS;
  let high = restsHigh;
  for (const flip of flips) {
    add(timeS, flip.timeS, high);
    timeS = flip.timeS;
    high = flip.high;
  }
  add(timeS, Math.max(endS, timeS), high);
  return stretches;
}
