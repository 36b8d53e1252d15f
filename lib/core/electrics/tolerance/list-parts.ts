import { nominalOf, toRange, type Range, type Spread } from "@/lib/core/units/spread";
import type { ConditionerSpec } from "../conditioner/conditioner-types";

/** One figure of a conditioner that may be other than its nominal value. */
export interface Part {
  /** As in the request: `coupling.farad`. */
  path: string;
  /** In words: `the coupling capacitor`. */
  name: string;
  nominal: number;
  range: Range;
}

const RESISTOR_TOL = 0.05;
const FILM_TOL = 0.1;
const ELECTROLYTIC_TOL = 0.2;
/** From here up a capacitor is taken for an electrolytic one: common practice, no source. */
const ELECTROLYTIC_F = 1e-6;

const PART_NAMES: Record<string, string> = {
  "supply.highV": "the supply",
  "supply.lowV": "the negative supply",
  "pad.restOhm": "the pad at rest",
  "pad.hitOhm": "the pad when hit",
  "divider.ohm": "the divider resistor",
  "coupling.farad": "the coupling capacitor",
  "coupling.ohm": "the coupling resistor",
  "threshold.topOhm": "the threshold's top resistor",
  "threshold.potOhm": "the threshold pot",
  "threshold.bottomOhm": "the threshold's bottom resistor",
  "comparator.highDropV": "the comparator's drop when high",
  "comparator.lowDropV": "the comparator's drop when low",
  "comparator.limitA": "the comparator's current limit",
  "output.seriesOhm": "the output's series resistor",
  "output.shuntOhm": "the output's shunt resistor",
  "envelope.seriesOhm": "the envelope's series resistor",
  "envelope.farad": "the envelope capacitor",
  "envelope.ohm": "the envelope's discharge resistor",
  "envelope.emitterOhm": "the emitter resistor",
  "load.ohm": "the load",
};

/**
 * Every figure that is not exact. Parts given as plain numbers have the tolerance parts are sold with: ±5 % resistors,
 * ±10 % film and ±20 % electrolytic capacitors (electrics §3). Supply, pad, comparator and load are as stated.
 */
export function listParts(spec: ConditionerSpec): Part[] {
  const parts: Part[] = [];
  const add = (path: string, spread: Spread | null | undefined, tol = 0) => {
    if (spread === null || spread === undefined) return;
    const nominal = nominalOf(spread);
    const range = typeof spread === "number" ? toRange({ nominal: spread, tol }) : toRange(spread);
    if (range.min < range.max) parts.push({ path, name: PART_NAMES[path] ?? path, nominal, range });
  };
  const film = (spread: Spread) => (nominalOf(spread) < ELECTROLYTIC_F ? FILM_TOL : ELECTROLYTIC_TOL);
  add("supply.highV", spec.supply.highV);
  add("supply.lowV", spec.supply.lowV);
  add("pad.restOhm", spec.pad.restOhm);
  add("pad.hitOhm", spec.pad.hitOhm);
  add("divider.ohm", spec.divider.ohm, RESISTOR_TOL);
  add("coupling.farad", spec.coupling.farad, film(spec.coupling.farad));
  add("coupling.ohm", spec.coupling.ohm, RESISTOR_TOL);
  add("threshold.topOhm", spec.threshold.topOhm, RESISTOR_TOL);
  add("threshold.potOhm", spec.threshold.potOhm, RESISTOR_TOL);
  add("threshold.bottomOhm", spec.threshold.bottomOhm, RESISTOR_TOL);
  add("comparator.highDropV", spec.comparator.highDropV);
  add("comparator.lowDropV", spec.comparator.lowDropV);
  add("comparator.limitA", spec.comparator.limitA);
  add("output.seriesOhm", spec.output.seriesOhm, RESISTOR_TOL);
  add("output.shuntOhm", spec.output.shuntOhm, RESISTOR_TOL);
  if (spec.envelope) {
    add("envelope.seriesOhm", spec.envelope.seriesOhm, RESISTOR_TOL);
    add("envelope.farad", spec.envelope.farad, film(spec.envelope.farad));
    add("envelope.ohm", spec.envelope.ohm, RESISTOR_TOL);
    add("envelope.emitterOhm", spec.envelope.emitterOhm, RESISTOR_TOL);
  }
  add("load.ohm", spec.load.ohm);
  return parts;
}
