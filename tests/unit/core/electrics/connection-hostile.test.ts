import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { checkConnection } from "@/lib/core/electrics/check-connection";
import { findConnectionIssues } from "@/lib/core/electrics/find-connection-issues";
import type { Input, Output } from "@/lib/core/electrics/jacks";
import type { Spread } from "@/lib/core/units/spread";

const output: Output = { signal: "gate", restV: 0, activeV: 5, sourceOhm: 1000 };
const input: Input = { id: "i", accepts: ["gate"], onV: { min: 1, max: 2 }, safeV: { min: -1, max: 12 }, loadOhm: 100e3 };
const clamp = { lowV: -0.6, highV: 5.6, seriesOhm: 1e3, maxA: 0.01 };
const paths = (o: object, i: object) =>
  findConnectionIssues({ outputs: [{ ...output, ...o } as Output], inputs: [{ ...input, ...i } as Input] }).map((issue) => issue.path.join("."));

describe("figures that cannot be meant are named by their path", () => {
  it.each([
    ["nothing wrong", {}, {}, []],
    ["upside down", { activeV: { min: 6, max: 5 } }, {}, ["outputs.0.activeV"]],
    ["tolerance of 100 %", { activeV: { nominal: 5, tol: 1 } }, {}, ["outputs.0.activeV.tol"]],
    ["negative tolerance", { activeV: { nominal: 5, tol: -0.1 } }, {}, ["outputs.0.activeV.tol"]],
    ["one-sided spread", { activeV: { min: 5 } }, {}, ["outputs.0.activeV.max"]],
    ["not a number", { restV: NaN }, {}, ["outputs.0.restV"]],
    ["infinite", {}, { onV: { min: 1, max: Infinity } }, ["inputs.0.onV.max"]],
    ["load of nothing", {}, { loadOhm: 0 }, ["inputs.0.loadOhm"]],
    ["load that may be nothing", {}, { loadOhm: { min: 0, max: 10 } }, ["inputs.0.loadOhm.min"]],
    ["negative source", { sourceOhm: -1 }, {}, ["outputs.0.sourceOhm"]],
    ["negative times", { pulseS: -1e-3, decayS: { min: -1, max: 1 } }, {}, ["outputs.0.pulseS", "outputs.0.decayS.min"]],
    ["one-sided pulse limits are meant", {}, { pulseS: { min: 1e-3 }, decayS: { min: 0.1 } }, []],
    ["pulse limits upside down", {}, { pulseS: { min: 2, max: 1 } }, ["inputs.0.pulseS"]],
    ["safe range one-sided", {}, { safeV: { max: 5 } }, ["inputs.0.safeV.min"]],
    ["1e300", { activeV: 1e300 }, {}, ["outputs.0.activeV"]],
    ["a denormal load", {}, { loadOhm: 1e-310 }, ["inputs.0.loadOhm"]],
    ["clamp figures", {}, { clamp: { ...clamp, seriesOhm: -1, maxA: NaN } }, ["inputs.0.clamp.seriesOhm", "inputs.0.clamp.maxA"]],
    ["clamp upside down", {}, { clamp: { ...clamp, lowV: 6 } }, ["inputs.0.clamp.lowV"]],
    ["an open input and an ideal output are meant", { sourceOhm: 0 }, { loadOhm: null }, []],
    ["blank figures are no issue", { restV: undefined }, { safeV: undefined }, []],
  ])("%s", (_name, o, i, expected) => expect(paths(o, i)).toEqual(expected));
  it("the check refuses what the issues name", () => {
    expect(() => checkConnection({ outputs: [{ ...output, activeV: { min: 6, max: 5 } }], inputs: [input] })).toThrow(RangeError);
  });
});

