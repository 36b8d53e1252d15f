import type { Spread } from "@/lib/core/units";
import type { Gear } from "@/lib/schemas/gear";

/** A supply of the rig that a box may run on. */
export interface SupplyChoice {
  id: string;
  name: string;
  highV: Spread;
  lowV: Spread;
}

/** The supplies among some gear, as a form offers them. */
export function toSupplyChoices(gear: readonly Gear[]): SupplyChoice[] {
  return gear.flatMap(({ id, name, details }) => (details.kind === "supply" ? [{ id, name, highV: details.highV, lowV: details.lowV }] : []));
}
