import type { Stack } from "./place-cards";
import type { ChartMetrics } from "./types";

/** Free above and below a lead that passes between two cards, at least, in parts of the distance between two tracks. */
const CLEARANCE = 0.35;

/**
 * Heights at which a lead may cross each lane between two of its cards, or below the last as far as the longest lane reaches.
 * They lie a quarter of a row from every jack's row, so that a lead that passes never lies on another's stub in the gutters beside.
 */
export function freeHeights(stack: Stack, { tapeHeight, jackPitch, trackPitch }: ChartMetrics): number[][] {
  const step = jackPitch / 2;
  const clear = trackPitch * CLEARANCE;
  return [0, 1, 2, 3].map((lane) => {
    const cards = stack.cards.filter((card) => card.lane === lane);
    return cards.flatMap((card, index) => {
      const from = card.top + card.height + clear;
      const to = (cards[index + 1]?.top ?? stack.height) - clear;
      const heights: number[] = [];
      const first = Math.ceil((from - tapeHeight) / step - 0.5);
      for (let row = first; tapeHeight + (row + 0.5) * step <= to; row += 1) heights.push(tapeHeight + (row + 0.5) * step);
      return heights;
    });
  });
}
