import { describe, expect, it } from "vitest";
import { describeDifference } from "@/components/gear/describe-difference";
import { draftKey, dropDraft, readDraft, writeDraft } from "@/components/gear/draft-store";
import { mergeGear } from "@/components/gear/merge-gear";
import { toFormValues } from "@/components/gear/form-values";
import { formFieldOf } from "@/components/gear/server-faults";
import { startingGear } from "@/lib/core/electrics/starting-figures";
import { gearInputSchema, type GearInput } from "@/lib/schemas/gear";

let n = 0;
const start = (kind: "pad" | "voice"): GearInput => gearInputSchema.parse(startingGear(kind, undefined, () => `id${(n += 1)}`));
const supplyName = (id: string | null) => id ?? "none";

describe("two versions of one piece of gear", () => {
  it("that are the same have no difference", () => {
    const gear = start("voice");
    expect(describeDifference(gear, structuredClone(gear), supplyName)).toEqual([]);
  });

  it("are told apart figure by figure, with units", () => {
    const mine = start("pad");
    const base = structuredClone(mine);
    const stored = structuredClone(mine);
    if (mine.details.kind !== "pad" || stored.details.kind !== "pad") throw new Error("not pads");
    mine.details.hitOhm = 9_100;
    stored.name = "Wide pad";
    expect(describeDifference(mine, stored, supplyName)).toEqual([
      { label: "Name", mine: "Foam pad", stored: "Wide pad", changedBy: null },
      { label: "Resistance when hit", mine: "9.1 kΩ", stored: "10 kΩ ±20 %", changedBy: null },
    ]);
    expect(describeDifference(mine, stored, supplyName, base).map((row) => row.changedBy)).toEqual(["the other", "you"]);
  });

  it("show a jack that only one of them has, and a jack's own figures under its name", () => {
    const mine = start("voice");
    const stored = structuredClone(mine);
    const jack = mine.jacks[0];
    if (jack?.direction !== "input") throw new Error("not an input");
    jack.input.safeHighV = 5;
    stored.jacks = stored.jacks.slice(0, 1);
    const rows = describeDifference(mine, stored, supplyName);
    expect(rows).toContainEqual({ label: "Trigger in: Highest safe level", mine: "5 V", stored: "12 V", changedBy: null });
    expect(rows).toContainEqual({ label: "Jack “Audio out”", mine: "output, 6.35 mm TS", stored: "—", changedBy: null });
  });
});

describe("putting one person's changes onto another's", () => {
  it("takes from each what only that one changed", () => {
    const base = start("pad");
    const [mine, stored] = [structuredClone(base), structuredClone(base)];
    if (mine.details.kind !== "pad" || stored.details.kind !== "pad") throw new Error("not pads");
    mine.details.hitOhm = 9_100;
    mine.assumed = base.assumed.filter((path) => path !== "details.hitOhm");
    stored.details.fallS = 0.02;
    stored.notes = "Measured at the bench.";
    stored.assumed = base.assumed.filter((path) => path !== "details.fallS");
    const merged = mergeGear(base, mine, stored);
    expect(merged?.clashes).toBe(0);
    expect(merged?.gear).toEqual({
      ...base,
      notes: "Measured at the bench.",
      details: { ...base.details, hitOhm: 9_100, fallS: 0.02 },
      assumed: base.assumed.filter((path) => path !== "details.hitOhm" && path !== "details.fallS"),
    });
  });

  it("keeps mine where both changed one figure, counts it, and never mixes the two ends of a range", () => {
    const base = start("pad");
    const [mine, stored] = [structuredClone(base), structuredClone(base)];
    if (mine.details.kind !== "pad" || stored.details.kind !== "pad") throw new Error("not pads");
    mine.details.restOhm = { min: 30e3, max: 50e3 };
    stored.details.restOhm = { min: 20e3, max: 28e3 };
    const merged = mergeGear(base, mine, stored);
    expect(merged?.clashes).toBe(1);
    expect(merged?.gear.details).toMatchObject({ restOhm: { min: 30e3, max: 50e3 } });
  });

  it("follows jacks by their ids: added ones stay, removed ones go, a removed but changed one is a clash", () => {
    const base = start("voice");
    const [mine, stored] = [structuredClone(base), structuredClone(base)];
    mine.jacks.push({ ...structuredClone(base.jacks[1]!), id: "mine", name: "Second out" });
    stored.jacks[0]!.name = "Trig";
    stored.jacks.splice(1, 1);
    const merged = mergeGear(base, mine, stored);
    expect(merged?.gear.jacks.map((jack) => jack.name)).toEqual(["Trig", "Second out"]);
    expect(merged?.clashes).toBe(0);
    mine.jacks[1]!.name = "Loud out";
    expect(mergeGear(base, mine, stored)).toMatchObject({ clashes: 1 });
  });

  it("is not offered where the result could not be saved", () => {
    const base = start("voice");
    const [mine, stored] = [structuredClone(base), structuredClone(base)];
    const [here, there] = [mine.jacks[0], stored.jacks[0]];
    if (here?.direction !== "input" || there?.direction !== "input") throw new Error("not inputs");
    here.input.pulseMinS = 0.004;
    there.input.pulseMaxS = 0.002;
    expect(mergeGear(base, mine, stored)).toBeNull();
  });
});

describe("a refused field's name", () => {
  it("is the form's own, whichever way the server wrote it", () => {
    expect(formFieldOf({ field: "details.restOhm" })).toBe("details.restOhm");
    expect(formFieldOf({ field: "gear.jacks.0.input.onV" })).toBe("jacks.0.input.onV");
    expect(formFieldOf({ field: "gear.jacks[2].name" })).toBe("jacks.2.name");
  });
});

describe("the draft kept on the device", () => {
  const memory = () => {
    const items = new Map<string, string>();
    return {
      items,
      getItem: (key: string) => items.get(key) ?? null,
      setItem: (key: string, value: string) => void items.set(key, value),
      removeItem: (key: string) => void items.delete(key),
    };
  };
  const key = draftKey("rig", "gear");
  const draft = { values: toFormValues(start("pad")), baseRevision: 3, savedAt: 1_000 };

  it("comes back as it was, and goes when it is dropped", () => {
    const store = memory();
    expect(writeDraft(store, key, draft)).toBe(true);
    expect(readDraft(store, key, 2_000)).toEqual(draft);
    dropDraft(store, key);
    expect(readDraft(store, key, 2_000)).toBeNull();
  });

  it("is forgotten after a fortnight, and when it is not a draft", () => {
    const store = memory();
    writeDraft(store, key, draft);
    expect(readDraft(store, key, 1_000 + 15 * 24 * 3600 * 1000)).toBeNull();
    expect(store.items.size).toBe(0);
    for (const broken of ["{", "null", "{\"values\":{}}", "[]"]) {
      store.setItem(key, broken);
      expect(readDraft(store, key, 2_000)).toBeNull();
    }
  });

  it("never stands in the way where the device keeps nothing", () => {
    const refusing = {
      getItem: () => { throw new Error("denied"); },
      setItem: () => { throw new Error("full"); },
      removeItem: () => { throw new Error("denied"); },
    };
    expect(readDraft(refusing, key, 0)).toBeNull();
    expect(writeDraft(refusing, key, draft)).toBe(false);
    expect(() => dropDraft(refusing, key)).not.toThrow();
  });
});
