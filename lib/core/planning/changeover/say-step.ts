import { fact } from "./fit-lead";
import type { ChangeoverRequest, Connection, KnobPosition, LeadId, PluggedLead, PullFirst } from "./types";

/** The words of a changeover: names for leads and jacks, and one line for each step. */
export interface Speech {
  lead(id: LeadId | null, where?: Connection): string;
  output(id: string): string;
  input(id: string): string;
  pull(one: PullFirst): string;
}

export function speakOf(request: ChangeoverRequest): Speech {
  const stock = new Map((request.leads ?? []).map((lead) => [String(lead.lead), lead]));
  const output = (id: string) => fact(request.outputs, id)?.name ?? id;
  const input = (id: string) => fact(request.inputs, id)?.name ?? id;
  const lead = (id: LeadId | null, where?: Connection) => {
    if (id === null) return where ? `Lead from ${output(where.output)} to ${input(where.input)}` : "A spare lead";
    const known = stock.get(String(id));
    const facts = [known?.colour, known?.lengthM === undefined ? undefined : sayLength(known.lengthM)].filter((word) => word !== undefined);
    return facts.length > 0 ? `Lead ${id} (${facts.join(", ")})` : `Lead ${id}`;
  };
  const pull = (one: PullFirst) => {
    const where: PluggedLead | undefined = request.from[one.fromRow];
    return `First pull ${lead(one.lead, where)} out of ${one.end === "output" ? output(one.jack) : input(one.jack)} and let that end hang`;
  };
  return { lead, output, input, pull };
}

/** A length as people say it: `60 cm`, `1.5 m`. */
export function sayLength(lengthM: number): string {
  if (lengthM < 0.995) return `${Number((lengthM * 100).toPrecision(3))} cm`;
  return `${Number(lengthM.toPrecision(3))} m`;
}

export function sayTurn(knob: string, from: KnobPosition | null, to: KnobPosition): string {
  return from === null ? `${knob}: set to ${sayPosition(to)}` : `${knob}: ${sayPosition(from)} → ${sayPosition(to)}`;
}

function sayPosition(position: KnobPosition): string {
  if (typeof position === "boolean") return position ? "on" : "off";
  return String(position).replace(/^-/, "\u2212");
}
