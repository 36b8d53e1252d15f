import { describe, expect, it } from "vitest";
import { checkConnection } from "@/lib/core/electrics/check-connection";
import type { Input, Output, Verdict } from "@/lib/core/electrics/jacks";
import { VERDICTS } from "@/lib/core/electrics/jacks";

const trigger: Output = { signal: "trigger", restV: 0, activeV: 5, sourceOhm: 1000, pulseS: { min: 2e-3, max: 3e-3 } };
const voice: Input = {
  id: "v", accepts: ["trigger", "gate"], onV: { min: 1, max: 2 }, safeV: { min: -12, max: 12 }, loadOhm: 100e3, pulseS: { min: 1e-3, max: 10e-3 },
};

function verdictsOf(output: Partial<Output>, input: Partial<Input>, base: { output: Output; input: Input } = { output: trigger, input: voice }) {
  const check = checkConnection({ outputs: [{ ...base.output, ...output }], inputs: [{ ...base.input, ...input }] }, { fixes: false });
  const listener = check.listeners[0]!;
  expect(check.verdict).toBe(listener.verdict);
  expect(listener.reasons[0]!.verdict).toBe(listener.verdict);
  return listener.reasons.map((reason) => reason.verdict);
}

/** The base pair upside down: 12 V at rest, pulled to 0 V, fires below. */
const falling = {
  output: { ...trigger, polarity: "falling", restV: 5, activeV: 0 } satisfies Output,
  input: { ...voice, polarity: "falling", onV: { min: 2, max: 3 }, loadOhm: null } satisfies Input,
};

type Row = [name: string, output: Partial<Output>, input: Partial<Input>, expected: Verdict[]];

describe("the verdict table, rising", () => {
  const rows: Row[] = [
    ["the base pair", {}, {}, ["good"]],
    ["hot: just above the highest it stands", { sourceOhm: 0, activeV: 12.001 }, {}, ["hot"]],
    ["exactly at the highest it stands is not above it, but tight", { sourceOhm: 0, activeV: 12 }, {}, ["tight"]],
    ["hot: at rest below the lowest it stands", { sourceOhm: 0, restV: -12.1 }, {}, ["hot"]],
    ["hot counts the worst of a spread", { sourceOhm: 0, activeV: { nominal: 11.5, tol: 0.05 } }, {}, ["hot"]],
    ["overload: more asked than the least it gives", { limitA: { min: 40e-6, max: 1e-3 } }, {}, ["overload"]],
    ["no overload at the limit itself", { sourceOhm: 0, limitA: 50e-6 }, {}, ["good"]],
    ["reversed", { polarity: "falling" }, {}, ["reversed"]],
    ["wrong kind", { signal: "control" }, {}, ["wrong-kind"]],
    ["stuck: at rest at the least level at which it may let go", { sourceOhm: 0, restV: 1 }, {}, ["stuck"]],
    ["stuck by its own offV", { sourceOhm: 0, restV: 0.7 }, { offV: { min: 0.6, max: 0.9 } }, ["stuck"]],
    ["dead: never as far as the least that may fire", { sourceOhm: 0, activeV: 0.9 }, {}, ["dead"]],
    ["weak: not surely as far as what surely fires", { sourceOhm: 0, activeV: { min: 1.9, max: 5 } }, {}, ["weak"]],
    ["exactly what surely fires is tight, not weak", { sourceOhm: 0, activeV: 2 }, {}, ["tight"]],
    ["brief", { pulseS: { min: 0.9e-3, max: 3e-3 } }, {}, ["brief"]],
    ["long", { pulseS: { min: 2e-3, max: 11e-3 } }, {}, ["long"]],
    ["brief and long at once, brief first", { pulseS: { min: 0.5e-3, max: 20e-3 } }, {}, ["brief", "long"]],
    ["unproven: what the input stands is not known", {}, { safeV: undefined }, ["unproven"]],
    ["unproven: where it fires is not known, and it takes triggers", {}, { onV: undefined }, ["unproven"]],
    ["unproven: the pulse is not known and the input states limits", { pulseS: undefined }, {}, ["unproven"]],
    ["an unknown pulse is no matter where the input states none", { pulseS: undefined }, { pulseS: undefined }, ["good"]],
    ["where it fires is no matter where it takes neither triggers nor gates", { signal: "control" }, { accepts: ["control"], onV: undefined }, ["good"]],
    ["tight: 0.2 V is the least margin to a low threshold", { sourceOhm: 0, activeV: 1.69 }, { onV: { min: 1, max: 1.5 } }, ["tight"]],
    ["0.2 V itself is margin enough", { sourceOhm: 0, activeV: 1.7 }, { onV: { min: 1, max: 1.5 } }, ["good"]],
    ["tight: a tenth of a high threshold", { sourceOhm: 0, activeV: 6.5 }, { onV: { min: 5, max: 6 } }, ["tight"]],
    ["tight: rest within 0.2 V of letting go", { sourceOhm: 0, restV: 0.85 }, {}, ["tight"]],
    ["tight: within 3 % of the safe range from its top", { sourceOhm: 0, activeV: 11.3 }, {}, ["tight"]],
    ["just outside 3 % of the safe range", { sourceOhm: 0, activeV: 11.27 }, {}, ["good"]],
    ["tight: within 3 % of the safe range from its bottom", { sourceOhm: 0, restV: -11.3 }, {}, ["tight"]],
    ["tight: pulse under 1.2 × the least", { pulseS: { min: 1.19e-3, max: 3e-3 } }, {}, ["tight"]],
    ["1.2 × the least is enough", { pulseS: { min: 1.2e-3, max: 3e-3 } }, {}, ["good"]],
    ["tight: pulse over the most ÷ 1.2", { pulseS: { min: 2e-3, max: 8.4e-3 } }, {}, ["tight"]],
    ["the most ÷ 1.2 itself is short enough", { pulseS: { min: 2e-3, max: 10e-3 / 1.2 } }, {}, ["good"]],
    ["pulse limits hold for a gate too", { signal: "gate", pulseS: 0.1 }, {}, ["long"]],
    ["several reasons, the table's order", { polarity: "falling", signal: "control", sourceOhm: 0, activeV: 13, restV: 1.5, pulseS: 0.5e-3, limitA: 1e-6 }, {}, ["hot", "overload", "reversed", "wrong-kind", "stuck", "brief"]],
  ];
  it.each(rows)("%s", (_name, output, input, expected) => {
    expect(verdictsOf(output, input)).toEqual(expected);
  });
});

