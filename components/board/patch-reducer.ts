import { LEAD_COLOURS, type Inline, type Lead, type Patch } from "@/lib/schemas/patch";
import { mergePatches } from "./merge-patches";

export type PatchEdit =
  | { type: "plug"; id: string; outputId: string; inputId: string }
  | { type: "unplug"; leadIds: readonly string[] }
  | { type: "renumber"; leadId: string; number: number }
  | { type: "recolour"; leadId: string; colour: Lead["colour"] }
  | { type: "inline"; leadId: string; inline: Inline | null }
  | { type: "through"; leadId: string; newId: string; inputId: string; outputId: string }
  | { type: "knob"; gearId: string; knobId: string; position: number | null }
  | { type: "lanes"; lanes: Patch["lanes"] }
  | { type: "replace"; patch: Patch };

export interface PatchHistory {
  past: Patch[];
  present: Patch;
  future: Patch[];
}

/** Somebody else's save taken in: `present` is the merge, and every step to undo or redo to is merged with it too. */
export interface Rebase {
  type: "rebase";
  base: Patch;
  theirs: Patch;
  present: Patch;
}

export type HistoryAction = PatchEdit | { type: "undo" } | { type: "redo" } | Rebase;

const MOST_UNDO = 200;

export function startHistory(present: Patch): PatchHistory {
  return { past: [], present, future: [] };
}

/** Every edit can be undone; an edit that changes nothing leaves the history as it is. */
export function reduceHistory(history: PatchHistory, action: HistoryAction): PatchHistory {
  const { past, present, future } = history;
  if (action.type === "undo") {
    const before = past.at(-1);
    return before ? { past: past.slice(0, -1), present: before, future: [present, ...future] } : history;
  }
  if (action.type === "redo") {
    const [after, ...rest] = future;
    return after ? { past: [...past, present], present: after, future: rest } : history;
  }
  if (action.type === "rebase") {
    // Undoing my own edit must never take theirs away.
    const onTheirs = (mine: Patch) => mergePatches(action.base, mine, action.theirs).patch;
    return { past: past.map(onTheirs), present: action.present, future: future.map(onTheirs) };
  }
  const next = editPatch(present, action);
  return next === present ? history : { past: [...past, present].slice(-MOST_UNDO), present: next, future: [] };
}

/** The patch after one edit; the same object where the edit changes nothing. */
export function editPatch(patch: Patch, edit: PatchEdit): Patch {
  switch (edit.type) {
    case "plug": return plug(patch, edit);
    case "unplug": return unplug(patch, new Set(edit.leadIds));
    case "renumber": return renumber(patch, edit.leadId, edit.number);
    case "recolour": return changeLead(patch, edit.leadId, (lead) => ({ ...lead, colour: edit.colour }));
    case "inline": return changeLead(patch, edit.leadId, ({ inline: _before, ...lead }) => (edit.inline ? { ...lead, inline: edit.inline } : lead));
    case "through": return leadThrough(patch, edit);
    case "knob": return turnKnob(patch, edit.gearId, edit.knobId, edit.position);
    case "lanes": return { ...patch, lanes: edit.lanes };
    case "replace": return edit.patch;
  }
}

function plug(patch: Patch, { id, outputId, inputId }: { id: string; outputId: string; inputId: string }): Patch {
  if (patch.leads.some((lead) => lead.outputId === outputId && lead.inputId === inputId)) return patch;
  const number = lowestFreeNumber(patch);
  const colour = LEAD_COLOURS[(number - 1) % LEAD_COLOURS.length] ?? "black";
  return { ...patch, leads: [...patch.leads, { id, number, colour, outputId, inputId }] };
}

export function lowestFreeNumber(patch: Patch): number {
  const taken = new Set(patch.leads.map((lead) => lead.number));
  let number = 1;
  while (taken.has(number)) number += 1;
  return number;
}

function unplug(patch: Patch, leadIds: ReadonlySet<string>): Patch {
  const leads = patch.leads.filter((lead) => !leadIds.has(lead.id));
  return leads.length === patch.leads.length ? patch : { ...patch, leads };
}

/** Leads a lead through a box: it ends at the box's input, and a new lead goes on from the box's output to where it ended. */
function leadThrough(patch: Patch, { leadId, newId, inputId, outputId }: { leadId: string; newId: string; inputId: string; outputId: string }): Patch {
  const lead = patch.leads.find((item) => item.id === leadId);
  if (!lead) return patch;
  const { inline: _parts, ...rest } = lead;
  const isThere = patch.leads.some((item) => item.id !== leadId && item.outputId === lead.outputId && item.inputId === inputId);
  const turned = { ...patch, leads: patch.leads.flatMap((item) => (item.id !== leadId ? [item] : isThere ? [] : [{ ...rest, inputId }])) };
  return plug(turned, { id: newId, outputId, inputId: lead.inputId });
}

/** A number another lead has is swapped with it, since two leads never carry one number. */
function renumber(patch: Patch, leadId: string, number: number): Patch {
  const lead = patch.leads.find((item) => item.id === leadId);
  if (!lead || lead.number === number || !Number.isInteger(number) || number < 1 || number > 999) return patch;
  const before = lead.number;
  return { ...patch, leads: patch.leads.map((item) => (item.id === leadId ? { ...item, number } : item.number === number ? { ...item, number: before } : item)) };
}

function changeLead(patch: Patch, leadId: string, change: (lead: Lead) => Lead): Patch {
  if (!patch.leads.some((lead) => lead.id === leadId)) return patch;
  return { ...patch, leads: patch.leads.map((lead) => (lead.id === leadId ? change(lead) : lead)) };
}

function turnKnob(patch: Patch, gearId: string, knobId: string, position: number | null): Patch {
  const others = patch.knobs.filter((knob) => knob.gearId !== gearId || knob.knobId !== knobId);
  if (position === null) return others.length === patch.knobs.length ? patch : { ...patch, knobs: others };
  const at = patch.knobs.findIndex((knob) => knob.gearId === gearId && knob.knobId === knobId);
  if (at < 0) return { ...patch, knobs: [...patch.knobs, { gearId, knobId, position }] };
  if (patch.knobs[at]?.position === position) return patch;
  return { ...patch, knobs: patch.knobs.map((knob, index) => (index === at ? { ...knob, position } : knob)) };
}
