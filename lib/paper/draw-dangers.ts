import type { Block } from "./flow-blocks";
import { measure } from "./fonts";
import { groupDangers } from "./group-dangers";
import type { SheetView } from "./sheet-view";
import { sayEnd } from "./say-end";
import { wrapSpans, wrapText } from "./wrap-text";

const STOP = "DO NOT PLUG";
const STOP_SIZE = 13;
const NUMBER = 17;
const MOST_NUMBERS = 70;

/** Leads that would hurt something, before anything else on the page. */
export function dangerBlocks(view: SheetView, width: number): Block[] {
  const stopWidth = measure("bold", STOP_SIZE, STOP) + 14;
  const groups = groupDangers(view.dangers).map((leads) => ({ leads, number: wrapText("tape", NUMBER, leads.map((lead) => lead.number).join(" + "), MOST_NUMBERS) }));
  const numberWidth = Math.max(0, ...groups.flatMap(({ number }) => number.map((line) => line.width))) + 14;
  const textWidth = width - stopWidth - numberWidth - 12;
  return groups.map(({ leads, number }, index): Block => {
    const [lead] = leads;
    const lines = wrapSpans([
      { style: "bold", size: 10.5, text: `${leads.map(({ from }) => sayEnd(from)).join(" and ")} to ${sayEnd(lead.to)}: ${lead.verdict}.` },
      { style: "text", size: 10.5, text: [lead.reason, lead.remedy].filter((part) => part !== null).join(" ") },
    ], textWidth);
    const height = Math.max(24, lines.length * 12.6 + 8, number.length * NUMBER * 1.2 + 4);
    return {
      height,
      before: index === 0 ? 8 : 0,
      draw: (pen, { x, top }) => {
        const frame = { x: x + 0.75, y: top, width: width - 1.5, height };
        pen.box(frame, { stroke: "black", width: 1.5 });
        const stop = { x: frame.x, y: top, width: stopWidth, height };
        pen.box(stop, { fill: "black" });
        pen.word("bold", STOP_SIZE, STOP, { x: stop.x, top: top + 4, width: stopWidth, align: "centre", within: stop, ink: "white" });
        const beside = { x: stop.x + stopWidth, y: top, width: numberWidth, height };
        let at = top + 2;
        for (const line of number) at += pen.line(line, { x: beside.x, top: at, width: numberWidth, align: "centre", within: beside });
        at = top + 5;
        for (const line of lines) at += pen.line(line, { x: beside.x + numberWidth, top: at, within: frame, leading: 1.2 });
      },
    };
  });
}
