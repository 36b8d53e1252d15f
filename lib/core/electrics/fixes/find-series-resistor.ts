import { formatQuantity } from "@/lib/core/units/format-quantity";
import type { Connection, FixOptions, SeriesResistorFix } from "../connection-types";
import { RESISTOR_TOL, resistorLists } from "./part-lists";
import { isFit, tryInLead } from "./try-lead";

/**
 * The least resistor in series with an input whose diodes conduct too much, so that they carry half of what they stand at
 * most — or all of it, where half leaves too little level. The diodes do the rest.
 * @returns null where the input has no clamp or no part of the lists does it.
 * Source: Ohm's law; current limits as in TI SCHS097F (10 mA into any input).
 */
export function findSeriesResistor(connection: Connection, place: number, options: FixOptions): SeriesResistorFix | null {
  const maxA = connection.inputs[place]?.clamp?.maxA;
  if (maxA === undefined) return null;
  const tol = options.resistorTol ?? RESISTOR_TOL;
  let fallback: SeriesResistorFix | null = null;
  for (const list of resistorLists(options)) {
    for (const seriesOhm of list) {
      const check = tryInLead(connection, place, { seriesOhm: { nominal: seriesOhm, tol }, shuntOhm: null });
      if (!isFit(check)) continue;
      const clampA = check.clampA ?? 0;
      const text = `${formatQuantity(seriesOhm, "Ohm")} in series: the input's own diodes then carry ${formatQuantity(clampA, "A")} of the ${formatQuantity(maxA, "A")} they stand.`;
      const fix: SeriesResistorFix = { kind: "series-resistor", seriesOhm, tol, clampA, text, verdict: check.verdict, highV: check.highV, lowV: check.lowV };
      if (clampA <= maxA / 2) return fix;
      fallback ??= fix;
    }
  }
  return fallback;
}
