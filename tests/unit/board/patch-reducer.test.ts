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
  it("leads a lead through a box: its number goes in, a new one comes out, and its parts stay behind", () => {
    const bare = editPatch(emptyPatch, plug("a", "o1", "i1"));
    const patch = editPatch(bare, { type: "inline", leadId: "a", inline: { kind: "series-resistor", seriesOhm: 1000, tol: 0.05 } });
    const led = editPatch(patch, { type: "through", leadId: "a", newId: "b", inputId: "box-in", outputId: "box-out" });
    expect(led.leads).toEqual([
      { id: "a", number: 1, colour: "black", outputId: "o1", inputId: "box-in" },
      { id: "b", number: 2, colour: "white", outputId: "box-out", inputId: "i1" },
    ]);
  });
  it("adds and takes away parts in a lead", () => {
    const patch = editPatch(emptyPatch, plug("a", "o1", "i1"));
    const mended = editPatch(patch, { type: "inline", leadId: "a", inline: { kind: "divider", seriesOhm: 4700, shuntOhm: 5600, tol: 0.05 } });
    expect(mended.leads[0]?.inline).toMatchObject({ kind: "divider" });
    expect(editPatch(mended, { type: "inline", leadId: "a", inline: null })).toEqual(patch);
  });
});

/** Edits of a lead take the one at this place among those there are when it happens. */
const place = fc.nat({ max: 8 });
const [output, input] = [fc.constantFrom("o1", "o2", "o3"), fc.constantFrom("i1", "i2", "i3")];
const makeEdit: fc.Arbitrary<(leadId: string) => PatchEdit> = fc.oneof(
  fc.record({ id: fc.uuid(), outputId: output, inputId: input }).map((ends) => () => ({ type: "plug" as const, ...ends })),
  fc.record({ gearId: fc.constantFrom("g1", "g2"), knobId: fc.constant("k"), position: fc.option(fc.double({ min: 0, max: 1, noNaN: true })) }).map((knob) => () => ({ type: "knob" as const, ...knob })),
  fc.record({ newId: fc.uuid(), inputId: input, outputId: output }).map((box) => (leadId: string) => ({ type: "through" as const, leadId, ...box })),
  fc.integer({ min: 1, max: 9 }).map((number) => (leadId: string) => ({ type: "renumber" as const, leadId, number })),
  fc.constant((leadId: string) => ({ type: "unplug" as const, leadIds: [leadId] })),
);
const edits = fc.array(fc.tuple(place, makeEdit), { maxLength: 30 });

describe("history", () => {
  it("undoes any run of edits to where it began, and redoes it to where it was; the patch stays valid", () => {
    fc.assert(fc.property(edits, (all) => {
      let history = startHistory(emptyPatch);
      for (const [at, make] of all) {
        const { leads } = history.present;
        history = reduceHistory(history, make(leads[at % Math.max(1, leads.length)]?.id ?? "none"));
      }
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