describe("the verdict table, falling (mirrored)", () => {
  const rows: Row[] = [
    ["the base pair", {}, {}, ["good"]],
    ["reversed", { polarity: "rising" }, {}, ["reversed"]],
    ["absent polarity is rising, and so reversed", { polarity: undefined }, {}, ["reversed"]],
    ["stuck: rest can be as low as the highest at which it lets go", { restV: { min: 3, max: 5 } }, {}, ["stuck"]],
    ["stuck by its own offV", { restV: { min: 3.9, max: 5 } }, { offV: { min: 3.5, max: 4 } }, ["stuck"]],
    ["tight: rest within a tenth of that", { restV: { min: 3.29, max: 5 } }, {}, ["tight"]],
    ["a tenth above is margin enough", { restV: { min: 3.3, max: 5 } }, {}, ["good"]],
    ["dead: never down to what may fire", { activeV: 3.1 }, {}, ["dead"]],
    ["weak: not surely down to what surely fires", { activeV: { min: 0, max: 2.1 } }, {}, ["weak"]],
    ["exactly what surely fires is tight", { activeV: 2 }, {}, ["tight"]],
    ["tight: within 0.2 V", { activeV: 1.81 }, {}, ["tight"]],
    ["0.2 V is margin enough", { activeV: 1.8 }, {}, ["good"]],
    ["hot is not mirrored: above what it stands at rest", { restV: 12.1 }, {}, ["hot"]],
    ["hot is not mirrored: below what it stands when struck", { activeV: -12.1 }, {}, ["hot"]],
  ];
  it.each(rows)("%s", (_name, output, input, expected) => {
    expect(verdictsOf(output, input, falling)).toEqual(expected);
  });
  it("highV stays the level while active and lowV the level at rest", () => {
    const listener = checkConnection({ outputs: [falling.output], inputs: [falling.input] }).listeners[0]!;
    expect(listener.highV).toEqual({ min: 0, max: 0 });
    expect(listener.lowV).toEqual({ min: 5, max: 5 });
  });
});

