import type { Range } from "@/lib/core/units/spread";
import type { Branch } from "./branch";
import { currentInto, feedLeast, feedMost, solvePieces, type Piece } from "./solve-node";

/**
 * Exact range of the current a source gives into the rest of its node, over every spread, A.
 * Negative: the rest pushes current into it.
 *
 * With the current as the unknown, the node's level is the source's less its
 * own drop, and what the rest draws grows with that level; so the most is drawn
 * with the source at its highest, its resistance least where current leaves it
 * (greatest where it enters), and every other branch feeding least.
 *
 * @param source the branch asked about; its `volt` may span both states.
 * @param others every other branch of the node.
 */
export function sourceCurrentRange(source: Branch, others: readonly Branch[]): Range {
  const most = givenCurrent(source, source.volt.max, others.map(feedLeast), "most");
  const least = givenCurrent(source, source.volt.min, others.map(feedMost), "least");
  // Without any spread the two differ by rounding at most, and may come out crossed.
  return { min: Math.min(least, most), max: Math.max(least, most) };
}

function givenCurrent(source: Branch, volt: number, others: readonly Piece[], want: "most" | "least"): number {
  const drawn = 0 - currentInto(others, volt);
  if (drawn === 0) return 0;
  if ((source.flow === "into" && drawn < 0) || (source.flow === "outOf" && drawn > 0)) return 0;
  const ohm = drawn > 0 === (want === "most") ? source.ohm.min : source.ohm.max;
  if (ohm === 0) return drawn;
  const level = solvePieces([{ volt, below: 1 / ohm, above: 1 / ohm }, ...others], "zero");
  // Two ways to the same current; the one over the lesser conductance loses fewer digits of the level.
  return conductanceAt(others, level) < 1 / ohm ? 0 - currentInto(others, level) : (volt - level) / ohm;
}

/**
 * Greatest current through one conducting diode branch of a node, A, 0 where it cannot conduct.
 * @param diode an `outOf` branch (it drains) or an `into` branch (it feeds).
 * @param others every other branch of the node.
 */
export function diodeCurrentMost(diode: Branch, others: readonly Branch[]): number {
  const drains = diode.flow === "outOf";
  const volt = drains ? diode.volt.min : diode.volt.max;
  const rest = others.map(drains ? feedMost : feedLeast);
  const sign = drains ? 1 : -1;
  const ohm = diode.ohm.min;
  const pushed = sign * currentInto(rest, volt);
  if (!(pushed > 0)) return 0;
  if (ohm === 0) return pushed;
  const piece: Piece = { volt, below: drains ? 0 : 1 / ohm, above: drains ? 1 / ohm : 0 };
  const level = solvePieces([piece, ...rest], drains ? "low" : "high");
  return Math.max(0, (sign * (level - volt)) / ohm);
}

function conductanceAt(pieces: readonly Piece[], level: number): number {
  return pieces.reduce((sum, piece) => sum + (piece.volt > level ? piece.below : piece.above), 0);
}
