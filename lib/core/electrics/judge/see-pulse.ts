import { toRange, type Range } from "@/lib/core/units/spread";
import type { Input, Output } from "../jacks";
import { outputBranch, type Branch } from "../node/branch";
import { currentInto, feedLeast, feedMost } from "../node/solve-node";
import { isFalling, mirror, type Scene } from "./scene";

/**
 * The pulse width an input sees from one output, s, or null where a figure is missing.
 * `max` is Infinity where the level may never fall back.
 *
 * A stated `pulseS` is taken as it is. An envelope without one lasts
 * decayS·ln((active − rest)/(on − rest)). Written at the output's own
 * (open-circuit) level this holds with any load: the node is at `on` when the
 * output has fallen to `on` plus its own drop, and that drop is exact from
 * Kirchhoff, so no spread is counted twice.
 */
export function seePulse(scene: Scene, index: number): Range | null {
  const output = scene.outputs[index];
  if (!output) return null;
  if (output.pulseS !== undefined) return toRange(output.pulseS);
  if (output.signal !== "envelope") return null;
  const figures = envelopeFigures(output, scene.input);
  const others = otherBranches(scene, index);
  if (!figures || !others) return null;
  const { decayS, active, rest, on, source, falling } = figures;
  // Source level at which the node passes the threshold: highest with the heaviest draw, lowest with the lightest.
  const branches = falling ? others.map(flip) : others;
  const crossHigh = on.max + drop(source, -currentInto(branches.map(feedLeast), on.max), "most");
  const crossLow = on.min + drop(source, -currentInto(branches.map(feedMost), on.min), "least");
  const width = {
    min: decayS.min * lasting(active.min, rest.min, crossHigh),
    max: decayS.max * lasting(active.max, rest.max, crossLow),
  };
  return { min: Math.min(width.min, clampedWidth(scene, decayS, on)), max: width.max };
}

function envelopeFigures(output: Partial<Output>, input: Input) {
  if (output.decayS === undefined || output.activeV === undefined || output.restV === undefined) return null;
  if (output.sourceOhm === undefined || input.onV === undefined) return null;
  const falling = isFalling(input);
  return {
    falling,
    decayS: toRange(output.decayS),
    active: mirror(toRange(output.activeV), falling),
    rest: mirror(toRange(output.restV), falling),
    on: mirror(toRange(input.onV), falling),
    source: toRange(output.sourceOhm),
  };
}

/** The rest of the node: what listens, and the other outputs at rest. */
function otherBranches(scene: Scene, index: number): Branch[] | null {
  const branches = [...scene.passive];
  for (const other of scene.driving) {
    const output = scene.outputs[other];
    if (other === index || !output) continue;
    const branch = outputBranch(output, "rest");
    if (!branch) return null;
    branches.push(branch);
  }
  return branches;
}

function flip({ volt, ohm, flow }: Branch): Branch {
  return { volt: mirror(volt, true), ohm, flow: flow === "both" ? "both" : flow === "into" ? "outOf" : "into" };
}

function drop(source: Range, amps: number, want: "most" | "least"): number {
  const ohm = amps > 0 === (want === "most") ? source.max : source.min;
  return ohm === 0 ? 0 : amps * ohm;
}

/** ln((active − rest)/(on − rest)): 0 where the threshold is never passed, Infinity where it is never left. */
function lasting(active: number, rest: number, cross: number): number {
  if (active <= cross) return 0;
  return cross <= rest ? Infinity : Math.log((active - rest) / (cross - rest));
}

/** Where diodes hold the active level down, the width from that held level: the shorter of the two is the safe one to promise. */
function clampedWidth(scene: Scene, decayS: Range, on: Range): number {
  if (!scene.highV || !scene.lowV || scene.driving.length !== 1) return Infinity;
  const falling = isFalling(scene.input);
  const [active, rest] = [mirror(scene.highV, falling).min, mirror(scene.lowV, falling).min];
  const held = scene.passive.some((b) => b.flow !== "both" && diodeConducts(b, scene.highV as Range));
  return held ? decayS.min * lasting(active, rest, on.max) : Infinity;
}

function diodeConducts(diode: Branch, level: Range): boolean {
  return diode.flow === "outOf" ? level.max > diode.volt.min : level.min < diode.volt.max;
}
