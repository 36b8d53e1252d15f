import type { ChartCard, ChartMetrics, LaneIndex } from "./types";

/** A card's place in its lane, before the gutters' widths are known. `top` is a multiple of `jackPitch` below the cards' top. */
export interface StackedCard {
  id: string;
  lane: LaneIndex;
  top: number;
  height: number;
}

/** A jack's height; inputs and outputs are half a row apart, so that no input's row is ever an output's. */
export interface RowedJack {
  id: string;
  cardId: string;
  lane: LaneIndex;
  side: "in" | "out";
  y: number;
}

export interface Stack {
  cards: StackedCard[];
  jacks: Map<string, RowedJack>;
  height: number;
}

/** Folded cards may stand close: there is nothing between them to tell apart. */
const FOLDED_GAP = 1;

/** Stacks each lane's cards from the top on the grid of jack rows. */
export function stackCards(cards: readonly ChartCard[], metrics: ChartMetrics): Stack {
  const nextTop = [0, 0, 0, 0];
  const stacked: StackedCard[] = [];
  const jacks = new Map<string, RowedJack>();
  let height = 0;
  for (const card of cards) {
    const top = nextTop[card.lane] as number;
    const cardHeight = heightOf(card, metrics);
    stacked.push({ id: card.id, lane: card.lane, top, height: cardHeight });
    height = Math.max(height, top + cardHeight);
    nextTop[card.lane] = top + Math.ceil((cardHeight + (card.folded ? FOLDED_GAP : metrics.cardGap)) / metrics.jackPitch - 1e-9) * metrics.jackPitch;
    if (card.folded) continue;
    const rows = { in: 0, out: 0 };
    for (const { id, side } of card.jacks) {
      const row = rows[side];
      rows[side] += 1;
      const y = top + metrics.tapeHeight + (side === "in" ? row + 0.5 : row + 1) * metrics.jackPitch;
      jacks.set(id, { id, cardId: card.id, lane: card.lane, side, y });
    }
  }
  return { cards: stacked, jacks, height };
}

function heightOf(card: ChartCard, { tapeHeight, jackPitch }: ChartMetrics): number {
  if (card.folded) return tapeHeight;
  const ins = card.jacks.filter((jack) => jack.side === "in").length;
  const outs = card.jacks.length - ins;
  const rows = Math.max(ins, outs > 0 ? outs + 0.5 : 0);
  return tapeHeight + rows * jackPitch + (card.footHeight ?? 0);
}
