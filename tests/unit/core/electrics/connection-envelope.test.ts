import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { checkConnection } from "@/lib/core/electrics/check-connection";
import type { Input, Output } from "@/lib/core/electrics/jacks";
import type { Spread } from "@/lib/core/units/spread";
import { corners, ends } from "./connection-oracle";

/**
 * decayS·ln((active − rest)/(on − rest)) at every corner, the two levels of one corner sharing its resistances and bias
 * (a part has one value at a time).
 */
function widths(output: Output, input: Input): { min: number; max: number } {
  let [min, max] = [Infinity, -Infinity];
  const lists = [output.activeV, output.restV, output.sourceOhm, input.loadOhm!, input.biasV!, input.onV!, output.decayS!].map(ends);
  for (const [va, vr, rs, rl, bias, on, decay] of corners(lists) as Generator<[number, number, number, number, number, number, number]>) {
    const level = (v: number) => (v / rs + bias / rl) / (1 / rs + 1 / rl);
    const [active, rest] = [level(va), level(vr)];
    const width = active <= on ? 0 : on <= rest ? Infinity : decay * Math.log((active - rest) / (on - rest));
    min = Math.min(min, width);
    max = Math.max(max, width);
  }
  return { min, max };
}

const around = (min: number, max: number): fc.Arbitrary<Spread> =>
  fc.tuple(fc.double({ min, max, noNaN: true }), fc.constantFrom(0, 0.05, 0.2)).map(([nominal, tol]) => ({ nominal, tol }));

describe("the width of an envelope without a stated pulse", () => {
  it("is exact over every corner, each part counted once (seeded)", () => {
    let finite = 0;
    const output = fc.record({ restV: around(-3, 1), activeV: around(3, 10), sourceOhm: around(100, 20e3), decayS: around(0.01, 0.3) })
      .map((o): Output => ({ signal: "envelope", ...o }));
    const input = fc.record({ loadOhm: around(5e3, 200e3), biasV: around(0, 3), onV: around(0.5, 3) })
      .map((i): Input => ({ id: "e", accepts: ["envelope"], safeV: { min: -12, max: 12 }, ...i, pulseS: { min: 1e-3, max: 100 } }));
    fc.assert(fc.property(output, input, (o, i) => {
      const expected = widths(o, i);
      const { pulseS, reasons } = checkConnection({ outputs: [o], inputs: [i] }).listeners[0]!;
      if (expected.max === Infinity) {
        expect(pulseS).toBeUndefined();
        expect(reasons.some((r) => r.verdict === "long")).toBe(true);
        return;
      }
      finite += 1;
      expect(Math.abs(pulseS!.min - expected.min)).toBeLessThan(1e-9);
      expect(Math.abs(pulseS!.max - expected.max)).toBeLessThan(1e-9);
    }), { seed: 51, numRuns: 800 });
    expect(finite).toBeGreaterThan(300);
  });
});
