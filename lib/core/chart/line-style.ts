import type { Point } from "./types";

/** How a verdict's track is drawn, in units of the thin line's width, so that it survives a black and white printer. */
export interface LineStyle {
  width: number;
  /** Dashes and gaps; empty: solid. */
  dash: readonly number[];
  /** Drawn as two lines side by side. */
  isDouble: boolean;
  /** Crossed by short strokes. */
  isHatched: boolean;
  /** The ends of dashes. */
  cap: "butt" | "round";
}

const line = (style: Partial<LineStyle>): LineStyle => ({ width: 1, dash: [], isDouble: false, isHatched: false, cap: "butt", ...style });

const STYLES = {
  good: line({}),
  tight: line({ isDouble: true }),
  unproven: line({ dash: [0, 3.5], cap: "round", width: 1.5 }),
  brief: line({ dash: [3, 3] }),
  long: line({ dash: [12, 4] }),
  weak: line({ dash: [6, 8] }),
  dead: line({ dash: [6, 14] }),
  "wrong-kind": line({ dash: [10, 4, 2, 4] }),
  reversed: line({ dash: [10, 4, 2, 4, 2, 4] }),
  stuck: line({ width: 3 }),
  overload: line({ width: 3 }),
  clash: line({ width: 2.5, isHatched: true }),
  hot: line({ width: 2.5, isHatched: true }),
} as const satisfies Record<string, LineStyle>;

export type StyledVerdict = keyof typeof STYLES;

export function lineStyle(verdict: StyledVerdict): LineStyle {
  return STYLES[verdict];
}

/**
 * Dashes for one straight part of a line: stretched a little so that it begins and ends in the middle of a dash, and
 * every corner and end is inked.
 * @param length of the part, in the unit of `dash`.
 * @returns the dashes and where in them to begin; no dashes where the part is too short to show any.
 */
export function fitDash(dash: readonly number[], length: number): { dash: number[]; offset: number } {
  const period = dash.reduce((sum, part) => sum + part, 0);
  if (period === 0 || length < period * 0.6) return { dash: [], offset: 0 };
  const scale = length / (Math.round(length / period) || 1) / period;
  return { dash: dash.map((part) => part * scale), offset: ((dash[0] ?? 0) * scale) / 2 };
}

/**
 * A square-cornered line moved sideways, for the two lines of a double one.
 * @param by distance to the right of its direction; negative: to the left.
 */
export function besideLine(points: readonly Point[], by: number): Point[] {
  const sides = points.slice(1).map((b, i) => {
    const a = points[i] as Point;
    const length = Math.hypot(b.x - a.x, b.y - a.y) || 1;
    return { x: (-(b.y - a.y) / length) * by, y: ((b.x - a.x) / length) * by };
  });
  return points.map((point, i) => {
    const [before, after] = [sides[i - 1] ?? sides[i], sides[i] ?? sides[i - 1]];
    if (!before || !after) return point;
    // On a straight part both are the same; at a square corner each moves along the other's line.
    const isCorner = before.x * after.x + before.y * after.y < by * by * 0.5;
    return isCorner ? { x: point.x + before.x + after.x, y: point.y + before.y + after.y } : { x: point.x + before.x, y: point.y + before.y };
  });
}

/**
 * Short strokes across a polyline, every `step`, half `reach` to either side.
 * @returns pairs of points.
 */
export function hatchStrokes(points: readonly Point[], step: number, reach: number): [Point, Point][] {
  const strokes: [Point, Point][] = [];
  for (let i = 1; i < points.length; i += 1) {
    const a = points[i - 1];
    const b = points[i];
    if (!a || !b) continue;
    const length = Math.hypot(b.x - a.x, b.y - a.y);
    const [dx, dy] = length === 0 ? [0, 0] : [(b.x - a.x) / length, (b.y - a.y) / length];
    for (let at = step / 2; at < length; at += step) {
      const [x, y] = [a.x + dx * at, a.y + dy * at];
      const [nx, ny] = [(dx - dy) * reach * 0.5, (dy + dx) * reach * 0.5];
      strokes.push([{ x: x - nx, y: y - ny }, { x: x + nx, y: y + ny }]);
    }
  }
  return strokes;
}
