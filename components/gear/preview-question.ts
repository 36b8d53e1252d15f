import type { ConditionerQuestion, PadModel } from "@/lib/core/electrics/patch-types";
import type { Spread } from "@/lib/core/units";
import { circuitSchema, type Gear } from "@/lib/schemas/gear";
import type { CircuitValues } from "./form-values";

export interface Rails {
  highV: Spread;
  lowV: Spread;
}

/** Where no supply is named, a 9 V battery over its life; common practice, no source. */
export const ASSUMED_RAILS: Rails = { highV: { min: 6, max: 9.6 }, lowV: 0 };

/**
 * What to ask of the circuit as it stands in the form, with one pad on it and nothing patched into its output.
 * Null while a part cannot be read, or where the pad is not one whose resistance is known at rest and hit.
 */
export function previewQuestion(circuit: CircuitValues | null, rails: Rails, pad: Pick<Gear, "details">, turn: number): ConditionerQuestion | null {
  const parts = circuitSchema.safeParse(circuit);
  if (!parts.success || pad.details.kind !== "pad") return null;
  const known = Object.fromEntries(Object.entries(pad.details).filter(([key, value]) => key !== "kind" && value !== null)) as unknown as PadModel;
  return { circuit: { supply: rails, ...parts.data }, pad: known, turn, loadOhm: null };
}
