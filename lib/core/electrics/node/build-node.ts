import type { Range } from "@/lib/core/units/spread";
import type { Connection } from "../connection-types";
import type { Output } from "../jacks";
import { clampBranches, loadBranch, outputBranch, type Branch, type DriveState } from "./branch";
import { diodeCurrentMost, sourceCurrentRange } from "./branch-currents";
import { keepFinite } from "./keep-finite";
import { nodeRange, type Floating } from "./solve-node";

/** Everything that hangs on one node, and what follows from it for all listeners alike. */
export interface Node {
  driving: number[];
  passive: Branch[];
  /** The diode branches of each input's clamp, by the input's place. */
  clamps: Map<number, { high: Branch; low: Branch }>;
  leastLoadOhm: number;
  highV: Range | null;
  lowV: Range | null;
  extremeV: Range | null;
  weakestV: Range | null;
  currentsA: Map<number, Range | null>;
  currentA: Range | null;
  /** All branches with each output free to be in either state; null where a figure is missing. */
  anyState: Branch[] | null;
}

export function buildNode(connection: Connection): Node {
  const { outputs, inputs } = keepFinite(connection);
  const driving = outputs.flatMap((output, i) => (output.signal === "sensor" ? [] : [i]));
  const drivers = driving.map((i) => outputs[i] as Partial<Output>);
  const floating: Floating = drivers.length === 0 ? "zero" : drivers[0]?.polarity === "falling" ? "high" : "low";
  const clamps = new Map<number, { high: Branch; low: Branch }>();
  const passive: Branch[] = [];
  let leastSiemens = 0;
  inputs.forEach((input, i) => {
    const load = loadBranch(input);
    if (load) {
      passive.push(load);
      leastSiemens += 1 / load.ohm.min;
    }
    if (!input.clamp) return;
    const pair = clampBranches(input.clamp);
    clamps.set(i, pair);
    passive.push(pair.high, pair.low);
  });
  const level = (state: DriveState) => levelIn(drivers, state, passive, floating);
  const highV = level("active");
  const lowV = level("rest");
  const extremeV = drivers.length === 1 && drivers[0]?.signal !== "audio" ? hull(highV, lowV) : hull(hull(level("any"), highV), lowV);
  const currentsA = currentsOf(drivers, driving, passive);
  return {
    driving, passive, clamps, highV, lowV, extremeV, currentsA,
    leastLoadOhm: leastSiemens === 0 ? Infinity : 1 / leastSiemens,
    weakestV: weakestOf(drivers, passive, floating, highV),
    currentA: driving.length === 0 ? { min: 0, max: 0 } : [...currentsA.values()].reduce(unite),
    anyState: branchesIn(drivers, "any", passive),
  };
}

/** Greatest current through the clamp of the input at `place`, either way, each output in its own worst state. */
export function clampCurrentAt(node: Node, place: number): number | null {
  const pair = node.clamps.get(place);
  if (!pair || !node.anyState || !node.extremeV) return null;
  const { anyState, extremeV } = node;
  // A level that stays between the diodes switches neither on; an ideal diode conducts at its very voltage.
  const high = extremeV.max >= pair.high.volt.min ? diodeCurrentMost(pair.high, anyState.filter((b) => b !== pair.high)) : 0;
  const low = extremeV.min <= pair.low.volt.max ? diodeCurrentMost(pair.low, anyState.filter((b) => b !== pair.low)) : 0;
  return Math.max(high, low);
}

function branchesIn(drivers: readonly Partial<Output>[], state: DriveState, passive: readonly Branch[]): Branch[] | null {
  const branches = drivers.map((output) => outputBranch(output, state));
  return branches.includes(null) ? null : [...(branches as Branch[]), ...passive];
}

function levelIn(drivers: readonly Partial<Output>[], state: DriveState, passive: readonly Branch[], floating: Floating): Range | null {
  const branches = branchesIn(drivers, state, passive);
  return branches && nodeRange(branches, floating);
}

/** In a diode OR each output must also do it alone, the others resting behind their diodes. */
function weakestOf(drivers: readonly Partial<Output>[], passive: readonly Branch[], floating: Floating, highV: Range | null): Range | null {
  if (drivers.length < 2 || !drivers.every((output) => output.or)) return highV;
  let weakest = highV;
  for (const alone of drivers) {
    const branches = drivers.map((output) => outputBranch(output, output === alone ? "active" : "rest"));
    if (branches.includes(null)) return null;
    weakest = hull(weakest, nodeRange([...(branches as Branch[]), ...passive], floating));
  }
  return weakest;
}

function currentsOf(drivers: readonly Partial<Output>[], driving: readonly number[], passive: readonly Branch[]): Map<number, Range | null> {
  const branches = drivers.map((output) => outputBranch(output.signal === "audio" ? { ...output, signal: "gate" } : output, "any"));
  const complete = !branches.includes(null);
  return new Map(driving.map((index, place) => {
    if (!complete) return [index, null];
    const others = (branches as Branch[]).filter((_, i) => i !== place);
    return [index, sourceCurrentRange(branches[place] as Branch, [...others, ...passive])];
  }));
}

function hull(a: Range | null, b: Range | null): Range | null {
  return a && b ? { min: Math.min(a.min, b.min), max: Math.max(a.max, b.max) } : null;
}

function unite(a: Range | null, b: Range | null): Range | null {
  return hull(a, b);
}
