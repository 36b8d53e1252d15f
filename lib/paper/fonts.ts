import { readFileSync } from "node:fs";
import { join } from "node:path";
import fontkit, { type Font } from "@pdf-lib/fontkit";
import { unpackWoff } from "./unpack-woff";

/** What a piece of text is: running text, the same in bold, figures, a name on tape, a smaller name. */
export type TextStyle = "text" | "bold" | "figures" | "tape" | "label";

const next = (weight: number, set: string) => `@fontsource/atkinson-hyperlegible-next/files/atkinson-hyperlegible-next-${set}-${weight}-normal.woff`;
const mono = (weight: number, set: string) => `@fontsource/atkinson-hyperlegible-mono/files/atkinson-hyperlegible-mono-${set}-${weight}-normal.woff`;
const sofia = (weight: number, set: string) => `@fontsource/sofia-sans-extra-condensed/files/sofia-sans-extra-condensed-${set}-${weight}-normal.woff`;
const dejavu = (name: string) => `dejavu-fonts-ttf/ttf/${name}.ttf`;
const SOFIA_SETS = ["latin", "latin-ext", "greek", "cyrillic"] as const;

/** Each style's fonts, first choice first. The last covers most of what the world writes but not Chinese, Japanese or Korean. */
const CHAINS: Record<TextStyle, readonly string[]> = {
  text: [next(400, "latin"), next(400, "latin-ext"), dejavu("DejaVuSans")],
  bold: [next(700, "latin"), next(700, "latin-ext"), dejavu("DejaVuSans-Bold")],
  figures: [mono(400, "latin"), mono(400, "latin-ext"), dejavu("DejaVuSansMono")],
  tape: [...SOFIA_SETS.map((set) => sofia(800, set)), dejavu("DejaVuSansCondensed-Bold")],
  label: [...SOFIA_SETS.map((set) => sofia(700, set)), dejavu("DejaVuSansCondensed-Bold")],
};

/** Stands for a letter that none of the fonts has. */
export const PLACEHOLDER = "□";

export interface LoadedFont {
  file: string;
  bytes: Uint8Array;
  font: Font;
}

const loaded = new Map<string, LoadedFont>();
const parsed = new WeakMap<Uint8Array, Font>();

/** A font file of the packages, read and parsed once a process. */
export function loadFont(file: string): LoadedFont {
  const known = loaded.get(file);
  if (known) return known;
  const stored = new Uint8Array(readFileSync(join(/* turbopackIgnore: true */ process.cwd(), "node_modules", file)));
  const bytes = file.endsWith(".woff") ? unpackWoff(stored) : stored;
  const made = { file, bytes, font: fontkit.create(bytes) as Font };
  loaded.set(file, made);
  parsed.set(bytes, made.font);
  return made;
}

/** What the PDF library embeds fonts with: fonts that are parsed already are not parsed again for every document. */
export const fontParser = { create: (bytes: Uint8Array, name?: string) => parsed.get(bytes) ?? fontkit.create(bytes, name) };

/** A stretch of text in one font. */
export interface FontRun {
  file: string;
  text: string;
}

/** Splits text into runs, each in the first font of its style that has the letters; what no font has becomes the placeholder. */
export function splitRuns(style: TextStyle, text: string): FontRun[] {
  const runs: FontRun[] = [];
  for (const letter of text.normalize("NFC")) {
    if (/[\p{Cc}\p{Cf}\p{Cs}]/u.test(letter) || /[\uFE00-\uFE0F]/.test(letter)) continue;
    const last = runs.at(-1);
    // A space stays with the run before it, so that words of a script read the other way keep together.
    if (last && letter === " ") {
      last.text += letter;
      continue;
    }
    const file = coveringFont(style, letter) ?? coveringFont(style, PLACEHOLDER) ?? (CHAINS[style][0] as string);
    const shown = coveringFont(style, letter) ? letter : PLACEHOLDER;
    if (last?.file === file) last.text += shown;
    else runs.push({ file, text: shown });
  }
  return runs;
}

/** Whether any letter of the text has to be replaced. */
export function hasMissing(style: TextStyle, text: string): boolean {
  return [...text.normalize("NFC")].some((letter) => !/[\p{Cc}\p{Cf}\p{Cs}\uFE00-\uFE0F]/u.test(letter) && coveringFont(style, letter) === null);
}

const covering = new Map<string, string | null>();

function coveringFont(style: TextStyle, letter: string): string | null {
  const key = `${style}:${letter}`;
  const known = covering.get(key);
  if (known !== undefined) return known;
  const code = letter.codePointAt(0) ?? 0;
  const found = CHAINS[style].find((file) => loadFont(file).font.hasGlyphForCodePoint(code)) ?? null;
  if (covering.size > 20_000) covering.clear();
  covering.set(key, found);
  return found;
}

/** Text is drawn without ligatures, so that a search in the file finds it letter by letter. */
export const FONT_FEATURES = { liga: false, dlig: false, clig: false } as const;

const widths = new Map<string, number>();

/** Width of a run at 1 pt, as it will be drawn: the sum of its glyphs' advances. */
export function runWidth({ file, text }: FontRun): number {
  const key = `${file}\n${text}`;
  const known = widths.get(key);
  if (known !== undefined) return known;
  const { font } = loadFont(file);
  const width = font.layout(text, FONT_FEATURES).glyphs.reduce((sum, glyph) => sum + glyph.advanceWidth, 0) / font.unitsPerEm;
  if (widths.size > 20_000) widths.clear();
  widths.set(key, width);
  return width;
}

/** Width of text at a size, in the size's unit. */
export function measure(style: TextStyle, size: number, text: string): number {
  return splitRuns(style, text).reduce((sum, run) => sum + runWidth(run), 0) * size;
}
