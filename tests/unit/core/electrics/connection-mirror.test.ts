import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { checkConnection } from "@/lib/core/electrics/check-connection";
import type { Input, Output, Verdict } from "@/lib/core/electrics/jacks";
import { toRange, type Range, type Spread } from "@/lib/core/units/spread";
import { oracle } from "./connection-oracle";

const pair = (min: number, max: number, step = 0.01): fc.Arbitrary<Range> => {
  const value = fc.integer({ min: Math.round(min / step), max: Math.round(max / step) }).map((n) => Number((n * step).toFixed(6)));
  return fc.oneof(value.map((v) => ({ min: v, max: v })), fc.tuple(value, value).map(([a, b]) => ({ min: Math.min(a, b), max: Math.max(a, b) })));
};
const optional = <T>(arbitrary: fc.Arbitrary<T>) => fc.option(arbitrary, { nil: undefined, freq: 4 });
const outputArb: fc.Arbitrary<Output> = fc.record({
  signal: fc.constantFrom("trigger" as const, "trigger" as const, "gate" as const, "envelope" as const, "control" as const),
  polarity: fc.constantFrom("rising" as const, "rising" as const, "falling" as const),
  restV: pair(-2, 2), activeV: pair(2, 9), sourceOhm: fc.constantFrom<Spread>(0, 100, { nominal: 1e3, tol: 0.1 }, 10e3),
  pulseS: optional(pair(0.5e-3, 12e-3, 1e-4)), decayS: optional(pair(0.01, 0.3)), limitA: optional(pair(0.1e-3, 5e-3, 1e-4)),
});
const inputArb: fc.Arbitrary<Input> = fc.record({
  accepts: fc.constantFrom<Input["accepts"][]>(["trigger", "gate"], ["trigger", "gate", "envelope", "control"], ["envelope"]),
  polarity: fc.constantFrom("rising" as const, "rising" as const, "falling" as const),
  onV: optional(pair(1.5, 4)), offV: optional(pair(0.5, 3)), safeV: optional(fc.constantFrom({ min: -0.5, max: 5.5 }, { min: -12, max: 12 }, { min: -3, max: 9 })),
  loadOhm: fc.constantFrom<Input["loadOhm"][]>(null, 100e3, { nominal: 10e3, tol: 0.2 }), biasV: fc.constantFrom<(Spread | undefined)[]>(undefined, undefined, 5, { min: 0, max: 1 }),
  pulseS: optional(fc.constantFrom<Input["pulseS"][]>({ min: 1e-3 }, { max: 10e-3 }, { min: 1e-3, max: 10e-3 })), decayS: optional(fc.constant({ min: 0.05 })),
  clamp: fc.option(fc.record({ lowV: fc.constant(-0.6), highV: fc.constantFrom<Spread[]>(5.6, { min: 5.3, max: 5.8 }), seriesOhm: fc.constantFrom<Spread[]>(100, { nominal: 1e3, tol: 0.2 }), maxA: fc.constantFrom(1e-3, 10e-3) }), { nil: undefined, freq: 2 }),
}).map((figures) => {
  const stated = Object.fromEntries(Object.entries(figures).filter(([, value]) => value !== undefined));
  return { id: "i", ...stated } as Input;
});

const flip = (spread: Spread): Range => {
  const { min, max } = toRange(spread);
  return { min: 0 - max, max: 0 - min };
};
const flipOutput = (o: Output): Output => ({ ...o, polarity: o.polarity === "falling" ? "rising" : "falling", restV: flip(o.restV), activeV: flip(o.activeV) });
const flipInput = (i: Input): Input => ({
  ...i, polarity: i.polarity === "falling" ? "rising" : "falling",
  ...(i.onV === undefined ? {} : { onV: flip(i.onV) }), ...(i.offV === undefined ? {} : { offV: flip(i.offV) }),
  ...(i.safeV ? { safeV: flip(i.safeV) } : {}), ...(i.biasV === undefined ? {} : { biasV: flip(i.biasV) }),
  ...(i.clamp ? { clamp: { ...i.clamp, lowV: flip(i.clamp.highV), highV: flip(i.clamp.lowV) } } : {}),
});

