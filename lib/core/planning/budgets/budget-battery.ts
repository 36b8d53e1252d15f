import { sayFigure, standingOf, type BudgetRow } from "./margin";

/** A discharge curve in two parts: how much a battery holds at each draw, and how that is spread over its voltage. */
export interface DischargeCurve {
  name: string;
  /** Where the figures are from, and what was not published. */
  source: string;
  /** [ampere, ampere-hours down to `endV`], draw rising. */
  capacity: [drawA: number, capacityAh: number][];
  endV: number;
  /** [volts under load, share of the capacity given before it falls to them], volts falling. */
  share: [volts: number, share: number][];
}

/**
 * A fresh 9 V alkaline (6LR61). 565 mAh for small draws is a nominal value (550–600 in maker's and secondary texts); 310 mAh at 0.1 A and 170 mAh at
 * 0.5 A are a published discharge test of retail batteries (powerstream.com, 9V-Alkaline-tests; the weakest alkaline there, run to 0.1 V, taken here
 * as 4.8 V, past which a 9 V battery gives little). The spread over voltage is from memory of makers' graphs; measure where it matters.
 */
export const ALKALINE_9V: DischargeCurve = {
  name: "9 V alkaline",
  source: "565 mAh nominal; 310 mAh at 0.1 A and 170 mAh at 0.5 A from a published test; shape over voltage assumed",
  capacity: [[0.01, 0.565], [0.1, 0.31], [0.5, 0.17]],
  endV: 4.8,
  share: [[9.3, 0], [8.4, 0.15], [7.8, 0.35], [7.2, 0.6], [6.6, 0.8], [6, 0.92], [4.8, 1]],
};

/**
 * Hours a fresh battery runs at a steady draw until it falls to a voltage. Between published draws the capacity is interpolated on the logarithm of the
 * draw; below the least it is held (never assumed larger); the share given by `cutoffV` is linear between the curve's points.
 * @param drawA above 0
 * @param cutoffV lowest voltage at which the gear still works; below the curve's end it counts as the end
 * @returns hours; null for a draw beyond the published ones, where nothing is known
 * @throws RangeError for a draw that is not above 0
 */
export function runHours(curve: DischargeCurve, drawA: number, cutoffV: number): number | null {
  if (!(drawA > 0)) throw new RangeError(`a battery's draw is above 0 A, got ${drawA}`);
  const capacityAh = capacityAt(curve.capacity, drawA);
  return capacityAh === null ? null : (capacityAh * shareAt(curve.share, cutoffV)) / drawA;
}

function capacityAt(points: DischargeCurve["capacity"], drawA: number): number | null {
  const [least] = points;
  if (!least || drawA > points[points.length - 1]![0] * (1 + 1e-12)) return null;
  if (drawA <= least[0]) return least[1];
  const above = Math.max(1, points.findIndex(([draw]) => draw >= drawA * (1 - 1e-12)));
  const [lowA, lowAh] = points[above - 1]!;
  const [highA, highAh] = points[above]!;
  return lowAh + ((highAh - lowAh) * Math.log(drawA / lowA)) / Math.log(highA / lowA);
}

function shareAt(points: DischargeCurve["share"], volts: number): number {
  const below = points.findIndex(([point]) => point <= volts);
  if (below === 0) return points[0]![1];
  if (below < 0) return points[points.length - 1]?.[1] ?? 0;
  const [highV, highShare] = points[below - 1]!;
  const [lowV, lowShare] = points[below]!;
  return highShare + ((lowShare - highShare) * (highV - volts)) / (highV - lowV);
}

export interface BatteryUse {
  subject: string;
  curve: DischargeCurve;
  /** The patch's real draw; null: not known. */
  drawA: number | null;
  /** The lowest voltage at which every run that uses it still fires; null: not known. */
  cutoffV: number | null;
  /** How many are wired in parallel or kept as fresh spares that are swapped in; default 1. */
  count?: number;
}

/**
 * Each battery's run time against what the night asks of it.
 * @param wanted hours of sound check, set and spare; together above 0
 */
export function budgetBattery(uses: BatteryUse[], wanted: { soundCheckH: number; setH: number; spareH: number }): BudgetRow[] {
  const need = wanted.soundCheckH + wanted.setH + wanted.spareH;
  return uses.map(({ subject, curve, drawA, cutoffV, count = 1 }) => {
    const row = { subject, need, unit: "h" };
    const unproven = (text: string): BudgetRow => ({ ...row, have: null, margin: null, standing: "unproven", text });
    if (drawA === null) return unproven("Its draw is missing: measure the current with the patch plugged.");
    if (cutoffV === null) return unproven("The lowest voltage at which its runs still fire is missing.");
    if (drawA === 0) return { ...row, have: null, margin: null, standing: "enough" as const, text: "Nothing draws from it." };
    const hours = runHours(curve, drawA, cutoffV);
    if (hours === null) return unproven(`${sayFigure(drawA * 1000)} mA is more than any published draw of a ${curve.name}.`);
    const have = hours * count;
    const standing = standingOf(need, have, WANTED_SPARE);
    const text = `About ${sayFigure(have)} h at ${sayFigure(drawA * 1000)} mA down to ${sayFigure(cutoffV)} V; ${sayFigure(need)} h wanted. ${curve.source}.`;
    const mend = standing === "short" ? { mend: `Take ${Math.ceil(need / hours) - count} more, or a supply.` } : {};
    return { ...row, have, margin: have - need, standing, text, ...mend };
  });
}

/** Batteries differ: under a fifth to spare is close (common practice, no source). */
const WANTED_SPARE = 0.2;
