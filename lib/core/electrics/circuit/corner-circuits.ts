import type { Circuit, ConditionerSpec } from "./conditioner-types";
import { partRange } from "./part-tolerances";
import { settleCircuit } from "./settle-circuit";

type End = "min" | "max";
const opposite = (end: End): End => (end === "min" ? "max" : "min");

/** Which end of its range each figure takes: as the whole corner says. */
interface Corner {
  supply: End;
  /** `min`: the weakest hit on the pad with the highest resistance at rest… */
  hit: End;
  /** `min`: least gets through and the threshold is at its highest. */
  through: End;
  divider: End;
}

/**
 * The circuit at the corners of its spreads that bound what it does: supply, strength of hit, how much gets through
 * against how high the threshold stands, and the divider's resistor both ways (its best value lies between).
 */
export function cornerCircuits(spec: ConditionerSpec): Circuit[] {
  const corners: Circuit[] = [];
  for (const supply of ["min", "max"] as const) {
    for (const hit of ["min", "max"] as const) {
      for (const through of ["min", "max"] as const) {
        for (const divider of ["min", "max"] as const) corners.push(cornerOf(spec, { supply, hit, through, divider }));
      }
    }
  }
  return corners;
}

export function cornerOf(spec: ConditionerSpec, { supply, hit, through, divider }: Corner): Circuit {
  const ends: Record<string, End> = {
    "supply.highV": supply,
    "supply.lowV": supply,
    "pad.restOhm": opposite(hit),
    "pad.hitOhm": opposite(hit),
    "divider.ohm": divider,
    "coupling.farad": through,
    "coupling.ohm": through,
    "threshold.topOhm": through,
    "threshold.potOhm": opposite(through),
    "threshold.bottomOhm": opposite(through),
    "comparator.highDropV": opposite(supply),
    "output.seriesOhm": opposite(supply),
    "output.shuntOhm": supply,
    "load.ohm": supply,
    "envelope.seriesOhm": opposite(supply),
    "envelope.farad": opposite(supply),
    "envelope.ohm": supply,
    "envelope.emitterOhm": supply,
  };
  return settleCircuit(spec, (spread, path) => partRange(spread, path)[ends[path] ?? "min"]);
}
