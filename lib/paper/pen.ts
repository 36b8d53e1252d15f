import { measure, type TextStyle } from "./fonts";
import type { Box, Ink, Page, Point } from "./page";
import type { Line } from "./wrap-text";

/** A line of text takes so much of its size above and below its baseline. */
export const ASCENT = 0.78;
export const DESCENT = 0.24;
export const LEADING = 1.2;

/** Draws onto one page; every text is also noted as a box. */
export interface Pen {
  page: Page;
  /** A line whose top is at `top`; returns the height it took. */
  line(line: Line, at: { x: number; top: number; within: Box; align?: "left" | "right" | "centre"; width?: number; ink?: Ink; leading?: number }): number;
  word(style: TextStyle, size: number, text: string, at: { x: number; top: number; within: Box; align?: "left" | "right" | "centre"; width?: number; ink?: Ink }): void;
  path(points: readonly Point[], look: { fill?: Ink; stroke?: Ink; width?: number; dash?: readonly number[]; cap?: "butt" | "round"; isClosed?: boolean }): void;
  rule(x: number, y: number, width: number, thick: number): void;
  box(box: Box, look: { fill?: Ink; stroke?: Ink; width?: number }): void;
  dot(centre: Point, radius: number, look: { fill?: Ink; stroke?: Ink; width?: number }): void;
}

export function penFor(page: Page): Pen {
  const pen: Pen = {
    page,
    line(line, { x, top, within, align = "left", width = 0, ink = "black", leading = LEADING }) {
      const height = line.size * leading;
      const slack = width - line.width;
      const left = align === "left" ? x : align === "right" ? x + slack : x + slack / 2;
      const baseline = top + (height - line.size * (ASCENT + DESCENT)) / 2 + line.size * ASCENT;
      let at = left;
      for (const span of line.spans) {
        page.ops.push({ kind: "text", ...span, x: at, y: baseline, ink });
        at += measure(span.style, span.size, span.text);
      }
      const text = line.spans.map((span) => span.text).join("");
      const size = Math.min(...line.spans.map((span) => span.size));
      if (text !== "") page.texts.push({ text, size, x: left, y: baseline - line.size * ASCENT, width: line.width, height: line.size * (ASCENT + DESCENT), within });
      return height;
    },
    word(style, size, text, at) {
      pen.line({ spans: [{ style, size, text }], width: measure(style, size, text), size }, at);
    },
    path(points, look) {
      page.ops.push({ kind: "path", points, ...look });
    },
    rule(x, y, width, thick) {
      pen.path([{ x, y }, { x: x + width, y }], { stroke: "black", width: thick });
    },
    box({ x, y, width, height }, look) {
      pen.path([{ x, y }, { x: x + width, y }, { x: x + width, y: y + height }, { x, y: y + height }], { ...look, isClosed: true });
    },
    dot(centre, radius, look) {
      page.ops.push({ kind: "dot", centre, radius, ...look });
    },
  };
  return pen;
}
