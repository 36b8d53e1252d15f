import { formatQuantity } from "@/lib/core/units/format-quantity";
import type { Fix } from "@/lib/core/electrics/connection-types";
import type { Inline } from "@/lib/schemas/patch";

const percent = (tol: number) => `±${Number((tol * 100).toPrecision(3))} %`;

/** Parts in a lead, in words. */
export function describeInline(inline: Inline): string {
  const ohm = (value: number) => formatQuantity(value, "Ohm");
  switch (inline.kind) {
    case "divider": return `a divider, ${ohm(inline.seriesOhm)} in series and ${ohm(inline.shuntOhm)} to 0 V (${percent(inline.tol)})`;
    case "diode-divider": return `a small-signal diode, then ${ohm(inline.seriesOhm)} in series and ${ohm(inline.shuntOhm)} to 0 V (${percent(inline.tol)})`;
    case "series-resistor": return `${ohm(inline.seriesOhm)} in series (${percent(inline.tol)})`;
    case "series-diode": return inline.pullDownOhm === null ? "a small-signal diode in series" : `a small-signal diode in series and ${ohm(inline.pullDownOhm)} from the input to 0 V`;
  }
}

/** The parts a fix would put into the lead; null where it asks for something else. */
export function inlineOf(fix: Fix): Inline | null {
  switch (fix.kind) {
    case "divider":
    case "diode-divider": return { kind: fix.kind, seriesOhm: fix.seriesOhm, shuntOhm: fix.shuntOhm, tol: fix.tol };
    case "series-resistor": return { kind: fix.kind, seriesOhm: fix.seriesOhm, tol: fix.tol };
    case "series-diode": return { kind: fix.kind, pullDownOhm: fix.pullDownOhm };
    default: return null;
  }
}
