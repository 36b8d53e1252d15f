/** How a need stands against what there is; `unproven`: a figure is missing, named in the text. */
export type Standing = "enough" | "close" | "short" | "unproven";

/** A budget's row: what is needed and what there is in one unit, the margin, and one plain sentence. */
export interface BudgetRow {
  /** What the row is about: a lead type, a rail, a battery, a gap, a channel. */
  subject: string;
  /** Null where a figure is missing. */
  need: number | null;
  have: number | null;
  /** have − need. */
  margin: number | null;
  unit: string;
  standing: Standing;
  text: string;
  /** What would mend it, where it is short. */
  mend?: string;
}

/** `close` where the margin is under this share of what there is. */
export function standingOf(need: number, have: number, wantedShare: number): Standing {
  if (need > have * (1 + 1e-12)) return "short";
  // Exactly the wanted margin is enough, rounding aside.
  return have - need < wantedShare * have * (1 - 1e-9) ? "close" : "enough";
}

/** A figure for people: at most 3 significant figures, true minus sign. */
export function sayFigure(value: number): string {
  return String(Number(value.toPrecision(3))).replace("-", "\u2212");
}
