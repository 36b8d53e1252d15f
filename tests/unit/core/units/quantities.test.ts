import fc from "fast-check";
import { describe, expect, it } from "vitest";
import {
  E_SERIES, exactSpreadText, formatQuantity, formatRange, formatSpread, nearestPreferred, parseQuantity, parseSpread,
  preferredAbove, preferredBelow, preferredBetween, toRange, type Spread, type Unit,
} from "@/lib/core/units";

const value = (text: string, unit: Unit) => {
  const parsed = parseQuantity(text, unit);
  return parsed.ok ? parsed.value : parsed.message;
};
const spread = (text: string, unit: Unit) => {
  const parsed = parseSpread(text, unit);
  return parsed.ok ? parsed.value : parsed.message;
};

describe("parseQuantity reads values as people write them and as IEC 60062 codes them", () => {
  it.each<[string, Unit, number]>([
    ["4k7", "Ohm", 4700], ["2n2", "F", 2.2e-9], ["R47", "Ohm", 0.47], ["0.01 µF", "F", 1e-8], ["0.01 μF", "F", 1e-8], ["0.01 uF", "F", 1e-8],
    ["10 nF", "F", 1e-8], ["27k", "Ohm", 27e3], ["2.5 ms", "s", 2.5e-3], ["0,1uF", "F", 1e-7], ["1M", "Ohm", 1e6], ["100R", "Ohm", 100], ["4R7", "Ohm", 4.7],
    ["9V", "V", 9], ["-0.3 V", "V", -0.3], ["−0.3 V", "V", -0.3], ["3V3", "V", 3.3], ["4k7Ω", "Ohm", 4700], ["4.7 kΩ", "Ohm", 4700], ["4.7 k\u2126", "Ohm", 4700],
    ["10 kohm", "Ohm", 1e4], ["100 ohms", "Ohm", 100], ["1K", "Ohm", 1e3], ["2M2", "Ohm", 2.2e6], ["p47", "F", 0.47e-12], ["1m5", "s", 1.5e-3],
    ["500 m", "s", 0.5], ["20 mA", "A", 0.02], ["1e-9", "F", 1e-9], [".5", "V", 0.5], ["5.", "V", 5], ["0", "V", 0], ["47", "Ohm", 47], ["1 MHz", "Hz", 1e6], ["  10\u00a0kΩ ", "Ohm", 1e4],
  ])("%s as %s", (text, unit, expected) => expect(value(text, unit)).toBe(expected));

  it.each<[string, Unit]>([
    ["", "V"], ["  ", "V"], ["hello", "V"], ["k", "Ohm"], ["4k7k", "Ohm"], ["1.5.2", "V"], ["1,5,2", "V"], ["10 nF", "Ohm"], ["4k7", "F"], ["1e999", "V"], ["NaN", "V"],
    ["Infinity", "V"], ["0x10", "V"], ["10,000", "Ohm"], ["104", "F"], ["2.5 MS", "s"], ["5 mm", "Ohm"], ["--5", "V"], ["5 V 5", "V"], ["9".repeat(80), "V"], ["<b>5</b>", "V"],
  ])("refuses %j as %s with a sentence", (text, unit) => expect(value(text, unit)).toMatch(/^\S.{10,}[.]$/s));

  it("never throws and never gives a number that is not finite (seeded)", () => {
    fc.assert(fc.property(fc.oneof(fc.string(), fc.stringMatching(/^[-+.,0-9eEkMRnuµpm ΩVF±%–]{0,20}$/)), (text) => {
      for (const unit of ["V", "Ohm", "F", "s", "A"] as const) {
        const one = parseQuantity(text, unit);
        if (one.ok) expect(Number.isFinite(one.value)).toBe(true);
        const wide = parseSpread(text, unit);
        if (wide.ok) expect(() => toRange(wide.value)).not.toThrow();
      }
    }), { seed: 5, numRuns: 2000 });
  });
});

