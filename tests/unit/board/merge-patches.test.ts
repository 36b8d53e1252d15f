import { describe, expect, it } from "vitest";
import { describeChanges, namesOf } from "@/components/board/describe-changes";
import { mergePatches, settleConflicts } from "@/components/board/merge-patches";
import { editPatch } from "@/components/board/patch-reducer";
import { emptyPatch, patchSchema, type Patch } from "@/lib/schemas/patch";

const base = editPatch(editPatch(emptyPatch, { type: "plug", id: "a", outputId: "o1", inputId: "i1" }), { type: "knob", gearId: "g", knobId: "k", position: 0.5 });
const plug = (patch: Patch, id: string, outputId: string, inputId: string) => editPatch(patch, { type: "plug", id, outputId, inputId });

describe("merging two people's edits of one song", () => {
  it("keeps both when both added leads, and gives mine a number of its own", () => {
    const { patch, conflicts } = mergePatches(base, plug(base, "mine", "o2", "i2"), plug(base, "theirs", "o3", "i3"));
    expect(conflicts).toEqual([]);
    expect(patch.leads.map((lead) => [lead.id, lead.number])).toEqual([["a", 1], ["theirs", 2], ["mine", 3]]);
    expect(patchSchema.safeParse(patch).success).toBe(true);
  });
  it("takes a lead once that both plugged alike", () => {
    const { patch, conflicts } = mergePatches(base, plug(base, "mine", "o2", "i2"), plug(base, "theirs", "o2", "i2"));
    expect(conflicts).toEqual([]);
    expect(patch.leads.filter((lead) => lead.outputId === "o2")).toHaveLength(1);
  });
  it("keeps my pull and their knob", () => {
    const mine = editPatch(base, { type: "unplug", leadIds: ["a"] });
    const theirs = editPatch(base, { type: "knob", gearId: "g", knobId: "k", position: 1 });
    const { patch, conflicts } = mergePatches(base, mine, theirs);
    expect(conflicts).toEqual([]);
    expect(patch.leads).toEqual([]);
    expect(patch.knobs[0]?.position).toBe(1);
  });
  it("asks when both turned one knob differently", () => {
    const mine = editPatch(base, { type: "knob", gearId: "g", knobId: "k", position: 0 });
    const theirs = editPatch(base, { type: "knob", gearId: "g", knobId: "k", position: 1 });
    const merge = mergePatches(base, mine, theirs);
    expect(merge.conflicts).toMatchObject([{ kind: "knob", id: "g/k", mine: { position: 0 }, theirs: { position: 1 } }]);
    expect(settleConflicts(merge, new Set()).knobs[0]?.position).toBe(1);
    expect(settleConflicts(merge, new Set(["g/k"])).knobs[0]?.position).toBe(0);
  });
  it("asks when one pulled the lead that the other changed", () => {
    const mine = editPatch(base, { type: "unplug", leadIds: ["a"] });
    const theirs = editPatch(base, { type: "recolour", leadId: "a", colour: "red" });
    const merge = mergePatches(base, mine, theirs);
    expect(merge.conflicts).toMatchObject([{ kind: "lead", id: "a", mine: null }]);
    expect(settleConflicts(merge, new Set(["a"])).leads).toEqual([]);
  });
});

describe("changes in words", () => {
  it("name what was plugged, pulled and turned", () => {
    const after = editPatch(plug(editPatch(base, { type: "unplug", leadIds: ["a"] }), "b", "o2", "i2"), { type: "knob", gearId: "g", knobId: "k", position: 1 });
    const text = describeChanges(base, after, namesOf([]));
    expect(text).toHaveLength(3);
    expect(text[0]).toMatch(/^Plugged: Lead 1/);
    expect(text[1]).toMatch(/^Pulled: Lead 1/);
    expect(text[2]).toMatch(/12 o’clock → 5 o’clock/);
  });
});