describe("clamps (TI SCHS097F: 10 mA into any CMOS input)", () => {
  const clamp = { lowV: -0.6, highV: 5.6, seriesOhm: 10e3, maxA: 10e-3 };
  const gate: Output = { signal: "gate", restV: 0, activeV: 12, sourceOhm: 0 };
  const cmos: Input = { id: "c", accepts: ["gate"], onV: { min: 1.5, max: 3.5 }, safeV: { min: -0.5, max: 5.5 }, loadOhm: null, clamp };
  it("12 V gate, 10 kΩ, diode of 0.6 V on 5 V: 0.64 mA, and tight (arithmetic)", () => {
    const { listeners, source } = checkConnection({ outputs: [gate], inputs: [cmos] });
    expect(listeners[0]!.clampA).toBeCloseTo(0.64e-3, 12);
    expect(source.currentA!.max).toBeCloseTo(0.64e-3, 12);
    expect(listeners[0]!.verdict).toBe("tight");
  });
  it("the same resistance in the output instead of behind the jack", () => {
    const { listeners } = checkConnection({ outputs: [{ ...gate, sourceOhm: 10e3 }], inputs: [{ ...cmos, clamp: { ...clamp, seriesOhm: 1e-3 } }] });
    expect(listeners[0]!.clampA).toBeCloseTo(0.64e-3, 8);
    expect(listeners[0]!.highV!.max).toBeCloseTo(5.6, 5);
  });
  it("10 mA is reached at 640 Ω: tight there, hot just below (arithmetic)", () => {
    const at = (seriesOhm: number) => checkConnection({ outputs: [gate], inputs: [{ ...cmos, clamp: { ...clamp, seriesOhm } }] }, { fixes: false }).listeners[0]!;
    expect(at(640).clampA).toBeCloseTo(10e-3, 12);
    expect(at(640).verdict).toBe("tight");
    expect(at(639).verdict).toBe("hot");
  });
  it("40 V through 100 kΩ onto the 5 V rail's diode: over the voltage, far under the current (ngspice 39 gives 0.34 mA)", () => {
    const { listeners } = checkConnection({ outputs: [{ ...gate, activeV: 40, sourceOhm: 100e3 }], inputs: [{ ...cmos, clamp: { ...clamp, highV: 5.535, seriesOhm: 0 } }] });
    expect(listeners[0]!.clampA).toBeCloseTo(0.34e-3, 5);
    expect(listeners[0]!.verdict).toBe("tight");
  });
  it("is judged hot even where safeV is absent, and unproven without it otherwise", () => {
    expect(verdictsOf({}, { safeV: undefined }, { output: { ...gate, activeV: 200 }, input: cmos })[0]).toBe("hot");
    expect(verdictsOf({}, { safeV: undefined }, { output: gate, input: cmos })[0]).toBe("unproven");
  });
  it("the lower diode counts too", () => {
    const { listeners } = checkConnection({ outputs: [{ ...gate, restV: -12, activeV: 5 }], inputs: [{ ...cmos, clamp: { ...clamp, seriesOhm: 1e3 } }] }, { fixes: false });
    expect(listeners[0]!.clampA).toBeCloseTo(11.4e-3, 12);
    expect(listeners[0]!.verdict).toBe("hot");
  });
  it("a conducting clamp lowers the level for every listener of the mult", () => {
    const plain: Input = { id: "p", accepts: ["gate"], onV: { min: 4, max: 6 }, safeV: { min: -12, max: 15 }, loadOhm: null };
    const together = checkConnection({ outputs: [{ ...gate, sourceOhm: 1e3 }], inputs: [plain, { ...cmos, clamp: { ...clamp, seriesOhm: 1e3 } }] });
    expect(together.listeners[0]!.highV!.max).toBeCloseTo((12 + 5.6) / 2, 9);
    expect(together.listeners[0]!.clampA).toBeUndefined();
    expect(together.listeners[1]!.clampA).toBeCloseTo(3.2e-3, 12);
  });
});

describe("several outputs", () => {
  const gate: Output = { signal: "gate", restV: 0, activeV: 10, sourceOhm: 1e3 };
  const input: Input = { id: "i", accepts: ["gate"], onV: { min: 1, max: 2 }, safeV: { min: -1, max: 12 }, loadOhm: 100e3 };
  const verdict = (outputs: Output[], change: Partial<Input> = {}) => checkConnection({ outputs, inputs: [{ ...input, ...change }] }, { fixes: false });
  it("two driving outputs clash", () => expect(verdict([gate, gate]).verdict).toBe("clash"));
  it("one of two through a diode still clashes with the other", () => expect(verdict([gate, { ...gate, or: true }]).verdict).toBe("clash"));
  it("two through diodes do not", () => expect(verdict([{ ...gate, or: true }, { ...gate, or: true }]).verdict).toBe("good"));
  it("a sensor beside an output does not drive and does not clash", () => {
    const check = verdict([gate, { signal: "sensor", restV: 9, activeV: 9, sourceOhm: 0 }], { accepts: ["gate", "sensor"] });
    expect(check.verdict).toBe("good");
    expect(check.listeners[0]!.highV!.max).toBeCloseTo((10 * 100) / 101, 9);
  });
  it("hot takes each output in its own worst state: one at rest high above, the other active", () => {
    const odd: Output = { ...gate, restV: 14, activeV: 0 };
    const { listeners } = verdict([gate, odd], { safeV: { min: -1, max: 11 }, loadOhm: null });
    expect(listeners[0]!.highV!.max).toBeCloseTo(5, 9);
    expect(listeners[0]!.lowV!.max).toBeCloseTo(7, 9);
    expect(listeners[0]!.reasons[0]).toMatchObject({ verdict: "hot", unit: "V" });
    expect(listeners[0]!.reasons[0]!.measured).toBeCloseTo(12, 9);
  });
  it("in a diode OR the weaker output must fire it alone", () => {
    const weaker: Output = { ...gate, activeV: 1.5, or: true };
    const { listeners } = verdict([{ ...gate, or: true }, weaker]);
    expect(listeners[0]!.reasons.map((r) => r.verdict)).toEqual(["weak"]);
  });
});

