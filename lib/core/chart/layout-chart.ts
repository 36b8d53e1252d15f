import { groupNets, type Net, type NetEnd } from "./group-nets";
import { stackCards } from "./place-cards";
import { endsIn, routeNets, type Routing } from "./route-nets";
import type { ChartInput, ChartLayout, ChartMetrics, Point, Tag, Track } from "./types";

interface Frame {
  metrics: ChartMetrics;
  routing: Routing;
  laneX: number[];
  /** Left edge of the tracks of each gutter. */
  tracksX: number[];
  cardsTop: number;
  cardsBottom: number;
}

/**
 * Lays out cards in their lanes and leads as straight square-cornered tracks between them: one layout
 * for the board and for paper.
 *
 * Runs stand upright in the gutters between lanes, on tracks assigned by the left-edge algorithm; leads that
 * skip a lane or go back pass over or under all cards in corridors. Inputs and outputs stand on rows half a row
 * apart, so that stubs from the two sides of a gutter never meet at one height. Different nets therefore cross at
 * right angles but never lie on each other, and no track runs under a card.
 *
 * @param input cards in lane order, leads, and sizes in one unit. Leads whose jacks are folded away are left out.
 * @returns boxes, points and polylines in the same unit, origin at the top left.
 */
export function layoutChart({ cards, leads, metrics }: ChartInput): ChartLayout {
  const stack = stackCards(cards, metrics);
  const nets = groupNets(leads, stack.jacks);
  const routing = routeNets(nets, stack.height, metrics);
  const frame = frameOf(routing, nets, stack.height, metrics);
  const placedCards = stack.cards.map((card) => ({
    id: card.id, lane: card.lane, x: frame.laneX[card.lane] as number, y: frame.cardsTop + card.top, width: metrics.cardWidth, height: card.height,
  }));
  const jacks = [...stack.jacks.values()].map((jack) => ({ id: jack.id, cardId: jack.cardId, side: jack.side, ...endPoint(frame, { jack }) }));
  return {
    width: (frame.laneX[3] as number) + metrics.cardWidth + gutterWidth(4, routing, nets, metrics),
    height: frame.cardsBottom + corridorDepth(routing.rows.bottom, metrics),
    cards: placedCards,
    jacks,
    tracks: nets.flatMap((net) => net.leads.map((lead) => trackOf(frame, net, lead))),
    tags: nets.flatMap((net) => tagsOf(frame, net)),
    junctions: nets.flatMap((net) => junctionsOf(frame, net)),
    lanes: frame.laneX.map((x) => ({ x, width: metrics.cardWidth })),
    cardsTop: frame.cardsTop,
  };
}

function frameOf(routing: Routing, nets: readonly Net[], cardsHeight: number, metrics: ChartMetrics): Frame {
  const laneX: number[] = [];
  const tracksX: number[] = [];
  let x = 0;
  for (let gutter = 0; gutter < 5; gutter += 1) {
    const width = gutterWidth(gutter, routing, nets, metrics);
    tracksX.push(x + tagRoom(gutter, "out", nets, metrics));
    x += width;
    if (gutter < 4) {
      laneX.push(x);
      x += metrics.cardWidth;
    }
  }
  const cardsTop = corridorDepth(routing.rows.top, metrics);
  return { metrics, routing, laneX, tracksX, cardsTop, cardsBottom: cardsTop + cardsHeight };
}

function corridorDepth(rows: number, { trackPitch }: ChartMetrics): number {
  return rows === 0 ? 0 : (rows + 1) * trackPitch;
}

function tagRoom(gutter: number, end: "out" | "in", nets: readonly Net[], metrics: ChartMetrics): number {
  const used = nets.some((net) => endsIn(net, gutter).some((item) => item.jack.side === end));
  if (!used) return 0;
  return end === "out" ? metrics.outTagWidth : metrics.inTagWidth;
}

function gutterWidth(gutter: number, routing: Routing, nets: readonly Net[], metrics: ChartMetrics): number {
  const count = routing.trackCounts[gutter] ?? 0;
  if (count === 0) return gutter === 0 || gutter === 4 ? 0 : metrics.gutterMin;
  const width = tagRoom(gutter, "out", nets, metrics) + (count + 1) * metrics.trackPitch + tagRoom(gutter, "in", nets, metrics);
  return Math.max(metrics.gutterMin, width);
}

function endPoint({ laneX, metrics, cardsTop }: Frame, { jack }: Pick<NetEnd, "jack">): Point {
  const left = laneX[jack.lane] as number;
  return { x: jack.side === "in" ? left : left + metrics.cardWidth, y: cardsTop + jack.y };
}

function trackX({ tracksX, routing, metrics }: Frame, gutter: number, net: string): number {
  return (tracksX[gutter] as number) + ((routing.tracks.get(`${gutter}:${net}`) ?? 0) + 1) * metrics.trackPitch;
}

function corridorY({ routing, cardsTop, cardsBottom, metrics }: Frame, net: string): number | null {
  const corridor = routing.corridors.get(net);
  if (!corridor) return null;
  const away = (corridor.row + 1) * metrics.trackPitch;
  return corridor.side === "top" ? cardsTop - away : cardsBottom + away;
}

function trackOf(frame: Frame, net: Net, lead: { id: string; from: string; to: string }): Track {
  const out = net.ends.get(lead.from) as NetEnd;
  const into = net.ends.get(lead.to) as NetEnd;
  const [start, end] = [endPoint(frame, out), endPoint(frame, into)];
  const [outX, inX] = [trackX(frame, out.gutter, net.id), trackX(frame, into.gutter, net.id)];
  const across = corridorY(frame, net.id);
  const middle = out.gutter === into.gutter || across === null
    ? [{ x: outX, y: start.y }, { x: outX, y: end.y }]
    : [{ x: outX, y: start.y }, { x: outX, y: across }, { x: inX, y: across }, { x: inX, y: end.y }];
  return { leadId: lead.id, net: net.id, points: [start, ...middle, end], backward: into.jack.lane <= out.jack.lane };
}

function tagsOf(frame: Frame, net: Net): Tag[] {
  const { outTagWidth, inTagWidth, tagHeight } = frame.metrics;
  return [...net.ends.values()].map(({ jack, leadIds }) => {
    const point = endPoint(frame, { jack });
    const isOut = jack.side === "out";
    const width = isOut ? outTagWidth : inTagWidth;
    return { leadIds, jackId: jack.id, end: jack.side, x: isOut ? point.x : point.x - width, y: point.y - tagHeight / 2, width, height: tagHeight };
  });
}

/** Where three or more ways of a net meet: a stub into the middle of its run, or into the same end as another. */
function junctionsOf(frame: Frame, net: Net): ChartLayout["junctions"] {
  const across = corridorY(frame, net.id);
  const dots: ChartLayout["junctions"] = [];
  for (const gutter of net.gutters) {
    const x = trackX(frame, gutter, net.id);
    const ys = endsIn(net, gutter).map((end) => frame.cardsTop + end.jack.y);
    const all = across === null ? ys : [...ys, across];
    const [top, bottom] = [Math.min(...all), Math.max(...all)];
    for (const y of ys) if (y > top && y < bottom) dots.push({ x, y, net: net.id });
    const inside = gutter !== net.gutters[0] && gutter !== net.gutters.at(-1);
    if (across !== null && inside) dots.push({ x, y: across, net: net.id });
  }
  return dots;
}
