import { clockDegrees } from "@/lib/core/chart";
import type { Block } from "./flow-blocks";
import { headingBlock } from "./draw-heading";
import { endSpans } from "./end-spans";
import { measure } from "./fonts";
import type { ChangeoverStep } from "./list-changeover";
import type { Pen } from "./pen";
import { sayDuration } from "./say-date";
import type { KnobView, SheetView } from "./sheet-view";
import { wrapSpans, wrapText, type Line, type Span } from "./wrap-text";

const BODY = 10.5;
const STEP = 14;
const LEADING = 1.18;
const heightOf = (lines: readonly Line[]) => lines.reduce((sum, line) => sum + line.size * LEADING, 0);

/** Leads still to be settled, with the reason and the one figure to measure next. */
export function unsettledBlocks(view: SheetView, width: number, before: number): Block[] {
  if (view.unsettled.length === 0 && view.nextMeasurement === null) return [];
  const rows = view.unsettled.map((lead) => numbered(String(lead.number), [
    { style: "bold", size: BODY, text: `${lead.verdict}:` },
    { style: "text", size: BODY, text: [lead.reason, lead.remedy].filter((part) => part !== null).join(" ") },
  ], width));
  const next = view.nextMeasurement === null ? [] : [lineRow([{ style: "bold", size: BODY, text: "Measure next:" }, { style: "text", size: BODY, text: view.nextMeasurement }], width)];
  return [headingBlock(view.unsettled.length === 0 ? "To measure" : `Not settled: ${view.unsettled.length} of ${view.leads.length} leads`, before), ...rows, ...next];
}

export function cautionBlocks(view: SheetView, width: number, before: number): Block[] {
  const rows = view.cautions.map(({ about, text }) => lineRow([{ style: "bold", size: 10, text: `${about}:` }, { style: "text", size: 10, text }], width));
  return [headingBlock("Take care", before), ...rows];
}

const DIAL = 23;
const KNOB_COLUMNS = 3;

export function knobBlocks(view: SheetView, width: number, before: number): Block[] {
  if (view.knobs.length === 0) return [];
  const column = width / KNOB_COLUMNS;
  const rows: Block[] = [];
  for (let at = 0; at < view.knobs.length; at += KNOB_COLUMNS) {
    const cells = view.knobs.slice(at, at + KNOB_COLUMNS).map((knob) => ({ knob, lines: knobLines(knob, column - DIAL - 16) }));
    const height = Math.max(DIAL + 4, ...cells.map((cell) => heightOf(cell.lines) + 3));
    rows.push({
      height,
      draw: (pen, { x, top }) => cells.forEach(({ knob, lines }, index) => {
        const left = x + index * column;
        drawDial(pen, { x: left + DIAL / 2, y: top + (DIAL + 2) / 2 }, knob.position);
        const within = { x: left + DIAL + 6, y: top, width: column - DIAL - 16, height };
        let line = top;
        for (const one of lines) line += pen.line(one, { x: within.x, top: line, within, leading: LEADING });
      }),
    });
  }
  return [headingBlock("Knobs", before), ...rows];
}

function knobLines(knob: KnobView, width: number): Line[] {
  return [
    ...wrapSpans([{ style: "label", size: 13, text: knob.gear }, { style: "text", size: 10, text: knob.knob }], width),
    ...wrapText("bold", BODY, knob.clock, width),
  ];
}

/** A clock's face from 7 to 5 with its hand; short ticks at 7, 12 and 5. */
function drawDial(pen: Pen, centre: { x: number; y: number }, position: number): void {
  const at = (degrees: number, radius: number) => ({ x: centre.x + radius * Math.sin((degrees * Math.PI) / 180), y: centre.y - radius * Math.cos((degrees * Math.PI) / 180) });
  pen.dot(centre, DIAL / 2 - 2.5, { stroke: "black", width: 1 });
  for (const degrees of [-150, 0, 150]) pen.path([at(degrees, DIAL / 2 - 2.5), at(degrees, DIAL / 2)], { stroke: "black", width: 1 });
  pen.path([centre, at(clockDegrees(position), DIAL / 2 - 3)], { stroke: "black", width: 2.2, cap: "round" });
}

const TICK = 10;
const STEP_COLUMNS = 2;
const STEP_LEADING = 1.08;

