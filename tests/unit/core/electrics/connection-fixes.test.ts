import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { checkConnection } from "@/lib/core/electrics/check-connection";
import type { Fix, FixOptions } from "@/lib/core/electrics/connection-types";
import type { Input, Output } from "@/lib/core/electrics/jacks";
import { E_SERIES } from "@/lib/core/units/e-series";
import { toRange, type Spread } from "@/lib/core/units/spread";

/** The 5 V CMOS pin of the sources: CD4001BC levels, −0.5…V_DD + 0.5 V. */
const pin: Input = { id: "pin", accepts: ["trigger", "gate"], onV: { min: 1.5, max: 3.5 }, safeV: { min: -0.5, max: 5.5 }, loadOhm: null };
/** A 12 V op-amp: 10.5 V sure, 12 V at most (LM358, TI SLOS068R). */
const opAmp: Output = { signal: "trigger", restV: 0, activeV: { min: 10.5, max: 12 }, sourceOhm: 0, pulseS: 2e-3 };

const fixesOf = (output: Output, input: Input, options: FixOptions = {}) => {
  const listener = checkConnection({ outputs: [output], inputs: [input] }, options).listeners[0]!;
  return { ...listener, of: <K extends Fix["kind"]>(kind: K) => listener.fixes.find((fix): fix is Extract<Fix, { kind: K }> => fix.kind === kind) };
};
const within = (ohm: number, tol: number): Spread => ({ nominal: ohm, tol });
const isPreferred = (ohm: number, series: "E12" | "E24") => E_SERIES[series].includes(Math.round(ohm / 10 ** (Math.floor(Math.log10(ohm)) - 1)));

/** The divider worked out by hand, corner by corner, apart from the check. */
function dividerRange(volt: number[], source: number[], series: Spread, shunt: Spread, load: number[]) {
  const ends = (s: Spread) => [toRange(s).min, toRange(s).max];
  const all = volt.flatMap((v) => source.flatMap((rs) => ends(series).flatMap((r1) => ends(shunt).flatMap((r2) => load.map((rl) => {
    const r = rl === Infinity ? r2 : (r2 * rl) / (r2 + rl);
    return (v * r) / (rs + r1 + r);
  })))));
  return { min: Math.min(...all), max: Math.max(...all) };
}

