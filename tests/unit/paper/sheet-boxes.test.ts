import { describe, expect, it } from "vitest";
import { buildSheetView } from "@/lib/paper/build-sheet-view";
import { layOutSheet } from "@/lib/paper/lay-out-sheet";
import { MARGIN, PAPER_SIZES, type Box, type Page, type PaperSize, type TextBox } from "@/lib/paper/page";
import { demoSheet } from "@/tests/factories/demo-sheet";
import { randomSheet } from "@/tests/factories/random-sheet";
import { demoSongs } from "@/seeders/demo/songs";

/** A hundredth of a point: what rounding may cost. */
const SLACK = 0.01;

function isInside(box: Box, within: Box): boolean {
  return box.x >= within.x - SLACK && box.y >= within.y - SLACK && box.x + box.width <= within.x + within.width + SLACK && box.y + box.height <= within.y + within.height + SLACK;
}

function overlaps(a: Box, b: Box): boolean {
  return a.x + SLACK < b.x + b.width && b.x + SLACK < a.x + a.width && a.y + SLACK < b.y + b.height && b.y + SLACK < a.y + a.height;
}

/** Every fault of a sheet's pages, in words, so that a failure says what stands where. */
function faultsOf(pages: readonly Page[]): string[] {
  return pages.flatMap((page, number) => {
    const safe = { x: MARGIN, y: MARGIN, width: page.width - 2 * MARGIN, height: page.height - 2 * MARGIN };
    const say = (box: TextBox) => `page ${number + 1} “${box.text}” at ${box.x.toFixed(1)}, ${box.y.toFixed(1)} (${box.width.toFixed(1)} × ${box.height.toFixed(1)})`;
    const outside = page.texts.filter((box) => !isInside(box, safe)).map((box) => `${say(box)} leaves the safe area`);
    const spilt = page.texts.filter((box) => !isInside(box, box.within)).map((box) => `${say(box)} leaves its box`);
    const onOther = page.texts.flatMap((a, index) => page.texts.slice(index + 1).filter((b) => overlaps(a, b)).map((b) => `${say(a)} lies on ${say(b)}`));
    const drawn = page.ops.flatMap((op) => (op.kind === "path" ? op.points : op.kind === "dot" ? [op.centre] : [])).filter((point) => !isInside({ ...point, width: 0, height: 0 }, safe));
    return [...outside, ...spilt, ...onOther, ...drawn.map((point) => `page ${number + 1}: a line at ${point.x}, ${point.y} leaves the safe area`)];
  });
}

function pagesOf(seed: number, paper: PaperSize): Page[] {
  const sizes = { leads: 1 + (seed * 7) % 40, knobs: seed % 17, noteLength: seed % 3 === 0 ? 2000 : seed % 90, nameLength: seed % 4 === 0 ? 60 : 5 + (seed % 30) };
  return layOutSheet(buildSheetView(randomSheet(seed, sizes)), paper);
}

describe.each(PAPER_SIZES)("boxes of text on %s", (paper) => {
  it.each(demoSongs.map((song) => song.id))("stand apart and inside: %s", (id) => {
    expect(faultsOf(layOutSheet(buildSheetView(demoSheet(id)), paper))).toEqual([]);
  });

  it("stand apart and inside over 80 random rigs, and are large enough to read unless the page says that its chart is drawn small", () => {
    for (let seed = 1; seed <= 80; seed += 1) {
      const pages = pagesOf(seed, paper);
      expect(faultsOf(pages), `seed ${seed}`).toEqual([]);
      const isSmall = pages.some((page) => page.texts.some((box) => box.text.startsWith("Drawn small")));
      const least = Math.min(...pages.flatMap((page) => page.texts.map((box) => box.size)));
      if (!isSmall) expect(least, `seed ${seed}`).toBeGreaterThanOrEqual(10);
    }
  });

  it("are large enough to read on every demo sheet; the title is 24 pt at least, lead numbers 14 pt", () => {
    for (const { id, title } of demoSongs) {
      const view = buildSheetView(demoSheet(id));
      const texts = layOutSheet(view, paper).flatMap((page) => page.texts);
      expect(Math.min(...texts.map((box) => box.size))).toBeGreaterThanOrEqual(10);
      expect(texts.find((box) => box.text === title)?.size).toBeGreaterThanOrEqual(24);
      for (const lead of view.leads) expect(texts.filter((box) => box.text === String(lead.number)).every((box) => box.size >= 14)).toBe(true);
    }
  });
});

describe("the check itself", () => {
  it("sees a text that lies on another, leaves its box or leaves the page", () => {
    const box = (x: number, y: number): TextBox => ({ text: "x", size: 10, x, y, width: 20, height: 10, within: { x: 30, y: 30, width: 100, height: 100 } });
    const page = (texts: TextBox[]): Page => ({ width: 200, height: 200, ops: [], texts });
    expect(faultsOf([page([box(40, 40), box(55, 45)])])).toHaveLength(1);
    expect(faultsOf([page([box(115, 40)])])).toHaveLength(1);
    expect(faultsOf([page([box(5, 40)])])).toHaveLength(2);
    expect(faultsOf([page([box(40, 40), box(70, 40)])])).toEqual([]);
  });
});
