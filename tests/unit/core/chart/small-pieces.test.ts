import { describe, expect, it } from "vitest";
import { besideLine, CLOCK_STEPS, clockText, fitDash, leadChain, lineStyle, readClock } from "@/lib/core/chart";
import { VERDICTS } from "@/lib/core/electrics/jacks";

describe("clock positions", () => {
  it.each([[0, "7 o’clock"], [0.5, "12 o’clock"], [1, "5 o’clock"], [0.25, "half past 9"], [0.6, "1 o’clock"]])("%d is %s", (position, text) => expect(clockText(position)).toBe(text));
});

describe("clock words", () => {
  it("read back as the position they were said for", () => {
    for (const position of CLOCK_STEPS) expect(readClock(clockText(position))).toBeCloseTo(position, 9);
  });
  it.each([["2 o'clock", 0.7], ["9:30", 0.25], ["12", 0.5], [" Half past 4 ", 0.95], ["7", 0]])("take %j as people write it", (text, position) => expect(readClock(text)).toBeCloseTo(position, 9));
  it.each(["6 o’clock", "5:30", "half past 6", "13", "0", "9:75", "half past 9:30", "noon", ""])("refuse %j, which is nowhere on the dial", (text) => expect(readClock(text)).toBeNull());
});

describe("dashes", () => {
  it.each([40, 63.7, 101, 400])("begin and end a part of %d in the middle of a dash", (length) => {
    const { dash, offset } = fitDash([6, 8], length);
    const period = dash.reduce((sum, part) => sum + part, 0);
    expect(length / period).toBeCloseTo(Math.round(length / period), 9);
    expect(offset).toBeCloseTo((dash[0] ?? 0) / 2, 9);
    // Stretched by less than a third, so that a style keeps its look.
    expect(Math.abs(Math.log(period / 14))).toBeLessThan(Math.log(4 / 3));
  });
  it("are left out where a part is too short for them", () => expect(fitDash([6, 14], 8)).toEqual({ dash: [], offset: 0 }));
});

describe("a double line", () => {
  it("keeps its distance round corners", () => {
    const corner = [{ x: 0, y: 0 }, { x: 10, y: 0 }, { x: 10, y: 10 }, { x: 20, y: 10 }];
    expect(besideLine(corner, 2)).toEqual([{ x: 0, y: 2 }, { x: 8, y: 2 }, { x: 8, y: 12 }, { x: 20, y: 12 }]);
    expect(besideLine(corner, -2)).toEqual([{ x: 0, y: -2 }, { x: 12, y: -2 }, { x: 12, y: 8 }, { x: 20, y: 8 }]);
  });
});

describe("line styles", () => {
  it("tell every verdict apart without colour, but for the pairs that share one by design", () => {
    const styles = VERDICTS.map((verdict) => JSON.stringify(lineStyle(verdict)));
    // stuck = overload and clash = hot: the word beside the line tells them apart.
    expect(new Set(styles).size).toBe(VERDICTS.length - 2);
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
