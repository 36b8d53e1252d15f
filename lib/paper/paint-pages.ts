import {
  appendBezierCurve, beginText, closePath, endText, fill, fillAndStroke, LineCapStyle, lineTo, moveTo, PDFDocument, popGraphicsState, pushGraphicsState, rgb, setDashPattern, setFillingColor,
  setFontAndSize, setLineCap, setLineWidth, setStrokingColor, setTextMatrix, showText, stroke, type PDFFont, type PDFName, type PDFOperator, type PDFPage,
} from "pdf-lib";
import { FONT_FEATURES, fontParser, loadFont, runWidth, splitRuns } from "./fonts";
import type { DotOp, Ink, Op, Page, PathOp, TextOp } from "./page";

export interface Metadata {
  title: string;
  author: string;
  /** BCP 47. */
  language: string;
  createdAt: Date;
}

/** Writes laid-out pages as a PDF. The same pages and metadata give the same bytes. */
export async function paintPages(pages: readonly Page[], { title, author, language, createdAt }: Metadata): Promise<Uint8Array> {
  const document = await PDFDocument.create({ updateMetadata: false });
  document.registerFontkit(fontParser as unknown as Parameters<PDFDocument["registerFontkit"]>[0]);
  document.setTitle(title, { showInWindowTitleBar: true });
  document.setAuthor(author);
  document.setLanguage(language);
  document.setCreationDate(createdAt);
  document.setModificationDate(createdAt);
  document.setCreator("Knockwire");
  document.setProducer("Knockwire");
  const fonts = await embedFonts(document, pages);
  for (const page of pages) paintPage(document.addPage([page.width, page.height]), page, fonts);
  return document.save({ addDefaultPage: false });
}

async function embedFonts(document: PDFDocument, pages: readonly Page[]): Promise<Map<string, PDFFont>> {
  const files = new Set(pages.flatMap((page) => page.ops.flatMap((op) => (op.kind === "text" ? splitRuns(op.style, op.text).map((run) => run.file) : []))));
  const fonts = new Map<string, PDFFont>();
  for (const file of [...files].sort()) {
    const font = loadFont(file);
    // Six capitals and a plus mark a subset: ISO 32000-1, 9.6.4.
    const tag = String.fromCharCode(65 + fonts.size);
    const customName = `KNKWI${tag}+${(font.font.postscriptName ?? "Font").replace(/[^A-Za-z0-9-]/g, "")}`;
    fonts.set(file, await document.embedFont(font.bytes, { subset: true, features: { ...FONT_FEATURES }, customName }));
  }
  return fonts;
}

function paintPage(sheet: PDFPage, page: Page, fonts: ReadonlyMap<string, PDFFont>): void {
  const names = new Map<string, PDFName>();
  const nameOf = (file: string): PDFName => {
    const known = names.get(file);
    if (known) return known;
    const font = fonts.get(file) as PDFFont;
    const name = sheet.node.newFontDictionary(`F${names.size}`, font.ref);
    names.set(file, name);
    return name;
  };
  const operators = page.ops.flatMap((op) => operatorsOf(op, page.height, fonts, nameOf));
  sheet.pushOperators(...operators);
}

function operatorsOf(op: Op, height: number, fonts: ReadonlyMap<string, PDFFont>, nameOf: (file: string) => PDFName): PDFOperator[] {
  if (op.kind === "text") return textOperators(op, height, fonts, nameOf);
  const path = op.kind === "path" ? pathOperators(op, height) : dotOperators(op, height);
  const paint = op.fill && op.stroke ? fillAndStroke() : op.fill ? fill() : stroke();
  return [pushGraphicsState(), ...lookOperators(op), ...path, paint, popGraphicsState()];
}

function textOperators(op: TextOp, height: number, fonts: ReadonlyMap<string, PDFFont>, nameOf: (file: string) => PDFName): PDFOperator[] {
  const operators = [beginText(), setFillingColor(colourOf(op.ink))];
  let x = op.x;
  for (const run of splitRuns(op.style, op.text)) {
    const font = fonts.get(run.file) as PDFFont;
    operators.push(setFontAndSize(nameOf(run.file), op.size), setTextMatrix(1, 0, 0, 1, round(x), round(height - op.y)), showText(font.encodeText(run.text)));
    x += runWidth(run) * op.size;
  }
  return [...operators, endText()];
}

function lookOperators(op: PathOp | DotOp): PDFOperator[] {
  return [
    ...(op.fill ? [setFillingColor(colourOf(op.fill))] : []),
    ...(op.stroke ? [setStrokingColor(colourOf(op.stroke)), setLineWidth(round(op.width ?? 1))] : []),
    ...(op.kind === "path" && op.dash && op.dash.length > 0 ? [setDashPattern(op.dash.map(round), 0)] : []),
    ...(op.kind === "path" && op.cap === "round" ? [setLineCap(LineCapStyle.Round)] : []),
  ];
}

function pathOperators(op: PathOp, height: number): PDFOperator[] {
  const steps = op.points.map(({ x, y }, index) => (index === 0 ? moveTo : lineTo)(round(x), round(height - y)));
  return op.isClosed ? [...steps, closePath()] : steps;
}

/** Four Bézier quarters; the handle is 0.5523 of the radius (least error for a quarter circle, from memory). */
function dotOperators({ centre, radius }: DotOp, height: number): PDFOperator[] {
  const handle = radius * 0.5523;
  const [x, y] = [centre.x, height - centre.y];
  const curve = (...at: [number, number, number, number, number, number]) => appendBezierCurve(...(at.map(round) as typeof at));
  return [
    moveTo(round(x + radius), round(y)),
    curve(x + radius, y + handle, x + handle, y + radius, x, y + radius),
    curve(x - handle, y + radius, x - radius, y + handle, x - radius, y),
    curve(x - radius, y - handle, x - handle, y - radius, x, y - radius),
    curve(x + handle, y - radius, x + radius, y - handle, x + radius, y),
    closePath(),
  ];
}

function colourOf(ink: Ink) {
  if (ink === "black") return rgb(0, 0, 0);
  return ink === "white" ? rgb(1, 1, 1) : rgb(ink.r, ink.g, ink.b);
}

/** A thousandth of a point is finer than any printer. */
function round(value: number): number {
  return Math.round(value * 1000) / 1000;
}
