import type { Block } from "./flow-blocks";
import { clipText } from "./wrap-text";

const SIZE = 16;

/** A section's name with a rule to the page's edge; it never stands alone at the foot of a page. */
export function headingBlock(text: string, before: number): Block {
  return {
    height: 22,
    before,
    keepsWithNext: true,
    draw: (pen, { x, top, width }) => {
      const line = clipText("tape", SIZE, text, width - 16);
      pen.line(line, { x, top, within: { x, y: top, width, height: 22 } });
      pen.rule(x + line.width + 8, top + 11, width - line.width - 8, 1.2);
    },
  };
}
