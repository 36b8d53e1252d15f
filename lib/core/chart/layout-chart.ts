import { findJunctions } from "./find-junctions";
import { gutterOf, groupNets, type Net } from "./group-nets";
import { stackCards, type RowedJack } from "./place-cards";
import { GUTTERS, routeNets, type Routing } from "./route-nets";
import type { ChartInput, ChartLayout, ChartMetrics, Point, Tag, Track } from "./types";

interface Frame {
  metrics: ChartMetrics;
  routing: Routing;
  laneX: number[];
  /** Left edge of the tracks of each gutter. */
  tracksX: number[];
  width: number;
  cardsTop: number;
}

/**
 * Lays out cards in their lanes and leads as straight square-cornered tracks between them: one layout
 * for the board and for paper.
 *
 * Runs stand upright in the gutters between lanes, on tracks assigned by the left-edge algorithm; leads that
 * skip a lane or go back cross it through a gap between two cards, or over or under all of them. Inputs and outputs
 * stand on rows half a row apart and crossings a quarter of a row from both, so that what enters a gutter from its
 * two sides never meets at one height. Different nets therefore cross at right angles but never lie on each other,
 * and no track runs under a card; only leads into one input share that input's row, from a dot on.
 *
 * @param input cards in lane order, leads, and sizes in one unit. Leads whose jacks are folded away are left out.
 * @returns boxes, points and polylines in the same unit, origin at the top left.
 */
export function layoutChart({ cards, leads, metrics }: ChartInput): ChartLayout {
  const stack = stackCards(cards, metrics);
  const nets = groupNets(leads, stack.jacks);
  const routing = routeNets(nets, stack, metrics);
  const frame = frameOf(routing, nets, metrics);
  const { cardsTop, laneX } = frame;
  const tracks = nets.flatMap((net) => net.leads.map((lead) => trackOf(frame, net, lead.id, stack.jacks.get(lead.to) as RowedJack)));
  return {
    width: frame.width,
    height: cardsTop + stack.height + corridorDepth(routing.rows.bottom, metrics),
    cards: stack.cards.map((card) => ({ id: card.id, lane: card.lane, x: laneX[card.lane] as number, y: cardsTop + card.top, width: metrics.cardWidth, height: card.height })),
    jacks: [...stack.jacks.values()].map((jack) => ({ id: jack.id, cardId: jack.cardId, side: jack.side, ...endPoint(frame, jack) })),
    tracks,
    tags: tagsOf(frame, nets, leads.map((lead) => lead.id)),
    junctions: findJunctions(routing, nets, (gutter, track) => trackX(frame, gutter, track), cardsTop, tracks),
    lanes: laneX.map((x) => ({ x, width: metrics.cardWidth })),
    cardsTop,
  };
}

function frameOf(routing: Routing, nets: readonly Net[], metrics: ChartMetrics): Frame {
  const laneX: number[] = [];
  const tracksX: number[] = [];
  let x = 0;
  for (let gutter = 0; gutter < GUTTERS; gutter += 1) {
    const outRoom = nets.some((net) => gutterOf(net.out) === gutter) ? metrics.outTagWidth : 0;
    const inRoom = nets.some((net) => net.ins.some((jack) => gutterOf(jack) === gutter)) ? metrics.inTagWidth : 0;
    const count = routing.trackCounts[gutter] ?? 0;
    const least = gutter === 0 || gutter === GUTTERS - 1 ? 0 : metrics.gutterMin;
    tracksX.push(x + outRoom);
    x += count === 0 ? least : Math.max(metrics.gutterMin, outRoom + (count + 1) * metrics.trackPitch + inRoom);
    if (gutter === GUTTERS - 1) break;
    laneX.push(x);
    x += metrics.cardWidth;
  }
  return { metrics, routing, laneX, tracksX, width: x, cardsTop: corridorDepth(routing.rows.top, metrics) };
}

function corridorDepth(rows: number, { trackPitch }: ChartMetrics): number {
  return rows === 0 ? 0 : (rows + 1) * trackPitch;
}

function endPoint({ laneX, metrics, cardsTop }: Frame, jack: RowedJack): Point {
  const left = laneX[jack.lane] as number;
  return { x: jack.side === "in" ? left : left + metrics.cardWidth, y: cardsTop + jack.y };
}

function trackX({ tracksX, metrics }: Frame, gutter: number, track: number): number {
  return (tracksX[gutter] as number) + (track + 1) * metrics.trackPitch;
}

/** From the output along its net's runs, gutter by gutter, to the input. */
function trackOf(frame: Frame, net: Net, leadId: string, into: RowedJack): Track {
  const { routing, cardsTop } = frame;
  const [from, to] = [gutterOf(net.out), gutterOf(into)];
  const step = to < from ? -1 : 1;
  const points = [endPoint(frame, net.out)];
  for (let gutter = from, y = net.out.y; ; gutter += step) {
    const lane = step > 0 ? gutter : gutter - 1;
    const next = gutter === to ? into.y : (routing.crossings.get(net.id)?.get(lane) as number);
    const track = routing.runs.get(net.id)?.get(gutter)?.track;
    if (next !== y && track !== null && track !== undefined) {
      const x = trackX(frame, gutter, track);
      points.push({ x, y: cardsTop + y }, { x, y: cardsTop + next });
    }
    if (gutter === to) break;
    y = next;
  }
  points.push(endPoint(frame, into));
  return { leadId, net: net.id, points, backward: into.lane <= net.out.lane };
}

function tagsOf(frame: Frame, nets: readonly Net[], order: readonly string[]): Tag[] {
  const { outTagWidth, inTagWidth, tagHeight } = frame.metrics;
  const place = new Map(order.map((leadId, index) => [leadId, index]));
  const tags = new Map<string, Tag>();
  for (const net of nets) {
    for (const jack of [net.out, ...net.ins]) {
      const leadIds = net.leads.filter((lead) => jack === net.out || lead.to === jack.id).map((lead) => lead.id);
      const known = tags.get(jack.id);
      if (known) {
        known.leadIds.push(...leadIds);
        known.leadIds.sort((a, b) => (place.get(a) ?? 0) - (place.get(b) ?? 0));
        continue;
      }
      const point = endPoint(frame, jack);
      const width = jack.side === "out" ? outTagWidth : inTagWidth;
      tags.set(jack.id, { leadIds, jackId: jack.id, end: jack.side, x: jack.side === "out" ? point.x : point.x - width, y: point.y - tagHeight / 2, width, height: tagHeight });
    }
  }
  return [...tags.values()];
}
