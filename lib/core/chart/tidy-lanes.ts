import type { ChartLead, LaneIndex } from "./types";

export interface TidyCard {
  id: string;
  lane: LaneIndex;
  jacks: readonly { id: string; side: "in" | "out" }[];
}

const SWEEPS = 8;

/** Crossings between leads whose ends lie in the same two lanes, by the order of their jacks. */
export function countCrossings(cards: readonly TidyCard[], leads: readonly ChartLead[]): number {
  const rank = ranks(cards);
  const ends = leads.flatMap((lead) => {
    const [from, to] = [rank.get(lead.from), rank.get(lead.to)];
    return from && to ? [{ gutter: `${from.lane}:${to.lane}`, from: from.row, to: to.row }] : [];
  });
  let sum = 0;
  for (let i = 0; i < ends.length; i += 1) {
    for (let j = i + 1; j < ends.length; j += 1) {
      const [a, b] = [ends[i], ends[j]];
      if (a && b && a.gutter === b.gutter && (a.from - b.from) * (a.to - b.to) < 0) sum += 1;
    }
  }
  return sum;
}

/**
 * Orders each lane's cards so that leads cross less: every card moves towards the middle of what it is
 * plugged to, lane by lane, there and back; the best order seen is kept, so it is never worse than before.
 * Cards without a lead keep their place after the others.
 * Source: barycentre sweeps, K. Sugiyama et al., IEEE Trans. SMC-11 (1981), from memory.
 */
export function tidyLanes<T extends TidyCard>(cards: readonly T[], leads: readonly ChartLead[]): T[] {
  let best = [...cards];
  let fewest = countCrossings(best, leads);
  let current = best;
  for (let sweep = 0; sweep < SWEEPS && fewest > 0; sweep += 1) {
    for (const lane of sweep % 2 === 0 ? [1, 2, 3] : [2, 1, 0]) current = sortLane(current, leads, lane);
    const crossings = countCrossings(current, leads);
    if (crossings < fewest) {
      fewest = crossings;
      best = current;
    }
  }
  return best;
}

function sortLane<T extends TidyCard>(cards: readonly T[], leads: readonly ChartLead[], lane: number): T[] {
  const rank = ranks(cards);
  const own = new Map(cards.flatMap((card) => card.jacks.map((jack) => [jack.id, card.id] as const)));
  const sums = new Map<string, { sum: number; count: number }>();
  for (const lead of leads) {
    for (const [here, there] of [[lead.from, lead.to], [lead.to, lead.from]] as const) {
      const [cardId, other] = [own.get(here), rank.get(there)];
      if (cardId === undefined || !other || other.lane === lane) continue;
      const entry = sums.get(cardId) ?? { sum: 0, count: 0 };
      sums.set(cardId, { sum: entry.sum + other.row, count: entry.count + 1 });
    }
  }
  const weight = (card: T): number => {
    const entry = sums.get(card.id);
    return entry ? entry.sum / entry.count : Infinity;
  };
  const sorted = cards.filter((card) => card.lane === lane).map((card, index) => ({ card, index, weight: weight(card) }))
    .sort((a, b) => (a.weight === b.weight ? a.index - b.index : a.weight - b.weight))
    .map((item) => item.card);
  let next = 0;
  return cards.map((card) => (card.lane === lane ? (sorted[next++] as T) : card));
}

function ranks(cards: readonly TidyCard[]): Map<string, { lane: LaneIndex; row: number }> {
  const rank = new Map<string, { lane: LaneIndex; row: number }>();
  const rows = [0, 0, 0, 0];
  for (const card of cards) {
    for (const jack of card.jacks) rank.set(jack.id, { lane: card.lane, row: (rows[card.lane] as number)++ });
  }
  return rank;
}
