import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { mergePatches } from "@/components/board/merge-patches";
import { editPatch, reduceHistory, startHistory, type PatchEdit } from "@/components/board/patch-reducer";
import { emptyPatch, patchSchema } from "@/lib/schemas/patch";

const plug = (id: string, outputId: string, inputId: string): PatchEdit => ({ type: "plug", id, outputId, inputId });

describe("editing a patch", () => {
  it("gives a new lead the lowest free number and that number's colour", () => {
    let patch = editPatch(emptyPatch, plug("a", "o1", "i1"));
    patch = editPatch(patch, plug("b", "o2", "i2"));
    patch = editPatch(patch, { type: "unplug", leadIds: ["a"] });
    patch = editPatch(patch, plug("c", "o3", "i3"));
    expect(patch.leads.map((lead) => [lead.id, lead.number, lead.colour])).toEqual([["b", 2, "white"], ["c", 1, "black"]]);
  });
  it("never joins two jacks twice", () => {
    const once = editPatch(emptyPatch, plug("a", "o1", "i1"));
    expect(editPatch(once, plug("b", "o1", "i1"))).toBe(once);
  });
  it("swaps numbers when one is taken", () => {
    const patch = editPatch(editPatch(emptyPatch, plug("a", "o1", "i1")), plug("b", "o2", "i2"));
    expect(editPatch(patch, { type: "renumber", leadId: "b", number: 1 }).leads.map((lead) => lead.number)).toEqual([2, 1]);
  });
  it("adds and takes away parts in a lead", () => {
    const patch = editPatch(emptyPatch, plug("a", "o1", "i1"));
    const mended = editPatch(patch, { type: "inline", leadId: "a", inline: { kind: "divider", seriesOhm: 4700, shuntOhm: 5600, tol: 0.05 } });
    expect(mended.leads[0]?.inline).toMatchObject({ kind: "divider" });
    expect(editPatch(mended, { type: "inline", leadId: "a", inline: null })).toEqual(patch);
  });
});

const edit: fc.Arbitrary<PatchEdit> = fc.oneof(
  fc.record({ type: fc.constant("plug" as const), id: fc.uuid(), outputId: fc.constantFrom("o1", "o2", "o3"), inputId: fc.constantFrom("i1", "i2", "i3") }),
  fc.record({ type: fc.constant("knob" as const), gearId: fc.constantFrom("g1", "g2"), knobId: fc.constant("k"), position: fc.option(fc.double({ min: 0, max: 1, noNaN: true })) }),
  fc.record({ type: fc.constant("renumber" as const), leadId: fc.constantFrom("x"), number: fc.integer({ min: 1, max: 9 }) }),
);

describe("history", () => {
  it("undoes any run of edits to where it began, and redoes it to where it was; the patch stays valid", () => {
    fc.assert(fc.property(fc.array(edit, { maxLength: 30 }), (edits) => {
      let history = startHistory(emptyPatch);
      for (const one of edits) history = reduceHistory(history, one);
      const end = history.present;
      expect(patchSchema.safeParse(end).success).toBe(true);
      const steps = history.past.length;
      for (let i = 0; i < steps; i += 1) history = reduceHistory(history, { type: "undo" });
      expect(history.present).toBe(emptyPatch);
      for (let i = 0; i < steps; i += 1) history = reduceHistory(history, { type: "redo" });
      expect(history.present).toBe(end);
    }));
  });
});

describe("undo after somebody else's save was taken in", () => {
  it("takes my edit away and leaves theirs", () => {
    const base = editPatch(emptyPatch, plug("a", "o1", "i1"));
    const mine = editPatch(base, plug("mine", "o2", "i2"));
    const theirs = editPatch(base, plug("theirs", "o3", "i3"));
    let history = reduceHistory(startHistory(base), plug("mine", "o2", "i2"));
    history = reduceHistory(history, { type: "rebase", base, theirs, present: mergePatches(base, mine, theirs).patch });
    expect(history.present.leads.map((lead) => lead.id).sort()).toEqual(["a", "mine", "theirs"]);
    history = reduceHistory(history, { type: "undo" });
    expect(history.present.leads.map((lead) => lead.id).sort()).toEqual(["a", "theirs"]);
    history = reduceHistory(history, { type: "redo" });
    expect(history.present.leads.map((lead) => lead.id).sort()).toEqual(["a", "mine", "theirs"]);
  });
});
