import { chartPages } from "./chart-pages";
import { CHART_EXTRA, CHART_NOTE, chartBlock, emptyChartBlock } from "./draw-chart";
import { dangerBlocks } from "./draw-dangers";
import { headerBlock, noteBlocks } from "./draw-header";
import { leadTableBlocks } from "./draw-lead-table";
import { cautionBlocks, changeoverBlocks, knobBlocks, unsettledBlocks } from "./draw-lists";
import { flowBlocks, keepTogether, type Block } from "./flow-blocks";
import { hasMissing, measure, PLACEHOLDER } from "./fonts";
import { MARGIN, PAPER, type Box, type Page, type PaperSize } from "./page";
import { penFor } from "./pen";
import { sayDate } from "./say-date";
import type { SheetView } from "./sheet-view";
import { clipText, wrapText } from "./wrap-text";

const FOOT_HEIGHT = 20;
const FOOT_SIZE = 10;

/** How closely a sheet is set. The first that gets onto one page is taken, else the first that keeps chart, table and knobs together on one. */
interface Density {
  rowHeight: number;
  jackPitch: number;
  cardGap: number;
  nameSize: number;
  gap: number;
}

const DENSITIES: readonly Density[] = [
  { rowHeight: 20.5, jackPitch: 24, cardGap: 10, nameSize: 17, gap: 12 },
  { rowHeight: 19, jackPitch: 22, cardGap: 6, nameSize: 15, gap: 8 },
  { rowHeight: 18, jackPitch: 20.5, cardGap: 3, nameSize: 14, gap: 5 },
];

/** Sets a patch sheet on as many pages as it needs: one for a normal song. */
export function layOutSheet(view: SheetView, size: PaperSize): Page[] {
  const paper = PAPER[size];
  const area: Box = { x: MARGIN, y: MARGIN, width: paper.width - 2 * MARGIN, height: paper.height - 2 * MARGIN - FOOT_HEIGHT };
  const tries = DENSITIES.map((density) => blocksOf(view, density, area));
  const onOnePage = (blocks: readonly Block[]) => heightOf(blocks) <= area.height;
  const chosen = tries.find(({ patch, rest }) => onOnePage([...patch, ...rest])) ?? tries.find(({ patch }) => onOnePage(patch)) ?? (tries[0] as SheetBlocks);
  const pages = flowBlocks([...chosen.patch, ...chosen.rest], paper, area);
  pages.forEach((page, index) => drawFoot(page, view, { page: index + 1, of: pages.length }));
  return pages;
}

interface SheetBlocks {
  /** What is plugged where and how the knobs stand: all on one page, if it can be. */
  patch: Block[];
  rest: Block[];
}

function heightOf(blocks: readonly Block[]): number {
  return blocks.reduce((sum, block, index) => sum + block.height + (index === 0 ? 0 : block.before ?? 0), 0);
}

function blocksOf(view: SheetView, density: Density, area: Box): SheetBlocks {
  const { width } = area;
  const head = [headerBlock(view, width), ...noteBlocks(view, width), ...dangerBlocks(view, width)];
  const height = area.height - CHART_EXTRA - CHART_NOTE;
  const charts = chartPages(view.chart, density, { width, height, firstHeight: Math.max(0, height - heightOf(head)) });
  return {
    patch: [
      ...head,
      ...(view.chart.cards.length === 0 ? [emptyChartBlock()] : charts.map(chartBlock)),
      ...leadTableBlocks(view.leads, width, { rowHeight: density.rowHeight, before: density.gap }),
      ...legendBlocks(view, width),
      ...keepTogether(knobBlocks(view, width, density.gap), area.height / 3),
    ],
    rest: [
      ...keepTogether(unsettledBlocks(view, width, density.gap), area.height / 3),
      ...keepTogether(cautionBlocks(view, width, density.gap), area.height / 3),
      ...keepTogether(changeoverBlocks(view, width, density.gap), area.height),
    ],
  };
}

function legendBlocks(view: SheetView, width: number): Block[] {
  const notes = [
    ...(view.leads.some((lead) => lead.isAssumed) ? ["* leans on a figure nobody has measured."] : []),
    ...(needsPlaceholder(view) ? [`${PLACEHOLDER} stands for a letter that this sheet’s fonts do not have; the rig’s own pages show it.`] : []),
  ];
  return notes.flatMap((note) => wrapText("text", 10, note, width)).map((line, index) => ({
    height: 12,
    before: index === 0 ? 3 : 0,
    draw: (pen, { x, top }) => pen.line(line, { x, top, within: { x, y: top, width, height: 12 } }),
  }));
}

function needsPlaceholder(view: SheetView): boolean {
  const names = [view.title, view.rigName, view.place ?? "", ...view.notes, ...view.leads.flatMap((lead) => [lead.from.gear, lead.from.jack, lead.to.gear, lead.to.jack]), ...view.knobs.flatMap((knob) => [knob.gear, knob.knob])];
  return names.some((name) => hasMissing("text", name) || hasMissing("tape", name));
}

function drawFoot(page: Page, view: SheetView, { page: number, of }: { page: number; of: number }): void {
  const pen = penFor(page);
  const foot: Box = { x: MARGIN, y: page.height - MARGIN - FOOT_HEIGHT, width: page.width - 2 * MARGIN, height: FOOT_HEIGHT };
  pen.rule(foot.x, foot.y + 5, foot.width, 0.8);
  const right = `revision ${view.revision} · printed ${sayDate(view.printedAt)} · page ${number} of ${of}`;
  const rightWidth = measure("text", FOOT_SIZE, right);
  pen.word("text", FOOT_SIZE, right, { x: foot.x, top: foot.y + 8, width: foot.width, align: "right", within: foot });
  const room = foot.width - rightWidth - 14;
  pen.line(clipText("bold", FOOT_SIZE, `${view.rigName} · ${view.title}`, room), { x: foot.x, top: foot.y + 8, within: { ...foot, width: room } });
}
