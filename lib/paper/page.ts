import type { TextStyle } from "./fonts";

/** Everything on paper is in points from the page's top left corner. */
export const MM = 72 / 25.4;

export type PaperSize = "a4" | "letter";
export const PAPER_SIZES = ["a4", "letter"] as const satisfies readonly PaperSize[];

/** A4: ISO 216, 210 × 297 mm. Letter: ANSI A, 8.5 × 11 in. */
export const PAPER: Record<PaperSize, { width: number; height: number; name: string }> = {
  a4: { width: 210 * MM, height: 297 * MM, name: "A4" },
  letter: { width: 8.5 * 72, height: 11 * 72, name: "US Letter" },
};

/** Nothing is printed nearer to the edge: office printers leave 4–6 mm, common practice, no source. */
export const MARGIN = 10 * MM;

export interface Point {
  x: number;
  y: number;
}

export interface Box extends Point {
  width: number;
  height: number;
}

export type Ink = "black" | "white" | { r: number; g: number; b: number };

export interface TextOp {
  kind: "text";
  style: TextStyle;
  size: number;
  text: string;
  x: number;
  /** Height of the baseline. */
  y: number;
  ink: Ink;
}

export interface PathOp {
  kind: "path";
  points: readonly Point[];
  isClosed?: boolean;
  fill?: Ink;
  stroke?: Ink;
  width?: number;
  dash?: readonly number[];
  cap?: "butt" | "round";
}

export interface DotOp {
  kind: "dot";
  centre: Point;
  radius: number;
  fill?: Ink;
  stroke?: Ink;
  width?: number;
}

export type Op = TextOp | PathOp | DotOp;

/** Where a line of text came to stand, for the tests: it must lie in `within` and on no other. */
export interface TextBox extends Box {
  text: string;
  size: number;
  within: Box;
}

export interface Page {
  width: number;
  height: number;
  ops: Op[];
  texts: TextBox[];
}
