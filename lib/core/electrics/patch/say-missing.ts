import type { Reason } from "../jacks";
import type { NoAnswer } from "./ask-conditioner";

/** The `unproven` sentence for a conditioner that could not be computed. */
export function sayMissing(missing: NoAnswer, name: string): Reason {
  const text: Record<NoAnswer, string> = {
    "no-pad": `No pad is plugged into ${name} in this song, so what it gives is not known.`,
    "several-pads": `Several pads share ${name}; only one pad at a time can be computed. Measure its output with both plugged in.`,
    "shared-pad": `The pad on ${name} also feeds another box, and the two load each other; only one box on a pad can be computed. Measure it with both plugged in.`,
    "no-circuit": `${name} is known only by its readings: try this pad on it, and record what comes out.`,
    "no-simulator": `What ${name} makes of its pad was not computed.`,
  };
  return { verdict: "unproven", text: text[missing] };
}
