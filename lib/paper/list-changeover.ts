import { clockText } from "@/lib/core/chart";
import { timeChangeover } from "@/lib/core/planning";
import type { Lead, Patch } from "@/lib/schemas/patch";
import type { EndView } from "./sheet-view";

export interface ChangeoverStep {
  /** Lead number; null for a knob. */
  number: number | null;
  /** What to do, a line each: the word that leads it, and the jacks (from one to the other) or a knob's way. */
  parts: { lead: string; ends: EndView[]; text: string }[];
}

export interface ChangeoverView {
  /** The song before. */
  from: string;
  /** Ends touched, knobs turned, and what that takes at a typical pace. */
  endMoves: number;
  knobTurns: number;
  seconds: number;
  steps: ChangeoverStep[];
  /** Leads that are not touched. */
  stays: number[];
}

interface Names {
  jack: (jackId: string) => EndView;
  knob: (gearId: string, knobId: string) => string;
}

/**
 * From the song before to this one, lead by lead as they are numbered: the number on the sheet is the number on the lead.
 * Ends are counted and timed as the set's planner does; which lead serves what is taken from the two patches, not chosen anew.
 */
export function listChangeover(before: { title: string; patch: Patch }, patch: Patch, names: Names): ChangeoverView {
  const old = new Map(before.patch.leads.map((lead) => [lead.number, lead]));
  const next = new Map(patch.leads.map((lead) => [lead.number, lead]));
  const away = before.patch.leads.filter((lead) => !next.has(lead.number)).sort(byNumber);
  const leads = [...patch.leads].sort(byNumber);
  const fetched = leads.filter((lead) => !old.has(lead.number));
  const moved = leads.flatMap((lead) => {
    const was = old.get(lead.number);
    return was && (was.outputId !== lead.outputId || was.inputId !== lead.inputId) ? [{ was, lead }] : [];
  });
  const touched = new Set([...fetched, ...moved.map(({ lead }) => lead)]);
  const turns = findTurns(before.patch, patch);
  const endMoves = 2 * (away.length + fetched.length) + moved.reduce((sum, { was, lead }) => sum + Number(was.outputId !== lead.outputId) + Number(was.inputId !== lead.inputId), 0);
  return {
    from: before.title,
    endMoves,
    knobTurns: turns.length,
    seconds: timeChangeover({ endMoves, knobTurns: turns.length, fetched: fetched.length }),
    steps: [
      ...away.map((lead) => ({ number: lead.number, parts: [{ lead: `${lead.colour}, put away:`, ends: [names.jack(lead.outputId), names.jack(lead.inputId)], text: "" }] })),
      ...moved.map(({ was, lead }) => ({ number: lead.number, parts: sayMove(was, lead, names) })),
      ...fetched.map((lead) => ({ number: lead.number, parts: [{ lead: `${lead.colour}, fetch:`, ends: [names.jack(lead.outputId), names.jack(lead.inputId)], text: "" }] })),
      ...turns.map(({ gearId, knobId, was, position }) => ({
        number: null,
        parts: [{ lead: `${names.knob(gearId, knobId)}:`, ends: [], text: `${was === null ? "set to" : `${clockText(was)} →`} ${clockText(position)}` }],
      })),
    ],
    stays: leads.filter((lead) => !touched.has(lead)).map((lead) => lead.number),
  };
}

const byNumber = (a: Lead, b: Lead) => a.number - b.number;

function sayMove(was: Lead, lead: Lead, { jack }: Names): ChangeoverStep["parts"] {
  const output = { lead: `${lead.colour}, out:`, ends: [jack(was.outputId), jack(lead.outputId)], text: "" };
  const input = { lead: `${was.outputId === lead.outputId ? `${lead.colour}, ` : ""}in:`, ends: [jack(was.inputId), jack(lead.inputId)], text: "" };
  return [...(was.outputId === lead.outputId ? [] : [output]), ...(was.inputId === lead.inputId ? [] : [input])];
}

function findTurns(before: Patch, patch: Patch): { gearId: string; knobId: string; was: number | null; position: number }[] {
  const stood = new Map(before.knobs.map((knob) => [`${knob.gearId}/${knob.knobId}`, knob.position]));
  return patch.knobs.flatMap(({ gearId, knobId, position }) => {
    const was = stood.get(`${gearId}/${knobId}`) ?? null;
    return was !== null && clockText(was) === clockText(position) ? [] : [{ gearId, knobId, was, position }];
  });
}