describe("a divider for a level that is too high", () => {
  it("brings a 12 V op-amp within a 5 V pin, from E12, with ±5 % parts counted", () => {
    const check = fixesOf(opAmp, pin);
    const fix = check.of("divider")!;
    expect(check.verdict).toBe("hot");
    expect(fix.verdict).toBe("good");
    expect(isPreferred(fix.seriesOhm, "E12") && isPreferred(fix.shuntOhm, "E12")).toBe(true);
    const byHand = dividerRange([10.5, 12], [0], within(fix.seriesOhm, fix.tol), within(fix.shuntOhm, fix.tol), [Infinity]);
    expect(fix.highV.min).toBeCloseTo(byHand.min, 9);
    expect(fix.highV.max).toBeCloseTo(byHand.max, 9);
    expect(byHand.max).toBeLessThan(5.5);
    expect(byHand.min).toBeGreaterThan(3.5);
  });
  it("is worked out with the real load and source, and does not load the source", () => {
    const fix = fixesOf({ ...opAmp, activeV: { min: 8.5, max: 9 }, sourceOhm: { nominal: 1e3, tol: 0.1 } }, { ...pin, loadOhm: { nominal: 22e3, tol: 0.2 } }).of("divider")!;
    const byHand = dividerRange([8.5, 9], [900, 1100], within(fix.seriesOhm, fix.tol), within(fix.shuntOhm, fix.tol), [22e3 * 0.8, 22e3 * 1.2]);
    expect(fix.highV.max).toBeCloseTo(byHand.max, 9);
    expect(fix.seriesOhm + fix.shuntOhm).toBeGreaterThanOrEqual(10e3);
  });
  it("uses only the parts drawer where there is one", () => {
    expect(fixesOf(opAmp, pin, { drawerOhm: [10e3, 15e3, 1e6] }).of("divider")).toMatchObject({ seriesOhm: 15e3, shuntOhm: 10e3 });
    expect(fixesOf(opAmp, pin, { drawerOhm: [1e6] }).fixes).toEqual([]);
  });
  it("is not offered, and why, where the spread is wider than the input allows", () => {
    const check = fixesOf({ ...opAmp, activeV: { min: 5, max: 12 } }, pin);
    expect(check.fixes).toEqual([]);
    expect(check.fixNote).toMatch(/No divider does it.*5\.5 V.*2\.29 V.*3\.5 V/);
  });
  it("is not offered where something else stays wrong", () => {
    const check = fixesOf({ ...opAmp, signal: "audio" }, pin);
    expect(check.fixes).toEqual([]);
    expect(check.fixNote).toContain("wrong-kind");
  });
  it("in a mult sits in its own lead and leaves the others as they were", () => {
    const other: Input = { id: "other", accepts: ["trigger"], onV: 2, safeV: { min: -12, max: 15 }, loadOhm: 100e3 };
    const check = checkConnection({ outputs: [{ ...opAmp, sourceOhm: 1e3 }], inputs: [other, pin] });
    const fix = check.listeners[1]!.fixes.find((f) => f.kind === "divider");
    expect(fix).toBeDefined();
    // Exact two-node solution at nominal parts must lie inside the enclosure given.
    if (fix?.kind !== "divider") return;
    const branch = fix.seriesOhm + fix.shuntOhm;
    const node = 11 / (1 + 1e3 / ((100e3 * branch) / (100e3 + branch)));
    const at = (node * fix.shuntOhm) / branch;
    expect(at).toBeGreaterThan(fix.highV.min);
    expect(at).toBeLessThan(fix.highV.max);
  });
});

