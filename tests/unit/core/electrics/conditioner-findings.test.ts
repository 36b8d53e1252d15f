import { describe, expect, it } from "vitest";
import { simulateConditioner, type ConditionerResult, type ConditionerSpec, type FindingCode } from "@/lib/core/electrics";

const example: ConditionerSpec = {
  supply: { highV: 9, lowV: 0 }, pad: { kind: "resistive", restOhm: 47e3, hitOhm: 9100, leg: "upper" }, strike: { riseS: 1e-3, holdS: 5e-3, fallS: 30e-3 },
  divider: { ohm: 22e3 }, coupling: { farad: 1e-7, ohm: 22e3 }, threshold: { topOhm: 100e3, potOhm: 10e3, bottomOhm: 1e3, turn: 0.5 },
  comparator: { highDropV: 1.5, lowDropV: 0.02, limitA: 0.02 }, output: { seriesOhm: 2200, shuntOhm: 4700 }, envelope: null, load: { ohm: 100e3 },
};
const run = (change: Partial<ConditionerSpec> = {}) => simulateConditioner({ ...example, ...change });
const find = (result: ConditionerResult, code: FindingCode) => result.findings.find((finding) => finding.code === code);
const codes = (result: ConditionerResult) => result.findings.map(({ code }) => code);
/** A finding's fix is the request's own fields: put them in and ask again. */
function mended(change: Partial<ConditionerSpec>, code: FindingCode): ConditionerResult {
  const spec = { ...example, ...change };
  const fix = find(simulateConditioner(spec), code)?.fix as (Partial<ConditionerSpec> & { text: string }) | undefined;
  if (!fix) throw new Error(`no fix for ${code}`);
  return simulateConditioner({
    ...spec,
    coupling: { ...spec.coupling, ...fix.coupling }, threshold: { ...spec.threshold, ...fix.threshold }, divider: { ...spec.divider, ...fix.divider },
    envelope: spec.envelope && { ...spec.envelope, ...fix.envelope },
  });
}

describe("a circuit in order", () => {
  it("has nothing against it, and says when the battery and the next hit end it", () => {
    expect(codes(run())).toEqual(expect.arrayContaining(["battery", "re-strike"]));
    for (const code of ["decade-slip", "slow-hit", "threshold-out-of-reach", "divider-off", "double-trigger", "rests-high", "rests-negative"] as const) expect(find(run(), code)).toBeUndefined();
  });
});

