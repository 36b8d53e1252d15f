import type { Gear } from "@/lib/schemas/gear";
import type { Patch } from "@/lib/schemas/patch";
import type { Candidate } from "./check-draft";
import { checkGearPatch } from "./check-gear-patch";

const DRAFT_LEAD = "draft-lead";

/** The verdict each jack of the other direction would get if a lead joined it to `from`, in the rig's order. */
export function judgeCandidates(gear: readonly Gear[], patch: Patch, from: string): Candidate[] {
  const jacks = gear.filter((item) => !item.retired).flatMap((item) => item.jacks.map((jack) => ({ jack, gearId: item.id })));
  const start = jacks.find(({ jack }) => jack.id === from);
  if (!start) return [];
  const startsAtOutput = start.jack.direction === "output";
  const joined = new Set(patch.leads.map((lead) => `${lead.outputId}>${lead.inputId}`));
  const numbers = new Set(patch.leads.map((lead) => lead.number));
  let number = 1;
  while (numbers.has(number)) number += 1;
  return jacks.flatMap(({ jack, gearId }) => {
    const [outputId, inputId] = startsAtOutput ? [from, jack.id] : [jack.id, from];
    if (jack.direction === start.jack.direction || gearId === start.gearId || joined.has(`${outputId}>${inputId}`)) return [];
    const lead = { id: DRAFT_LEAD, number, colour: "black" as const, outputId, inputId };
    const outcome = checkGearPatch(gear, { ...patch, leads: [...patch.leads, lead] }).leads[DRAFT_LEAD];
    return outcome ? [{ jackId: jack.id, verdict: outcome.verdict, text: outcome.reasons[0]?.text ?? "" }] : [];
  });
}
