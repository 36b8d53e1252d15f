import { describe, expect, it } from "vitest";
import { checkPatch, type JackModel, type PatchModel, type RigModel } from "@/lib/core/electrics";

const input = (id: string, safeMax: number): JackModel => ({
  id, name: id, direction: "input", role: "plain", input: { accepts: ["trigger"], onV: { min: 1, max: 2 }, offV: 0.8, safeV: { min: -0.5, max: safeMax }, loadOhm: 100_000 },
});
const rig: RigModel = {
  gear: [
    { id: "box", kind: "shaper", name: "Box", assumed: [], jacks: [{ id: "out", name: "Out", direction: "output", role: "plain", output: { signal: "trigger", restV: 0, activeV: 8.1, sourceOhm: 1000 } }] },
    { id: "v", kind: "voice", name: "Voice", assumed: [], jacks: [input("bare", 5.5), input("hardy", 12)] },
  ],
};
const lead = (id: string, inputId: string, inline?: PatchModel["leads"][number]["inline"]) => ({ id, number: 1, outputId: "out", inputId, ...(inline ? { inline } : {}) });
const check = (...leads: PatchModel["leads"]) => checkPatch(rig, { leads, knobs: [] }).leads;

describe("parts in a lead", () => {
  it("turn hot into good, by the loaded divider rule (LIEC vol. I ch. 6)", () => {
    expect(check(lead("a", "bare")).a?.verdict).toBe("hot");
    const mended = check(lead("a", "bare", { kind: "divider", seriesOhm: 10_000, shuntOhm: 10_000, tol: 0.05 })).a;
    expect(mended?.verdict).toBe("good");
    // Highest: series −5 %, shunt +5 %; 8.1 × (10.5k ∥ 100k)/((10.5k ∥ 100k) + 9.5k + 1k).
    const shunt = 1 / (1 / 10_500 + 1 / 100_000);
    expect(mended?.highV?.max).toBeCloseTo((8.1 * shunt) / (shunt + 10_500), 9);
  });
  it("is what the offered fix promised", () => {
    const before = check(lead("a", "bare")).a;
    const fix = before?.fixes.find((item) => item.kind === "divider");
    expect(fix).toBeDefined();
    if (fix?.kind !== "divider") return;
    const after = check(lead("a", "bare", { kind: "divider", seriesOhm: fix.seriesOhm, shuntOhm: fix.shuntOhm, tol: fix.tol })).a;
    expect(after?.verdict).toBe(fix.verdict);
    expect(after?.highV?.max).toBeCloseTo(fix.highV.max, 9);
  });
  it("in one branch of a mult leave the other branch its level", () => {
    const both = check(lead("a", "bare", { kind: "divider", seriesOhm: 10_000, shuntOhm: 10_000, tol: 0.05 }), lead("b", "hardy"));
    expect(both.a?.verdict).toBe("good");
    expect(both.b?.verdict).toBe("good");
    expect(both.b?.highV?.max).toBeGreaterThan(7);
    expect(both.b?.highV?.max).toBeLessThan(8.1);
  });
});

describe("audio that is too hot for a channel", () => {
  it("is never mended with a diode", () => {
    const audio: RigModel = {
      gear: [
        { id: "v", kind: "voice", name: "Voice", assumed: [], jacks: [{ id: "out", name: "Out", direction: "output", role: "through", output: { signal: "audio", restV: 0, activeV: { min: 1.5, max: 2 }, sourceOhm: 1000 } }] },
        { id: "d", kind: "desk-channel", name: "Mic", assumed: [], jacks: [{ id: "mic", name: "Mic", direction: "input", role: "plain", input: { accepts: ["audio"], safeV: { min: -15, max: 15 }, loadOhm: 10_000, maxDbu: -10 } }] },
      ],
    };
    const lead = checkPatch(audio, { leads: [{ id: "a", number: 1, outputId: "out", inputId: "mic" }], knobs: [] }).leads.a;
    expect(lead?.verdict).toBe("hot");
    expect(lead?.fixes.map((fix) => fix.kind)).not.toContain("series-diode");
  });
});
