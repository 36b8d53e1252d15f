import type { RowedJack } from "./place-cards";
import type { ChartLead } from "./types";

/** Everything joined at one node: its leads and where they surface, gutter by gutter (0 = left of lane 0 … 4). */
export interface Net {
  id: string;
  leads: ChartLead[];
  ends: Map<string, NetEnd>;
  /** Gutters it appears in, left to right. */
  gutters: number[];
}

export interface NetEnd {
  jack: RowedJack;
  gutter: number;
  leadIds: string[];
}

/** An output surfaces in the gutter right of its lane, an input in the one left of it. */
export function gutterOf(jack: RowedJack): number {
  return jack.side === "out" ? jack.lane + 1 : jack.lane;
}

/** Groups leads that share a jack, directly or through others. Leads with an end that is not on the chart are left out. */
export function groupNets(leads: readonly ChartLead[], jacks: ReadonlyMap<string, RowedJack>): Net[] {
  const parent = new Map<string, string>();
  const find = (id: string): string => {
    let root = id;
    while (parent.get(root) !== root) root = parent.get(root) as string;
    for (let at = id; at !== root; ) {
      const next = parent.get(at) as string;
      parent.set(at, root);
      at = next;
    }
    return root;
  };
  const drawn = leads.filter((lead) => jacks.get(lead.from)?.side === "out" && jacks.get(lead.to)?.side === "in");
  for (const { from, to } of drawn) {
    for (const id of [from, to]) if (!parent.has(id)) parent.set(id, id);
    const [a, b] = [find(from), find(to)];
    if (a !== b) parent.set(b, a);
  }
  const nets = new Map<string, Net>();
  for (const lead of drawn) {
    const root = find(lead.from);
    const net = nets.get(root) ?? { id: root, leads: [], ends: new Map<string, NetEnd>(), gutters: [] };
    nets.set(root, net);
    net.leads.push(lead);
    for (const id of [lead.from, lead.to]) {
      const jack = jacks.get(id) as RowedJack;
      const end = net.ends.get(id) ?? { jack, gutter: gutterOf(jack), leadIds: [] };
      end.leadIds.push(lead.id);
      net.ends.set(id, end);
    }
  }
  for (const net of nets.values()) net.gutters = [...new Set([...net.ends.values()].map((end) => end.gutter))].sort((a, b) => a - b);
  return [...nets.values()];
}
