import { describe, expect, it } from "vitest";
import { ALKALINE_9V, budgetBattery, budgetCurrent, budgetDesk, budgetLeads, budgetTime, runHours, sayLead, type DischargeCurve, type StockLead } from "@/lib/core/planning";

describe("leads, counted by hand", () => {
  const big = "6.35 mm TS";
  const small = "3.5 mm TS";
  const lead = (id: number, lengthM: number, output = big, input = big): StockLead => ({ lead: id, lengthM, connectors: { output, input } });
  const outputs = { a: { connector: big, xM: 0, yM: 0 }, b: { connector: big, xM: 0, yM: 0 } };
  const inputs = { near: { connector: big, xM: 0.3, yM: 0.4 }, far: { connector: big, xM: 1.2, yM: 0.9 }, tiny: { connector: small, xM: 0.3, yM: 0.4 } };
  const near = { output: "a", input: "near" };
  const far = { output: "b", input: "far" };

  it("does not spend the long lead on the short run", () => {
    // a–near is 0.5 m (3-4-5), b–far 1.5 m: of 0.6 m and 2 m only one deal serves both.
    expect(budgetLeads({ songs: [{ id: "one", connections: [near, far] }], stock: [lead(1, 2), lead(2, 0.6)], outputs, inputs }).rows)
      .toEqual([{ subject: "one", need: 2, have: 2, margin: 0, unit: "leads", standing: "close", text: "2 leads at once of 2 in stock." }]);
  });

  it("says what to buy: for the set, the most that any one song misses", () => {
    const budget = budgetLeads({ songs: [{ id: "one", connections: [near, far] }, { id: "two", connections: [near] }], stock: [], outputs, inputs });
    expect(budget.rows[0]).toMatchObject({ need: 2, have: 0, standing: "short", mend: "Buy or borrow: 1 × 6.35 mm TS to 6.35 mm TS, at least 1.5 m; 1 × 6.35 mm TS to 6.35 mm TS, at least 50 cm." });
    expect(budget.toBuy.map(sayLead)).toEqual(["1 × 6.35 mm TS to 6.35 mm TS, at least 1.5 m", "1 × 6.35 mm TS to 6.35 mm TS, at least 50 cm"]);
  });

  it("takes an adapter where the rig has one and counts it", () => {
    const request = { songs: [{ id: "one", connections: [{ output: "a", input: "tiny" }] }], stock: [lead(1, 1)], outputs, inputs };
    expect(budgetLeads(request).rows[0]!.standing).toBe("short");
    const adapters = [{ plug: big, jack: small }];
    expect(budgetLeads({ ...request, adapters })).toMatchObject({ rows: [{ standing: "close" }], adapters: [{ plug: big, jack: small, count: 1 }] });
  });
});

describe("current, added by hand", () => {
  const rail = (ratingA: number | null) => [{ id: "+12", name: "+12 V", ratingA }];
  const draws = [1, 2, 3, 4].map((k) => ({ rail: "+12", gear: `voice ${k}`, drawA: 0.02 }));

  it("80 mA of 100 mA is exactly the 20 % wanted; 81 mA is close; 101 mA is short", () => {
    expect(budgetCurrent(rail(0.1), draws)[0]).toMatchObject({ need: 0.08, standing: "enough", text: "80 mA of 100 mA, 20 % to spare." });
    expect(budgetCurrent(rail(0.1), [...draws, { rail: "+12", gear: "pad", drawA: 0.001 }])[0]!.standing).toBe("close");
    expect(budgetCurrent(rail(0.1), [...draws, { rail: "+12", gear: "lamp", drawA: 0.021 }])[0]).toMatchObject({
      standing: "short", mend: "Move gear that takes 21 mA to another supply, or use one rated 126 mA or more.",
    });
  });

  it("says which figure is missing, and still calls too much too much", () => {
    const unknown = { rail: "+12", gear: "black box", drawA: null };
    expect(budgetCurrent(rail(0.2), [...draws, unknown])[0]).toMatchObject({ standing: "unproven", text: "80 mA of 200 mA, 60 % to spare. Measure what black box takes." });
    expect(budgetCurrent(rail(0.05), [...draws, unknown])[0]!.standing).toBe("short");
    expect(budgetCurrent(rail(null), draws)[0]).toMatchObject({ standing: "unproven", margin: null });
  });

  it("keeps rails apart", () => {
    const rows = budgetCurrent([...rail(0.1), { id: "-12", name: "−12 V", ratingA: 0.1 }], draws);
    expect(rows.map((row) => row.need)).toEqual([0.08, 0]);
  });
});

