import type { FixOptions } from "./connection-types";
import { VERDICTS, type Verdict } from "./jacks";
import { severityOf, worstVerdict } from "./judge/order-verdicts";
import { conditionerAsker } from "./patch/ask-conditioner";
import { checkNode } from "./patch/check-node";
import { nextOfLead, nextOfPatch } from "./patch/choose-measurement";
import { indexPatch, type Lead, type PatchIndex, type PatchNode } from "./patch/index-patch";
import { freeGearIds, listFreeGear } from "./patch/list-free-gear";
import type { NodeContext } from "./patch/node-context";
import { relatedLeads } from "./patch/related-leads";
import { traceRuns } from "./patch/trace-runs";
import type { ConditionerSimulator, LeadCheck, PatchCheck, PatchModel, RigModel } from "./patch-types";

export interface CheckPatchOptions extends FixOptions {
  /** Solves a conditioner; absent, leads that need one are `unproven`. */
  simulate?: ConditionerSimulator;
}

/**
 * Says of every lead of a song whether it is safe and will fire, follows each run from pad to desk, and names the one
 * figure worth measuring next.
 *
 * Leads that meet at a jack are one node and are checked together: one output into several inputs is a mult, several
 * outputs into one input meet there. A conditioner's outputs are computed from its parts and the pad plugged into it in
 * this song, so its leads depend on what is upstream.
 *
 * @param rig every piece of gear, jacks with SI figures; blank ones may be absent.
 * @param patch the song's leads and knob positions (0…1).
 * @param options the conditioner's solver, and what fixes may be made from.
 * @throws RangeError on a spread that is none (see `checkConnection`).
 * Limits: those of `checkConnection` and of the solver; a pad shared by two conditioners, or two pads on one, is `unproven`.
 */
export function checkPatch(rig: RigModel, patch: PatchModel, options: CheckPatchOptions = {}): PatchCheck {
  const index = indexPatch(rig, patch);
  return assemble(index, options, () => null);
}

/**
 * As {@link checkPatch}, keeping from an earlier check every lead that the change cannot reach.
 * @param previous the check before the change.
 * @param rig the rig as it is now.
 * @param patch the patch as it is now. Leads plugged, moved or pulled are noticed without being named.
 * @param changedIds ids of the gear and jacks whose figures or knobs changed.
 */
export function recheckPatch(previous: PatchCheck, rig: RigModel, patch: PatchModel, changedIds: Iterable<string>, options: CheckPatchOptions = {}): PatchCheck {
  const index = indexPatch(rig, patch);
  const changed = new Set(changedIds);
  const free = freeGearIds(index);
  const sameFree = free.join() === previous.freeGearIds.join() && !free.some((id) => changed.has(id));
  return assemble(index, options, (node) => keep(previous, index, node, changed, sameFree));
}

function assemble(index: PatchIndex, options: CheckPatchOptions, kept: (node: PatchNode) => LeadCheck[] | null): PatchCheck {
  const { simulate, ...rest } = options;
  const fixOptions = { freeGear: listFreeGear(index), ...rest };
  const context: NodeContext = { index, ask: conditionerAsker(index, simulate), simulate, fixOptions };
  const checked = [
    ...index.nodes.flatMap((node) => kept(node) ?? checkNode(context, node).map((lead) => withNext(index, lead))),
    ...index.loose.map(looseLead),
  ];
  const byId = new Map(checked.map((lead) => [lead.leadId, lead]));
  const leads = Object.fromEntries(index.patch.leads.flatMap(({ id }) => {
    const check = byId.get(id);
    return check ? [[id, check]] : [];
  }));
  const list = Object.values(leads);
  const next = nextOfPatch(index, list);
  return {
    leads,
    runs: traceRuns(index, leads),
    worst: worstVerdict(list.map((lead) => lead.verdict)),
    counts: Object.fromEntries(VERDICTS.map((verdict) => [verdict, list.filter((lead) => lead.verdict === verdict).length])) as Record<Verdict, number>,
    freeGearIds: freeGearIds(index),
    ...(next ? { nextMeasurement: next } : {}),
  };
}

function withNext(index: PatchIndex, lead: LeadCheck): LeadCheck {
  const next = nextOfLead(index, lead);
  return next ? { ...lead, nextMeasurement: next } : lead;
}

/** The node's earlier answers where nothing they depend on has changed, else null. */
function keep(previous: PatchCheck, index: PatchIndex, node: PatchNode, changed: ReadonlySet<string>, sameFree: boolean): LeadCheck[] | null {
  const earlier = node.leads.map(({ id }) => previous.leads[id]);
  if (earlier.some((lead) => lead === undefined)) return null;
  const related = relatedNow(index, node);
  for (const lead of earlier as LeadCheck[]) {
    if (lead.relatedLeadIds.join() !== related.ids.join()) return null;
    if (!sameFree && severityOf(lead.verdict) > severityOf("unproven")) return null;
  }
  return related.touches.some((id) => changed.has(id)) ? null : (earlier as LeadCheck[]);
}

function relatedNow(index: PatchIndex, node: PatchNode): { ids: string[]; touches: string[] } {
  const ids = relatedLeads(index, node);
  const byId = new Map(index.patch.leads.map((lead) => [lead.id, lead]));
  const touches = ids.flatMap((id) => {
    const lead = byId.get(id) as Lead;
    return [id, ...[lead.outputId, lead.inputId].flatMap((jackId) => [jackId, index.jacks.get(jackId)?.gear.id ?? jackId])];
  });
  return { ids, touches };
}

function looseLead(lead: Lead): LeadCheck {
  return {
    leadId: lead.id, verdict: "unproven", highV: null, lowV: null, currentA: null, fixes: [], cautions: [], assumed: [], relatedLeadIds: [lead.id],
    reasons: [{ verdict: "unproven", text: `Lead ${lead.number} ends at a jack that this rig does not have.` }],
  };
}
