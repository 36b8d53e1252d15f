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
    if (isUnseen(letter)) continue;
    const last = runs.at(-1);
    // A space stays with the run before it, so that words of a script read the other way keep together.
    if (last && letter === " ") {
      last.text += letter;
      continue;
    }
    const covered = coveringFont(style, letter);
    const file = covered ?? coveringFont(style, PLACEHOLDER) ?? (CHAINS[style][0] as string);
    const shown = covered ? letter : PLACEHOLDER;
    if (last?.file === file) last.text += shown;
    else runs.push({ file, text: shown });
  }
  return runs;
}

/** Whether any letter of the text has to be replaced. */
export function hasMissing(style: TextStyle, text: string): boolean {
  return [...text.normalize("NFC")].some((letter) => !isUnseen(letter) && coveringFont(style, letter) === null);
}

/** Control and format characters, halves of surrogate pairs, variation selectors. */
function isUnseen(letter: string): boolean {
  return /[\p{Cc}\p{Cf}\p{Cs}\uFE00-\uFE0F]/u.test(letter);
}

const covering: Record<TextStyle, Map<string, string | null>> = { text: new Map(), bold: new Map(), figures: new Map(), tape: new Map(), label: new Map() };

function coveringFont(style: TextStyle, letter: string): string | null {
  const known = covering[style].get(letter);
  if (known !== undefined) return known;
  const code = letter.codePointAt(0) ?? 0;
  const found = CHAINS[style].find((file) => loadFont(file).font.hasGlyphForCodePoint(code)) ?? null;
  if (covering[style].size > MOST_CACHED) covering[style].clear();
  covering[style].set(letter, found);
  return found;
}

/** Text is drawn without ligatures, so that a search in the file finds it letter by letter. */
export const FONT_FEATURES = { liga: false, dlig: false, clig: false } as const;

/** Caches are emptied when they hold so many entries, so that a long-lived process does not grow. */
const MOST_CACHED = 20_000;
const widths = new Map<string, number>();
const measured: Record<TextStyle, Map<string, number>> = { text: new Map(), bold: new Map(), figures: new Map(), tape: new Map(), label: new Map() };

/** Width of a run at 1 pt, as it will be drawn: the sum of its glyphs' advances. */
export function runWidth({ file, text }: FontRun): number {
  const key = `${file}\n${text}`;
  const known = widths.get(key);
  if (known !== undefined) return known;
  const { font } = loadFont(file);
  const width = font.layout(text, FONT_FEATURES).glyphs.reduce((sum, glyph) => sum + glyph.advanceWidth, 0) / font.unitsPerEm;
  if (widths.size > MOST_CACHED) widths.clear();
  widths.set(key, width);
  return width;
}

/** Width of text at a size, in the size's unit. */
export function measure(style: TextStyle, size: number, text: string): number {
  const known = measured[style].get(text);
  if (known !== undefined) return known * size;
  const width = splitRuns(style, text).reduce((sum, run) => sum + runWidth(run), 0);
  if (measured[style].size > MOST_CACHED) measured[style].clear();
  measured[style].set(text, width);
  return width * size;
}
