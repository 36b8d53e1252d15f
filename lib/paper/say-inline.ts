import { formatQuantity } from "@/lib/core/units/format-quantity";
import type { Inline } from "@/lib/schemas/patch";

/** Parts in a lead, short enough for a table's cell. */
export function sayInline(inline: Inline): string {
  const ohm = (value: number) => formatQuantity(value, "Ohm");
  switch (inline.kind) {
    case "divider": return `with its divider, ${ohm(inline.seriesOhm)} over ${ohm(inline.shuntOhm)}`;
    case "diode-divider": return `with its diode and divider, ${ohm(inline.seriesOhm)} over ${ohm(inline.shuntOhm)}`;
    case "series-resistor": return `with its ${ohm(inline.seriesOhm)} in series`;
    case "series-diode": return inline.pullDownOhm === null ? "with its series diode" : `with its series diode and ${ohm(inline.pullDownOhm)} to 0 V`;
  }
}
