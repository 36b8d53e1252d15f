"use client";
import { formatRange } from "@/lib/core/units/format-quantity";
import type { PatchCheck } from "@/lib/core/electrics/patch-types";
import type { Lead } from "@/lib/schemas/patch";
import { VerdictWord } from "../chart/verdict-word";
import { EmptyState } from "../ui/empty-state";

interface RunListProps {
  check: PatchCheck;
  leads: readonly Lead[];
  gearName: (gearId: string) => string;
  leadLabel: (lead: Lead) => string;
  pickedLeadId: string | null;
  onPick: (leadId: string) => void;
}

/** Every run from pad to desk as a row, its leads with their verdicts below: the whole board in words. */
export function RunList({ check, leads, gearName, leadLabel, pickedLeadId, onPick }: RunListProps) {
  const byId = new Map(leads.map((lead) => [lead.id, lead]));
  const runs = check.runs.filter((run) => run.leadIds.every((id) => byId.has(id)));
  if (leads.length === 0) return <EmptyState title="No lead plugged yet">A run begins at a pad and ends at the desk.</EmptyState>;
  return (
    <ol className="flex flex-col gap-3">
      {runs.map((run) => (
        <li key={run.leadIds.join()} className="bg-bench p-3">
          <div className="mb-2 flex flex-wrap items-center justify-between gap-x-4 gap-y-1">
            <h2 className="font-tape text-xl font-bold leading-tight">{run.gearIds.map(gearName).join(" → ")}{run.complete ? "" : " …"}</h2>
            <VerdictWord verdict={run.verdict} />
          </div>
          <ul className="flex flex-col">
            {run.leadIds.map((id) => {
              const lead = byId.get(id);
              const outcome = check.leads[id];
              if (!lead) return null;
              return (
                <li key={id}>
                  <button
                    type="button"
                    data-tag-of={id}
                    onClick={() => onPick(id)}
                    aria-current={pickedLeadId === id ? "true" : undefined}
                    className={`flex min-h-11 w-full flex-wrap items-center gap-x-3 gap-y-0.5 border-t border-line-soft px-1 py-1 text-left hover:bg-raised ${pickedLeadId === id ? "border-l-8 border-l-ink bg-raised" : ""}`}
                  >
                    <span className="w-8 font-mono text-lg font-bold">{lead.number}</span>
                    <span className="flex min-w-0 flex-1 flex-wrap items-center justify-between gap-x-4">
                      <span className="min-w-40">{leadLabel(lead)}</span>
                      <span className="flex flex-wrap items-center gap-x-3">
                        {outcome?.highV ? <span className="font-mono text-sm">{formatRange(outcome.highV, "V")}</span> : null}
                        {outcome ? <VerdictWord verdict={outcome.verdict} /> : null}
                      </span>
                    </span>
                  </button>
                </li>
              );
            })}
          </ul>
        </li>
      ))}
    </ol>
  );
}