describe("envelopes", () => {
  // 8 V envelope, 100 kΩ·1 µF (0.1 s), down to 1 V: 0.20794 s (arithmetic, as in the sources).
  const envelope: Output = { signal: "envelope", restV: 0, activeV: 8, sourceOhm: 0, decayS: 0.1 };
  const input: Input = { id: "e", accepts: ["envelope"], onV: 1, safeV: { min: -12, max: 12 }, loadOhm: null };
  const check = (output: Partial<Output>, change: Partial<Input>) => checkConnection({ outputs: [{ ...envelope, ...output }], inputs: [{ ...input, ...change }] }).listeners[0]!;
  it("8 V falling with 0.1 s stays above 1 V for 0.20794 s", () => {
    expect(check({}, { pulseS: { min: 0.01 } }).pulseS!.min).toBeCloseTo(0.1 * Math.log(8), 12);
    expect(check({}, { pulseS: { min: 0.01 } }).pulseS!.min).toBeCloseTo(0.20794, 5);
  });
  it("a load takes its share before the threshold is counted", () => {
    const half = check({ sourceOhm: 10e3 }, { loadOhm: 10e3, pulseS: { min: 0.01 } });
    expect(half.pulseS!.min).toBeCloseTo(0.1 * Math.log(4), 12);
  });
  it("worst cases over level, decay and threshold", () => {
    const wide = check({ activeV: { min: 6, max: 8 }, decayS: { nominal: 0.1, tol: 0.2 } }, { onV: { min: 1, max: 2 }, pulseS: { min: 0.01 } });
    expect(wide.pulseS!.min).toBeCloseTo(0.08 * Math.log(3), 12);
    expect(wide.pulseS!.max).toBeCloseTo(0.12 * Math.log(8), 12);
  });
  it("brief and long by that width", () => {
    expect(check({}, { pulseS: { min: 0.3 } }).verdict).toBe("brief");
    expect(check({}, { pulseS: { max: 0.1 } }).verdict).toBe("long");
  });
  it("rest above the threshold never ends: long, with no number that is not one", () => {
    const never = check({ restV: 2 }, { pulseS: { max: 0.1 } });
    expect(never.reasons.map((r) => r.verdict)).toEqual(["stuck", "long"]);
    expect(JSON.stringify(never)).not.toContain("null,\"limit\"");
    expect(never.pulseS).toBeUndefined();
  });
  it("decayS is checked as well as the width", () => {
    expect(check({}, { decayS: { min: 0.2 } }).verdict).toBe("brief");
    expect(check({ pulseS: 1 }, { pulseS: { min: 0.5 }, decayS: { min: 0.2 } }).verdict).toBe("brief");
    expect(check({}, { decayS: { min: 0.1 } }).verdict).toBe("good");
  });
  it("a stated pulse comes before the formula", () => expect(check({ pulseS: 1 }, { pulseS: { min: 0.5 } }).verdict).toBe("good"));
  it("names the figure the width needs", () => {
    expect(check({ decayS: undefined }, { pulseS: { min: 0.1 } }).reasons[0]).toMatchObject({ verdict: "unproven", figure: "outputs.0.decayS" });
    expect(check({}, { onV: undefined, pulseS: { min: 0.1 } }).reasons[0]).toMatchObject({ verdict: "unproven", figure: "input.onV" });
    expect(check({ decayS: undefined }, { decayS: { min: 0.1 } }).reasons[0]).toMatchObject({ verdict: "unproven", figure: "outputs.0.decayS" });
  });
  it("falls from below for a falling input", () => {
    const down = checkConnection({
      outputs: [{ ...envelope, polarity: "falling", restV: 8, activeV: 0 }],
      inputs: [{ ...input, polarity: "falling", onV: 7, pulseS: { min: 0.01 } }],
    }).listeners[0]!;
    expect(down.pulseS!.min).toBeCloseTo(0.1 * Math.log(8), 12);
  });
});

