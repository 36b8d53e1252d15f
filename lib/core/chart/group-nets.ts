import type { RowedJack } from "./place-cards";
import type { ChartLead } from "./types";

/** One output's leads: a trunk with a branch to each input. Gutters are counted from 0, left of lane 0, to 4. */
export interface Net {
  /** The output jack. */
  id: string;
  out: RowedJack;
  leads: ChartLead[];
  ins: RowedJack[];
  /** First and last gutter it runs in; it also runs in all between. */
  first: number;
  last: number;
}

/** An output surfaces in the gutter right of its lane, an input in the one left of it. */
export function gutterOf(jack: RowedJack): number {
  return jack.side === "out" ? jack.lane + 1 : jack.lane;
}

/**
 * Groups leads by their output. Leads that share an input keep trunks of their own, so that each can be followed
 * with a finger, and meet only on that input's row. Leads with an end that is not on the chart are left out.
 */
export function groupNets(leads: readonly ChartLead[], jacks: ReadonlyMap<string, RowedJack>): Net[] {
  const nets = new Map<string, Net>();
  for (const lead of leads) {
    const [out, into] = [jacks.get(lead.from), jacks.get(lead.to)];
    if (out?.side !== "out" || into?.side !== "in") continue;
    const net = nets.get(out.id) ?? { id: out.id, out, leads: [], ins: [], first: gutterOf(out), last: gutterOf(out) };
    nets.set(out.id, net);
    net.leads.push(lead);
    if (!net.ins.includes(into)) net.ins.push(into);
    net.first = Math.min(net.first, gutterOf(into));
    net.last = Math.max(net.last, gutterOf(into));
  }
  return [...nets.values()];
}

/** Heights at which a net's own jacks meet its run in a gutter. */
export function jackHeights(net: Net, gutter: number): { left: number[]; right: number[] } {
  return {
    left: gutterOf(net.out) === gutter ? [net.out.y] : [],
    right: net.ins.filter((jack) => gutterOf(jack) === gutter).map((jack) => jack.y),
  };
}
