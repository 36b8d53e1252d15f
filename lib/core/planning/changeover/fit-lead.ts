import type { Adapter, ChangeoverRequest, Connection, JackFacts, StockLead } from "./types";

/**
 * Whether a lead can make a connection: its connectors go into both jacks (straight or through an adapter the rig has), and
 * it reaches where its length and both places are known. What is unknown never rules a lead out.
 * @param lead what is known of the lead; undefined: nothing
 * @returns the adapters it needs, in order output end, input end; null where it does not fit
 */
export function fitLead(lead: StockLead | undefined, connection: Connection, request: ChangeoverRequest): Adapter[] | null {
  if (!lead) return [];
  const output = fact(request.outputs, connection.output);
  const input = fact(request.inputs, connection.input);
  if (lead.lengthM !== undefined && lead.lengthM < distanceM(output, input)) return null;
  const needed: Adapter[] = [];
  for (const [plug, jack] of [[lead.connectors?.output, output?.connector], [lead.connectors?.input, input?.connector]]) {
    if (plug === undefined || jack === undefined || plug === jack) continue;
    const adapter = request.adapters?.find((one) => one.plug === plug && one.jack === jack);
    if (!adapter) return null;
    needed.push({ plug: adapter.plug, jack: adapter.jack });
  }
  return needed;
}

/** A record's own entry: a jack may be called `constructor`. */
export function fact<T>(facts: Record<string, T> | undefined, id: string): T | undefined {
  return facts && Object.hasOwn(facts, id) ? facts[id] : undefined;
}

/** Straight-line metres between two jacks; 0 where either place is unknown. */
function distanceM(a: JackFacts | undefined, b: JackFacts | undefined): number {
  if (a?.xM === undefined || a.yM === undefined || b?.xM === undefined || b.yM === undefined) return 0;
  return Math.hypot(a.xM - b.xM, a.yM - b.yM);
}
