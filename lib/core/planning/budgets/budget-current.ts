import { sayFigure, standingOf, type BudgetRow } from "./margin";

export interface Rail {
  id: string;
  name: string;
  /** What the rail is rated for; null: not known. */
  ratingA: number | null;
}

export interface Draw {
  rail: string;
  gear: string;
  /** Worst-case ampere the gear takes from the rail, 0 or more; null: not known. */
  drawA: number | null;
}

/** Share of a rail's rating to be left free (common practice, no source). */
export const WANTED_HEADROOM = 0.2;

/**
 * The current each supply rail gives in one song (or with everything plugged in), against its rating with 20 % to spare.
 * @param draws of all gear that is switched on; a positive and a negative rail are two rails
 * @returns one row a rail, in ampere; a rail with a missing figure is `unproven` unless what is known is already too much
 */
export function budgetCurrent(rails: Rail[], draws: Draw[]): BudgetRow[] {
  return rails.map((rail) => {
    const own = draws.filter((draw) => draw.rail === rail.id);
    const unknown = own.filter((draw) => draw.drawA === null).map((draw) => draw.gear);
    const need = own.reduce((sum, draw) => sum + (draw.drawA ?? 0), 0);
    const have = rail.ratingA;
    const row = { subject: rail.name, need, have, margin: have === null ? null : have - need, unit: "A" };
    const known = `${sayFigure(need * 1000)} mA`;
    const measure = unknown.length > 0 ? ` Measure what ${unknown.join(", ")} takes.` : "";
    if (have === null) return { ...row, standing: "unproven" as const, text: `${known} known; the rating is missing.${measure}` };
    const standing = standingOf(need, have, WANTED_HEADROOM);
    const spare = have > 0 ? Math.round((1 - need / have) * 100) : 0;
    const text = `${known} of ${sayFigure(have * 1000)} mA${need <= have ? `, ${sayFigure(spare)} % to spare` : ""}.${measure}`;
    if (standing === "short") {
      return { ...row, standing, text, mend: `Move gear that takes ${sayFigure((need - have * (1 - WANTED_HEADROOM)) * 1000)} mA to another supply, or use one rated ${sayFigure((need / (1 - WANTED_HEADROOM)) * 1000)} mA or more.` };
    }
    return { ...row, standing: unknown.length > 0 ? ("unproven" as const) : standing, text };
  });
}