describe("other fixes", () => {
  it("a series resistor where diodes do the rest: 12 V into 5.6 V at 10 mA wants more than 640 Ω (arithmetic)", () => {
    const clamp = { lowV: -0.6, highV: 5.6, seriesOhm: 1, maxA: 10e-3 };
    const fix = fixesOf({ ...opAmp, activeV: 12 }, { ...pin, clamp }).of("series-resistor")!;
    expect(fix.seriesOhm).toBeGreaterThan(640);
    expect(fix.clampA).toBeCloseTo(6.4 / (fix.seriesOhm * 0.95 + 1), 9);
    expect(fix.clampA).toBeLessThanOrEqual(5e-3);
    expect(fix.verdict).toBe("tight");
  });
  it("a series diode for an output that rests far below 0 V, with its drop", () => {
    const split: Output = { signal: "trigger", restV: -10.5, activeV: 10.5, sourceOhm: 1e3, pulseS: 2e-3 };
    const fix = fixesOf(split, { ...pin, safeV: { min: -5, max: 15 }, loadOhm: 100e3 }).of("series-diode")!;
    expect(fix.lowV).toEqual({ min: 0, max: 0 });
    expect(fix.highV.min).toBeCloseTo((9.5 * 100) / 101, 9);
    expect(fix.highV.max).toBeCloseTo((10.3 * 100) / 101, 9);
  });
  it("an open input gets a resistor to 0 V with it", () => {
    const fix = fixesOf({ ...opAmp, restV: -10.5 }, { ...pin, safeV: { min: -5, max: 15 } }).of("series-diode")!;
    expect(fix.pullDownOhm).toBe(100e3);
  });
  it("a diode and a divider where the output goes beyond both ends", () => {
    const fix = fixesOf({ ...opAmp, restV: -10.5, activeV: { min: 10.5, max: 11 }, sourceOhm: 1e3 }, { ...pin, loadOhm: 1e6 }).of("diode-divider")!;
    const byHand = dividerRange([10.5 - fix.dropV.max, 11 - fix.dropV.min], [1e3], within(fix.seriesOhm, fix.tol), within(fix.shuntOhm, fix.tol), [1e6]);
    expect(fix.highV.max).toBeCloseTo(byHand.max, 9);
    expect(fix.highV.min).toBeCloseTo(byHand.min, 9);
    expect(fix.lowV.min).toBeCloseTo(0, 12);
  });
  it("a lighter load for a level that is pulled down", () => {
    const fix = fixesOf({ ...opAmp, activeV: 5, sourceOhm: 10e3 }, { ...pin, safeV: { min: -1, max: 12 }, loadOhm: 10e3 }).of("lighter-load")!;
    expect(fix.loadOhm).toBeGreaterThan(10e3);
    expect(fix.highV.min).toBeGreaterThanOrEqual(3.5);
  });
  it("alone on the output, where the other listeners pull it down", () => {
    const { listeners } = checkConnection({ outputs: [{ ...opAmp, activeV: 5, sourceOhm: 1e3 }], inputs: [pin, { ...pin, id: "heavy", loadOhm: 1e3 }] });
    expect(listeners[0]!.fixes[0]).toMatchObject({ kind: "lighter-load", dropListeners: ["heavy"], verdict: "good" });
  });
  it("22 nF with 12 kΩ is a decade off: 0.26 ms; the C and the R that make it long enough", () => {
    const short: Output = { ...opAmp, activeV: 5, pulseS: 12e3 * 22e-9 };
    const check = fixesOf(short, { ...pin, pulseS: { min: 1e-3, max: 5e-3 } }, { pulseParts: { ohm: 12e3, farad: 22e-9 } });
    const [farad, ohm] = check.fixes.filter((fix) => fix.kind === "pulse-width");
    expect(farad).toMatchObject({ part: "farad", value: 100e-9, verdict: "good" });
    expect(ohm).toMatchObject({ part: "ohm", value: 56e3, verdict: "good" });
  });
  it("a free shaper for the wrong kind of signal, tried on both its sides", () => {
    const shaper = {
      gearId: "s", name: "Long tail",
      input: { id: "in", accepts: ["trigger" as const], onV: 2, safeV: { min: -12, max: 15 }, loadOhm: 100e3 },
      output: { signal: "envelope" as const, restV: 0, activeV: 5, sourceOhm: 1e3, decayS: 0.2 },
    };
    const wants: Input = { id: "v", accepts: ["envelope"], safeV: { min: -12, max: 12 }, loadOhm: 100e3, decayS: { min: 0.1 } };
    expect(fixesOf(opAmp, wants, { freeGear: [shaper] }).fixes).toMatchObject([{ kind: "shaper", gearId: "s", verdict: "good", feedVerdict: "good" }]);
    const deaf = { ...shaper, input: { ...shaper.input, onV: 14 } };
    expect(fixesOf(opAmp, wants, { freeGear: [deaf] }).fixes).toEqual([]);
  });
});

describe("no fix is offered that does not hold (seeded)", () => {
  it("every divider, diode and resistor offered for random hot pairs keeps the level safe and firing at every corner", () => {
    let offered = 0;
    const volts = (min: number, max: number) => fc.double({ min, max, noNaN: true });
    fc.assert(fc.property(volts(6, 30), fc.double({ min: 0, max: 0.15, noNaN: true }), fc.constantFrom(0, 100, 1e3, 4.7e3), fc.constantFrom(10e3, 47e3, 100e3, 1e6), volts(0.5, 4), (volt, tol, rs, load, on) => {
      const input: Input = { ...pin, onV: { min: on * 0.8, max: on }, loadOhm: load };
      const fix = fixesOf({ ...opAmp, activeV: { nominal: volt, tol }, sourceOhm: rs }, input).of("divider");
      if (!fix) return;
      offered += 1;
      const byHand = dividerRange([volt * (1 - tol), volt * (1 + tol)], [rs], within(fix.seriesOhm, fix.tol), within(fix.shuntOhm, fix.tol), [load]);
      expect(byHand.max).toBeLessThanOrEqual(5.5);
      expect(byHand.min).toBeGreaterThanOrEqual(on);
    }), { seed: 31, numRuns: 150 });
    expect(offered).toBeGreaterThan(75);
  });
});
