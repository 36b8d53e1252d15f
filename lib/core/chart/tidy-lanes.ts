import { measureEffort, type Effort, type TidyCard } from "./count-crossings";
import type { ChartLead } from "./types";

const SWEEPS = 8;
const LANES = [0, 1, 2, 3];
/** Swaps tried after the sweeps, at most: each costs one layout, so the press of a button stays well under a tenth of a second. */
const MOST_SWAPS = 40;

/**
 * Orders each lane's cards so that leads cross less, and run shorter where they cross as often: every card moves towards the
 * middle of what it is plugged to, lane by lane, there and back; then neighbours change places where that helps. The best
 * order seen is kept, judged by its tracks as they would be drawn, so it is never worse than before.
 * Cards without a lead stand after the others.
 * Source: barycentre sweeps, K. Sugiyama et al., IEEE Trans. SMC-11 (1981), from memory.
 */
export function tidyLanes<T extends TidyCard>(cards: readonly T[], leads: readonly ChartLead[]): T[] {
  let best = [...cards];
  let least = measureEffort(best, leads);
  const consider = (order: T[]): boolean => {
    const effort = measureEffort(order, leads);
    if (!isLess(effort, least)) return false;
    [best, least] = [order, effort];
    return true;
  };
  // Lanes are sorted outwards from either end; starting from both sides finds different orders.
  for (const first of [[1, 2, 3], [2, 1, 0]]) {
    let current = [...cards];
    for (let sweep = 0; sweep < SWEEPS; sweep += 1) {
      const lanes = sweep % 2 === 0 ? first : [...first].reverse().concat(LANES.filter((lane) => !first.includes(lane)));
      for (const lane of lanes) current = sortLane(current, leads, lane);
      consider(current);
    }
  }
  swapNeighbours(() => best, consider, plugged(cards, leads));
  return best;
}

function isLess(a: Effort, b: Effort): boolean {
  return a.crossings < b.crossings || (a.crossings === b.crossings && a.rows < b.rows - 1e-6);
}

function plugged(cards: readonly TidyCard[], leads: readonly ChartLead[]): Set<string> {
  const used = new Set(leads.flatMap((lead) => [lead.from, lead.to]));
  return new Set(cards.filter((card) => card.jacks.some((jack) => used.has(jack.id))).map((card) => card.id));
}

function swapNeighbours<T extends TidyCard>(current: () => T[], consider: (order: T[]) => boolean, movable: ReadonlySet<string>): void {
  let tried = 0;
  for (let helped = true; helped && tried < MOST_SWAPS; ) {
    helped = false;
    for (let i = 0; i < current().length && tried < MOST_SWAPS; i += 1) {
      const order = [...current()];
      const card = order[i] as T;
      const j = order.findIndex((other, index) => index > i && other.lane === card.lane);
      if (j < 0 || !movable.has(card.id) || !movable.has((order[j] as T).id)) continue;
      [order[i], order[j]] = [order[j] as T, card];
      tried += 1;
      if (consider(order)) helped = true;
    }
  }
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

function ranks(cards: readonly TidyCard[]): Map<string, { lane: number; row: number }> {
  const rank = new Map<string, { lane: number; row: number }>();
  const rows = [0, 0, 0, 0];
  for (const card of cards) {
    for (const jack of card.jacks) rank.set(jack.id, { lane: card.lane, row: (rows[card.lane] as number)++ });
  }
  return rank;
}
