import { formatQuantity, formatRange } from "@/lib/core/units/format-quantity";
import { toRange } from "@/lib/core/units/spread";
import type { Reason } from "../jacks";
import { isFalling, type Scene } from "./scene";

/** The sentence behind `good`: what arrives, and what it had to be. */
export function sayGood({ input, highV, lowV }: Scene): Reason {
  const levels = highV && lowV ? `${formatRange(highV, "V")} when struck, ${formatRange(lowV, "V")} at rest` : "What arrives";
  if (input.onV === undefined || !highV) return { verdict: "good", text: `${levels}: within what the input stands.` };
  const falling = isFalling(input);
  const on = toRange(input.onV);
  const [measured, limit] = falling ? [highV.max, on.min] : [highV.min, on.max];
  const text = `${levels}; the input is sure to fire ${falling ? "down from" : "from"} ${formatQuantity(limit, "V")}.`;
  return { verdict: "good", text, measured, limit, unit: "V" };
}
