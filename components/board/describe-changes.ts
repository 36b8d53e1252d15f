import { clockText } from "@/lib/core/chart";
import type { Gear } from "@/lib/schemas/gear";
import type { KnobPosition, Lead, Patch } from "@/lib/schemas/patch";

/** Names for jacks and knobs, for sentences. */
export interface Names {
  jack(id: string): string;
  knob(gearId: string, knobId: string): string;
}

export function namesOf(gear: readonly Gear[]): Names {
  const jacks = new Map(gear.flatMap((item) => item.jacks.map((jack) => [jack.id, `${item.name} · ${jack.name}`] as const)));
  const knobs = new Map(gear.flatMap((item) => item.knobs.map((knob) => [`${item.id}/${knob.id}`, `${item.name} · ${knob.name}`] as const)));
  return {
    jack: (id) => jacks.get(id) ?? "a jack that is gone",
    knob: (gearId, knobId) => knobs.get(`${gearId}/${knobId}`) ?? "a knob that is gone",
  };
}

export function describeLead(lead: Lead | null, names: Names): string {
  return lead ? `Lead ${lead.number} (${lead.colour}): ${names.jack(lead.outputId)} → ${names.jack(lead.inputId)}${lead.inline ? `, with a ${lead.inline.kind.replace("-", " ")} in it` : ""}` : "not plugged";
}

export function describeKnob(knob: KnobPosition | null): string {
  return knob ? clockText(knob.position) : "not set";
}

/** What changed from one patch to another, one sentence each. */
export function describeChanges(before: Patch, after: Patch, names: Names): string[] {
  const old = new Map(before.leads.map((lead) => [lead.id, lead]));
  const now = new Map(after.leads.map((lead) => [lead.id, lead]));
  const knobs = (patch: Patch) => new Map(patch.knobs.map((knob) => [`${knob.gearId}/${knob.knobId}`, knob]));
  const [oldKnobs, newKnobs] = [knobs(before), knobs(after)];
  return [
    ...after.leads.filter((lead) => !old.has(lead.id)).map((lead) => `Plugged: ${describeLead(lead, names)}.`),
    ...before.leads.filter((lead) => !now.has(lead.id)).map((lead) => `Pulled: ${describeLead(lead, names)}.`),
    ...after.leads.flatMap((lead) => {
      const was = old.get(lead.id);
      return was && JSON.stringify(was) !== JSON.stringify(lead) ? [`Changed: ${describeLead(was, names)} became ${describeLead(lead, names)}.`] : [];
    }),
    ...[...new Set([...oldKnobs.keys(), ...newKnobs.keys()])].flatMap((key) => {
      const [was, is] = [oldKnobs.get(key) ?? null, newKnobs.get(key) ?? null];
      const knob = is ?? was;
      return knob && was?.position !== is?.position ? [`${names.knob(knob.gearId, knob.knobId)}: ${describeKnob(was)} → ${describeKnob(is)}.`] : [];
    }),
  ];
}
