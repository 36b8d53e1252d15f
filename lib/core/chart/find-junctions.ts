import type { Net } from "./group-nets";
import type { Run, Routing } from "./route-nets";
import type { Junction, Point, Track } from "./types";

/** Ways that leave a point, and the nets that may run through it. */
interface Meeting extends Point {
  nets: Set<string>;
  left: boolean;
  right: boolean;
  up: boolean;
  down: boolean;
}

/**
 * Points where three or more ways of joined leads meet: a branch of a mult, or a lead that comes onto the row of an input
 * which another already feeds.
 * @param xOf where a track of a gutter lies.
 */
export function findJunctions(routing: Routing, nets: readonly Net[], xOf: (gutter: number, track: number) => number, cardsTop: number, tracks: readonly Track[]): Junction[] {
  const meetings = new Map<string, Meeting>();
  const meet = (run: Run, track: number, y: number): Meeting => {
    const key = `${run.gutter}:${track}:${y}`;
    const known = meetings.get(key) ?? { x: xOf(run.gutter, track), y: cardsTop + y, nets: new Set<string>(), left: false, right: false, up: false, down: false };
    known.nets.add(run.net);
    meetings.set(key, known);
    return known;
  };
  const feeds = new Map<string, Meeting[]>();
  for (const net of nets) {
    for (const run of routing.runs.get(net.id)?.values() ?? []) {
      if (run.track === null) continue;
      for (const y of new Set([...run.left, ...run.right])) {
        const at = meet(run, run.track, y);
        at.left ||= run.left.includes(y);
        at.right ||= run.right.includes(y);
        at.up ||= y > run.span.from;
        at.down ||= y < run.span.to;
      }
      for (const jack of net.ins) {
        if (jack.lane === run.gutter) feeds.set(jack.id, [...(feeds.get(jack.id) ?? []), meet(run, run.track, jack.y)]);
      }
    }
  }
  for (const row of feeds.values()) {
    const first = Math.min(...row.map((meeting) => meeting.x));
    const onRow = row.flatMap((meeting) => [...meeting.nets]);
    for (const meeting of row) {
      meeting.left ||= meeting.x > first;
      for (const net of onRow) meeting.nets.add(net);
    }
  }
  const byNet = new Map<string, Track[]>();
  for (const track of tracks) byNet.set(track.net, [...(byNet.get(track.net) ?? []), track]);
  return [...meetings.values()]
    .filter(({ left, right, up, down }) => Number(left) + Number(right) + Number(up) + Number(down) >= 3)
    .map(({ x, y, nets: near }) => ({ x, y, leadIds: [...near].flatMap((net) => byNet.get(net) ?? []).filter((track) => passes(track, x, y)).map((track) => track.leadId) }));
}

function passes({ points }: Track, x: number, y: number): boolean {
  return points.some((b, index) => {
    const a = points[index - 1];
    return a !== undefined && x >= Math.min(a.x, b.x) && x <= Math.max(a.x, b.x) && y >= Math.min(a.y, b.y) && y <= Math.max(a.y, b.y);
  });
}
