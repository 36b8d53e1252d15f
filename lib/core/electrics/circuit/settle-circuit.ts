import { nominalOf, type Spread } from "@/lib/core/units/spread";
import type { Circuit, ConditionerSpec } from "./conditioner-types";

/** Chooses one value out of a spread; `path` names the figure, as in `coupling.farad`. */
export type Pick = (spread: Spread, path: string) => number;

/** Every part at its nominal value. */
export const nominal: Pick = (spread) => nominalOf(spread);

/**
 * The circuit with one value for every figure.
 * @throws RangeError naming the figure that is not positive and finite where it must be.
 */
export function settleCircuit(spec: ConditionerSpec, pick: Pick = nominal): Circuit {
  const positive = (spread: Spread, path: string) => {
    const value = pick(spread, path);
    if (!(value > 0) || !Number.isFinite(value)) throw new RangeError(`${path} must be more than zero: ${value}`);
    return value;
  };
  const any = (spread: Spread, path: string) => {
    const value = pick(spread, path);
    if (!Number.isFinite(value)) throw new RangeError(`${path} must be a finite number: ${value}`);
    return value;
  };
  const highV = positive(spec.supply.highV, "supply.highV");
  const lowV = any(spec.supply.lowV, "supply.lowV");
  const { threshold, comparator, output, envelope } = spec;
  const [top, pot, bottom] = [any(threshold.topOhm, "threshold.topOhm"), any(threshold.potOhm, "threshold.potOhm"), any(threshold.bottomOhm, "threshold.bottomOhm")];
  if (!(top + pot + bottom > 0)) throw new RangeError("threshold needs some resistance");
  const thresholdV = (highV * (bottom + threshold.turn * pot)) / (top + pot + bottom);
  const [offset, half] = [comparator.offsetV ?? 0, (comparator.hysteresisV ?? 0) / 2];
  const shuntOhm = output.shuntOhm === null ? Infinity : positive(output.shuntOhm, "output.shuntOhm");
  const load = spec.load.ohm === null ? Infinity : positive(spec.load.ohm, "load.ohm");
  return {
    highV,
    lowV,
    leg: spec.pad.leg,
    restOhm: positive(spec.pad.restOhm, "pad.restOhm"),
    hitOhm: positive(spec.pad.hitOhm, "pad.hitOhm"),
    strike: spec.strike,
    dividerOhm: positive(spec.divider.ohm, "divider.ohm"),
    couplingF: positive(spec.coupling.farad, "coupling.farad"),
    couplingOhm: positive(spec.coupling.ohm, "coupling.ohm"),
    thresholdV,
    tripV: thresholdV + offset + half,
    releaseV: thresholdV + offset - half,
    outHighV: highV - any(comparator.highDropV, "comparator.highDropV"),
    outLowV: lowV + any(comparator.lowDropV, "comparator.lowDropV"),
    limitA: comparator.limitA,
    sinkA: comparator.sinkA ?? comparator.limitA,
    seriesOhm: any(output.seriesOhm, "output.seriesOhm"),
    shuntOhm,
    loadOhm: 1 / (1 / shuntOhm + 1 / load),
    envelope: envelope && {
      seriesOhm: any(envelope.seriesOhm, "envelope.seriesOhm"),
      farad: positive(envelope.farad, "envelope.farad"),
      ohm: positive(envelope.ohm, "envelope.ohm"),
      emitterOhm: positive(envelope.emitterOhm, "envelope.emitterOhm"),
    },
  };
}
