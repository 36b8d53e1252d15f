import type { Range } from "@/lib/core/units/spread";
import type { Branch } from "./branch";

/**
 * A branch with its spreads settled: below `volt` it feeds the node through
 * `below` siemens, above it drains the node through `above` siemens.
 */
export interface Piece {
  volt: number;
  below: number;
  above: number;
}

/** Which end is taken where the node floats between diodes that all block. */
export type Floating = "low" | "high" | "zero";

/** The branch as it feeds most current into the node, whatever the node's level. */
export function feedMost({ volt, ohm, flow }: Branch): Piece {
  return {
    volt: volt.max,
    below: flow === "outOf" ? 0 : 1 / ohm.min,
    above: flow === "into" ? 0 : 1 / ohm.max,
  };
}

/** The branch as it feeds least current into the node, whatever the node's level. */
export function feedLeast({ volt, ohm, flow }: Branch): Piece {
  return {
    volt: volt.min,
    below: flow === "outOf" ? 0 : 1 / ohm.max,
    above: flow === "into" ? 0 : 1 / ohm.min,
  };
}

/** Current into a node at `volt` through settled branches, A. */
export function currentInto(pieces: readonly Piece[], volt: number): number {
  let sum = 0;
  for (const piece of pieces) {
    const drop = piece.volt - volt;
    if (drop > 0) sum += drop * piece.below;
    else if (drop < 0) sum += drop * piece.above;
  }
  return sum;
}

/**
 * Exact range of a node's level over every spread of its branches.
 *
 * For a fixed level the current each branch feeds depends on its own spreads
 * alone, so the most (least) that all together can feed is the sum of each
 * one's most (least). Both sums fall with the level, and where the upper one
 * is zero the level is the highest that any choice of values can reach —
 * reached by that very choice, so nothing is overestimated. The sums are
 * straight between the branches' voltages; there the level is Millman's.
 *
 * @param floating end taken where nothing fixes the level.
 * Source: J. Millman, “A Useful Network Theorem”, Proc. IRE 28 (1940), from memory; Kirchhoff's current law.
 */
export function nodeRange(branches: readonly Branch[], floating: Floating): Range {
  const least = solvePieces(branches.map(feedLeast), floating);
  const most = solvePieces(branches.map(feedMost), floating);
  // Without any spread the two differ by rounding at most, and may come out crossed.
  return { min: Math.min(least, most), max: Math.max(least, most) };
}

/** The level at which settled branches feed as much as they drain. An isolated node rests at 0 V. Ideal branches must not fight (see `keepFinite`). */
export function solvePieces(pieces: readonly Piece[], floating: Floating): number {
  if (pieces.length === 0) return 0;
  const levels = pieces.map((p) => p.volt).sort((a, b) => a - b);
  // First level whose right-hand current is not positive: the lowest root lies at it or just below it.
  let low = 0;
  let high = levels.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if (sideCurrent(pieces, levels[middle] as number, "right") > 0) low = middle + 1;
    else high = middle;
  }
  if (low === levels.length) return millman(pieces, levels[low - 1] as number, Infinity);
  const level = levels[low] as number;
  if (sideCurrent(pieces, level, "left") < 0) return millman(pieces, low === 0 ? -Infinity : (levels[low - 1] as number), level);
  return settleFloating(pieces, levels, low, floating);
}

/** Current into the node just beside a branch's own voltage, where an ideal one jumps. */
function sideCurrent(pieces: readonly Piece[], level: number, side: "left" | "right"): number {
  for (const piece of pieces) {
    if (piece.volt !== level) continue;
    if (side === "left" && piece.below === Infinity) return Infinity;
    if (side === "right" && piece.above === Infinity) return -Infinity;
  }
  return currentInto(pieces, level);
}

/** Millman's level for the conductances that hold strictly between two neighbouring branch voltages. */
function millman(pieces: readonly Piece[], above: number, below: number): number {
  let siemens = 0;
  let amps = 0;
  for (const piece of pieces) {
    const g = piece.volt >= below ? piece.below : piece.above;
    siemens += g;
    amps += g * piece.volt;
  }
  const level = amps / siemens;
  return Math.min(Math.max(level, above), below);
}

/** `levels[index]` balances; where the current stays zero beyond it the node floats and an end is chosen. */
function settleFloating(pieces: readonly Piece[], levels: readonly number[], index: number, floating: Floating): number {
  const lowest = levels[index] as number;
  if (floating === "low") return lowest;
  const above = pieces.some((p) => (p.volt > lowest ? p.below : p.above) !== 0);
  if (above || sideCurrent(pieces, lowest, "right") !== 0) return lowest;
  const highest = levels.find((level) => level > lowest) ?? lowest;
  return floating === "high" ? highest : Math.min(Math.max(0, lowest), highest);
}