describe("findings and their fixes", () => {
  it("decade-slip: 22 nF with 12 kΩ is 0.26 ms, 220 nF makes it 2.6 ms (electrics §3)", () => {
    const slip = { coupling: { farad: 22e-9, ohm: 12e3 }, strike: { riseS: 1e-4, holdS: 5e-3, fallS: 30e-3 } };
    const finding = find(run(slip), "decade-slip");
    expect(finding?.text).toMatch(/264 µs|0\.264 ms/);
    expect(finding?.fix?.text).toContain("2.64 ms");
    const after = mended(slip, "decade-slip");
    expect(after.ruleOfThumbS).toBeCloseTo(2.64e-3, 9);
    expect(after.pulses).toHaveLength(1);
    expect(find(after, "decade-slip")).toBeUndefined();
  });

  it("slow-hit: a hit of 40 ms through 2.2 ms, and a capacitor that lets more through", () => {
    const slow = { strike: { riseS: 40e-3, holdS: 5e-3, fallS: 30e-3 }, threshold: { ...example.threshold, turn: 0 } };
    const finding = find(run(slow), "slow-hit");
    expect(finding?.text).toContain("40 ms");
    expect(mended(slow, "slow-hit").shaped.peakV).toBeGreaterThan(run(slow).shaped.peakV * 1.1);
  });

  it("threshold-out-of-reach: turned too high the pot's position is told, and out of all reach a top resistor", () => {
    const high = { threshold: { topOhm: 10e3, potOhm: 50e3, bottomOhm: 1e3, turn: 0.9 } };
    expect(run(high).fires).toBe(false);
    expect(mended(high, "threshold-out-of-reach").fires).toBe(true);
    const never = { threshold: { topOhm: 1e3, potOhm: 1e3, bottomOhm: 47e3, turn: 0 } };
    expect(find(run(never), "threshold-out-of-reach")?.text).toContain("nowhere on the pot's travel");
    expect(mended(never, "threshold-out-of-reach").fires).toBe(true);
  });

  it("rests-high: a threshold of 5 mV under an offset of 7 mV never fires; turned up it does", () => {
    const low = { threshold: { topOhm: 179_900, potOhm: 10e3, bottomOhm: 100, turn: 0 }, comparator: { ...example.comparator, offsetV: 0.007 } };
    expect(run(low).fires).toBe(false);
    expect(find(run(low), "rests-high")).toBeDefined();
    expect(mended(low, "rests-high").fires).toBe(true);
  });

  it("divider-off: √(47 kΩ × 9.1 kΩ) = 20.7 kΩ, and 2.2 kΩ loses swing (calculus, sources §2)", () => {
    const off = { divider: { ohm: 2200 } };
    expect(find(run(off), "divider-off")?.text).toContain("20.7 kΩ");
    expect(mended(off, "divider-off").shaped.peakV).toBeGreaterThan(run(off).shaped.peakV);
    expect(find(run(), "divider-off")).toBeUndefined();
  });

  it("double-trigger: a capture that bounces gives two pulses, and a higher threshold one", () => {
    const bouncing: Partial<ConditionerSpec> = {
      coupling: { farad: 1e-8, ohm: 22e3 },
      strike: { samples: [[0, 47e3], [5e-4, 9100], [1e-3, 40e3], [2e-3, 40e3], [3e-3, 20e3], [6e-3, 20e3], [36e-3, 47e3]] },
      threshold: { topOhm: 100e3, potOhm: 50e3, bottomOhm: 1e3, turn: 0.05 },
    };
    expect(run(bouncing).pulses).toHaveLength(2);
    expect(mended(bouncing, "double-trigger").pulses).toHaveLength(1);
  });

  it("rests-negative: on ±12 V the output rests below 0 V until a diode is put in", () => {
    const split = { supply: { highV: 12, lowV: -12 }, comparator: { highDropV: 1.5, lowDropV: 1.5, limitA: 0.01 } };
    const finding = find(run(split), "rests-negative");
    expect(run(split).trigger.restV).toBeLessThan(-5);
    expect(finding?.fix).toMatchObject({ seriesDiode: "1N4148" });
    expect(find(run(), "rests-negative")).toBeUndefined();
  });

  it("envelope-underfilled: 100 µF from 5 mA stays low, a smaller capacitor fills and falls as long", () => {
    const large = { envelope: { seriesOhm: 100, farad: 1e-4, ohm: 1e3, emitterOhm: 10e3 }, comparator: { ...example.comparator, limitA: 5e-3 } };
    const before = run(large);
    expect(find(before, "envelope-underfilled")?.text).toContain("5 mA");
    const after = mended(large, "envelope-underfilled");
    expect(after.fires).toBe(true);
    expect(after.envelope!.peakV).toBeGreaterThan(2 * before.envelope!.peakV);
    expect(find(after, "envelope-underfilled")).toBeUndefined();
  });

  it("noise-near-threshold: 30 mV beside 81 mV", () => {
    const noisy = { threshold: { ...example.threshold, turn: 0 }, comparator: { ...example.comparator, noiseV: 0.03 } };
    expect(find(run(noisy), "noise-near-threshold")?.text).toContain("30 mV");
    expect(find(mended(noisy, "noise-near-threshold"), "noise-near-threshold")).toBeUndefined();
    expect(mended(noisy, "noise-near-threshold").fires).toBe(true);
  });

  it("input-out-of-range: an LM358 at 9 V takes 0…7.5 V (TI SLOS068R: V_CC − 1.5 V)", () => {
    const commonMode = { lowV: -0.3, highV: 7.5 };
    expect(find(run({ comparator: { ...example.comparator, commonMode: { lowV: -1, highV: 7.5 } } }), "input-out-of-range")).toBeUndefined();
    const high = { threshold: { topOhm: 1e3, potOhm: 1e3, bottomOhm: 47e3, turn: 0 }, comparator: { ...example.comparator, commonMode } };
    expect(find(run(high), "input-out-of-range")?.text).toContain("7.5 V");
  });

  it("input-below-rail: a pad that lets go at once pulls the input to the clamp's drop, a split supply has room for it", () => {
    const quick = { strike: { riseS: 1e-4, holdS: 20e-3, fallS: 1e-5 } };
    expect(find(run(quick), "input-below-rail")?.fix).toMatchObject({ inputOhm: 10e3 });
    expect(find(run({ ...quick, supply: { highV: 9, lowV: -9 } }), "input-below-rail")).toBeUndefined();
  });

  it("re-strike: the time told is the least at which two hits are two pulses", () => {
    const text = find(run(), "re-strike")!.text;
    const gapS = Number(/from ([\d.]+) ms/.exec(text)![1]) / 1e3;
    // Two strikes on one pad, the firmer counts; from electrics §3's example by hand.
    const siemens = (t: number) => {
      const one = (u: number) => (u <= 0 || u >= 36e-3 ? 0 : u < 1e-3 ? u / 1e-3 : u < 6e-3 ? 1 : (36e-3 - u) / 30e-3);
      return 1 / 47e3 + (1 / 9100 - 1 / 47e3) * Math.max(one(t), one(t - at));
    };
    let at = 0;
    const pulsesAt = (gap: number) => {
      at = gap;
      return run({ strike: { samples: Array.from({ length: 2000 }, (_, i) => [i * 5e-5, 1 / siemens(i * 5e-5)] as const) } }).pulses.length;
    };
    expect(pulsesAt(gapS * 1.03)).toBe(2);
    expect(pulsesAt(gapS * 0.97)).toBe(1);
  });
});