describe("parseSpread", () => {
  it.each<[string, Unit, Spread]>([
    ["47k", "Ohm", 47e3], ["20k–50k", "Ohm", { min: 20e3, max: 50e3 }], ["20k..50k", "Ohm", { min: 20e3, max: 50e3 }], ["20k-50k", "Ohm", { min: 20e3, max: 50e3 }],
    ["20–50 kΩ", "Ohm", { min: 20e3, max: 50e3 }], ["100-1k", "Ohm", { min: 100, max: 1e3 }], ["10k ±5%", "Ohm", { nominal: 1e4, tol: 0.05 }], ["10k +/-5%", "Ohm", { nominal: 1e4, tol: 0.05 }],
    ["10k±2,5 %", "Ohm", { nominal: 1e4, tol: 0.025 }], ["9 to 12 V", "V", { min: 9, max: 12 }], ["-0.5 - 5.5 V", "V", { min: -0.5, max: 5.5 }], ["−0.5–5.5 V", "V", { min: -0.5, max: 5.5 }],
    ["-12--10 V", "V", { min: -12, max: -10 }], ["-5 V", "V", -5], ["9V ±0.5V", "V", { min: 8.5, max: 9.5 }], ["1e-3-2e-3", "s", { min: 1e-3, max: 2e-3 }], ["1–10 µF", "F", { min: 1e-6, max: 1e-5 }],
    ["−0.5 to 5.5 V", "V", { min: -0.5, max: 5.5 }], ["4k7–5k6", "Ohm", { min: 4700, max: 5600 }],
  ])("%s as %s", (text, unit, expected) => expect(spread(text, unit)).toEqual(expected));
  it.each<[string, Unit]>([["5..", "V"], ["..5", "V"], ["50k-20k", "Ohm"], ["10k ±100%", "Ohm"], ["10k ±-5%", "Ohm"], ["±5%", "V"], ["a–b", "V"]])(
    "refuses %s as %s", (text, unit) => expect(typeof spread(text, unit)).toBe("string"));
});

describe("printing", () => {
  it.each<[number, Unit, string]>([
    [4700, "Ohm", "4.7 kΩ"], [1e-7, "F", "100 nF"], [0.6, "V", "0.6 V"], [-0.5, "V", "−0.5 V"], [6.4e-4, "A", "0.64 mA"], [2.6249e-3, "s", "2.62 ms"],
    [999.6, "Ohm", "1 kΩ"], [0, "V", "0 V"], [12345, "Ohm", "12.3 kΩ"], [NaN, "V", "—"],
  ])("%d %s", (number, unit, text) => expect(formatQuantity(number, unit)).toBe(text));
  it("ranges and tolerances", () => {
    expect(formatRange({ min: 4.2, max: 4.8 }, "V")).toBe("4.2–4.8 V");
    expect(formatRange({ min: -0.5, max: 5.5 }, "V")).toBe("−0.5 to 5.5 V");
    expect(formatRange({ min: 5, max: 5.0001 }, "V")).toBe("5 V");
    expect(formatSpread({ nominal: 1e4, tol: 0.05 }, "Ohm")).toBe("10 kΩ ±5 %");
    expect(formatSpread({ min: 20e3, max: 50e3 }, "Ohm")).toBe("20–50 kΩ");
  });
  it("never prints more than three significant figures (seeded)", () => {
    fc.assert(fc.property(fc.double({ min: 1e-12, max: 1e9, noNaN: true }), fc.constantFrom<Unit[]>("V", "Ohm", "F", "s", "A"), (number, unit) => {
      const digits = formatQuantity(number, unit).replace(/e.*/, "").replace(/[^\d.]/g, "").replace(/^0?\.?0*/, "").replace(".", "").replace(/0+$/, "");
      expect(digits.length).toBeLessThanOrEqual(3);
    }), { seed: 6, numRuns: 1000 });
  });
  it("the exact text reads back to the very same numbers (seeded)", () => {
    const number = fc.oneof(fc.double({ min: 1e-12, max: 1e9, noNaN: true }), fc.integer({ min: 1, max: 10 ** 7 }), fc.constantFrom(0, 0.1 + 0.2, 1e-300, 1e20));
    const any = fc.oneof<fc.Arbitrary<Spread>[]>(
      number, number.map((n) => -n || 0), fc.tuple(number, number).map(([a, b]) => ({ min: Math.min(a, b), max: Math.max(a, b) })),
      fc.record({ nominal: number, tol: fc.oneof(fc.double({ min: 0, max: 0.99, noNaN: true }), fc.constantFrom(0.05, 0.1, 0.07)) }),
    );
    fc.assert(fc.property(any, fc.constantFrom<Unit[]>("V", "Ohm", "F", "s", "A", "W", "Hz"), (original, unit) => {
      expect(spread(exactSpreadText(original, unit), unit)).toEqual(original);
    }), { seed: 7, numRuns: 3000 });
  });
});

