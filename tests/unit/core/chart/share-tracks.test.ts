import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { layoutChart, shareTracks, type ChartInput, type ChartLayout, type Point } from "@/lib/core/chart";
import { anyBoard } from "./any-board";
import { isCrossing, partsOf, type Part } from "./read-layout";

const onAnyBoard = (check: (layout: ChartLayout, input: ChartInput) => void) =>
  fc.assert(fc.property(anyBoard, (input) => { check(layoutChart(input), input); }), { numRuns: 200, seed: 20261202 });

const key = ({ x, y }: Point) => `${x.toFixed(4)},${y.toFixed(4)}`;
const lengthOf = (points: readonly Point[]) => points.slice(1).reduce((sum, b, i) => sum + Math.abs(b.x - (points[i]?.x ?? 0)) + Math.abs(b.y - (points[i]?.y ?? 0)), 0);

function stretchParts(layout: ChartLayout): Part[] {
  return shareTracks(layout.tracks).flatMap(({ points, leadIds }) => points.slice(1).map((b, i) => ({ a: points[i] as Point, b, net: "", leadId: leadIds[0] ?? "" })));
}

describe("shared stretches", () => {
  it("together are as long as each lead's own track", () => onAnyBoard((layout) => {
    const stretches = shareTracks(layout.tracks);
    for (const track of layout.tracks) {
      const along = stretches.filter((stretch) => stretch.leadIds.includes(track.leadId));
      expect(along.reduce((sum, stretch) => sum + lengthOf(stretch.points), 0)).toBeCloseTo(lengthOf(track.points), 6);
    }
  }));

  it("never lie on each other", () => onAnyBoard((layout) => {
    const parts = stretchParts(layout);
    for (const [i, one] of parts.entries()) {
      for (const other of parts.slice(i + 1)) {
        const axis = one.a.x === one.b.x ? "x" : "y";
        const along = axis === "x" ? "y" : "x";
        if (one.a[axis] !== one.b[axis] || other.a[axis] !== other.b[axis] || one.a[axis] !== other.a[axis]) continue;
        const from = Math.max(Math.min(one.a[along], one.b[along]), Math.min(other.a[along], other.b[along]));
        const to = Math.min(Math.max(one.a[along], one.b[along]), Math.max(other.a[along], other.b[along]));
        expect(to - from).toBeLessThan(1e-6);
      }
    }
  }));

  it("meet in threes and fours exactly where the chart has its dots", () => onAnyBoard((layout) => {
    const ends = new Map<string, number>();
    for (const { points } of shareTracks(layout.tracks)) for (const end of [points[0], points.at(-1)]) if (end) ends.set(key(end), (ends.get(key(end)) ?? 0) + 1);
    const jacks = new Set(layout.jacks.map(key));
    const branches = [...ends].filter(([at, count]) => count >= 3 && !jacks.has(at)).map(([at]) => at);
    expect(layout.junctions.map(key).sort()).toEqual(branches.sort());
  }));

  it("cross as often as the tracks of different outputs do, each pair of lines counted once", () => onAnyBoard((layout) => {
    const parts = partsOf(layout);
    const places = new Set<string>();
    for (const [i, one] of parts.entries()) {
      for (const other of parts.slice(i + 1)) {
        if (one.net === other.net || !isCrossing(one, other)) continue;
        const upright = one.a.x === one.b.x ? one : other;
        places.add(key({ x: upright.a.x, y: (upright === one ? other : one).a.y }));
      }
    }
    const shared = stretchParts(layout);
    let crossings = 0;
    for (const [i, one] of shared.entries()) for (const other of shared.slice(i + 1)) if (isCrossing(one, other)) crossings += 1;
    const dots = new Set(layout.junctions.map(key));
    expect(crossings).toBe([...places].filter((place) => !dots.has(place)).length);
  }));
});
