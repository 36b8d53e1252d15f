import type { Tag } from "@/lib/core/chart";
import { severityOf } from "@/lib/core/electrics/judge/order-verdicts";
import type { PaperChart } from "./chart-pages";
import { TAG_GAP, TAG_PAD, TAG_SIZE, tagText } from "./chart-pages";
import { drawTape } from "./draw-tape";
import { drawVerdictLine } from "./draw-verdict-line";
import type { Block } from "./flow-blocks";
import { measure } from "./fonts";
import type { Box, Point } from "./page";
import type { Pen } from "./pen";
import { clipText, wrapText, type Line } from "./wrap-text";

const LANE_NAMES = ["Pads", "Conditioning", "Voices", "Desk"] as const;
const LANE_HEAD = 19;
const JACK_SIZE = 10;
const NOTE_SIZE = 10;
const GAP = 8;

/** Room a chart takes besides its drawing. */
export const CHART_EXTRA = GAP + LANE_HEAD + 4;
/** And more where it has to be drawn small. */
export const CHART_NOTE = NOTE_SIZE * 1.2;

/** The run chart as one block, centred. */
export function chartBlock(chart: PaperChart): Block {
  const note = chart.scale < 1 ? "Drawn small to fit the page: the lead table has every lead at full size." : null;
  const drawn = chart.layout.height * chart.scale;
  return {
    height: CHART_EXTRA - GAP + drawn + (note ? CHART_NOTE : 0),
    before: GAP,
    draw: (pen, { x, top, width }) => {
      const left = x + (width - chart.layout.width * chart.scale) / 2;
      const place = placeAt(left, top + LANE_HEAD, chart.scale);
      drawLaneHeads(pen, chart, place, top);
      drawTracks(pen, chart, place);
      for (const card of chart.layout.cards) drawCard(pen, chart, card.id, place);
      for (const tag of chart.layout.tags) drawTag(pen, chart, tag, place);
      if (note) pen.line(clipText("text", NOTE_SIZE, note, width), { x, top: top + LANE_HEAD + drawn + 3, within: { x, y: top + LANE_HEAD + drawn, width, height: CHART_NOTE + 4 } });
    },
  };
}

interface Place {
  scale: number;
  point: (point: Point) => Point;
  box: (box: Box) => Box;
}

function placeAt(left: number, top: number, scale: number): Place {
  const point = ({ x, y }: Point) => ({ x: left + x * scale, y: top + y * scale });
  return { scale, point, box: (box) => ({ ...point(box), width: box.width * scale, height: box.height * scale }) };
}

function drawLaneHeads(pen: Pen, { layout }: PaperChart, place: Place, top: number): void {
  for (const [index, lane] of layout.lanes.entries()) {
    const box = place.box({ x: lane.x, y: 0, width: lane.width, height: 0 });
    const within = { x: box.x, y: top, width: box.width, height: LANE_HEAD };
    pen.line(clipText("bold", 10, LANE_NAMES[index] ?? "", box.width), { x: box.x, top, within });
    pen.rule(box.x, top + 13, box.width, 1.2);
  }
}

function drawTracks(pen: Pen, { layout, view }: PaperChart, place: Place): void {
  const verdicts = new Map(view.leads.map((lead) => [lead.id, lead.verdict]));
  const severity = (leadId: string) => severityOf(verdicts.get(leadId) ?? "unproven");
  const tracks = [...layout.tracks].sort((a, b) => severity(a.leadId) - severity(b.leadId));
  for (const track of tracks) {
    const points = track.points.map(place.point);
    drawVerdictLine(pen, points, verdicts.get(track.leadId) ?? "unproven", 1.05 * place.scale);
    const end = points.at(-1);
    if (track.backward && end) {
      const size = 6 * place.scale;
      pen.path([{ x: end.x - size, y: end.y - size / 2 }, end, { x: end.x - size, y: end.y + size / 2 }], { fill: "black", isClosed: true });
    }
  }
  for (const dot of layout.junctions) pen.dot(place.point(dot), 2.6 * place.scale, { fill: "black" });
}

function drawCard(pen: Pen, { layout, metrics, view, names }: PaperChart, cardId: string, place: Place): void {
  const placed = layout.cards.find((card) => card.id === cardId);
  const card = view.cards.find((one) => one.id === cardId);
  if (!placed || !card) return;
  const box = place.box(placed);
  const tape = { x: box.x, y: box.y, width: box.width, height: metrics.tapeHeight * place.scale };
  pen.box(box, { fill: "white", stroke: "black", width: 0.5 });
  drawTape(pen, tape, 1.1);
  const lines = (names.get(cardId) ?? []).map((line) => scaled(line, place.scale));
  let top = tape.y + (tape.height - lines.reduce((sum, line) => sum + line.size * 1.04, 0)) / 2;
  for (const line of lines) top += pen.line(line, { x: tape.x, top, width: tape.width, align: "centre", within: tape, leading: 1.04 });
  for (const jack of layout.jacks.filter((one) => one.cardId === cardId)) {
    const at = place.point(jack);
    const size = JACK_SIZE * place.scale;
    const mark = 3.4 * place.scale;
    pen.box({ x: at.x - mark / 2, y: at.y - mark / 2, width: mark, height: mark }, { fill: "black" });
    const room = box.width - 10 * place.scale;
    const line = jackLine(card.jackNames[jack.id] ?? "", size, room);
    const left = box.x + 5 * place.scale;
    pen.line(line, { x: left, top: at.y - size * 0.6, width: room, align: jack.side === "in" ? "left" : "right", within: box });
  }
}

/** Running text where it fits, else the narrow face, else cut: the table has the whole name. */
function jackLine(name: string, size: number, width: number): Line {
  return measure("text", size, name) <= width ? clipText("text", size, name, width) : clipText("label", size, name, width);
}

function drawTag(pen: Pen, { view }: PaperChart, tag: Tag, place: Place): void {
  const text = tagText(view, tag.leadIds);
  const isDanger = view.leads.some((lead) => lead.isDanger && tag.leadIds.includes(lead.id));
  const size = TAG_SIZE * place.scale;
  const wide = measure("tape", size, text) + 2 * TAG_PAD * place.scale;
  const area = place.box(tag);
  const x = tag.end === "out" ? area.x + TAG_GAP.out * place.scale : area.x + area.width - wide - TAG_GAP.in * place.scale;
  const box = { x, y: area.y, width: wide, height: area.height };
  pen.box(box, { fill: isDanger ? "black" : "white", stroke: "black", width: 0.8 });
  pen.word("tape", size, text, { x, top: box.y + (box.height - size * 1.2) / 2, width: wide, align: "centre", within: box, ink: isDanger ? "white" : "black" });
}

function scaled(line: Line, scale: number): Line {
  return scale === 1 ? line : { spans: line.spans.map((span) => ({ ...span, size: span.size * scale })), width: line.width * scale, size: line.size * scale };
}

/** Said in the chart's place where nothing is plugged. */
export function emptyChartBlock(): Block {
  return { height: 20, before: 8, draw: (pen, { x, top, width }) => pen.line(wrapText("text", 11, "Nothing is patched in this song.", width)[0] as Line, { x, top, within: { x, y: top, width, height: 20 } }) };
}
