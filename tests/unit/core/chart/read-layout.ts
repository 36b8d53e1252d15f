import type { Box, ChartLayout, Point } from "@/lib/core/chart";

/** One straight part of a track. */
export interface Part {
  a: Point;
  b: Point;
  net: string;
  leadId: string;
}

export function partsOf(layout: ChartLayout): Part[] {
  return layout.tracks.flatMap(({ points, net, leadId }) => points.slice(1).map((b, i) => ({ a: points[i] as Point, b, net, leadId })));
}

export function boxOf({ a, b }: { a: Point; b: Point }): Box {
  return { x: Math.min(a.x, b.x), y: Math.min(a.y, b.y), width: Math.abs(b.x - a.x), height: Math.abs(b.y - a.y) };
}

/** Where two closed boxes meet, or null; lines are boxes without width or height. */
export function meeting(p: Box, q: Box): Box | null {
  const [x, y] = [Math.max(p.x, q.x), Math.max(p.y, q.y)];
  const [right, bottom] = [Math.min(p.x + p.width, q.x + q.width), Math.min(p.y + p.height, q.y + q.height)];
  return right < x || bottom < y ? null : { x, y, width: right - x, height: bottom - y };
}

/** True where they share room, not only an edge. */
export function overlap(p: Box, q: Box): boolean {
  const both = meeting(p, q);
  return both !== null && both.width > 1e-6 && both.height > 1e-6;
}

/** True where one line goes straight through the other at a right angle. */
export function isCrossing(one: Part, other: Part): boolean {
  const [upright, level] = one.a.x === one.b.x ? [one, other] : [other, one];
  if (upright.a.x !== upright.b.x || level.a.y !== level.b.y) return false;
  const [u, l] = [boxOf(upright), boxOf(level)];
  return l.y > u.y && l.y < u.y + u.height && u.x > l.x && u.x < l.x + l.width;
}
