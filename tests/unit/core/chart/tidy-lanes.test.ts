import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { countCrossings, layoutChart, shareTracks, tidyLanes, type Point } from "@/lib/core/chart";
import { randomBoard } from "../../../factories/random-board";
import { anyBoard } from "./any-board";
import { isCrossing } from "./read-layout";

/** Counted anew on the drawn lines, for comparison. */
function drawnCrossings(cards: Parameters<typeof countCrossings>[0], leads: Parameters<typeof countCrossings>[1]): number {
  const board = { cardWidth: 196, tapeHeight: 26, jackPitch: 28, cardGap: 10, trackPitch: 12, outTagWidth: 34, inTagWidth: 152, gutterMin: 110, tagHeight: 20 };
  const layout = layoutChart({ cards: cards.map(({ id, lane, jacks }) => ({ id, lane, jacks, folded: false })), leads, metrics: board });
  const parts = shareTracks(layout.tracks).flatMap(({ points }) => points.slice(1).map((b, i) => ({ a: points[i] as Point, b, net: "", leadId: "" })));
  let sum = 0;
  for (const [i, one] of parts.entries()) for (const other of parts.slice(i + 1)) if (isCrossing(one, other)) sum += 1;
  return sum;
}

describe("counting crossings", () => {
  it("gives what is drawn", () => fc.assert(fc.property(anyBoard, ({ cards, leads }) => {
    expect(countCrossings(cards, leads)).toBe(drawnCrossings(cards, leads));
  }), { numRuns: 200, seed: 20261203 }));
});

describe("tidying", () => {
  it("never makes a board worse, keeps every card in its lane, and comes out the same twice", () => fc.assert(fc.property(anyBoard, ({ cards, leads }) => {
    const tidied = tidyLanes(cards, leads);
    expect(countCrossings(tidied, leads)).toBeLessThanOrEqual(countCrossings(cards, leads));
    expect([...tidied].sort((a, b) => (a.id < b.id ? -1 : 1))).toEqual([...cards].sort((a, b) => (a.id < b.id ? -1 : 1)));
    expect(tidyLanes(cards, leads)).toEqual(tidied);
  }), { numRuns: 60, seed: 20261204 }));

  it("uncrosses two crossed leads", () => {
    const card = (id: string, lane: 0 | 1, side: "in" | "out") => ({ id, lane, jacks: [{ id: `${id}-j`, side }] });
    const cards = [card("a", 0, "out"), card("b", 0, "out"), card("x", 1, "in"), card("y", 1, "in")];
    const leads = [{ id: "1", from: "a-j", to: "y-j" }, { id: "2", from: "b-j", to: "x-j" }];
    expect(countCrossings(cards, leads)).toBe(1);
    expect(countCrossings(tidyLanes(cards, leads), leads)).toBe(0);
  });

  it("takes at least a fifth of the crossings off boards in no order", () => {
    let [before, after] = [0, 0];
    for (let seed = 0; seed < 12; seed += 1) {
      const { cards, leads } = randomBoard(seed, 30, 40);
      before += countCrossings(cards, leads);
      after += countCrossings(tidyLanes(cards, leads), leads);
    }
    expect(after).toBeLessThan(0.8 * before);
  });
});
