import type { Gear } from "@/lib/schemas/gear";
import type { Patch } from "@/lib/schemas/patch";
import { checkPatch, recheckPatch } from "@/lib/core/electrics";
import type { Candidate } from "./check-draft";
import { CHECK_OPTIONS } from "./check-gear-patch";
import { toRigModel } from "./to-rig-model";

const DRAFT_LEAD = "draft-lead";

/** The verdict each jack of the other direction would get if a lead joined it to `from`, in the rig's order. */
export function judgeCandidates(gear: readonly Gear[], patch: Patch, from: string): Candidate[] {
  const jacks = gear.filter((item) => !item.retired).flatMap((item) => item.jacks.map((jack) => ({ jack, gearId: item.id })));
  const start = jacks.find(({ jack }) => jack.id === from);
  if (!start) return [];
  const startsAtOutput = start.jack.direction === "output";
  const joined = new Set(patch.leads.map((lead) => `${lead.outputId}>${lead.inputId}`));
  const numbers = new Set(patch.leads.map((lead) => lead.number));
  const rig = toRigModel(gear);
  const options = { ...CHECK_OPTIONS, fixes: false as const };
  const before = checkPatch(rig, patch, options);
  let number = 1;
  while (numbers.has(number)) number += 1;
  return jacks.flatMap(({ jack, gearId }) => {
    const [outputId, inputId] = startsAtOutput ? [from, jack.id] : [jack.id, from];
    if (jack.direction === start.jack.direction || gearId === start.gearId || joined.has(`${outputId}>${inputId}`)) return [];
    const lead = { id: DRAFT_LEAD, number, colour: "black" as const, outputId, inputId };
    const outcome = recheckPatch(before, rig, { ...patch, leads: [...patch.leads, lead] }, [], options).leads[DRAFT_LEAD];
    return outcome ? [{ jackId: jack.id, verdict: outcome.verdict, text: outcome.reasons[0]?.text ?? "" }] : [];
  });
}
