import { describe, expect, it } from "vitest";
import { clockText, countCrossings, leadChain, lineStyle, tidyLanes } from "@/lib/core/chart";
import { VERDICTS } from "@/lib/core/electrics/jacks";
import { randomBoard } from "../../../factories/random-board";

describe("clock positions", () => {
  it.each([[0, "7 o’clock"], [0.5, "12 o’clock"], [1, "5 o’clock"], [0.25, "half past 9"], [0.6, "1 o’clock"]])("%d is %s", (position, text) => expect(clockText(position)).toBe(text));
});

describe("line styles", () => {
  it("tell every verdict apart without colour, but for the pairs that share one by design", () => {
    const styles = VERDICTS.map((verdict) => JSON.stringify(lineStyle(verdict)));
    // stuck = overload and clash = hot: the word beside the line tells them apart.
    expect(new Set(styles).size).toBe(VERDICTS.length - 2);
  });
});

describe("tidying", () => {
  it.each(Array.from({ length: 40 }, (_, seed) => seed))("never makes board %i worse, and keeps every card", (seed) => {
    const { cards, leads } = randomBoard(seed, 30, 40);
    const tidied = tidyLanes(cards, leads);
    expect(countCrossings(tidied, leads)).toBeLessThanOrEqual(countCrossings(cards, leads));
    expect(tidied.map((card) => card.id).sort()).toEqual(cards.map((card) => card.id).sort());
  });
  it("uncrosses two crossed leads", () => {
    const card = (id: string, lane: 0 | 1, side: "in" | "out") => ({ id, lane, folded: false, jacks: [{ id: `${id}-j`, side }] });
    const cards = [card("a", 0, "out"), card("b", 0, "out"), card("x", 1, "in"), card("y", 1, "in")];
    const leads = [{ id: "1", from: "a-j", to: "y-j" }, { id: "2", from: "b-j", to: "x-j" }];
    expect(countCrossings(cards, leads)).toBe(1);
    expect(countCrossings(tidyLanes(cards, leads), leads)).toBe(0);
  });
});

describe("the chain of a lead", () => {
  const cards = [
    { id: "pad", jacks: [{ id: "p", side: "out" as const }] },
    { id: "cond", jacks: [{ id: "ci", side: "in" as const }, { id: "co", side: "out" as const }] },
    { id: "v1", jacks: [{ id: "v1i", side: "in" as const }] },
    { id: "v2", jacks: [{ id: "v2i", side: "in" as const }] },
    { id: "other", jacks: [{ id: "o", side: "out" as const }] },
  ];
  const leads = [{ id: "1", from: "p", to: "ci" }, { id: "2", from: "co", to: "v1i" }, { id: "3", from: "co", to: "v2i" }];
  it("goes up to the pad and down to the voice, not into the sister branch", () => {
    const chain = leadChain(leads, cards, { leadIds: ["2"] });
    expect([...chain.leadIds].sort()).toEqual(["1", "2"]);
    expect([...chain.cardIds].sort()).toEqual(["cond", "pad", "v1"]);
  });
  it("of a card takes all its branches", () => {
    expect([...leadChain(leads, cards, { cardIds: ["pad"] }).leadIds].sort()).toEqual(["1", "2", "3"]);
  });
});
