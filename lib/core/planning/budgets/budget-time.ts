import { sayFigure, standingOf, type BudgetRow } from "./margin";

export interface Gap {
  /** Names of the songs before and after. */
  before: string;
  after: string;
  changeoverS: number;
  /** Seconds the set list gives: talk, tuning, a drone that covers it; null: not planned. */
  gapS: number | null;
}

export interface TimeBudget {
  rows: BudgetRow[];
  /** Seconds over the whole set; spare is what the slot leaves, null where a figure is missing. */
  playingS: number | null;
  changeoverS: number;
  /** Gaps as they will be: each at least its changeover. */
  gapsS: number;
  spareS: number | null;
}

/**
 * Each changeover against the gap it has, and the set against its slot.
 * @param lengthsS seconds each song plays; null: not known
 * @param slotS seconds on stage; null: not known
 */
export function budgetTime(gaps: Gap[], lengthsS: (number | null)[] = [], slotS: number | null = null): TimeBudget {
  const rows = gaps.map(({ before, after, changeoverS, gapS }): BudgetRow => {
    const row = { subject: `${before} → ${after}`, need: changeoverS, have: gapS, margin: gapS === null ? null : gapS - changeoverS, unit: "s" };
    if (gapS === null) return { ...row, standing: "unproven", text: `${sayFigure(changeoverS)} s to change over; no gap is planned.` };
    const standing = changeoverS === 0 ? "enough" : standingOf(changeoverS, gapS, 0.1);
    const text = `${sayFigure(changeoverS)} s to change over in a gap of ${sayFigure(gapS)} s.`;
    return { ...row, standing, text, ...(standing === "short" ? { mend: `Cover ${sayFigure(changeoverS - gapS)} s more, or move the songs apart.` } : {}) };
  });
  const playingS = lengthsS.some((length) => length === null) ? null : lengthsS.reduce<number>((sum, length) => sum + (length ?? 0), 0);
  const changeoverS = gaps.reduce((sum, gap) => sum + gap.changeoverS, 0);
  const gapsS = gaps.reduce((sum, gap) => sum + Math.max(gap.gapS ?? 0, gap.changeoverS), 0);
  return { rows, playingS, changeoverS, gapsS, spareS: playingS === null || slotS === null ? null : slotS - playingS - gapsS };
}
