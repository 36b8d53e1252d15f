import { layoutChart, type ChartLayout, type ChartMetrics } from "@/lib/core/chart";
import { measure } from "./fonts";
import type { ChartView } from "./sheet-view";
import { fitText, type Line } from "./wrap-text";

/** Sizes of a chart on paper, pt. */
export interface ChartLook {
  jackPitch: number;
  cardGap: number;
  nameSize: number;
}

/** One chart, or the part of it that a page holds. */
export interface PaperChart {
  layout: ChartLayout;
  metrics: ChartMetrics;
  view: ChartView;
  names: Map<string, Line[]>;
  /** Below 1 where even the closest setting is too large for a page: everything is then drawn smaller. */
  scale: number;
}

/** Lead numbers, pt: not below 14. */
export const TAG_SIZE = 14;
/** Free on either side of a number in its tag, and between the tag and its card. */
export const TAG_PAD = 2.5;
export const TAG_GAP = { out: 3.5, in: 6.5 } as const;
const TAG_HEIGHT = 16;
const MOST_TAG = 31;
const LEAST_CARD = 62;
const MOST_CARD = 128;
const NAME_LINES = 3;
const LEAST_NAME = 10;
const LEAST_ON_ONE_LINE = 13;

/**
 * The chart, in as few parts as pages of this size hold; cards joined by leads are never parted.
 * @param size `firstHeight` is what the first page has left; a part too high for it is given a whole page.
 */
export function chartPages(view: ChartView, look: ChartLook, size: { width: number; height: number; firstHeight: number }): PaperChart[] {
  const atFirst = { width: size.width, height: size.firstHeight };
  const whole = layOut(view, look, atFirst);
  const groups = whole.scale === 1 ? [] : joinedGroups(view);
  if (groups.length <= 1) return [whole.scale === 1 ? whole : layOut(view, look, size)];
  const charts: PaperChart[] = [];
  let held: ChartView | null = null;
  const room = () => (charts.length === 0 ? atFirst : size);
  for (const group of groups) {
    const both: ChartView = held === null ? group : pick(view, new Set([...held.cards, ...group.cards].map((card) => card.id)));
    if (held !== null && layOut(both, look, room()).scale < 1) {
      charts.push(layOut(held, look, size));
      held = group;
    } else held = both;
  }
  return held === null ? charts : [...charts, layOut(held, look, size)];
}

function layOut(view: ChartView, look: ChartLook, size: { width: number; height: number }): PaperChart {
  let best: PaperChart | null = null;
  for (const trackPitch of [7, 5.5, 4.5]) {
    const chart = layOutAt(view, look, size, trackPitch);
    if (!best || chart.scale > best.scale) best = chart;
    if (chart.scale === 1) break;
  }
  return best as PaperChart;
}

function layOutAt(view: ChartView, look: ChartLook, size: { width: number; height: number }, trackPitch: number): PaperChart {
  const bare = { ...look, trackPitch, tagHeight: TAG_HEIGHT, gutterMin: 24, ...tagWidths(view), tapeHeight: look.jackPitch, cardWidth: 0 };
  const gutters = layoutChart({ cards: view.cards, leads: view.leads, metrics: bare }).width;
  const cardWidth = Math.min(MOST_CARD, Math.max(LEAST_CARD, (size.width - gutters) / 4));
  const names = fitNames(view, look, cardWidth - 10);
  const tapeHeight = Math.max(18, ...[...names.values()].map((lines) => lines.reduce((sum, line) => sum + line.size * 1.08, 3)));
  const metrics: ChartMetrics = { ...bare, cardWidth, tapeHeight };
  const layout = layoutChart({ cards: view.cards, leads: view.leads, metrics });
  return { layout, metrics, view, names, scale: Math.min(1, size.width / layout.width, size.height / layout.height) };
}

/** Every name at one size: the largest at which all stand on one line, if that is not too small; else on as few lines as it takes. */
function fitNames(view: ChartView, look: ChartLook, width: number): Map<string, Line[]> {
  const sizeOn = (maxLines: number, minSize: number) => Math.min(look.nameSize, ...view.cards.map((card) => {
    const fit = fitText("tape", card.name, { width, maxSize: look.nameSize, minSize, maxLines, clips: false });
    return fit.lines.length <= maxLines ? fit.size : 0;
  }));
  const size = sizeOn(1, LEAST_ON_ONE_LINE) || sizeOn(2, LEAST_NAME) || sizeOn(NAME_LINES, LEAST_NAME) || LEAST_NAME;
  return new Map(view.cards.map((card) => [card.id, fitText("tape", card.name, { width, maxSize: size, minSize: LEAST_NAME, maxLines: NAME_LINES, clips: true }).lines]));
}

/** What a tag says: the numbers of its leads, or how many there are where they would take too much room. */
export function tagText(view: ChartView, leadIds: readonly string[]): string {
  const numbers = leadIds.map((id) => view.leads.find((lead) => lead.id === id)?.number ?? 0).sort((a, b) => a - b);
  const text = numbers.join("+");
  return measure("tape", TAG_SIZE, text) <= MOST_TAG ? text : `${numbers.length} leads`;
}

function tagWidths(view: ChartView): { outTagWidth: number; inTagWidth: number } {
  const widest = (end: "from" | "to") => {
    const groups = new Map<string, string[]>();
    for (const lead of view.leads) groups.set(lead[end], [...(groups.get(lead[end]) ?? []), lead.id]);
    return Math.max(0, ...[...groups.values()].map((ids) => measure("tape", TAG_SIZE, tagText(view, ids))));
  };
  const around = 2 * TAG_PAD + 1.5;
  return { outTagWidth: widest("from") + around + TAG_GAP.out, inTagWidth: widest("to") + around + TAG_GAP.in };
}

/** Cards that are joined by leads, directly or through others, in the order of their first card. */
function joinedGroups(view: ChartView): ChartView[] {
  const cardOf = new Map(view.cards.flatMap((card) => card.jacks.map((jack) => [jack.id, card.id] as const)));
  const neighbours = new Map<string, Set<string>>(view.cards.map((card) => [card.id, new Set()]));
  for (const { from, to } of view.leads) {
    const [a, b] = [cardOf.get(from), cardOf.get(to)];
    if (a === undefined || b === undefined) continue;
    neighbours.get(a)?.add(b);
    neighbours.get(b)?.add(a);
  }
  const seen = new Set<string>();
  return view.cards.flatMap((card) => {
    if (seen.has(card.id)) return [];
    const group = new Set<string>();
    const queue = [card.id];
    for (let id = queue.pop(); id !== undefined; id = queue.pop()) {
      if (group.has(id)) continue;
      group.add(id);
      seen.add(id);
      queue.push(...(neighbours.get(id) ?? []));
    }
    return [pick(view, group)];
  });
}

function pick(view: ChartView, ids: ReadonlySet<string>): ChartView {
  const cards = view.cards.filter((card) => ids.has(card.id));
  const jacks = new Set(cards.flatMap((card) => card.jacks.map((jack) => jack.id)));
  return { cards, leads: view.leads.filter((lead) => jacks.has(lead.from) && jacks.has(lead.to)) };
}
