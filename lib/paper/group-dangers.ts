import type { LeadView } from "./sheet-view";

/** Leads that meet in one input for one reason are one danger. */
export function groupDangers(dangers: readonly LeadView[]): [LeadView, ...LeadView[]][] {
  const groups = new Map<string, [LeadView, ...LeadView[]]>();
  for (const lead of dangers) {
    const key = JSON.stringify([lead.to, lead.verdict, lead.reason, lead.remedy]);
    const group = groups.get(key);
    if (group) group.push(lead);
    else groups.set(key, [lead]);
  }
  return [...groups.values()];
}
