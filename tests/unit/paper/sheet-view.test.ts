import { describe, expect, it } from "vitest";
import { buildSheetView } from "@/lib/paper/build-sheet-view";
import { listChangeover } from "@/lib/paper/list-changeover";
import { nameFile } from "@/lib/paper/name-file";
import { sayDate, sayDuration } from "@/lib/paper/say-date";
import { formatRange } from "@/lib/core/units/format-quantity";
import { emptyPatch, type Patch } from "@/lib/schemas/patch";
import { demoSheet } from "@/tests/factories/demo-sheet";

describe("the view of a sheet", () => {
  it("takes volts, pulse, verdict and reason from the check", () => {
    const source = demoSheet("back-stairs");
    const view = buildSheetView(source);
    const gate = view.leads.find((lead) => lead.number === 8);
    const outcome = source.check.leads["back-stairs-8"];
    expect(gate).toMatchObject({ verdict: "overload", isDanger: true, reason: outcome?.reasons[0]?.text, struckVolts: outcome?.highV && formatRange(outcome.highV, "V"), pulse: "20–80 ms" });
    expect(view.dangers.map((lead) => lead.number)).toEqual([2, 4, 8]);
  });

  it("tells nobody in the changeover to plug a dangerous lead", () => {
    const { changeover } = buildSheetView(demoSheet("ladder-month"));
    const held = changeover?.steps.filter((step) => step.parts.some((part) => part.lead.startsWith("DO NOT PLUG")));
    expect(held?.map((step) => step.number)).toEqual([2]);
  });

  it("draws only the cards of this song, and on them the jacks in use", () => {
    const { chart } = buildSheetView(demoSheet("last-bus-north"));
    expect(chart.cards.map((card) => card.id)).not.toContain("cond-grey");
    expect(chart.cards.find((card) => card.id === "cond-tom")?.jacks.map((jack) => jack.id)).toEqual(["cond-tom-pad", "cond-tom-env"]);
  });

  it("keeps the order of cards that the board has", () => {
    const source = demoSheet("wet-chalk");
    const turned = buildSheetView({ ...source, patch: { ...source.patch, lanes: [["pad-tom-l", "pad-kick"], [], [], []] } });
    expect(turned.chart.cards.slice(0, 2).map((card) => card.id)).toEqual(["pad-tom-l", "pad-kick"]);
  });

  it("warns of phantom power where a lead goes into such a channel, and nowhere else", () => {
    const phantom = (id: string) => buildSheetView(demoSheet(id)).cautions.filter((caution) => caution.about === "Phantom power");
    expect(phantom("last-bus-north")).toEqual([{ about: "Phantom power", text: expect.stringContaining("lead 9") }]);
    expect(phantom("wet-chalk")).toEqual([]);
  });

  it("says so where a lead is in a jack that is gone", () => {
    const source = demoSheet("wet-chalk");
    const view = buildSheetView({ ...source, gear: source.gear.filter((item) => item.id !== "voice-low") });
    expect(view.leads[1]?.to).toEqual({ gear: "A jack that is no longer in the rig", jack: "" });
  });

  it("stands without leads, set and song before", () => {
    const view = buildSheetView({ ...demoSheet("wet-chalk"), patch: emptyPatch, place: null, before: null });
    expect(view).toMatchObject({ leads: [], dangers: [], unsettled: [], place: null, changeover: null });
  });
});

describe("the changeover by lead number", () => {
  const lead = (number: number, outputId: string, inputId: string): Patch["leads"][number] => ({ id: `l${number}`, number, colour: "red", outputId, inputId });
  const patch = (leads: Patch["leads"], knobs: Patch["knobs"] = []): Patch => ({ leads, knobs, lanes: [[], [], [], []] });
  const names = { jack: (id: string) => ({ gear: id, jack: "" }), knob: (gearId: string, knobId: string) => `${gearId} ${knobId}` };
  const plan = (from: Patch, to: Patch) => listChangeover({ title: "Before", patch: from }, to, names);

  it("counts ends touched: stay 0, one end 1, both 2, put away 2, fetched 2 (design: planning, 1)", () => {
    expect(plan(patch([lead(1, "a", "b")]), patch([lead(1, "a", "b")]))).toMatchObject({ endMoves: 0, steps: [], stays: [1] });
    expect(plan(patch([lead(1, "a", "b")]), patch([lead(1, "a", "c")])).endMoves).toBe(1);
    expect(plan(patch([lead(1, "a", "b")]), patch([lead(1, "c", "d")])).endMoves).toBe(2);
    expect(plan(patch([lead(1, "a", "b")]), patch([])).endMoves).toBe(2);
    expect(plan(patch([]), patch([lead(1, "a", "b")])).endMoves).toBe(2);
  });

  it("takes 4 s an end, 2 s a knob, 3 s a lead fetched (typical pace)", () => {
    const knob = { gearId: "g", knobId: "k", position: 0.5 };
    expect(plan(patch([]), patch([lead(1, "a", "b")], [knob])).seconds).toBe(2 * 4 + 2 + 3);
  });

  it("leaves a knob alone that stands there already, to the half hour", () => {
    const at = (position: number) => patch([], [{ gearId: "g", knobId: "k", position }]);
    expect(plan(at(0.5), at(0.51)).knobTurns).toBe(0);
    expect(plan(at(0.5), at(0.6)).steps).toEqual([{ number: null, parts: [{ lead: "g k:", ends: [], text: "12 o’clock → 1 o’clock" }] }]);
  });
});

describe("small words", () => {
  it("names files so that every system takes them", () => {
    expect(nameFile("Łódź / “Zürich”", 3, "pdf")).toBe("odz-zurich-patch-sheet-r3.pdf");
    expect(nameFile("太鼓", 0, "pdf")).toBe("patch-sheet-r0.pdf");
  });

  it("says dates and durations plainly", () => {
    expect(sayDate(new Date("2026-02-03T04:05:59Z"))).toBe("3 February 2026, 04:05 UTC");
    expect([sayDuration(45), sayDuration(60), sayDuration(86.4)]).toEqual(["45 s", "1 min", "1 min 26 s"]);
  });
});
