/** An interval that needs a track of its own where it meets another: a net's vertical run in a gutter, or its horizontal run in a corridor. */
export interface Span {
  net: string;
  from: number;
  to: number;
}

/**
 * Puts intervals on as few tracks as possible so that none lie on each other:
 * sorted by their nearer end, each takes the first track that is free (the
 * left-edge channel algorithm; optimal, its count is the greatest number of
 * intervals at one place).
 * @param clearance distance kept between two intervals on one track.
 * @returns each net's track, counted from 0.
 * Source: A. Hashimoto and J. Stevens, “Wire routing by optimizing channel assignment within large apertures”, 1971 (from memory).
 */
export function assignTracks(spans: readonly Span[], clearance: number): Map<string, number> {
  const ends: number[] = [];
  const tracks = new Map<string, number>();
  for (const span of [...spans].sort((a, b) => a.from - b.from || a.to - b.to || (a.net < b.net ? -1 : 1))) {
    let track = ends.findIndex((end) => end + clearance <= span.from);
    if (track < 0) track = ends.length;
    ends[track] = span.to;
    tracks.set(span.net, track);
  }
  return tracks;
}

/** Heights at which a net's stubs reach its vertical run from the left (outputs) and from the right (inputs). */
export interface Stubs {
  net: string;
  span: Span;
  left: readonly number[];
  right: readonly number[];
}

/**
 * Reorders whole tracks, neighbour by neighbour, while that lessens the crossings
 * between stubs and runs. The number of tracks stays as it is.
 */
export function orderTracks(stubs: readonly Stubs[], tracks: Map<string, number>): Map<string, number> {
  const count = Math.max(-1, ...tracks.values()) + 1;
  const onTrack: Stubs[][] = Array.from({ length: count }, () => []);
  for (const item of stubs) onTrack[tracks.get(item.net) as number]?.push(item);
  const cost = onTrack.map((a) => onTrack.map((b) => crossings(a, b)));
  const order = onTrack.map((_, index) => index);
  for (let pass = 0, moved = true; moved && pass < count; pass += 1) {
    moved = false;
    for (let i = 0; i + 1 < count; i += 1) {
      const [a, b] = [order[i] as number, order[i + 1] as number];
      if ((cost[b]?.[a] ?? 0) >= (cost[a]?.[b] ?? 0)) continue;
      order[i] = b;
      order[i + 1] = a;
      moved = true;
    }
  }
  const place = new Map(order.map((track, index) => [track, index]));
  return new Map([...tracks].map(([net, track]) => [net, place.get(track) ?? track]));
}

/** Crossings where the nets of `a` run left of those of `b`. */
function crossings(a: readonly Stubs[], b: readonly Stubs[]): number {
  let sum = 0;
  for (const one of a) {
    for (const other of b) {
      for (const y of other.left) if (y > one.span.from && y < one.span.to) sum += 1;
      for (const y of one.right) if (y > other.span.from && y < other.span.to) sum += 1;
    }
  }
  return sum;
}
