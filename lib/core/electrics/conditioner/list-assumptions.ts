import type { ConditionerSpec } from "./conditioner-types";

/** What the answer takes as ideal, for want of a figure. */
export function listAssumptions({ comparator, threshold, pad }: ConditionerSpec): string[] {
  const { slewVperS, offsetV, hysteresisV, noiseV, commonMode, sinkA } = comparator;
  return [
    ...(slewVperS === undefined ? ["The comparator's output jumps: no slew rate was given."] : []),
    ...(offsetV === undefined ? ["The comparator's input offset is taken as 0 V."] : []),
    ...(hysteresisV === undefined ? ["The comparator has no hysteresis."] : []),
    ...(noiseV === undefined ? ["No noise rides on the comparator's input."] : []),
    ...(commonMode === undefined ? ["Any input voltage suits the comparator: no common-mode range was given."] : []),
    ...(sinkA === undefined ? ["The comparator sinks as much current as it gives."] : []),
    `The supply has no internal resistance; inputs draw no current${threshold.turn === 0 || threshold.turn === 1 ? "" : " from the pot's wiper"}.`,
    ...(pad.kind === "resistive" ? ["Parts given as plain numbers vary as sold: resistors ±5 %, capacitors ±10 % below 1 µF and ±20 % from there; the supply stays as given."] : []),
  ];
}