describe("the rest of the answer", () => {
  it("weakestHitOhm is the edge: 1 % firmer fires, 1 % weaker does not", () => {
    const edge = run().weakestHitOhm!;
    const hit = (hitOhm: number) => run({ pad: { ...example.pad, hitOhm } }).fires;
    expect([hit(edge * 0.99), hit(edge * 1.01)]).toEqual([true, false]);
  });

  it("weakestHitOhm is null where no hit fires", () => {
    expect(run({ threshold: { topOhm: 0, potOhm: 0, bottomOhm: 1e3, turn: 0 } }).weakestHitOhm).toBeNull();
  });

  it("every corner range holds what single moves and random samples reach", () => {
    const { spread } = run();
    for (let i = 0; i < 60; i += 1) {
      const off = (k: number, tol: number) => 1 + tol * Math.cos(i * (k + 1) * 1.7);
      const other = run({
        divider: { ohm: 22e3 * off(0, 0.05) }, coupling: { farad: 1e-7 * off(1, 0.1), ohm: 22e3 * off(2, 0.05) },
        threshold: { topOhm: 100e3 * off(3, 0.05), potOhm: 10e3 * off(4, 0.05), bottomOhm: 1e3 * off(5, 0.05), turn: 0.5 }, output: { seriesOhm: 2200 * off(6, 0.05), shuntOhm: 4700 * off(7, 0.05) },
      });
      const within = (value: number, { min, max }: { min: number; max: number }) => expect(value >= min - 1e-9 - 1e-3 * Math.abs(min) && value <= max + 1e-9 + 1e-3 * Math.abs(max)).toBe(true);
      within(other.shaped.peakV, spread.shapedPeakV);
      within(other.trigger.activeV, spread.activeV);
      within(other.pulses[0]!.widthS, spread.pulseS!);
    }
  });

  it("the coupling capacitor's 10 % moves the pulse most", () => {
    expect(run().sensitivity[0]?.path).toBe("coupling.farad");
  });

  it("the same request has the same yield, and a marginal one has less than all", () => {
    const { weakestHitOhm } = run();
    const marginal = { pad: { ...example.pad, hitOhm: weakestHitOhm! * 0.999 } };
    expect(run().yield).toBe(1);
    expect(run(marginal).yield).toBe(run(marginal).yield);
    expect(run(marginal).yield).toBeGreaterThan(0.2);
    expect(run(marginal).yield).toBeLessThan(0.8);
  });

  it("the trace has one value a moment in each column, and time that does not fall", () => {
    const { trace } = run({ envelope: { seriesOhm: 100, farad: 1e-6, ohm: 100e3, emitterOhm: 10e3 } });
    for (const column of [trace.padV, trace.shapedV, trace.thresholdV, trace.outV, trace.envelopeV!]) expect(column).toHaveLength(trace.timeS.length);
    expect(trace.timeS.every((t, i) => i === 0 || t >= trace.timeS[i - 1]!)).toBe(true);
    expect(Math.max(...trace.outV)).toBeCloseTo(run().trigger.activeV, 3);
  });
});
