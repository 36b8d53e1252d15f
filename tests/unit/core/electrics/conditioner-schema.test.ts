import { describe, expect, it } from "vitest";
import { simulateConditioner } from "@/lib/core/electrics";
import { conditionerRequestSchema } from "@/lib/schemas/conditioner";

const request = {
  supply: { highV: 9, lowV: 0 }, pad: { kind: "resistive", restOhm: "47k", hitOhm: "9k1", leg: "upper" }, strike: { riseS: "1 ms", holdS: 0.005, fallS: 0.03 },
  divider: { ohm: 10000 }, coupling: { farad: "100n", ohm: "22k" }, threshold: { topOhm: 1e5, potOhm: 1e4, bottomOhm: 1e3, turn: 0.5 },
  comparator: { highDropV: 1.5, lowDropV: 0.02, limitA: 0.02 }, output: { seriesOhm: 2200, shuntOhm: 4700 }, envelope: null, load: { ohm: 1e5 },
};

describe("what the calculator's schema lets through, the solver answers", () => {
  it("text and numbers alike", () => {
    const result = simulateConditioner(conditionerRequestSchema.parse(request));
    expect(result.fires).toBe(true);
    expect(result.ruleOfThumbS).toBeCloseTo(2.2e-3, 12);
  });

  it.each([
    ["threshold.topOhm", { threshold: { topOhm: 0, potOhm: 0, bottomOhm: 0, turn: 0 } }],
    ["comparator.highDropV", { comparator: { highDropV: 9, lowDropV: 0.5, limitA: 0.02 } }],
    ["divider.ohm", { divider: { ohm: 1e-9 } }],
    ["comparator.commonMode", { comparator: { ...request.comparator, commonMode: { lowV: 3, highV: 1 } } }],
  ])("%s is refused by name where only the solver could tell", (field, change) => {
    const parsed = conditionerRequestSchema.safeParse({ ...request, ...change });
    expect(parsed.success).toBe(false);
    expect(parsed.error?.issues.map(({ path }) => path.join("."))).toContain(field);
  });
});
