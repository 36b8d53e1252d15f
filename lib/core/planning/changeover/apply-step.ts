import type { KnobPosition, LeadId, PluggedLead, Step } from "./types";

/** A lead as it is at one moment; an end in no jack is null. */
export interface HeldLead {
  /** Row of the changeover's `from`; null for one that was fetched. */
  fromRow: number | null;
  lead: LeadId | null;
  output: string | null;
  input: string | null;
}

/** The rig at one moment between two songs. */
export interface PatchState {
  leads: HeldLead[];
  knobs: Record<string, KnobPosition>;
}

/** The moment before the first step. */
export function startState(from: PluggedLead[], knobs: Record<string, KnobPosition> = {}): PatchState {
  return { leads: from.map(({ output, input, lead }, fromRow) => ({ fromRow, lead: lead ?? null, output, input })), knobs: { ...knobs } };
}

/**
 * The rig after one step of a changeover: first what the step says to pull and let hang, then the step itself.
 * @throws Error when the step does not meet the rig as it is (a lead that is not where the step pulls it from)
 */
export function applyStep(state: PatchState, step: Step): PatchState {
  if (step.kind === "turn") return { ...state, knobs: { ...state.knobs, [step.knob]: step.to } };
  let leads = state.leads;
  for (const { fromRow, end, jack } of step.pullFirst ?? []) {
    leads = change(leads, fromRow, (lead) => {
      if (lead[end] !== jack) throw new Error(`the lead of row ${fromRow} is not in ${jack}`);
      return { ...lead, [end]: null };
    });
  }
  if (step.kind === "fetch") return { ...state, leads: [...leads, { fromRow: null, lead: step.lead, ...step.to }] };
  leads = change(leads, step.fromRow, (lead) => {
    for (const end of ["output", "input"] as const) {
      if (lead[end] !== null && lead[end] !== step.from[end]) throw new Error(`the lead of row ${step.fromRow} is not in ${step.from[end]}`);
    }
    return step.kind === "put-away" ? null : { ...lead, ...step.to };
  });
  return { ...state, leads };
}

/** All steps one after the other. @throws as {@link applyStep} */
export function applySteps(state: PatchState, steps: Step[]): PatchState {
  return steps.reduce(applyStep, state);
}

function change(leads: HeldLead[], fromRow: number, to: (lead: HeldLead) => HeldLead | null): HeldLead[] {
  const index = leads.findIndex((lead) => lead.fromRow === fromRow);
  const lead = leads[index];
  if (!lead) throw new Error(`no lead of row ${fromRow} is on the rig`);
  const changed = to(lead);
  return [...leads.slice(0, index), ...(changed ? [changed] : []), ...leads.slice(index + 1)];
}