describe("levels by hand", () => {
  it("TTL into 4000B at 5 V: 2.7 V sure against 3.5 V wanted, weak by 0.8 V (LIEC vol. IV ch. 3; National CD4001BC)", () => {
    const ttl: Output = { signal: "gate", restV: { min: 0, max: 0.4 }, activeV: { min: 2.7, max: 5 }, sourceOhm: 0 };
    const cmos: Input = { id: "b", accepts: ["gate"], onV: { min: 1.5, max: 3.5 }, safeV: { min: -0.5, max: 5.5 }, loadOhm: null };
    const { listeners } = checkConnection({ outputs: [ttl], inputs: [cmos] });
    expect(listeners[0]!.reasons[0]).toMatchObject({ verdict: "weak", measured: 2.7, limit: 3.5 });
  });
  it("12 V op-amp into a 5 V CMOS pin: 11k/10k lets 5.71 V through, 15k/10k gives 4.2–4.8 V (arithmetic)", () => {
    const behind = (seriesOhm: number) => checkConnection({
      outputs: [{ signal: "gate", restV: 0, activeV: { min: 10.5, max: 12 }, sourceOhm: seriesOhm }],
      inputs: [{ id: "pin", accepts: ["gate"], onV: { min: 1.5, max: 3.5 }, safeV: { min: -0.5, max: 5.5 }, loadOhm: 10e3 }],
    }, { fixes: false }).listeners[0]!;
    expect(behind(11e3).highV!.max).toBeCloseTo(5.714, 3);
    expect(behind(11e3).verdict).toBe("hot");
    expect(behind(15e3).highV!.min).toBeCloseTo(4.2, 12);
    expect(behind(15e3).highV!.max).toBeCloseTo(4.8, 12);
    expect(behind(15e3).verdict).toBe("good");
  });
  it("a 9 V pulse over 2.2 kΩ and 4.7 kΩ with 100 kΩ behind: divider law (LIEC vol. I ch. 6)", () => {
    const { listeners } = checkConnection({
      outputs: [{ signal: "trigger", restV: 0, activeV: (7.5 * 4.7) / 6.9, sourceOhm: (2200 * 4700) / 6900 }],
      inputs: [{ id: "i", accepts: ["trigger"], onV: 1, safeV: { min: -12, max: 12 }, loadOhm: 100e3 }],
    });
    const loaded = 1 / (1 / 4700 + 1 / 100e3);
    expect(listeners[0]!.highV!.max).toBeCloseTo((7.5 * loaded) / (2200 + loaded), 9);
  });
  it("a pull-up bias lifts the level at rest", () => {
    const { listeners } = checkConnection({
      outputs: [{ signal: "gate", restV: 0, activeV: 5, sourceOhm: 10e3 }],
      inputs: [{ id: "i", accepts: ["gate"], onV: 3, safeV: { min: -1, max: 6 }, loadOhm: 10e3, biasV: 5 }],
    });
    expect(listeners[0]!.lowV).toEqual({ min: 2.5, max: 2.5 });
    expect(listeners[0]!.highV).toEqual({ min: 5, max: 5 });
  });
});

describe("the whole", () => {
  it("takes the worst of its listeners", () => {
    const { verdict, listeners } = checkConnection({ outputs: [trigger], inputs: [voice, { ...voice, id: "w", onV: 6 }, { ...voice, id: "x", onV: 4.6 }] });
    expect(listeners.map((l) => l.verdict)).toEqual(["good", "dead", "tight"]);
    expect(verdict).toBe("dead");
  });
  it("answers for an output with blanks, naming each", () => {
    const { listeners, source } = checkConnection({ outputs: [{ signal: "trigger" }], inputs: [voice] });
    expect(listeners[0]!.reasons.map((r) => r.figure)).toEqual(["outputs.0.restV", "outputs.0.activeV", "outputs.0.sourceOhm", "outputs.0.pulseS"]);
    expect(listeners[0]!.highV).toBeNull();
    expect(source.currentA).toBeNull();
  });
  it("still sees danger in the state it knows", () => {
    const { verdict } = checkConnection({ outputs: [{ signal: "trigger", activeV: 20, sourceOhm: 0, restV: 0 }], inputs: [voice] });
    expect(verdict).toBe("hot");
  });
  it("every verdict of the list has a place in the table's order", () => {
    expect(new Set(VERDICTS).size).toBe(13);
  });
});
