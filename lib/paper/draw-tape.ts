import type { Box, Point } from "./page";
import type { Pen } from "./pen";

/** How far in from either end the tear of a strip of tape goes, at successive heights (0…1). */
const TEAR: readonly [number, number][] = [[0, 0], [0.2, 1], [0.38, 0.2], [0.6, 1], [0.8, 0.3], [1, 0.8]];

/** A strip of tape, torn at both ends: an outline, so that it costs a printer no more than its edge. */
export function drawTape(pen: Pen, { x, y, width, height }: Box, thick: number): void {
  const depth = Math.min(3, height * 0.13);
  const right: Point[] = TEAR.map(([at, bite]) => ({ x: x + width - bite * depth, y: y + at * height }));
  const left: Point[] = TEAR.map(([at, bite]) => ({ x: x + bite * depth, y: y + height - at * height }));
  pen.path([...right, ...left], { fill: "white", stroke: "black", width: thick, isClosed: true });
}
