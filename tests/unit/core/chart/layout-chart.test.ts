import { describe, expect, it } from "vitest";
import { layoutChart, type ChartCard, type ChartLayout, type Point } from "@/lib/core/chart";
import { boardMetrics, randomBoard } from "../../../factories/random-board";

interface Segment { a: Point; b: Point; net: string }

function segmentsOf(layout: ChartLayout): Segment[] {
  return layout.tracks.flatMap((track) => track.points.slice(1).map((b, i) => ({ a: track.points[i] as Point, b, net: track.net })));
}

/** True where two segments lie on each other for more than a point, or one ends on the other. */
function lieTogether(one: Segment, other: Segment): boolean {
  const upright = (s: Segment) => s.a.x === s.b.x;
  if (upright(one) !== upright(other)) return touchesT(one, other) || touchesT(other, one);
  const [axis, along] = upright(one) ? (["x", "y"] as const) : (["y", "x"] as const);
  if (one.a[axis] !== other.a[axis]) return false;
  const [lo1, hi1] = [Math.min(one.a[along], one.b[along]), Math.max(one.a[along], one.b[along])];
  const [lo2, hi2] = [Math.min(other.a[along], other.b[along]), Math.max(other.a[along], other.b[along])];
  return Math.min(hi1, hi2) >= Math.max(lo1, lo2);
}

function touchesT(one: Segment, other: Segment): boolean {
  return [one.a, one.b].some((end) =>
    end.x >= Math.min(other.a.x, other.b.x) && end.x <= Math.max(other.a.x, other.b.x) && end.y >= Math.min(other.a.y, other.b.y) && end.y <= Math.max(other.a.y, other.b.y));
}

describe.each(Array.from({ length: 60 }, (_, seed) => seed))("random board %i", (seed) => {
  const { cards, leads } = randomBoard(seed, 4 + (seed % 57), (seed * 7) % 101);
  const layout = layoutChart({ cards, leads, metrics: boardMetrics });
  const segments = segmentsOf(layout);

  it("draws every lead whose jacks are unfolded, from its output to its input, square-cornered", () => {
    const at = new Map(layout.jacks.map((jack) => [jack.id, jack]));
    const drawable = leads.filter((lead) => at.has(lead.from) && at.has(lead.to));
    expect(layout.tracks.map((track) => track.leadId).sort()).toEqual(drawable.map((lead) => lead.id).sort());
    for (const track of layout.tracks) {
      const lead = drawable.find((item) => item.id === track.leadId);
      const [out, into] = [at.get(lead?.from ?? ""), at.get(lead?.to ?? "")];
      expect(track.points[0]).toEqual({ x: out?.x, y: out?.y });
      expect(track.points.at(-1)).toEqual({ x: into?.x, y: into?.y });
    }
    for (const { a, b } of segments) expect(a.x === b.x || a.y === b.y).toBe(true);
  });

  it("never lays two nets on each other", () => {
    const clashes = segments.flatMap((one, i) => segments.slice(i + 1).filter((other) => one.net !== other.net && lieTogether(one, other)));
    expect(clashes).toEqual([]);
  });

  it("never runs under a card", () => {
    const under = segments.filter(({ a, b }) => layout.cards.some((card) =>
      Math.max(a.x, b.x) > card.x && Math.min(a.x, b.x) < card.x + card.width && Math.max(a.y, b.y) > card.y && Math.min(a.y, b.y) < card.y + card.height));
    expect(under).toEqual([]);
  });

  it("keeps tags off each other and off cards, and everything inside", () => {
    const overlap = (p: { x: number; y: number; width: number; height: number }, q: typeof p) =>
      p.x < q.x + q.width && q.x < p.x + p.width && p.y < q.y + q.height && q.y < p.y + p.height;
    for (const [i, tag] of layout.tags.entries()) {
      expect(layout.tags.slice(i + 1).filter((other) => overlap(tag, other))).toEqual([]);
      expect(layout.cards.filter((card) => overlap(tag, card))).toEqual([]);
    }
    for (const { a, b } of segments) {
      expect(Math.min(a.x, b.x, a.y, b.y)).toBeGreaterThanOrEqual(0);
      expect(Math.max(a.x, b.x)).toBeLessThanOrEqual(layout.width);
      expect(Math.max(a.y, b.y)).toBeLessThanOrEqual(layout.height);
    }
  });
});

describe("a mult", () => {
  const cards: ChartCard[] = [
    { id: "a", lane: 0, folded: false, jacks: [{ id: "out", side: "out" }] },
    { id: "b", lane: 1, folded: false, jacks: [{ id: "in1", side: "in" }, { id: "in2", side: "in" }, { id: "in3", side: "in" }] },
  ];
  const leads = ["in1", "in2", "in3"].map((to) => ({ id: to, from: "out", to }));
  const layout = layoutChart({ cards, leads, metrics: boardMetrics });

  it("is one trunk with a dot at each inner branch", () => {
    const trunkX = new Set(layout.tracks.map((track) => track.points[1]?.x));
    expect(trunkX.size).toBe(1);
    // The output leaves between rows 1 and 2: in1 and in3 are the trunk's ends, the output and in2 meet it between.
    expect(layout.junctions).toHaveLength(2);
  });
});

describe("sixty cards and a hundred leads", () => {
  it("are laid out the same twice, in well under a frame", () => {
    const board = randomBoard(7, 60, 100);
    const input = { ...board, metrics: boardMetrics };
    const first = layoutChart(input);
    for (let i = 0; i < 20; i += 1) layoutChart(input);
    const startedMs = performance.now();
    for (let i = 0; i < 10; i += 1) layoutChart(input);
    const eachMs = (performance.now() - startedMs) / 10;
    expect(layoutChart(input)).toEqual(first);
    expect(eachMs).toBeLessThan(16);
  });
});