describe("battery hours", () => {
  const curve: DischargeCurve = { name: "cell", source: "made up", capacity: [[0.01, 0.6], [0.1, 0.4]], endV: 5, share: [[9, 0], [7, 0.5], [5, 1]] };

  it("565 mAh at 5 mA is the ideal 113 h to the end (arithmetic from the nominal capacity)", () => {
    expect(runHours(ALKALINE_9V, 0.005, 4.8)).toBeCloseTo(113, 9);
  });

  it("310 mAh at 0.1 A is 3.1 h (published test)", () => {
    expect(runHours(ALKALINE_9V, 0.1, 4.8)).toBeCloseTo(3.1, 9);
  });

  it.each([
    ["half the capacity to the middle voltage", 0.01, 7, 30],
    ["three quarters a volt lower", 0.01, 6, 45],
    ["halfway between draws on a log scale: 0.5 Ah", Math.sqrt(0.001), 5, 0.5 / Math.sqrt(0.001)],
    ["below the least published draw no more than there", 0.001, 5, 600],
    ["a cutoff above the fresh voltage", 0.01, 9.5, 0],
    ["a cutoff below the curve's end", 0.01, 3, 60],
  ])("%s", (_, drawA, cutoffV, hours) => {
    expect(runHours(curve, drawA, cutoffV)).toBeCloseTo(hours, 9);
  });

  it("falls as the draw rises, for any cutoff", () => {
    for (const cutoffV of [8, 7, 6, 4.8]) {
      const hours = [0.005, 0.02, 0.05, 0.1, 0.3, 0.5].map((drawA) => runHours(ALKALINE_9V, drawA, cutoffV)!);
      expect(hours).toEqual([...hours].sort((a, b) => b - a));
    }
  });

  it("knows nothing beyond the published draws, and refuses a draw of nothing", () => {
    expect(runHours(curve, 0.2, 5)).toBeNull();
    expect(() => runHours(curve, 0, 5)).toThrow(RangeError);
    expect(() => runHours(curve, Number.NaN, 5)).toThrow(RangeError);
  });

  it("stands against sound check, set and spare", () => {
    const wanted = { soundCheckH: 1, setH: 1.5, spareH: 1 };
    const row = (drawA: number | null, cutoffV: number | null, count?: number) => budgetBattery([{ subject: "9 V of pad A", curve, drawA, cutoffV, count }], wanted)[0]!;
    expect(row(0.01, 5)).toMatchObject({ need: 3.5, have: 60, standing: "enough" });
    // 0.4 Ah × 0.5 ÷ 0.1 A = 2 h: short of 3.5 h; two batteries give 4 h, an eighth to spare.
    expect(row(0.1, 7)).toMatchObject({ have: 2, standing: "short", mend: "Take 1 more, or a supply." });
    expect(row(0.1, 7, 2)).toMatchObject({ have: 4, standing: "close" });
    expect(row(null, 5).standing).toBe("unproven");
    expect(row(0.01, null).standing).toBe("unproven");
    expect(row(1, 5)).toMatchObject({ standing: "unproven", have: null });
    expect(row(0, 5).standing).toBe("enough");
  });
});

describe("time and desk", () => {
  it("each changeover stands against its gap, and the set against its slot", () => {
    const gap = (changeoverS: number, gapS: number | null) => ({ before: "One", after: "Two", changeoverS, gapS });
    const budget = budgetTime([gap(20, 60), gap(58, 60), gap(90, 60), gap(10, null), gap(0, 0)], [200, 180, 240, 200, 200, 180], 1800);
    expect(budget.rows.map((row) => row.standing)).toEqual(["enough", "close", "short", "unproven", "enough"]);
    expect(budget.rows[2]!.mend).toBe("Cover 30 s more, or move the songs apart.");
    // Gaps as they will be: 60 + 60 + 90 + 10 + 0 = 220 s; playing 1200 s; 1800 − 1420 = 380 s to spare.
    expect(budget).toMatchObject({ playingS: 1200, changeoverS: 178, gapsS: 220, spareS: 380 });
    expect(budgetTime([], [null], 1800)).toMatchObject({ playingS: null, spareS: null });
  });

  it("phantom, level and what is missing are told per channel", () => {
    const use = { channel: "Desk 1", source: "kick", levelDbu: { min: 0, max: 12 }, maxDbu: 22, phantom: false, hasDi: false, isHomeMade: true };
    const row = (change: Partial<typeof use> | object) => budgetDesk([{ ...use, ...change }], 8).rows[0]!;
    expect(row({})).toMatchObject({ standing: "enough", margin: 10 });
    expect(row({ levelDbu: { min: 0, max: 18 } }).standing).toBe("close");
    expect(row({ levelDbu: { min: 0, max: 25 } })).toMatchObject({ standing: "short", mend: "Use a DI box with at least 9 dB of pad, or turn the source down." });
    expect(row({ phantom: true })).toMatchObject({ standing: "short", text: "Phantom power is on and kick is home-made." });
    expect(row({ phantom: true, hasDi: true }).standing).toBe("enough");
    expect(row({ phantom: null }).standing).toBe("unproven");
    expect(row({ levelDbu: null }).text).toBe("The level of kick is missing.");
    expect(budgetDesk([use, use, { ...use, channel: "Desk 2" }], 8)).toMatchObject({ used: 2, available: 8 });
  });
});
