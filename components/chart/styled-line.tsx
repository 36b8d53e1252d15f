import type { Verdict } from "@/lib/core/electrics/jacks";
import { hatchStrokes, lineStyle, type Point } from "@/lib/core/chart";

interface StyledLineProps {
  points: readonly Point[];
  verdict: Verdict;
  /** Width of the thin line, in the drawing's unit. */
  thin?: number;
  /** Colour of the ground, seen between the two lines of a double one. */
  ground?: string;
}

/** A polyline drawn in its verdict's line style, in the current text colour. */
export function StyledLine({ points, verdict, thin = 1.75, ground = "var(--floor)" }: StyledLineProps) {
  const style = lineStyle(verdict);
  const path = points.map((point) => `${point.x},${point.y}`).join(" ");
  const shared = { points: path, fill: "none", strokeLinejoin: "miter" as const };
  if (style.isDouble) {
    return (
      <>
        <polyline {...shared} stroke="currentColor" strokeWidth={thin * 3} />
        <polyline {...shared} stroke={ground} strokeWidth={thin * 1.1} />
      </>
    );
  }
  return (
    <>
      <polyline
        {...shared}
        stroke="currentColor"
        strokeWidth={thin * style.width}
        strokeLinecap={style.cap}
        strokeDasharray={style.dash.length > 0 ? style.dash.map((part) => part * thin).join(" ") : undefined}
      />
      {style.isHatched ? (
        <path
          d={hatchStrokes(points, thin * 5, thin * 5).map(([a, b]) => `M${round(a.x)} ${round(a.y)}L${round(b.x)} ${round(b.y)}`).join("")}
          stroke="currentColor"
          strokeWidth={thin}
          fill="none"
        />
      ) : null}
    </>
  );
}

function round(value: number): number {
  return Math.round(value * 100) / 100;
}
