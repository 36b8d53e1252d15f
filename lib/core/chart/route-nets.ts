import { assignTracks, orderTracks, type Stubs } from "./assign-tracks";
import { chooseCrossings } from "./choose-crossings";
import { freeHeights } from "./free-heights";
import { jackHeights, type Net } from "./group-nets";
import type { Stack } from "./place-cards";
import type { ChartMetrics } from "./types";

export const GUTTERS = 5;

/** A net's upright run in one gutter, with the heights at which its stubs meet it from either side. */
export interface Run extends Stubs {
  gutter: number;
  /** Counted from 0; null where the net passes straight through at one height. */
  track: number | null;
}

export interface Routing {
  /** Net → gutter → run. */
  runs: Map<string, Map<number, Run>>;
  trackCounts: number[];
  /** Net → lane → height at which it crosses the lane. */
  crossings: Map<string, Map<number, number>>;
  rows: { top: number; bottom: number };
}

/** Chooses crossings and tracks for every net. Heights are measured from the cards' top. */
export function routeNets(nets: readonly Net[], stack: Stack, metrics: ChartMetrics): Routing {
  const { at, rows } = chooseCrossings(nets, freeHeights(stack, metrics), stack.height, metrics.trackPitch);
  const runs: Routing["runs"] = new Map(nets.map((net) => [net.id, new Map()]));
  const trackCounts: number[] = [];
  // A little under half a row: two runs on one track never come closer end to end than two stubs do side by side.
  const clearance = metrics.jackPitch * 0.45;
  for (let gutter = 0; gutter < GUTTERS; gutter += 1) {
    const here = nets.filter((net) => gutter >= net.first && gutter <= net.last).map((net) => runOf(net, gutter, at.get(net.id)));
    const upright = here.filter((run) => run.span.from < run.span.to);
    const tracks = orderTracks(upright, assignTracks(upright.map((run) => run.span), clearance));
    for (const run of here) runs.get(run.net)?.set(gutter, { ...run, gutter, track: tracks.get(run.net) ?? null });
    trackCounts.push(Math.max(-1, ...tracks.values()) + 1);
  }
  return { runs, trackCounts, crossings: at, rows };
}

function runOf(net: Net, gutter: number, crossings: ReadonlyMap<number, number> | undefined): Stubs {
  const { left, right } = jackHeights(net, gutter);
  const [fromLeft, toRight] = [crossings?.get(gutter - 1), crossings?.get(gutter)];
  if (fromLeft !== undefined) left.push(fromLeft);
  if (toRight !== undefined) right.push(toRight);
  const all = [...left, ...right];
  return { net: net.id, left, right, span: { net: net.id, from: Math.min(...all), to: Math.max(...all) } };
}
