import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { checkConnection } from "@/lib/core/electrics/check-connection";
import type { Input, Output } from "@/lib/core/electrics/jacks";
import type { Spread } from "@/lib/core/units/spread";
import { oracle } from "./connection-oracle";

const volt = (min: number, max: number): fc.Arbitrary<Spread> => {
  const level = fc.double({ min, max, noNaN: true }).map((v) => Math.round(v * 100) / 100);
  return fc.oneof(level, fc.tuple(level, level).map(([a, b]) => ({ min: Math.min(a, b), max: Math.max(a, b) })));
};
const ohm = (minExp: number, maxExp: number): fc.Arbitrary<Spread> => {
  const nominal = fc.double({ min: minExp, max: maxExp, noNaN: true }).map((e) => Number((10 ** e).toPrecision(3)));
  return fc.oneof(nominal, fc.tuple(nominal, fc.constantFrom(0.05, 0.2, 0.5)).map(([n, tol]) => ({ nominal: n, tol })));
};
const output = (or: boolean, polarity: "rising" | "falling"): fc.Arbitrary<Output> =>
  fc.record({ restV: volt(-12, 12), activeV: volt(-12, 12), sourceOhm: ohm(0.5, 5) })
    .map((figures) => ({ signal: "gate" as const, polarity, or, ...figures }));
const input = (id: string, bare: boolean): fc.Arbitrary<Input> =>
  fc.record({
    loadOhm: bare ? ohm(2, 6) : fc.oneof(ohm(2, 6), fc.constant(null)),
    biasV: volt(-5, 12),
    clamp: fc.option(fc.record({ lowV: volt(-3, 0), highV: volt(1, 6), seriesOhm: ohm(1, 5), maxA: fc.constant(0.01) }), { nil: undefined }),
  }).map(({ clamp, ...figures }) => ({ id, accepts: ["gate" as const], ...figures, ...(clamp ? { clamp } : {}) }));

/** How near the two must come: the slow way halves its interval to some 1e-14 V of the level. */
function near(measured: number, expected: number, scale: number) {
  expect(Math.abs(measured - expected)).toBeLessThan(1e-9 * scale + 1e-9 * Math.abs(expected));
}

function compare(outputs: Output[], inputs: Input[]) {
  const slow = oracle(outputs, inputs);
  const fast = checkConnection({ outputs, inputs });
  const first = fast.listeners[0]!;
  near(first.highV!.min, slow.highV.min, 1);
  near(first.highV!.max, slow.highV.max, 1);
  near(first.lowV!.min, slow.lowV.min, 1);
  near(first.lowV!.max, slow.lowV.max, 1);
  near(fast.source.currentA!.min, Math.min(...slow.currentA.map((c) => c.min)), 1e-3);
  near(fast.source.currentA!.max, Math.max(...slow.currentA.map((c) => c.max)), 1e-3);
  fast.listeners.forEach((listener, i) => {
    expect(listener.clampA !== undefined).toBe(inputs[i]!.clamp !== undefined);
    if (listener.clampA !== undefined) near(listener.clampA, slow.clampA[i]!, 1e-3);
  });
}

describe("exact ranges against every corner, solved by bisection", () => {
  it("one output into one input, with bias and clamp", () => {
    fc.assert(fc.property(output(false, "rising"), input("a", false), (o, a) => compare([o], [a])), { seed: 11, numRuns: 300 });
  });
  it("one output into two inputs", () => {
    fc.assert(fc.property(output(false, "falling"), input("a", false), input("b", false), (o, a, b) => compare([o], [a, b])), { seed: 12, numRuns: 60 });
  });
  it("two outputs that fight over one input", () => {
    fc.assert(fc.property(output(false, "rising"), output(false, "rising"), input("a", false), (o, p, a) => compare([o, p], [a])), { seed: 13, numRuns: 60 });
  });
  it("two outputs through diodes into one loaded input", () => {
    fc.assert(fc.property(output(true, "rising"), output(true, "rising"), input("a", true), (o, p, a) => compare([o, p], [a])), { seed: 14, numRuns: 60 });
  });
  it("falling outputs through diodes into one loaded input", () => {
    fc.assert(fc.property(output(true, "falling"), output(true, "falling"), input("a", true), (o, p, a) => compare([o, p], [a])), { seed: 15, numRuns: 60 });
  });
});