describe("preferred numbers (IEC 60063:2015)", () => {
  it("E24 is the traditional list, eight values off round(10·10^(i/24))", () => {
    const rounded = E_SERIES.E24.map((_, i) => Math.round(10 * 10 ** (i / 24)));
    expect(E_SERIES.E24.filter((v, i) => v !== rounded[i])).toEqual([27, 30, 33, 36, 39, 43, 47, 82]);
  });
  it("E6 ⊂ E12 ⊂ E24, E48 ⊂ E96, E24 ⊄ E96", () => {
    expect(E_SERIES.E6.every((v) => E_SERIES.E12.includes(v))).toBe(true);
    expect(E_SERIES.E12.every((v) => E_SERIES.E24.includes(v))).toBe(true);
    expect(E_SERIES.E48.every((v) => E_SERIES.E96.includes(v))).toBe(true);
    expect(E_SERIES.E24.every((v) => E_SERIES.E96.includes(v * 10))).toBe(false);
    expect([E_SERIES.E3, E_SERIES.E6, E_SERIES.E12, E_SERIES.E24, E_SERIES.E48, E_SERIES.E96].map((s) => s.length)).toEqual([3, 6, 12, 24, 48, 96]);
  });
  it("R for 2 ms with 47 nF: 42.6 kΩ, nearest 39 kΩ in E12 (1.83 ms) and 43 kΩ in E24 (2.02 ms) (τ = RC)", () => {
    const ohm = 2e-3 / 47e-9;
    expect(formatQuantity(ohm, "Ohm")).toBe("42.6 kΩ");
    expect(nearestPreferred(ohm, "E12")).toBe(39e3);
    expect(nearestPreferred(ohm, "E24")).toBe(43e3);
    expect(formatQuantity(39e3 * 47e-9, "s")).toBe("1.83 ms");
    expect(formatQuantity(43e3 * 47e-9, "s")).toBe("2.02 ms");
  });
  it("next up and down, across decades", () => {
    expect(preferredAbove(83, "E12")).toBe(100);
    expect(preferredBelow(99, "E12")).toBe(82);
    expect(preferredAbove(82, "E12")).toBe(82);
    expect(preferredBelow(1.01e-9, "E24")).toBe(1e-9);
    expect(preferredBetween("E12", 100, 1000)).toHaveLength(13);
    expect(preferredAbove(9.77e5, "E96")).toBe(1e6);
  });
  it("works at any size of value (seeded)", () => {
    fc.assert(fc.property(fc.double({ min: -12, max: 12, noNaN: true }), fc.constantFrom("E3", "E6", "E12", "E24", "E48", "E96"), (exponent, series) => {
      const wanted = 10 ** exponent;
      const [below, above] = [preferredBelow(wanted, series), preferredAbove(wanted, series)];
      expect(below).toBeLessThanOrEqual(wanted);
      expect(above).toBeGreaterThanOrEqual(wanted);
      expect(above / below).toBeLessThan(2.3);
    }), { seed: 8, numRuns: 1000 });
  });
  it("refuses what has no neighbour", () => {
    for (const bad of [0, -1, NaN, Infinity]) expect(() => nearestPreferred(bad, "E12")).toThrow(RangeError);
  });
});
