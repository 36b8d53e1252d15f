import { measure, type TextStyle } from "./fonts";

/** A stretch of text in one style and size. */
export interface Span {
  style: TextStyle;
  size: number;
  text: string;
}

/** One line of spans, set one after the other. */
export interface Line {
  spans: Span[];
  width: number;
  size: number;
}

const ELLIPSIS = "…";

/** Breaks spans into lines no wider than `width`, at spaces where it can and inside a word where it must. */
export function wrapSpans(spans: readonly Span[], width: number): Line[] {
  const lines: Line[] = [];
  let line: Line = { spans: [], width: 0, size: 0 };
  const close = () => {
    if (line.spans.length > 0) lines.push(line);
    line = { spans: [], width: 0, size: 0 };
  };
  for (const { style, size, text } of spans) {
    for (const word of text.split(/\s+/u).filter((part) => part !== "")) {
      for (const piece of breakWord({ style, size, text: word }, width)) {
        const longer = append(line, { style, size, text: piece });
        if (line.spans.length > 0 && longer.width > width + 1e-6) {
          close();
          line = append(line, { style, size, text: piece });
        } else line = longer;
      }
    }
  }
  close();
  return lines;
}

/** A line with one more word. Its last span is measured anew: a space is as wide as the font of the word before it makes it. */
function append(line: Line, word: Span): Line {
  const last = line.spans.at(-1);
  const size = Math.max(line.size, word.size);
  if (!last) return { spans: [word], width: widthOf(word), size };
  if (last.style === word.style && last.size === word.size) {
    const joined = { ...last, text: `${last.text} ${word.text}` };
    return { spans: [...line.spans.slice(0, -1), joined], width: line.width - widthOf(last) + widthOf(joined), size };
  }
  const spaced = { ...word, text: ` ${word.text}` };
  return { spans: [...line.spans, spaced], width: line.width + widthOf(spaced), size };
}

function widthOf({ style, size, text }: Span): number {
  return measure(style, size, text);
}

export function wrapText(style: TextStyle, size: number, text: string, width: number): Line[] {
  return wrapSpans([{ style, size, text }], width);
}

function breakWord({ style, size, text }: Span, width: number): string[] {
  if (measure(style, size, text) <= width) return [text];
  const pieces: string[] = [];
  let piece = "";
  for (const letter of text) {
    if (piece !== "" && measure(style, size, piece + letter) > width) {
      pieces.push(piece);
      piece = "";
    }
    piece += letter;
  }
  return piece === "" ? pieces : [...pieces, piece];
}

interface Fit {
  width: number;
  maxSize: number;
  minSize: number;
  maxLines: number;
  /** True: what still does not fit ends in an ellipsis; false: it takes as many lines as it needs. */
  clips: boolean;
}

/** The largest size, in steps of a point, at which the text stands in so many lines with its words whole; else at the least size. */
export function fitText(style: TextStyle, text: string, { width, maxSize, minSize, maxLines, clips }: Fit): { lines: Line[]; size: number } {
  const words = text.split(/\s+/u);
  for (let size = maxSize; size >= minSize; size -= 1) {
    const lines = wrapText(style, size, text, width);
    if (lines.length <= maxLines && words.every((word) => measure(style, size, word) <= width)) return { lines, size };
  }
  const lines = wrapText(style, minSize, text, width);
  if (!clips || lines.length <= maxLines) return { lines, size: minSize };
  const kept = lines.slice(0, maxLines - 1);
  const rest = lines.slice(maxLines - 1).flatMap((line) => line.spans.map((span) => span.text)).join(" ");
  return { lines: [...kept, clipText(style, minSize, rest, width)], size: minSize };
}

/** One line, cut at the end with an ellipsis where it is too long. */
export function clipText(style: TextStyle, size: number, text: string, width: number): Line {
  let shown = text;
  if (measure(style, size, text) > width) {
    const letters = [...text];
    let [low, high] = [0, letters.length];
    while (low < high) {
      const middle = Math.ceil((low + high) / 2);
      if (measure(style, size, letters.slice(0, middle).join("").trimEnd() + ELLIPSIS) <= width) low = middle;
      else high = middle - 1;
    }
    shown = letters.slice(0, low).join("").trimEnd() + ELLIPSIS;
  }
  return { spans: [{ style, size, text: shown }], width: measure(style, size, shown), size };
}
