import { describe, expect, it } from "vitest";
import { buildSheetView } from "@/lib/paper/build-sheet-view";
import { PAPER, PAPER_SIZES } from "@/lib/paper/page";
import { renderSheet } from "@/lib/paper/render-sheet";
import { demoSongs } from "@/seeders/demo/songs";
import { demoSheet } from "@/tests/factories/demo-sheet";
import { denseSheet, randomSheet } from "@/tests/factories/random-sheet";
import { readPdf } from "@/tests/factories/read-pdf";

/** Names break over lines and runs, so text is compared without its spaces. */
const dense = (text: string) => text.normalize("NFC").replace(/\s+/g, "");

describe.each(PAPER_SIZES)("the sheet read back on %s", (paper) => {
  it.each(demoSongs.map((song) => song.id))("says everything: %s", async (id) => {
    const source = demoSheet(id);
    const view = buildSheetView(source);
    const { texts, info } = await readPdf(await renderSheet(view, paper));
    const all = dense(texts.join(" "));
    const wanted = [
      view.title, view.rigName, ...view.notes, "revision 1", "printed 1 December 2026, 13:05 UTC", view.place ?? "", view.tempo ?? "",
      ...view.leads.flatMap((lead) => [lead.colour, lead.from.gear, lead.from.jack, lead.to.gear, lead.to.jack, lead.restVolts ?? "", lead.struckVolts ?? lead.noVolts, lead.pulse ?? "", lead.verdict]),
      ...view.dangers.flatMap((lead) => [`DO NOT PLUG`, lead.reason ?? ""]),
      ...view.unsettled.flatMap((lead) => [lead.reason ?? "", lead.remedy ?? ""]),
      ...view.knobs.flatMap((knob) => [knob.gear, knob.knob, knob.clock]),
      ...view.cautions.flatMap((caution) => [caution.about, caution.text]),
      ...(view.changeover?.steps.flatMap((step) => step.parts.flatMap((part) => [part.lead, part.text, ...part.ends.flatMap((end) => [end.gear, end.jack])])) ?? []),
    ];
    for (const text of wanted) expect(all, text).toContain(dense(text));
    expect(info.Title).toBe(`${view.title}: patch sheet, revision 1`);
    expect(info.Author).toBe("Marrow Lane");
    expect(info.Language).toBe("en-GB");
    expect(info.CreationDate).toBe("D:20261201130500Z");
  });

  it.each(demoSongs.map((song) => song.id))("has each lead as one row, number to verdict: %s", async (id) => {
    const view = buildSheetView(demoSheet(id));
    const all = dense((await readPdf(await renderSheet(view, paper))).texts.join(" "));
    for (const { number, colour, from, to } of view.leads) expect(all, `lead ${number}`).toContain(dense(`${number}${colour}${from.gear}${from.jack}${to.gear}${to.jack}`));
  });

  it("numbers its pages and keeps to its paper", async () => {
    const view = buildSheetView(randomSheet(3, { leads: 40, knobs: 16, noteLength: 400, nameLength: 14 }));
    const { texts, pages, sizes } = await readPdf(await renderSheet(view, paper));
    expect(pages).toBeGreaterThan(1);
    texts.forEach((text, index) => expect(text).toContain(`page ${index + 1} of ${pages}`));
    for (const size of sizes) expect(size).toEqual([expect.closeTo(PAPER[paper].width, 2), expect.closeTo(PAPER[paper].height, 2)]);
  });

  it("holds every lead of forty and every knob of sixteen", async () => {
    const view = buildSheetView(randomSheet(11, { leads: 40, knobs: 16, noteLength: 0, nameLength: 12 }));
    expect(view.leads).toHaveLength(40);
    const all = dense((await readPdf(await renderSheet(view, paper))).texts.join(" "));
    for (const lead of view.leads) expect(all, `lead ${lead.number}`).toContain(`${lead.number}${lead.colour}`);
    expect(all.split("o’clock").length + all.split("halfpast").length - 2).toBeGreaterThanOrEqual(view.knobs.length);
  });
});

describe("one page", () => {
  it.each(demoSongs.map((song) => song.id))("holds chart, lead table and knobs of a demo song on A4: %s", async (id) => {
    const view = buildSheetView({ ...demoSheet(id), before: null });
    const first = dense((await readPdf(await renderSheet(view, "a4"))).texts[0] ?? "");
    for (const { number, colour, to, verdict } of view.leads) {
      expect(first).toContain(`${number}${colour}`);
      expect(first).toContain(dense(to.gear));
      expect(first).toContain(verdict);
    }
    for (const knob of view.knobs) expect(first).toContain(dense(knob.clock));
  });

  it("is all that the first song of the set needs, on either paper", async () => {
    for (const paper of PAPER_SIZES) expect((await readPdf(await renderSheet(buildSheetView(demoSheet("wet-chalk")), paper))).pages).toBe(1);
  });
});

describe("a crowded song", () => {
  it.each([8, 12])("of %i runs has its chart at full size and every lead in it", async (runs) => {
    const view = buildSheetView(denseSheet(runs));
    const { texts } = await readPdf(await renderSheet(view, "a4"));
    expect(texts.join(" ")).not.toContain("Drawn small");
    const all = dense(texts.join(" "));
    for (const lead of view.leads) expect(all).toContain(dense(`${lead.number}${lead.colour}${lead.from.gear}${lead.from.jack}${lead.to.gear}${lead.to.jack}`));
  });
});

describe("the same data", () => {
  it("gives the same bytes", async () => {
    const make = () => renderSheet(buildSheetView(demoSheet("copper-rain")), "a4");
    const [first, second] = [await make(), await make()];
    expect(Buffer.from(first).equals(Buffer.from(second))).toBe(true);
  });

  it("printed at another time differs", async () => {
    const make = (printedAt: Date) => renderSheet(buildSheetView({ ...demoSheet("copper-rain"), printedAt }), "a4");
    expect(Buffer.from(await make(new Date(0))).equals(Buffer.from(await make(new Date(6e7))))).toBe(false);
  });
});

describe("letters beyond the product's own fonts", () => {
  const named = (name: string) => {
    const source = demoSheet("wet-chalk");
    return renderSheet(buildSheetView({ ...source, song: { ...source.song, title: name } }), "a4");
  };

  it.each(["Łódź żółw", "10 kΩ ± 5 %", "Größe naïve", "Ωμέγα", "Большой"])("are set and read back: %s", async (name) => {
    const { texts } = await readPdf(await named(name));
    expect(dense(texts[0] ?? "")).toContain(dense(name));
    expect(texts[0]).not.toContain("□");
  });

  it("are shown as boxes with a note where no font has them", async () => {
    const { texts } = await readPdf(await named("太鼓 drum"));
    expect(texts[0]).toContain("□□ drum");
    expect(dense(texts[0] ?? "")).toContain(dense("□ stands for a letter that this sheet’s fonts do not have"));
  });
});
