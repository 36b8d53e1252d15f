import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { layoutChart, type ChartCard, type ChartInput, type ChartLead, type LaneIndex } from "@/lib/core/chart";
import { boardMetrics, randomBoard } from "../../../factories/random-board";
import { anyBoard } from "./any-board";
import { boxOf, isCrossing, meeting, overlap, partsOf } from "./read-layout";

/** Checks a property on 300 boards, smaller ones shrunk from any that fails. */
const onAnyBoard = (check: (input: ChartInput) => void) => fc.assert(fc.property(anyBoard, (input) => { check(input); }), { numRuns: 300, seed: 20261201 });

describe("any board", () => {
  it("has every lead whose jacks are unfolded, square-cornered from its output to its input", () => onAnyBoard((input) => {
    const layout = layoutChart(input);
    const at = new Map(layout.jacks.map((jack) => [jack.id, { x: jack.x, y: jack.y }]));
    const drawable = input.leads.filter((lead) => at.has(lead.from) && at.has(lead.to));
    expect(layout.tracks.map((track) => track.leadId).sort()).toEqual(drawable.map((lead) => lead.id).sort());
    for (const lead of drawable) {
      const track = layout.tracks.find((item) => item.leadId === lead.id);
      expect(track?.points[0]).toEqual(at.get(lead.from));
      expect(track?.points.at(-1)).toEqual(at.get(lead.to));
    }
    for (const { a, b } of partsOf(layout)) expect((a.x === b.x) !== (a.y === b.y)).toBe(true);
  }));

  it("lets leads of different outputs cross, but touch only on the row of an input they share", () => onAnyBoard((input) => {
    const layout = layoutChart(input);
    const parts = partsOf(layout);
    const inputOf = new Map(input.leads.map((lead) => [lead.id, layout.jacks.find((jack) => jack.id === lead.to)]));
    const inputsOf = new Map<string, Set<string>>();
    for (const lead of input.leads) inputsOf.set(lead.from, new Set([...(inputsOf.get(lead.from) ?? []), lead.to]));
    for (const [i, one] of parts.entries()) {
      for (const other of parts.slice(i + 1)) {
        if (one.net === other.net) continue;
        const both = meeting(boxOf(one), boxOf(other));
        if (both === null || isCrossing(one, other)) continue;
        const shared = [inputOf.get(one.leadId), inputOf.get(other.leadId)].some((jack) => jack !== undefined && both.height === 0 && both.y === jack.y && both.x + both.width <= jack.x + 1e-6 && inputsOf.get(one.net)?.has(jack.id) && inputsOf.get(other.net)?.has(jack.id));
        expect(shared, `${one.leadId} lies on ${other.leadId}`).toBe(true);
      }
    }
  }));

  it("runs nothing under a card and no track beside another closer than the track pitch", () => onAnyBoard((input) => {
    const layout = layoutChart(input);
    const parts = partsOf(layout);
    for (const part of parts) expect(layout.cards.some((card) => overlapsLine(card, boxOf(part))), `${part.leadId} runs under a card`).toBe(false);
    const upright = parts.filter(({ a, b }) => a.x === b.x);
    for (const [i, one] of upright.entries()) {
      for (const other of upright.slice(i + 1)) {
        const apart = Math.abs(one.a.x - other.a.x);
        if (apart > 0) expect(apart).toBeGreaterThan(input.metrics.trackPitch - 1e-6);
      }
    }
  }));

  it("keeps tags off each other, off cards and off every upright track, and everything inside", () => onAnyBoard((input) => {
    const layout = layoutChart(input);
    for (const [i, tag] of layout.tags.entries()) {
      expect(layout.tags.slice(i + 1).filter((other) => overlap(tag, other))).toEqual([]);
      expect(layout.cards.filter((card) => overlap(tag, card))).toEqual([]);
      for (const part of partsOf(layout)) if (part.a.x === part.b.x) expect(overlapsLine(tag, boxOf(part))).toBe(false);
    }
    const frame = { x: 0, y: 0, width: layout.width, height: layout.height };
    for (const box of [...layout.cards, ...layout.tags, ...partsOf(layout).map(boxOf)]) {
      const within = meeting(frame, box);
      expect(within?.width).toBeCloseTo(box.width, 6);
      expect(within?.height).toBeCloseTo(box.height, 6);
    }
  }));

  it("has one tag at each plugged jack, with all its leads in their given order", () => onAnyBoard((input) => {
    const layout = layoutChart(input);
    const drawn = new Set(layout.tracks.map((track) => track.leadId));
    const leads = input.leads.filter((lead) => drawn.has(lead.id));
    const expected = new Map<string, string[]>();
    for (const lead of leads) for (const jackId of [lead.from, lead.to]) expected.set(jackId, [...(expected.get(jackId) ?? []), lead.id]);
    expect(Object.fromEntries(layout.tags.map((tag) => [tag.jackId, tag.leadIds]))).toEqual(Object.fromEntries(expected));
    expect(layout.tags).toHaveLength(expected.size);
  }));

  it("comes out the same twice", () => onAnyBoard((input) => expect(layoutChart(input)).toEqual(layoutChart(structuredClone(input)))));
});

function overlapsLine(box: { x: number; y: number; width: number; height: number }, line: typeof box): boolean {
  return line.x + line.width > box.x + 1e-6 && line.x < box.x + box.width - 1e-6 && line.y + line.height > box.y + 1e-6 && line.y < box.y + box.height - 1e-6;
}

