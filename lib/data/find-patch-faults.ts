import { fieldFault, type FieldFault } from "@/lib/errors";
import type { Gear } from "@/lib/schemas/gear";
import type { Patch } from "@/lib/schemas/patch";

/** What in a patch does not exist in this rig: jacks, knobs, cards. Ends of a lead must be an output and an input. */
export function findPatchFaults(gear: readonly Gear[], patch: Patch, at: readonly string[]): FieldFault[] {
  const directions = new Map(gear.flatMap((item) => item.jacks.map((jack) => [jack.id, jack.direction] as const)));
  const knobs = new Set(gear.flatMap((item) => item.knobs.map((knob) => `${item.id}/${knob.id}`)));
  const known = new Set(gear.map((item) => item.id));
  return [
    ...patch.leads.flatMap((lead, index) => [
      ...(directions.get(lead.outputId) === "output" ? [] : [fieldFault([...at, "leads", index, "outputId"], `Lead ${lead.number} begins at a jack that is not an output of this rig.`)]),
      ...(directions.get(lead.inputId) === "input" ? [] : [fieldFault([...at, "leads", index, "inputId"], `Lead ${lead.number} ends at a jack that is not an input of this rig.`)]),
    ]),
    ...patch.knobs.flatMap((knob, index) => (knobs.has(`${knob.gearId}/${knob.knobId}`) ? [] : [fieldFault([...at, "knobs", index], "This knob is not in the rig.")])),
    ...patch.lanes.flatMap((lane, row) => lane.flatMap((id, index) => (known.has(id) ? [] : [fieldFault([...at, "lanes", row, index], "This card is not in the rig.")]))),
  ];
}