describe("upside down", () => {
  it("a falling connection is judged as the rising one it mirrors (seeded)", () => {
    fc.assert(fc.property(outputArb, inputArb, (output, input) => {
      const up = checkConnection({ outputs: [output], inputs: [input] }, { fixes: false }).listeners[0]!;
      const down = checkConnection({ outputs: [flipOutput(output)], inputs: [flipInput(input)] }, { fixes: false }).listeners[0]!;
      expect(down.reasons.map((r) => r.verdict).sort()).toEqual(up.reasons.map((r) => r.verdict).sort());
      expect(down.highV!.min).toBeCloseTo(-up.highV!.max, 9);
      expect(down.clampA ?? 0).toBeCloseTo(up.clampA ?? 0, 12);
    }), { seed: 41, numRuns: 2000 });
  });
});

/** The table once more, written straight down for a rising pair from levels found by enumeration; no envelope widths. */
function tableFor(output: Output, input: Input): Verdict {
  const { highV, lowV, anyV, currentA, clampA } = oracle([output], [input]);
  const r = (spread: Spread) => toRange(spread);
  const tiny = 1e-9;
  const on = input.onV === undefined ? null : r(input.onV);
  const off = input.offV === undefined ? on : r(input.offV);
  const pulse = output.pulseS === undefined ? null : r(output.pulseS);
  const { min, max } = input.pulseS ?? {};
  const asked = Math.max(Math.abs(currentA[0]!.min), Math.abs(currentA[0]!.max));
  if (input.clamp ? clampA[0]! > input.clamp.maxA + tiny : input.safeV && (anyV.max > input.safeV.max + tiny || anyV.min < input.safeV.min - tiny)) return "hot";
  if (output.limitA !== undefined && asked > r(output.limitA).min + tiny) return "overload";
  if (output.polarity !== input.polarity) return "reversed";
  if (!input.accepts.includes(output.signal)) return "wrong-kind";
  if (off && lowV.max >= off.min - tiny) return "stuck";
  if (on && highV.max < on.min - tiny) return "dead";
  if (on && highV.min < on.max - tiny) return "weak";
  if (pulse && min !== undefined && pulse.min < min - tiny) return "brief";
  if (output.signal === "envelope" && output.decayS !== undefined && input.decayS?.min !== undefined && r(output.decayS).min < input.decayS.min - tiny) return "brief";
  if (pulse && max !== undefined && pulse.max > max + tiny) return "long";
  const needsPulse = (min !== undefined || max !== undefined) && !pulse;
  const needsDecay = output.signal === "envelope" && input.decayS?.min !== undefined && output.decayS === undefined;
  if (!input.safeV || (!on && (input.accepts.includes("trigger") || input.accepts.includes("gate"))) || needsPulse || needsDecay) return "unproven";
  const margin = (threshold: number) => Math.max(0.1 * Math.abs(threshold), 0.2);
  const safe = 0.03 * (input.safeV.max - input.safeV.min);
  if ((on && highV.min - on.max < margin(on.max) - tiny) || (off && off.min - lowV.max < margin(off.min) - tiny)) return "tight";
  if (input.clamp ? clampA[0]! > tiny : anyV.max > input.safeV.max - safe + tiny || anyV.min < input.safeV.min + safe - tiny) return "tight";
  if (pulse && ((min !== undefined && pulse.min < 1.2 * min - tiny) || (max !== undefined && pulse.max > max / 1.2 + tiny))) return "tight";
  return "good";
}

describe("the table, written down a second time", () => {
  it("gives the same verdict for random rising pairs, every verdict among them (seeded)", () => {
    const seen = new Map<Verdict, number>();
    const rising = outputArb.filter((o) => (o.signal !== "envelope" || o.pulseS !== undefined) && o.sourceOhm !== 0);
    fc.assert(fc.property(rising, inputArb.map((i) => ({ ...i, polarity: "rising" as const })), (output, input) => {
      const expected = tableFor(output, input);
      seen.set(expected, (seen.get(expected) ?? 0) + 1);
      const listener = checkConnection({ outputs: [output], inputs: [input] }, { fixes: false }).listeners[0]!;
      expect(listener.verdict).toBe(expected);
    }), { seed: 42, numRuns: 3000 });
    console.log("verdicts met:", Object.fromEntries(seen));
    expect([...seen.keys()].sort()).toEqual(["brief", "dead", "good", "hot", "long", "overload", "reversed", "stuck", "tight", "unproven", "weak", "wrong-kind"]);
  });
});