const card = (id: string, lane: LaneIndex, ins: number, outs: number): ChartCard => ({
  id, lane, folded: false,
  jacks: [...Array.from({ length: ins }, (_, i) => ({ id: `${id}.in${i}`, side: "in" as const })), ...Array.from({ length: outs }, (_, i) => ({ id: `${id}.out${i}`, side: "out" as const }))],
});
const plug = (...pairs: [string, string][]): ChartLead[] => pairs.map(([from, to], i) => ({ id: `${i + 1}`, from, to }));
const layOut = (cards: ChartCard[], leads: ChartLead[]) => layoutChart({ cards, leads, metrics: boardMetrics });

describe("a mult", () => {
  const layout = layOut([card("a", 0, 0, 1), card("b", 1, 3, 0)], plug(["a.out0", "b.in0"], ["a.out0", "b.in1"], ["a.out0", "b.in2"]));

  it("is one trunk with a dot at each inner branch, each branch with its own tag", () => {
    expect(new Set(layout.tracks.map((track) => track.points[1]?.x)).size).toBe(1);
    // The output leaves between rows 1 and 2: in0 and in2 are the trunk's ends, the output and in1 meet it between.
    expect(layout.junctions.map((dot) => dot.leadIds)).toEqual([["1", "2", "3"], ["2", "3"]]);
    expect(layout.tags.filter((tag) => tag.end === "in").map((tag) => tag.leadIds)).toEqual([["1"], ["2"], ["3"]]);
  });
});

describe("two pads into one input", () => {
  const layout = layOut([card("a", 0, 0, 1), card("b", 0, 0, 1), card("c", 1, 1, 0), card("d", 1, 1, 0)], plug(["a.out0", "d.in0"], ["b.out0", "d.in0"], ["b.out0", "c.in0"]));

  it("meet at a dot on the input's row and share one tag there", () => {
    const into = layout.jacks.find((jack) => jack.id === "d.in0");
    const dot = layout.junctions.filter((junction) => junction.y === into?.y);
    // One where lead 2 leaves the trunk it shares with 3, one where it meets 1.
    expect(dot.map((junction) => [...junction.leadIds].sort()).sort()).toEqual([["1", "2"], ["2", "3"]]);
    expect(layout.tags.find((tag) => tag.jackId === "d.in0")?.leadIds).toEqual(["1", "2"]);
  });

  it("come from above and from below on one upright line where nothing else is in the way", () => {
    const { tracks } = layOut([card("a", 0, 0, 1), card("b", 0, 0, 1), card("c", 1, 1, 0), card("d", 1, 1, 0)], plug(["a.out0", "d.in0"], ["b.out0", "d.in0"]));
    expect(tracks[0]?.points[1]?.x).toBe(tracks[1]?.points[1]?.x);
  });

  it("keep a trunk each until then", () => {
    const xs = (leadId: string) => new Set(partsOf(layout).filter((part) => part.leadId === leadId && part.a.x === part.b.x).map((part) => part.a.x));
    expect([...xs("1")].some((x) => xs("3").has(x))).toBe(false);
  });
});

describe("a pad plugged straight into a voice", () => {
  it("crosses the lane between through the gap of two cards, not round all of them", () => {
    const cards = [card("p", 0, 0, 1), card("p2", 0, 0, 1), ...[0, 1, 2, 3].map((i) => card(`c${i}`, 1, 1, 1)), card("v", 2, 1, 1), card("v2", 2, 1, 1)];
    const layout = layOut(cards, plug(["p2.out0", "v2.in0"]));
    const across = partsOf(layout).filter(({ a, b }) => a.y === b.y && Math.abs(b.x - a.x) > boardMetrics.cardWidth);
    expect(across).toHaveLength(1);
    const y = across[0]?.a.y ?? 0;
    const lane = layout.cards.filter((box) => box.lane === 1);
    expect(lane.some((box, i) => box.y + box.height < y && y < (lane[i + 1]?.y ?? 0))).toBe(true);
    expect(layout.cardsTop).toBe(0);
  });

  it("goes round where cards stand too close", () => {
    const cards = [card("p", 0, 0, 1), card("c", 1, 1, 1), card("v", 2, 1, 1)];
    const layout = layOut(cards, plug(["p.out0", "v.in0"]));
    expect(layout.height).toBeGreaterThan(Math.max(...layout.cards.map((box) => box.y + box.height)));
  });
});

describe("audio from one voice through another", () => {
  const layout = layOut([card("v", 2, 1, 1), card("filter", 2, 1, 1)], plug(["v.out0", "filter.in0"]));
  it("leaves to the right and comes back in the gutter before its input, with an arrowhead", () => {
    const [track] = layout.tracks;
    const [from, to] = [track?.points[0], track?.points.at(-1)];
    expect(track?.backward).toBe(true);
    expect(track?.points[1]?.x).toBeGreaterThan(from?.x ?? 0);
    expect(track?.points.at(-2)?.x).toBeLessThan(to?.x ?? 0);
  });
  it("is the only kind with one: a lead to the next lane has none", () => {
    expect(layOut([card("c", 1, 1, 1), card("v", 2, 1, 1)], plug(["c.out0", "v.in0"])).tracks[0]?.backward).toBe(false);
  });
});

describe("sixty cards and a hundred leads", () => {
  it("are laid out in less than 8 ms at the best of forty tries", () => {
    const input = { ...randomBoard(7, 60, 100), metrics: boardMetrics };
    for (let i = 0; i < 30; i += 1) layoutChart(input);
    const tries = Array.from({ length: 40 }, () => {
      const startedMs = performance.now();
      layoutChart(input);
      return performance.now() - startedMs;
    });
    expect(Math.min(...tries)).toBeLessThan(8);
  });
});
