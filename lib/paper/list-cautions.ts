import type { PatchCheck } from "@/lib/core/electrics/patch-types";
import type { Gear } from "@/lib/schemas/gear";
import type { Patch } from "@/lib/schemas/patch";

export interface Caution {
  /** What leads the line, before a colon. */
  about: string;
  text: string;
}

/** The cautions that apply to this patch, what is nearest to hand first. */
export function listCautions(gear: readonly Gear[], patch: Patch, check: PatchCheck): Caution[] {
  const byId = new Map(gear.map((item) => [item.id, item]));
  const jackOwner = new Map(gear.flatMap((item) => item.jacks.map((jack) => [jack.id, item] as const)));
  const used = new Set(patch.leads.flatMap((lead) => [lead.outputId, lead.inputId]).flatMap((id) => jackOwner.get(id) ?? []));
  const supplies = [...new Set([...used].flatMap((item) => (item.supplyId === null ? [] : byId.get(item.supplyId) ?? [])))];
  return [
    ...phantomCautions(patch, jackOwner),
    ...unpoweredCautions(patch, check),
    ...supplyCautions(supplies),
    { about: "Always", text: "verdicts are as good as the figures typed in: measure before the gig. Protect your hearing, at rehearsal too." },
  ];
}

function phantomCautions(patch: Patch, jackOwner: ReadonlyMap<string, Gear>): Caution[] {
  return patch.leads.flatMap((lead) => {
    const desk = jackOwner.get(lead.inputId);
    const jack = desk?.jacks.find((item) => item.id === lead.inputId);
    if (!desk || jack?.direction !== "input" || !jack.input.phantom) return [];
    return [{ about: "Phantom power", text: `on for ${desk.name}. Switch it off before lead ${lead.number} goes in, or put a DI box between.` }];
  });
}

/** Leads of one box say the same thing, so each sentence stands once with all its leads. */
function unpoweredCautions(patch: Patch, check: PatchCheck): Caution[] {
  const leadsOf = new Map<string, number[]>();
  for (const lead of patch.leads) {
    for (const { text } of check.leads[lead.id]?.cautions ?? []) leadsOf.set(text, [...(leadsOf.get(text) ?? []), lead.number]);
  }
  return [...leadsOf].map(([text, numbers]) => ({ about: numbers.length === 1 ? `Lead ${numbers[0]}` : `Leads ${numbers.join(", ")}`, text }));
}

function supplyCautions(supplies: readonly Gear[]): Caution[] {
  const named = (source: "battery" | "mains-adapter") =>
    supplies.filter((item) => item.details.kind === "supply" && item.details.source === source).map((item) => item.name).join(", ");
  const [adapters, batteries] = [named("mains-adapter"), named("battery")];
  return [
    ...(adapters ? [{ about: `Mains adapters (${adapters})`, text: `this sheet covers their low-voltage DC side only. Mains, RCD and inspection follow local rules and a qualified person.` }] : []),
    ...(batteries ? [{ about: `Batteries (${batteries})`, text: `never short one, never charge a primary cell.` }] : []),
  ];
}