describe("ranges where a resistance is zero", () => {
  const a: Input = { id: "a", accepts: ["gate"], loadOhm: { min: 9e3, max: 11e3 }, biasV: { min: 0, max: 1 }, safeV: { min: -20, max: 20 } };
  it("an ideal output holds its level and gives what the load draws (Ohm's law)", () => {
    const { listeners, source } = checkConnection({ outputs: [{ signal: "gate", restV: 0, activeV: { min: 4.9, max: 5.1 }, sourceOhm: 0 }], inputs: [a] });
    expect(listeners[0]!.highV).toEqual({ min: 4.9, max: 5.1 });
    expect(listeners[0]!.lowV).toEqual({ min: 0, max: 0 });
    expect(source.currentA!.max).toBeCloseTo(5.1 / 9e3, 12);
    expect(source.currentA!.min).toBeCloseTo(-1 / 9e3, 12);
  });
  it("a source resistance that may be zero counts as zero where that is the worst", () => {
    const { listeners } = checkConnection({ outputs: [{ signal: "gate", restV: 0, activeV: 5, sourceOhm: { min: 0, max: 1e3 } }], inputs: [{ ...a, biasV: 0, loadOhm: 1e3 }] });
    expect(listeners[0]!.highV).toEqual({ min: 2.5, max: 5 });
  });
  it("a clamp without series resistance holds the node at its voltage and takes what is left over", () => {
    const clamp = { lowV: -0.6, highV: 5.6, seriesOhm: 0, maxA: 0.01 };
    const { listeners, source } = checkConnection({ outputs: [{ signal: "gate", restV: 0, activeV: 12, sourceOhm: 1e3 }], inputs: [{ ...a, biasV: 0, loadOhm: 1e4, clamp }] });
    expect(listeners[0]!.highV).toEqual({ min: 5.6, max: 5.6 });
    expect(listeners[0]!.clampA).toBeCloseTo(6.4e-3 - 5.6e-4, 12);
    expect(source.currentA!.max).toBeCloseTo(6.4e-3, 12);
  });
  it("two ideal outputs that fight give finite, opposite and ruinous currents", () => {
    const ideal: Output = { signal: "gate", restV: 0, activeV: 5, sourceOhm: 0 };
    const { verdict, source, listeners } = checkConnection({ outputs: [ideal, ideal], inputs: [a] });
    expect(verdict).toBe("clash");
    expect(source.currentA!.max).toBeCloseTo(2500, 0);
    expect(source.currentA!.min).toBeCloseTo(-2500, 0);
    expect(listeners[0]!.highV!.max).toBeCloseTo(5, 6);
  });
  it("an ideal output against an ideal clamp is hot with a finite current", () => {
    const clamp = { lowV: -0.6, highV: 5.6, seriesOhm: 0, maxA: 0.01 };
    const { verdict, listeners, source } = checkConnection({ outputs: [{ signal: "gate", restV: 0, activeV: 12, sourceOhm: 0 }], inputs: [{ ...a, clamp }] });
    expect(verdict).toBe("hot");
    expect(Number.isFinite(listeners[0]!.clampA)).toBe(true);
    expect(Number.isFinite(source.currentA!.max)).toBe(true);
  });
  it("nothing but an open input rests at 0 V", () => {
    const { listeners } = checkConnection({ outputs: [{ signal: "sensor", restV: 9, activeV: 9, sourceOhm: 0 }], inputs: [{ ...a, loadOhm: null }] });
    expect(listeners[0]!.highV).toEqual({ min: 0, max: 0 });
  });
  it("a diode OR into an open input keeps the level it was given", () => {
    const or: Output = { signal: "gate", restV: 0, activeV: 5, sourceOhm: 1e3, or: true };
    const { listeners } = checkConnection({ outputs: [or, or], inputs: [{ ...a, loadOhm: null }] });
    expect(listeners[0]!.highV).toEqual({ min: 5, max: 5 });
    expect(listeners[0]!.lowV).toEqual({ min: 0, max: 0 });
  });
});
