import { hatchStrokes, lineStyle } from "@/lib/core/chart";
import type { Verdict } from "@/lib/core/electrics/jacks";
import type { Point } from "./page";
import type { Pen } from "./pen";

/** A polyline in its verdict's style, as on the board; `thin` is the width of the thin line. */
export function drawVerdictLine(pen: Pen, points: readonly Point[], verdict: Verdict, thin: number): void {
  const style = lineStyle(verdict);
  if (style.isDouble) {
    pen.path(points, { stroke: "black", width: thin * 3 });
    pen.path(points, { stroke: "white", width: thin * 1.1 });
    return;
  }
  pen.path(points, { stroke: "black", width: thin * style.width, dash: style.dash.map((part) => part * thin), cap: style.cap });
  if (!style.isHatched) return;
  for (const [a, b] of hatchStrokes(points, thin * 5, thin * 5)) pen.path([a, b], { stroke: "black", width: thin });
}
