import { describe, expect, it } from "vitest";
import { describeDifference } from "@/components/gear/describe-difference";
import { draftKey, dropDraft, readDraft, writeDraft } from "@/components/gear/draft-store";
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
    const stored = structuredClone(mine);
    if (mine.details.kind !== "pad" || stored.details.kind !== "pad") throw new Error("not pads");
    mine.details.hitOhm = 9_100;
    stored.name = "Wide pad";
    expect(describeDifference(mine, stored, supplyName)).toEqual([
      { label: "Name", mine: "Foam pad", stored: "Wide pad" },
      { label: "Resistance when hit", mine: "9.1 kΩ", stored: "10 kΩ ±20 %" },
    ]);
  });

  it("show a jack that only one of them has, and a jack's own figures under its name", () => {
    const mine = start("voice");
    const stored = structuredClone(mine);
    const jack = mine.jacks[0];
    if (jack?.direction !== "input") throw new Error("not an input");
    jack.input.safeHighV = 5;
    stored.jacks = stored.jacks.slice(0, 1);
    const rows = describeDifference(mine, stored, supplyName);
    expect(rows).toContainEqual({ label: "Trigger in: Highest safe level", mine: "5 V", stored: "12 V" });
    expect(rows).toContainEqual({ label: "Jack “Audio out”", mine: "output, 6.35 mm TS", stored: "—" });
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
