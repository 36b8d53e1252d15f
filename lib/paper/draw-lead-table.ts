import { drawVerdictLine } from "./draw-verdict-line";
import type { Block } from "./flow-blocks";
import type { Ink } from "./page";
import type { Pen } from "./pen";
import type { LeadView } from "./sheet-view";
import { measure } from "./fonts";
import { endSpans } from "./end-spans";
import { fitText, wrapSpans, wrapText, type Line } from "./wrap-text";

const NUMBER_SIZE = 17;
const BODY = 10;
const HEAD_HEIGHT = 16;
/** Columns: number, colour, from, to, what to expect, verdict; shares of the width. */
const COLUMNS = [["No.", 0.05], ["Lead", 0.09], ["From", 0.183], ["To", 0.183], ["At rest → struck", 0.326], ["Verdict", 0.168]] as const;
const GUTTER = 6;
const SWATCH = 6;
const SAMPLE = 20;

/** Lead colours as ink; the word beside them is what counts. */
const SWATCHES: Record<string, Ink> = {
  black: "black", white: "white", red: { r: 0.8, g: 0.1, b: 0.1 }, orange: { r: 0.95, g: 0.5, b: 0.1 }, yellow: { r: 0.98, g: 0.85, b: 0.1 }, green: { r: 0.1, g: 0.6, b: 0.25 },
  blue: { r: 0.1, g: 0.3, b: 0.8 }, violet: { r: 0.5, g: 0.2, b: 0.7 }, grey: { r: 0.55, g: 0.55, b: 0.55 }, brown: { r: 0.45, g: 0.28, b: 0.12 },
};

interface Column {
  x: number;
  width: number;
}

function columnsOf(width: number): Column[] {
  let x = 0;
  return COLUMNS.map(([, share]) => {
    const column = { x, width: width * share - GUTTER };
    x += width * share;
    return column;
  });
}

/** One row a lead; the heading comes again on every page. */
export function leadTableBlocks(leads: readonly LeadView[], width: number, look: { rowHeight: number; before: number }): Block[] {
  const head = headBlock(width);
  const [first, ...rest] = leads.map((lead) => rowBlock(lead, width, look.rowHeight, head));
  return first ? [{ ...head, before: look.before, keepsWithNext: true }, { ...first, head: undefined }, ...rest] : [];
}

function headBlock(width: number): Block {
  const columns = columnsOf(width);
  return {
    height: HEAD_HEIGHT,
    draw: (pen, { x, top }) => {
      COLUMNS.forEach(([name], index) => {
        const column = columns[index] as Column;
        pen.word("bold", BODY, name, { x: x + column.x, top, within: { x: x + column.x, y: top, width: column.width, height: HEAD_HEIGHT } });
      });
      pen.rule(x, top + HEAD_HEIGHT - 1.5, width, 1.2);
    },
  };
}

function rowBlock(lead: LeadView, width: number, rowHeight: number, head: Block): Block {
  const columns = columnsOf(width);
  const [number, colour, from, to, expect, verdict] = columns as [Column, Column, Column, Column, Column, Column];
  const cells: { column: Column; lines: Line[]; indent: number; ink?: Ink }[] = [
    { column: colour, lines: wrapText("text", BODY, lead.colour, colour.width - SWATCH - 3), indent: SWATCH + 3 },
    { column: from, lines: wrapSpans(endSpans(lead.from), from.width), indent: 0 },
    { column: to, lines: [...wrapSpans(endSpans(lead.to), to.width), ...(lead.inline ? wrapText("bold", BODY, lead.inline, to.width) : [])], indent: 0 },
    { column: expect, lines: expectLines(lead, expect.width), indent: 0 },
    { column: verdict, lines: fitText("bold", lead.verdict + (lead.isAssumed ? "*" : ""), { width: verdict.width - SAMPLE - 5, maxSize: 11, minSize: BODY, maxLines: 1, clips: false }).lines, indent: SAMPLE + 5 },
  ];
  const stop = lead.isDanger ? wrapText("bold", BODY, "DO NOT PLUG", verdict.width - 6) : [];
  const linesHeight = (lines: readonly Line[]) => lines.reduce((sum, line) => sum + line.size * 1.16, 0);
  const height = Math.max(rowHeight, ...cells.map((cell) => linesHeight(cell.lines) + 5), linesHeight(cells[4]?.lines ?? []) + linesHeight(stop) + (stop.length > 0 ? 8 : 0));
  return {
    height,
    head,
    draw: (pen, { x, top }) => {
      const middle = top + Math.min(height, rowHeight) / 2;
      const numberBox = { x: x + number.x, y: top, width: number.width, height };
      pen.word("tape", NUMBER_SIZE, String(lead.number), { x: numberBox.x, top: middle - NUMBER_SIZE * 0.6, within: numberBox });
      pen.box({ x: x + colour.x, y: middle - SWATCH / 2, width: SWATCH, height: SWATCH }, { fill: SWATCHES[lead.colour] ?? "white", stroke: "black", width: 0.6 });
      for (const { column, lines, indent } of cells) {
        const within = { x: x + column.x, y: top, width: column.width, height };
        let at = middle - ((lines[0]?.size ?? BODY) * 1.16) / 2;
        for (const line of lines) at += pen.line(line, { x: within.x + indent, top: at, within, leading: 1.16 });
      }
      drawVerdictLine(pen, [{ x: x + verdict.x, y: middle }, { x: x + verdict.x + SAMPLE, y: middle }], lead.verdict, 1.05);
      if (stop.length > 0) drawStop(pen, stop, { x: x + verdict.x, top: middle + 8, width: verdict.width });
      pen.rule(x, top + height - 0.25, width, 0.5);
    },
  };
}

function drawStop(pen: Pen, lines: readonly Line[], { x, top, width }: { x: number; top: number; width: number }): void {
  const height = lines.reduce((sum, line) => sum + line.size * 1.16, 2);
  const box = { x, y: top, width: Math.min(width, Math.max(...lines.map((line) => line.width)) + 6), height };
  pen.box(box, { fill: "black" });
  let at = top + 1;
  for (const line of lines) at += pen.line(line, { x: x + 3, top: at, within: box, ink: "white", leading: 1.16 });
}

/** `0–49 mV → 7.34–8.32 V`, on one line where it fits, and the pulse below. */
function expectLines(lead: LeadView, width: number): Line[] {
  const volts = lead.struckVolts === null ? null : lead.restVolts === null ? lead.struckVolts : `${lead.restVolts} → ${lead.struckVolts}`;
  if (volts === null) return wrapText("text", BODY, lead.noVolts, width);
  const oneLine = measure("figures", BODY, volts) <= width;
  const lines = oneLine || lead.restVolts === null ? wrapText("figures", BODY, volts, width) : [...wrapText("figures", BODY, `${lead.restVolts} →`, width), ...wrapText("figures", BODY, lead.struckVolts ?? "", width)];
  return lead.pulse === null ? lines : [...lines, ...wrapText("figures", BODY, `for ${lead.pulse}`, width)];
}