/** From the song before, as boxes to tick: pull what is listed, then plug it. */
export function changeoverBlocks(view: SheetView, width: number, before: number): Block[] {
  const { changeover } = view;
  if (!changeover) return [];
  const counts = [count(changeover.endMoves, "end"), ...(changeover.knobTurns > 0 ? [count(changeover.knobTurns, "knob")] : []), `about ${sayDuration(changeover.seconds)} at typical pace`];
  const stays = changeover.stays.length === 0 ? "" : ` ${changeover.stays.length === 1 ? "Lead" : "Leads"} ${changeover.stays.join(", ")} ${changeover.stays.length === 1 ? "stays" : "stay"}.`;
  const how = changeover.steps.length === 0 ? "Nothing moves." : "Desk down; pull every end below, inputs first; plug, inputs last; knobs; desk up.";
  const intro = lineRow([{ style: "bold", size: BODY, text: `${counts.join(", ")}.` }, { style: "text", size: BODY, text: `${how}${stays}` }], width);
  const gap = 14;
  const column = (width - gap * (STEP_COLUMNS - 1)) / STEP_COLUMNS;
  const numberWidth = Math.max(...changeover.steps.map((step) => (step.number === null ? 0 : measure("tape", STEP, String(step.number)))), 0) + 6;
  const cells = changeover.steps.map((step) => ({
    step,
    lines: step.parts.flatMap((part) => wrapSpans(partSpans(part), column - TICK - 6 - numberWidth)),
  }));
  const rows: Block[] = [];
  const perColumn = Math.ceil(cells.length / STEP_COLUMNS);
  for (let row = 0; row < perColumn; row += 1) {
    const pair = Array.from({ length: STEP_COLUMNS }, (_, index) => cells[row + index * perColumn]);
    const height = Math.max(18, ...pair.map((cell) => (cell ? cell.lines.reduce((sum, line) => sum + line.size * STEP_LEADING, 4) : 0)));
    rows.push({
      height,
      draw: (pen, { x, top }) => pair.forEach((cell, index) => {
        if (!cell) return;
        const left = x + index * (column + gap);
        pen.box({ x: left + 0.5, y: top + 3, width: TICK, height: TICK }, { stroke: "black", width: 1 });
        const within = { x: left, y: top, width: column, height };
        if (cell.step.number !== null) pen.word("tape", STEP, String(cell.step.number), { x: left + TICK + 6, top, within });
        let at = top + 1;
        for (const line of cell.lines) at += pen.line(line, { x: left + TICK + 6 + numberWidth, top: at, within, leading: STEP_LEADING });
      }),
    });
  }
  return [headingBlock(`From ${changeover.from}`, before), { ...intro, keepsWithNext: rows.length > 0 }, ...rows];
}

function partSpans({ lead, ends, text }: ChangeoverStep["parts"][number]): Span[] {
  const arrow: Span = { style: "text", size: 10, text: "→" };
  return [{ style: "bold", size: 10, text: lead }, ...ends.flatMap((end, index) => [...(index === 0 ? [] : [arrow]), ...endSpans(end)]), ...(text === "" ? [] : [{ style: "text" as const, size: 10, text }])];
}

function count(number: number, noun: string): string {
  return `${number} ${noun}${number === 1 ? "" : "s"}`;
}

function numbered(number: string, spans: readonly Span[], width: number): Block {
  const indent = 28;
  const lines = wrapSpans(spans, width - indent);
  const height = Math.max(17, heightOf(lines) + 3);
  return {
    height,
    draw: (pen, { x, top }) => {
      const within = { x, y: top, width, height };
      pen.word("tape", STEP, number, { x, top, within: { ...within, width: indent } });
      let at = top + 2;
      for (const line of lines) at += pen.line(line, { x: x + indent, top: at, within, leading: LEADING });
    },
  };
}

function lineRow(spans: readonly Span[], width: number): Block {
  const lines = wrapSpans(spans, width);
  const height = heightOf(lines) + 2;
  return {
    height,
    draw: (pen, { x, top }) => {
      let at = top;
      for (const line of lines) at += pen.line(line, { x, top: at, within: { x, y: top, width, height }, leading: LEADING });
    },
  };
}
