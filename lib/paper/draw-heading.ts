import type { Block } from "./flow-blocks";
import { measure } from "./fonts";

const SIZE = 16;

/** A section's name with a rule to the page's edge; it never stands alone at the foot of a page. */
export function headingBlock(text: string, before: number): Block {
  return {
    height: 22,
    before,
    keepsWithNext: true,
    draw: (pen, { x, top, width }) => {
      const wide = measure("tape", SIZE, text);
      pen.word("tape", SIZE, text, { x, top, within: { x, y: top, width, height: 22 } });
      pen.rule(x + wide + 8, top + 11, Math.max(0, width - wide - 8), 1.2);
    },
  };
}
