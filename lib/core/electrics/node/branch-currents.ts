import type { Range } from "@/lib/core/units/spread";
import type { Branch } from "./branch";
import { currentInto, feedLeast, feedMost, solvePieces, withLeadOhm, type Piece } from "./solve-node";

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
  return { min: least, max: most };
}

function givenCurrent(source: Branch, volt: number, others: readonly Piece[], want: "most" | "least"): number {
  const drawn = -netCurrent(others, volt);
  if (drawn === 0) return 0;
  if ((source.flow === "into" && drawn < 0) || (source.flow === "outOf" && drawn > 0)) return 0;
  const ohm = drawn > 0 === (want === "most") ? source.ohm.min : source.ohm.max;
  if (ohm === 0) {
    if (Number.isFinite(drawn)) return drawn;
    return givenCurrent({ ...source, ohm: { min: 1e-3, max: 1e-3 } }, volt, others.map(withLeadOhm), want);
  }
  const level = solvePieces([{ volt, below: 1 / ohm, above: 1 / ohm }, ...others], "zero");
  // Kirchhoff keeps more digits than the small difference over a small resistance, but an ideal branch has no Ohm's law.
  const ideal = others.some((p) => p.below === Infinity || p.above === Infinity);
  return ideal ? (volt - level) / ohm : 0 - currentInto(others, level);
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
  if (!(sign * netCurrent(rest, volt) > 0)) return 0;
  if (ohm === 0) {
    const pushed = sign * netCurrent(rest, volt);
    return Number.isFinite(pushed) ? pushed : diodeCurrentMost({ ...diode, ohm: { min: 1e-3, max: 1e-3 } }, others);
  }
  const piece: Piece = { volt, below: drains ? 0 : 1 / ohm, above: drains ? 1 / ohm : 0 };
  const level = solvePieces([piece, ...rest], drains ? "low" : "high");
  return Math.max(0, (sign * (level - volt)) / ohm);
}

/** As `currentInto`, but an ideal branch that is exactly at the level may take all of it: its jump is reported by sign. */
function netCurrent(pieces: readonly Piece[], volt: number): number {
  let sum = 0;
  let up = false;
  let down = false;
  for (const piece of pieces) {
    const drop = piece.volt - volt;
    if (drop > 0 && piece.below === Infinity) up = true;
    else if (drop < 0 && piece.above === Infinity) down = true;
    else if (drop !== 0) sum += drop * (drop > 0 ? piece.below : piece.above);
  }
  if (up && down) return currentInto(pieces.map(withLeadOhm), volt);
  return up ? Infinity : down ? -Infinity : sum;
}
