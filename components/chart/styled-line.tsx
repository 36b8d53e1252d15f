import type { Verdict } from "@/lib/core/electrics/jacks";
import { besideLine, fitDash, hatchStrokes, lineStyle, type Point } from "@/lib/core/chart";

interface StyledLineProps {
  points: readonly Point[];
  verdict: Verdict;
  /** Width of the thin line, in the drawing's unit. */
  thin?: number;
}

/** A square-cornered line drawn in its verdict's line style, in the current text colour. */
export function StyledLine({ points, verdict, thin = 1.75 }: StyledLineProps) {
  const style = lineStyle(verdict);
  const shared = { fill: "none", stroke: "currentColor", strokeWidth: thin * style.width, strokeLinejoin: "miter" as const };
  if (style.isDouble) return [-1, 1].map((side) => <polyline key={side} {...shared} points={pointList(besideLine(points, side * thin))} />);
  if (style.dash.length > 0) {
    return points.slice(1).map((b, i) => {
      const a = points[i] as Point;
      const { dash, offset } = fitDash(style.dash.map((part) => part * thin), Math.hypot(b.x - a.x, b.y - a.y));
      const dashes = dash.length > 0 ? { strokeDasharray: dash.map(round).join(" "), strokeDashoffset: round(offset), strokeLinecap: style.cap } : {};
      return <line key={i} {...shared} x1={a.x} y1={a.y} x2={b.x} y2={b.y} {...dashes} />;
    });
  }
  return (
    <>
      <polyline {...shared} points={pointList(points)} />
      {style.isHatched ? <path {...shared} strokeWidth={thin} d={hatchStrokes(points, thin * 5, thin * 5).map(([a, b]) => `M${round(a.x)} ${round(a.y)}L${round(b.x)} ${round(b.y)}`).join("")} /> : null}
    </>
  );
}

function pointList(points: readonly Point[]): string {
  return points.map(({ x, y }) => `${round(x)},${round(y)}`).join(" ");
}

function round(value: number): number {
  return Math.round(value * 100) / 100;
}
