import type { Box, Page } from "./page";
import { penFor, type Pen } from "./pen";

/** A piece of a page that is not broken: how high it is, and how it is drawn from its top left corner. */
export interface Block {
  height: number;
  draw: (pen: Pen, at: { x: number; top: number; width: number }) => void;
  /** Not left alone at the foot of a page: what follows stands on the same one. */
  keepsWithNext?: boolean;
  /** Repeated at the head of a page that begins with this block, such as a table's heading. */
  head?: Block;
  /** Free space above, left out at the head of a page. */
  before?: number;
}

/** Sets blocks one under the other on as many pages as they need. */
export function flowBlocks(blocks: readonly Block[], paper: { width: number; height: number }, area: Box): Page[] {
  const pages: Page[] = [];
  let top = Infinity;
  for (const [index, block] of blocks.entries()) {
    const gap = block.before ?? 0;
    if (top + gap + heightWithNext(blocks, index) > area.y + area.height + 1e-6) {
      pages.push({ width: paper.width, height: paper.height, ops: [], texts: [] });
      top = area.y;
      if (block.head) top = place(block.head, pages.at(-1) as Page, area, top);
    } else top += gap;
    top = place(block, pages.at(-1) as Page, area, top);
  }
  return pages;
}

/** Blocks that should stay on one page, where a page can hold them. */
export function keepTogether(blocks: readonly Block[], most: number): Block[] {
  const height = blocks.reduce((sum, block, index) => sum + block.height + (index === 0 ? 0 : block.before ?? 0), 0);
  return height > most ? [...blocks] : blocks.map((block, index) => (index === blocks.length - 1 ? block : { ...block, keepsWithNext: true }));
}

function place(block: Block, page: Page, area: Box, top: number): number {
  block.draw(penFor(page), { x: area.x, top, width: area.width });
  return top + block.height;
}

/** The height a block asks for before it may begin here, with all that must follow it on the page. */
function heightWithNext(blocks: readonly Block[], index: number): number {
  let height = 0;
  for (let at = index; ; at += 1) {
    const block = blocks[at];
    if (!block) return height;
    height += (at === index ? 0 : block.before ?? 0) + block.height;
    if (!block.keepsWithNext) return height;
  }
}
