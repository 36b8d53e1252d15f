import type { Block } from "./flow-blocks";
import { measure } from "./fonts";
import type { SheetView } from "./sheet-view";
import { wrapSpans } from "./wrap-text";

const STOP = "DO NOT PLUG";
const STOP_SIZE = 13;
const NUMBER = 17;

/** Leads that would hurt something, before anything else on the page. */
export function dangerBlocks(view: SheetView, width: number): Block[] {
  const stopWidth = measure("bold", STOP_SIZE, STOP) + 14;
  const numberWidth = Math.max(0, ...view.dangers.map((lead) => measure("tape", NUMBER, String(lead.number)))) + 14;
  const textWidth = width - stopWidth - numberWidth - 12;
  return view.dangers.map((lead, index): Block => {
    const fix = lead.fix ? ` Way out: ${lead.fix}` : "";
    const lines = wrapSpans([
      { style: "bold", size: 10.5, text: `${lead.from.gear}, ${lead.from.jack} to ${lead.to.gear}, ${lead.to.jack}: ${lead.verdict}.` },
      { style: "text", size: 10.5, text: `${lead.reason ?? ""}${fix}` },
    ], textWidth);
    const height = Math.max(24, lines.length * 12.6 + 8);
    return {
      height,
      before: index === 0 ? 8 : 0,
      draw: (pen, { x, top }) => {
        const frame = { x: x + 0.75, y: top, width: width - 1.5, height };
        pen.box(frame, { stroke: "black", width: 1.5 });
        const stop = { x: frame.x, y: top, width: stopWidth, height };
        pen.box(stop, { fill: "black" });
        pen.word("bold", STOP_SIZE, STOP, { x: stop.x, top: top + 4, width: stopWidth, align: "centre", within: stop, ink: "white" });
        const number = { x: stop.x + stopWidth, y: top, width: numberWidth, height };
        pen.word("tape", NUMBER, String(lead.number), { x: number.x, top: top + 2, width: numberWidth, align: "centre", within: number });
        let at = top + 5;
        for (const line of lines) at += pen.line(line, { x: number.x + numberWidth, top: at, within: frame, leading: 1.2 });
      },
    };
  });
}
