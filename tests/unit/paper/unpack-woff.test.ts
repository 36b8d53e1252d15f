import { readFileSync } from "node:fs";
import fontkit from "@pdf-lib/fontkit";
import { describe, expect, it } from "vitest";
import { unpackWoff } from "@/lib/paper/unpack-woff";

describe("a WOFF font unpacked", () => {
  it("has the same glyphs and widths as the packed one has for another reader", () => {
    const packed = new Uint8Array(readFileSync("node_modules/@fontsource/atkinson-hyperlegible-next/files/atkinson-hyperlegible-next-latin-400-normal.woff"));
    const widths = (bytes: Uint8Array) => fontkit.create(bytes).layout("Kick slab 4.7 V – é").glyphs.map((glyph) => [glyph.id, glyph.advanceWidth]);
    expect(widths(unpackWoff(packed))).toEqual(widths(packed));
  });

  it("is refused where it is not WOFF", () => {
    expect(() => unpackWoff(new Uint8Array(60))).toThrow(RangeError);
  });
});