const anyVolt = fc.oneof(fc.double({ noNaN: true, min: -1e9, max: 1e9 }), fc.constantFrom(0, -0, 1e-9, -1e9, 1e9));
const anyOhm = fc.oneof(fc.constantFrom(0, 1e-12, 1e18), fc.double({ noNaN: true, min: 1e-9, max: 1e9 }));
const spreadOf = (numbers: fc.Arbitrary<number>): fc.Arbitrary<Spread> => fc.oneof(
  numbers,
  fc.tuple(numbers, numbers).map(([a, b]) => ({ min: Math.min(a, b), max: Math.max(a, b) })),
  fc.record({ nominal: numbers, tol: fc.double({ min: 0, max: 0.99, noNaN: true }) }),
);
const anyOutput: fc.Arbitrary<Output> = fc.record({
  signal: fc.constantFrom("sensor", "trigger", "gate", "envelope", "control", "audio"),
  polarity: fc.constantFrom("rising", "falling", undefined), restV: spreadOf(anyVolt), activeV: spreadOf(anyVolt), sourceOhm: spreadOf(anyOhm),
  pulseS: fc.option(spreadOf(fc.double({ min: 0, max: 1e9, noNaN: true })), { nil: undefined }),
  decayS: fc.option(spreadOf(fc.double({ min: 0, max: 1e9, noNaN: true })), { nil: undefined }), or: fc.boolean(),
  limitA: fc.option(spreadOf(fc.double({ min: 0, max: 1e9, noNaN: true })), { nil: undefined }),
});
const anyInput: fc.Arbitrary<Input> = fc.record({
  id: fc.string(), accepts: fc.subarray(["sensor", "trigger", "gate", "envelope", "control", "audio"] as const).map((s) => [...s]),
  polarity: fc.constantFrom("rising", "falling", undefined), onV: fc.option(spreadOf(anyVolt), { nil: undefined }), offV: fc.option(spreadOf(anyVolt), { nil: undefined }),
  safeV: fc.option(fc.tuple(anyVolt, anyVolt).map(([a, b]) => ({ min: Math.min(a, b), max: Math.max(a, b) })), { nil: undefined }),
  loadOhm: fc.option(spreadOf(fc.double({ min: 1e-9, max: 1e9, noNaN: true })), { nil: null }), biasV: fc.option(spreadOf(anyVolt), { nil: undefined }),
  pulseS: fc.option(fc.record({ min: fc.double({ min: 0, max: 1, noNaN: true }) }), { nil: undefined }),
  decayS: fc.option(fc.record({ min: fc.double({ min: 0, max: 1, noNaN: true }) }), { nil: undefined }),
  clamp: fc.option(fc.tuple(anyVolt, anyVolt, spreadOf(anyOhm)).map(([a, b, seriesOhm]) => ({ lowV: Math.min(a, b), highV: Math.max(a, b), seriesOhm, maxA: 0.01 })), { nil: undefined }),
  maxDbu: fc.option(fc.integer({ min: -60, max: 60 }), { nil: undefined }), phantom: fc.option(fc.boolean(), { nil: undefined }),
});

describe("whatever passes for a figure gets a finite answer", () => {
  it("no NaN, no infinity, no exception, ranges the right way up (seeded)", () => {
    fc.assert(fc.property(fc.array(anyOutput, { minLength: 1, maxLength: 3 }), fc.array(anyInput, { minLength: 1, maxLength: 4 }), (outputs, inputs) => {
      const connection = { outputs, inputs };
      if (findConnectionIssues(connection).length > 0) return;
      const check = checkConnection(connection);
      const walk = (value: unknown): void => {
        if (typeof value === "number") expect(Number.isFinite(value)).toBe(true);
        else if (value !== null && typeof value === "object") Object.values(value).forEach(walk);
      };
      walk(check);
      for (const { highV, lowV } of check.listeners) {
        for (const range of [highV!, lowV!, check.source.currentA!]) expect(range.min).toBeLessThanOrEqual(range.max);
      }
    }), { seed: 21, numRuns: 1500 });
  });

  it("200 listeners with full spreads, clamps and bias are answered in under 2 s", () => {
    const inputs = Array.from({ length: 200 }, (_, i): Input => ({
      id: `i${i}`, accepts: ["gate"], onV: { min: 0.1, max: 0.2 }, safeV: { min: -1, max: 3 }, loadOhm: { nominal: 1e5, tol: 0.2 }, biasV: { min: 0, max: (i % 7) / 10 },
      ...(i % 2 ? { clamp: { lowV: -0.6, highV: { nominal: 3.5, tol: 0.05 }, seriesOhm: { nominal: 1000, tol: 0.1 }, maxA: 1e-4 } } : {}),
    }));
    const began = performance.now();
    const check = checkConnection({ outputs: [{ ...output, activeV: { nominal: 12, tol: 0.1 }, sourceOhm: { nominal: 100, tol: 0.1 } }], inputs });
    expect(performance.now() - began).toBeLessThan(2000);
    expect(check.listeners).toHaveLength(200);
    expect(check.verdict).toBe("hot");
  });

  it.each([1e-9, 1e-6, 1e-3, 1, 1e3, 1e6])("scales with the volts (× %d)", (scale) => {
    const at = (s: number) => checkConnection({
      outputs: [{ ...output, activeV: { min: 4 * s, max: 5 * s }, sourceOhm: { nominal: 1e3, tol: 0.05 } }],
      inputs: [{ ...input, biasV: 2 * s, loadOhm: { nominal: 1e4, tol: 0.05 } }],
    }).listeners[0]!.highV!;
    expect(at(scale).min / scale).toBeCloseTo(at(1).min, 9);
    expect(at(scale).max / scale).toBeCloseTo(at(1).max, 9);
  });
});
