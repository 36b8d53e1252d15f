import type { ChartLead } from "./types";

export interface ChainCard {
  id: string;
  jacks: readonly { id: string; side: "in" | "out" }[];
}

export interface Chain {
  leadIds: Set<string>;
  cardIds: Set<string>;
}

/** Everything up and down the runs that pass through these cards or leads. */
export function leadChain(leads: readonly ChartLead[], cards: readonly ChainCard[], picked: { leadIds?: readonly string[]; cardIds?: readonly string[] }): Chain {
  const cardOf = new Map(cards.flatMap((card) => card.jacks.map((jack) => [jack.id, card.id] as const)));
  const chain: Chain = { leadIds: new Set(), cardIds: new Set(picked.cardIds) };
  const start = leads.filter((lead) => picked.leadIds?.includes(lead.id));
  for (const direction of ["up", "down"] as const) {
    const near = (lead: ChartLead) => cardOf.get(direction === "down" ? lead.from : lead.to);
    const far = (lead: ChartLead) => cardOf.get(direction === "down" ? lead.to : lead.from);
    const queue = [...(picked.cardIds ?? []), ...start.flatMap((lead) => far(lead) ?? [])];
    for (const lead of start) chain.leadIds.add(lead.id);
    const seen = new Set<string>();
    for (let cardId = queue.shift(); cardId !== undefined; cardId = queue.shift()) {
      if (seen.has(cardId)) continue;
      seen.add(cardId);
      chain.cardIds.add(cardId);
      for (const lead of leads) {
        if (near(lead) !== cardId) continue;
        chain.leadIds.add(lead.id);
        const next = far(lead);
        if (next !== undefined) queue.push(next);
      }
    }
  }
  return chain;
}
