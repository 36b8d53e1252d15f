import type { Point, Track } from "./types";

/** A stretch of line that the same leads run along. */
export interface Stretch {
  points: Point[];
  leadIds: string[];
}

/**
 * Cuts tracks where leads part or meet, so that a stretch which several share is drawn once, in one style,
 * and no dashes lie on a solid line.
 * @returns stretches that together cover every track; each along the direction of its leads.
 */
export function shareTracks(tracks: readonly Track[]): Stretch[] {
  const [onColumn, onRow] = [new Map<number, Set<number>>(), new Map<number, Set<number>>()];
  const note = (lines: Map<number, Set<number>>, at: number, value: number) => {
    const line = lines.get(at);
    if (line) line.add(value);
    else lines.set(at, new Set([value]));
  };
  for (const { points } of tracks) {
    for (const { x, y } of points) {
      note(onColumn, x, y);
      note(onRow, y, x);
    }
  }
  const paths = tracks.map(({ leadId, points }) => ({ leadId, points: cut(points, onColumn, onRow) }));
  const users = new Map<string, string[]>();
  for (const { leadId, points } of paths) {
    for (let i = 1; i < points.length; i += 1) {
      const key = edgeKey(points, i);
      const list = users.get(key);
      if (list) list.push(leadId);
      else users.set(key, [leadId]);
    }
  }
  const drawn = new Set<string>();
  const stretches: Stretch[] = [];
  for (const { points } of paths) {
    let open: Stretch | null = null;
    for (let i = 1; i < points.length; i += 1) {
      const [a, b, key] = [points[i - 1] as Point, points[i] as Point, edgeKey(points, i)];
      if (drawn.has(key)) {
        open = null;
        continue;
      }
      drawn.add(key);
      const leadIds = users.get(key) ?? [];
      if (open === null || !isSame(open.leadIds, leadIds)) {
        open = { points: [a], leadIds };
        stretches.push(open);
      }
      open.points.push(b);
    }
  }
  for (const stretch of stretches) stretch.points = stretch.points.filter((point, i, all) => !isOnTheWay(all[i - 1], point, all[i + 1]));
  return stretches;
}

/** The same polyline with a point wherever another track has one on it. */
function cut(points: readonly Point[], onColumn: ReadonlyMap<number, ReadonlySet<number>>, onRow: ReadonlyMap<number, ReadonlySet<number>>): Point[] {
  return points.flatMap((b, i) => {
    const a = points[i - 1];
    if (!a) return [b];
    const upright = a.x === b.x;
    const [from, to] = upright ? [a.y, b.y] : [a.x, b.x];
    const between = [...((upright ? onColumn.get(a.x) : onRow.get(a.y)) ?? [])].filter((at) => at > Math.min(from, to) && at < Math.max(from, to));
    between.sort((p, q) => (p - q) * Math.sign(to - from));
    return [...between.map((at) => (upright ? { x: a.x, y: at } : { x: at, y: a.y })), b];
  });
}

function edgeKey(points: readonly Point[], i: number): string {
  const [a, b] = [points[i - 1] as Point, points[i] as Point];
  return a.x < b.x || (a.x === b.x && a.y < b.y) ? `${a.x},${a.y},${b.x},${b.y}` : `${b.x},${b.y},${a.x},${a.y}`;
}

function isSame(a: readonly string[], b: readonly string[]): boolean {
  return a.length === b.length && a.every((id, i) => id === b[i]);
}

function isOnTheWay(a: Point | undefined, at: Point, b: Point | undefined): boolean {
  return a !== undefined && b !== undefined && ((a.x === at.x && at.x === b.x) || (a.y === at.y && at.y === b.y));
}
