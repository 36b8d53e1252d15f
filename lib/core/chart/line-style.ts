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
 * Short strokes across a polyline, every `step`, half `reach` to either side.
 * @returns pairs of points.
 */
export function hatchStrokes(points: readonly { x: number; y: number }[], step: number, reach: number): [{ x: number; y: number }, { x: number; y: number }][] {
  const strokes: [{ x: number; y: number }, { x: number; y: number }][] = [];
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
