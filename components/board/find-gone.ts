import type { Gear } from "@/lib/schemas/gear";
import type { Patch } from "@/lib/schemas/patch";

/** What a patch still names though its gear no longer has it: a jack or knob taken off a box after the song was saved. */
export interface Gone {
  leadNumbers: number[];
  knobs: number;
  /** The patch without any of it. */
  patch: Patch;
}

export function findGone(patch: Patch, gear: readonly Gear[]): Gone | null {
  const jacks = new Set(gear.flatMap((item) => item.jacks.map((jack) => jack.id)));
  const knobs = new Set(gear.flatMap((item) => item.knobs.map((knob) => `${item.id}/${knob.id}`)));
  const cards = new Set(gear.map((item) => item.id));
  const leads = patch.leads.filter((lead) => jacks.has(lead.outputId) && jacks.has(lead.inputId));
  const kept = patch.knobs.filter((knob) => knobs.has(`${knob.gearId}/${knob.knobId}`));
  if (leads.length === patch.leads.length && kept.length === patch.knobs.length) return null;
  const lanes = patch.lanes.map((lane) => lane.filter((id) => cards.has(id))) as Patch["lanes"];
  return {
    leadNumbers: patch.leads.filter((lead) => !leads.includes(lead)).map((lead) => lead.number),
    knobs: patch.knobs.length - kept.length,
    patch: { leads, knobs: kept, lanes },
  };
}
