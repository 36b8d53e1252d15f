import { formatQuantity, formatRange } from "@/lib/core/units/format-quantity";
import type { Range } from "@/lib/core/units/spread";
import type { Connection, SeriesDiodeFix } from "../connection-types";
import { isFit, tryInLead } from "./try-lead";

/**
 * Drop of a small-signal silicon diode from a few microamperes to 10 mA.
 * Source: 1N4148, 1.0 V at most at 10 mA (Panjit); its model gives 0.27 V at 1 µA; 0.2 V allows for warmth.
 */
export const DIODE_DROP_V: Range = { min: 0.2, max: 1 };

/** Where the input is open, this takes the level back down when the diode blocks. */
const PULL_DOWN_OHM = 100e3;

/**
 * A diode in series with an output that rests beyond what the input stands (below it, for a rising one): it lets the
 * output drive one way only. Fixes nothing where nothing takes the level back, so an open input gets a resistor to 0 V.
 */
export function findSeriesDiode(connection: Connection, place: number): SeriesDiodeFix | null {
  const open = connection.inputs[place]?.loadOhm === null;
  const pullDownOhm = open ? PULL_DOWN_OHM : null;
  const check = tryInLead(connection, place, {
    seriesOhm: 0,
    shuntOhm: open ? { nominal: PULL_DOWN_OHM, tol: 0.05 } : null,
    diodeDropV: DIODE_DROP_V,
  });
  if (!isFit(check)) return null;
  const back = open ? ` and ${formatQuantity(PULL_DOWN_OHM, "Ohm")} from the input to 0 V` : "";
  const text = `A small-signal diode in series with the output${back}: ${formatRange(check.highV, "V")} when struck, ${formatRange(check.lowV, "V")} at rest.`;
  return { kind: "series-diode", dropV: DIODE_DROP_V, pullDownOhm, text, verdict: check.verdict, highV: check.highV, lowV: check.lowV };
}
