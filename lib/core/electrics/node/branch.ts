import { toRange, type Range, type Spread } from "@/lib/core/units/spread";
import type { Clamp, Input, Output } from "../jacks";

/**
 * One path from a node to a voltage behind a resistance.
 * `flow` says which way current may pass: a resistor both ways, a diode
 * `into` the node or `outOf` it (ideal: no drop; the drop stands in the voltage).
 */
export interface Branch {
  volt: Range;
  ohm: Range;
  flow: "both" | "into" | "outOf";
}

/** States of a drive in which levels are asked for. */
export type DriveState = "rest" | "active" | "any";

/** A figure of an output that a level cannot be computed without. */
export type DriveFigure = "restV" | "activeV" | "sourceOhm";

/** The output as a branch in one state, or null where a figure is missing. A `sensor` drives nothing: no branch is asked of it. */
export function outputBranch(output: Partial<Output>, state: DriveState): Branch | null {
  const volt = driveVolt(output, state);
  if (volt === null || output.sourceOhm === undefined) return null;
  const flow = output.or ? (output.polarity === "falling" ? "outOf" : "into") : "both";
  return { volt, ohm: ohmRange(output.sourceOhm), flow };
}

function driveVolt(output: Partial<Output>, state: DriveState): Range | null {
  const rest = output.restV === undefined ? null : toRange(output.restV);
  const active = output.activeV === undefined ? null : toRange(output.activeV);
  if (state === "rest") return rest;
  if (state === "active") return active;
  if (rest === null || active === null) return null;
  const both = { min: Math.min(rest.min, active.min), max: Math.max(rest.max, active.max) };
  if (output.signal !== "audio") return both;
  // A sine swings as far below its offset as above it.
  return { min: Math.min(both.min, 2 * rest.min - active.max), max: Math.max(both.max, 2 * rest.max - active.min) };
}

/** The input's own load, or null where it is open. */
export function loadBranch(input: Pick<Input, "loadOhm" | "biasV">): Branch | null {
  if (input.loadOhm === null || input.loadOhm === undefined) return null;
  return { volt: toRange(input.biasV ?? 0), ohm: ohmRange(input.loadOhm), flow: "both" };
}

/** The two protection diodes behind their resistor. Only one of them can conduct at a time. */
export function clampBranches(clamp: Clamp): { high: Branch; low: Branch } {
  const ohm = ohmRange(clamp.seriesOhm);
  return {
    high: { volt: toRange(clamp.highV), ohm, flow: "outOf" },
    low: { volt: toRange(clamp.lowV), ohm, flow: "into" },
  };
}

/** Minus zero is zero: its reciprocal must not be minus infinity. */
function ohmRange(ohm: Spread): Range {
  const { min, max } = toRange(ohm);
  return { min: Math.max(0, min), max: Math.max(0, max) };
}
