import { worstVerdict } from "../judge/order-verdicts";
import type { LeadCheck, Run } from "../patch-types";
import type { Lead, PatchIndex } from "./index-patch";

/** A patch of many mults has more ways through it than anyone wants to read. */
const MOST_RUNS = 1000;

/** Follows every chain of leads from a pad (or from a box nothing feeds) to where it ends. A loop ends where it meets itself. */
export function traceRuns(index: PatchIndex, checks: Readonly<Record<string, LeadCheck>>): Run[] {
  const leadsFrom = new Map<string, Lead[]>();
  const fed = new Set<string>();
  for (const node of index.nodes) {
    for (const lead of node.leads) {
      const gearId = index.jacks.get(lead.outputId)?.gear.id ?? "";
      leadsFrom.set(gearId, [...(leadsFrom.get(gearId) ?? []), lead]);
      fed.add(index.jacks.get(lead.inputId)?.gear.id ?? "");
    }
  }
  const runs: Run[] = [];
  const follow = (gearId: string, path: Lead[], seen: ReadonlySet<string>) => {
    if (runs.length >= MOST_RUNS) return;
    const onward = (leadsFrom.get(gearId) ?? []).filter((lead) => !seen.has(index.jacks.get(lead.inputId)?.gear.id ?? ""));
    if (onward.length === 0 && path.length > 0) runs.push(presentRun(index, path, checks));
    for (const lead of onward) {
      const next = index.jacks.get(lead.inputId)?.gear.id ?? "";
      follow(next, [...path, lead], new Set([...seen, next]));
    }
  };
  const starts = [...leadsFrom.keys()].filter((gearId) => !fed.has(gearId));
  for (const gearId of starts) follow(gearId, [], new Set([gearId]));
  // What only loops reach begins anywhere on the loop.
  const reached = new Set(runs.flatMap((run) => run.gearIds));
  for (const gearId of leadsFrom.keys()) {
    if (reached.has(gearId)) continue;
    const before = runs.length;
    follow(gearId, [], new Set([gearId]));
    for (const run of runs.slice(before)) run.gearIds.forEach((id) => reached.add(id));
  }
  return runs;
}

function presentRun(index: PatchIndex, path: readonly Lead[], checks: Readonly<Record<string, LeadCheck>>): Run {
  const gearOf = (jackId: string) => index.jacks.get(jackId)?.gear;
  const steps: Run["steps"] = path.flatMap((lead): Run["steps"] => [
    { kind: "jack", id: lead.outputId }, { kind: "lead", id: lead.id }, { kind: "jack", id: lead.inputId },
  ]);
  const first = path[0] && gearOf(path[0].outputId);
  const last = path.at(-1);
  return {
    steps,
    leadIds: path.map((lead) => lead.id),
    gearIds: [...(first ? [first.id] : []), ...path.flatMap((lead) => gearOf(lead.inputId)?.id ?? [])],
    verdict: worstVerdict(path.flatMap((lead) => checks[lead.id]?.verdict ?? [])),
    complete: first?.kind === "pad" && last !== undefined && gearOf(last.inputId)?.kind === "desk-channel",
  };
}
