import { formatQuantity } from "@/lib/core/units/format-quantity";
import { toRange } from "@/lib/core/units/spread";
import type { Connection, ListenerCheck } from "../connection-types";

/** Why nothing simple makes a dangerous lead safe. One sentence, from the numbers where they decide it. */
export function explainNoFix({ outputs, inputs }: Connection, place: number, listener: ListenerCheck): string {
  const driving = outputs.filter((output) => output.signal !== "sensor");
  if (driving.length > 1) return "No fix is offered while several outputs drive this input: pull all but one first.";
  const other = listener.reasons.find((r) => ["overload", "reversed", "wrong-kind"].includes(r.verdict));
  if (other) return `No simple part makes this lead fit: with the level tamed it would still be ${other.verdict}. ${other.text}`;
  const input = inputs[place];
  const unproven = listener.reasons.find((r) => r.verdict === "unproven");
  if (unproven) return `No fix can be checked while a figure is missing. ${unproven.text}`;
  if (input?.onV !== undefined && input.safeV && listener.highV && listener.highV.max > 0) {
    const ceiling = toRange(input.safeV).max;
    const left = (ceiling / listener.highV.max) * listener.highV.min;
    const sure = toRange(input.onV).max;
    if (input.polarity !== "falling" && left < sure + 0.2) {
      return `No divider does it: one that keeps the highest level under ${formatQuantity(ceiling, "V")} leaves ${formatQuantity(left, "V")} of the lowest, and the input is sure to fire only from ${formatQuantity(sure, "V")}.`;
    }
  }
  return "No divider, diode or series resistor of the usual parts brings this lead within what the input stands and still fires it.";
}
