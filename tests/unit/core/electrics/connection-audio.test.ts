import { describe, expect, it } from "vitest";
import { checkConnection } from "@/lib/core/electrics/check-connection";
import { dbuOfPeak, peakOfDbu } from "@/lib/core/electrics/judge/judge-audio";
import type { Input, Output } from "@/lib/core/electrics/jacks";

describe("dBu (0 dBu = √0.6 V rms; table at Sowter)", () => {
  it.each([
    ["0 dBu", Math.sqrt(0.6) * Math.SQRT2, 0],
    ["+4 dBu is 1.2277 V rms", 1.2277 * Math.SQRT2, 4],
    ["−10 dBV is −7.7815 dBu", 0.316228 * Math.SQRT2, -7.7815],
    ["10 V peak is 19.2 dBu", 10, 19.2],
  ])("%s", (_name, peak, dbu) => expect(dbuOfPeak(peak)).toBeCloseTo(dbu, 1 + Number(dbu !== 19.2)));
  it("and back", () => expect(dbuOfPeak(peakOfDbu(-13.7))).toBeCloseTo(-13.7, 12));
  it("1 kΩ into 10 kΩ costs 0.828 dB (arithmetic)", () => {
    const { listeners } = checkConnection({ outputs: [{ ...sound, sourceOhm: 1e3 }], inputs: [{ ...desk, loadOhm: 10e3 }] });
    expect(dbuOfPeak(listeners[0]!.highV!.max) - dbuOfPeak(5)).toBeCloseTo(-0.828, 3);
  });
});

const sound: Output = { signal: "audio", restV: 0, activeV: 5, sourceOhm: 600 };
const desk: Input = { id: "ch", accepts: ["audio"], safeV: { min: -20, max: 20 }, loadOhm: 20e3, maxDbu: 20 };
const verdicts = (output: Partial<Output>, input: Partial<Input>) =>
  checkConnection({ outputs: [{ ...sound, ...output }], inputs: [{ ...desk, ...input }] }, { fixes: false }).listeners[0]!.reasons.map((r) => r.verdict);

describe("audio leads", () => {
  it("good where level, load and phantom suit", () => expect(verdicts({}, {})).toEqual(["good"]));
  it("hot above what the channel takes", () => {
    expect(verdicts({ activeV: 10 }, { maxDbu: 18 })).toEqual(["hot"]);
    expect(verdicts({ activeV: 10 }, { maxDbu: 19.3 })).toEqual(["good"]);
  });
  it("tight where the load is under ten times the source", () => {
    expect(verdicts({ sourceOhm: 2001 }, {})).toEqual(["tight"]);
    expect(verdicts({ sourceOhm: 2000 }, {})).toEqual(["good"]);
  });
  it("never good with phantom power on", () => expect(verdicts({}, { phantom: true })).toEqual(["tight"]));
  it("a sine swings below its offset as far as above", () => expect(verdicts({ activeV: 10 }, { safeV: { min: -5, max: 20 } })).toEqual(["hot"]));
  it("unproven where the desk's limits are not known", () => expect(verdicts({}, { safeV: undefined })).toEqual(["unproven"]));
  it("an attenuator is offered where the level is too high, and has been checked", () => {
    const { listeners } = checkConnection({ outputs: [{ ...sound, activeV: 10 }], inputs: [{ ...desk, maxDbu: 4 }] });
    const fix = listeners[0]!.fixes.find((f) => f.kind === "divider")!;
    expect(["good", "tight"]).toContain(fix.verdict);
    expect(dbuOfPeak(fix.highV.max)).toBeLessThan(4);
  });
});
