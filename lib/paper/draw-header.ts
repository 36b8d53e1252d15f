import { drawTape } from "./draw-tape";
import type { Block } from "./flow-blocks";
import type { SheetView } from "./sheet-view";
import { fitText, wrapText, type Line } from "./wrap-text";

const TITLE_MOST = 38;
/** A title stays legible from a music stand's distance. */
const TITLE_LEAST = 24;
const ASIDE_SHARE = 0.34;

/** The song's title on tape; beside it the rig, the song's place in the set and its tempo. */
export function headerBlock(view: SheetView, width: number): Block {
  const asideWidth = width * ASIDE_SHARE;
  const tapeWidth = width - asideWidth - 14;
  const title = fitText("tape", view.title, { width: tapeWidth - 30, maxSize: TITLE_MOST, minSize: TITLE_LEAST, maxLines: view.title.length > 24 ? 2 : 1, clips: false });
  const tapeHeight = title.lines.reduce((sum, line) => sum + line.size * 1.06, 8);
  const aside: Line[] = [
    ...fitText("label", view.rigName, { width: asideWidth, maxSize: 19, minSize: 13, maxLines: 1, clips: false }).lines,
    ...(view.place ? wrapText("text", 10.5, view.place, asideWidth) : []),
    ...(view.tempo ? wrapText("bold", 11, view.tempo, asideWidth) : []),
  ];
  const asideHeight = aside.reduce((sum, line) => sum + line.size * 1.2, 0);
  const height = Math.max(tapeHeight, asideHeight);
  return {
    height: height + 2,
    draw: (pen, { x, top }) => {
      const tape = { x: x + 1, y: top + 1, width: Math.min(tapeWidth, Math.max(...title.lines.map((line) => line.width)) + 30), height: tapeHeight };
      drawTape(pen, tape, 2);
      let at = tape.y + 4;
      for (const line of title.lines) at += pen.line(line, { x: tape.x + 15, top: at, within: tape, leading: 1.06 });
      at = top;
      const within = { x: x + width - asideWidth, y: top, width: asideWidth, height: height + 2 };
      for (const line of aside) at += pen.line(line, { x: within.x, top: at, width: asideWidth, align: "right", within });
    },
  };
}

/** Feel notes, line by line. */
export function noteBlocks(view: SheetView, width: number): Block[] {
  return view.notes.flatMap((paragraph, index) => wrapText("text", 10.5, paragraph, width).map((line, row): Block => ({
    height: 13,
    before: row === 0 ? (index === 0 ? 6 : 2) : 0,
    draw: (pen, { x, top }) => pen.line(line, { x, top, within: { x, y: top, width, height: 13 } }),
  })));
}
