import { nominalOf, type Spread } from "@/lib/core/units/spread";
import type { Circuit, ConditionerSpec } from "./conditioner-types";

/** Chooses one value out of a spread; `path` names the figure, as in `coupling.farad`. */
export type Pick = (spread: Spread, path: string) => number;

/** Every part at its nominal value. */
export const nominal: Pick = (spread) => (typeof spread === "number" ? spread : nominalOf(spread));

/** The circuit with one value for every figure. The spec's figures are taken as checked (`findConditionerIssues`). */
export function settleCircuit(spec: ConditionerSpec, pick: Pick = nominal): Circuit {
  const { supply, pad, threshold, comparator, output, envelope, load } = spec;
  const highV = pick(supply.highV, "supply.highV");
  const lowV = pick(supply.lowV, "supply.lowV");
  const topOhm = pick(threshold.topOhm, "threshold.topOhm");
  const potOhm = pick(threshold.potOhm, "threshold.potOhm");
  const bottomOhm = pick(threshold.bottomOhm, "threshold.bottomOhm");
  const thresholdV = (highV * (bottomOhm + threshold.turn * potOhm)) / (topOhm + potOhm + bottomOhm);
  const offsetV = comparator.offsetV ?? 0;
  const halfBandV = (comparator.hysteresisV ?? 0) / 2;
  const seriesOhm = pick(output.seriesOhm, "output.seriesOhm");
  const shuntOhm = output.shuntOhm === null ? Infinity : pick(output.shuntOhm, "output.shuntOhm");
  const drivenOhm = load.ohm === null ? Infinity : pick(load.ohm, "load.ohm");
  const loadOhm = 1 / (1 / shuntOhm + 1 / drivenOhm);
  const limitA = pick(comparator.limitA, "comparator.limitA");
  return {
    highV,
    lowV,
    leg: pad.leg,
    restOhm: pick(pad.restOhm, "pad.restOhm"),
    hitOhm: pick(pad.hitOhm, "pad.hitOhm"),
    strike: spec.strike,
    dividerOhm: pick(spec.divider.ohm, "divider.ohm"),
    couplingF: pick(spec.coupling.farad, "coupling.farad"),
    couplingOhm: pick(spec.coupling.ohm, "coupling.ohm"),
    thresholdV,
    tripV: thresholdV - offsetV + halfBandV,
    releaseV: thresholdV - offsetV - halfBandV,
    outHighV: highV - pick(comparator.highDropV, "comparator.highDropV"),
    outLowV: lowV + pick(comparator.lowDropV, "comparator.lowDropV"),
    limitA,
    sinkA: comparator.sinkA ?? limitA,
    slewVperS: comparator.slewVperS ?? Infinity,
    seriesOhm,
    shuntOhm,
    loadOhm,
    triggerS: loadOhm === Infinity ? 0 : 1 / (seriesOhm + loadOhm),
    triggerShare: loadOhm === Infinity ? 1 : loadOhm / (seriesOhm + loadOhm),
    envelope: envelope && {
      seriesOhm: pick(envelope.seriesOhm, "envelope.seriesOhm"),
      farad: pick(envelope.farad, "envelope.farad"),
      ohm: pick(envelope.ohm, "envelope.ohm"),
      emitterOhm: pick(envelope.emitterOhm, "envelope.emitterOhm"),
    },
  };
}
