import { describe, expect, it } from "vitest";
import { bench, floor } from "@/tailwind.config";

/** Relative luminance and contrast ratio. Source: WCAG 2.2, definitions; #767676 on white is 4.54 there. */
function luminance(hex: string): number {
  const [r, g, b] = [1, 3, 5].map((at) => {
    const c = Number.parseInt(hex.slice(at, at + 2), 16) / 255;
    return c <= 0.04045 ? c / 12.92 : ((c + 0.055) / 1.055) ** 2.4;
  }) as [number, number, number];
  return 0.2126 * r + 0.7152 * g + 0.0722 * b;
}

function contrast(a: string, b: string): number {
  const [high, low] = [luminance(a), luminance(b)].sort((x, y) => y - x) as [number, number];
  return (high + 0.05) / (low + 0.05);
}

describe("contrast", () => {
  it("is computed as WCAG does", () => {
    expect(contrast("#767676", "#ffffff")).toBeCloseTo(4.5422, 3);
    expect(contrast("#777777", "#ffffff")).toBeCloseTo(4.4781, 3);
  });

  describe.each([["bench", bench], ["floor", floor]] as const)("in the %s theme", (_name, theme) => {
    const grounds = ["floor", "bench", "raised"] as const;
    const words = Object.keys(theme).filter((token) => token === "ink" || token === "ink-soft" || token.startsWith("verdict-")) as (keyof typeof bench)[];
    it.each(words)("%s is text on every ground (4.5:1)", (token) => {
      for (const ground of grounds) expect(contrast(theme[token], theme[ground]), ground).toBeGreaterThanOrEqual(4.5);
    });
    it("lines show on every ground (3:1)", () => {
      for (const ground of grounds) expect(contrast(theme.line, theme[ground]), ground).toBeGreaterThanOrEqual(3);
    });
    it("a strip of tape, or else its edge, stands out from every ground (3:1)", () => {
      for (const ground of grounds) expect(Math.max(contrast(theme.tape, theme[ground]), contrast(theme["tape-edge"], theme[ground])), ground).toBeGreaterThanOrEqual(3);
    });
    it("the ring of the focus is seen on every ground: the mark, or the ink it is edged with (3:1)", () => {
      for (const ground of grounds) expect(Math.max(contrast(theme.mark, theme[ground]), contrast(theme.ink, theme[ground])), ground).toBeGreaterThanOrEqual(3);
      expect(Math.max(contrast(theme.mark, theme.ink), contrast(theme.mark, theme.bench))).toBeGreaterThanOrEqual(3);
    });
    it("tape and mark carry their lettering", () => {
      expect(contrast(theme["tape-ink"], theme.tape)).toBeGreaterThanOrEqual(4.5);
      expect(contrast(theme["mark-ink"], theme.mark)).toBeGreaterThanOrEqual(4.5);
    });
  });
});
