import { sayFigure, type BudgetRow } from "./margin";

export interface DeskUse {
  channel: string;
  /** What is heard on it. */
  source: string;
  /** Expected level, worst case, in dBu; null: not known. */
  levelDbu: { min: number; max: number } | null;
  /** The most the input takes; null: not known. */
  maxDbu: number | null;
  /** Phantom power on: true, false, or null where nobody has looked. */
  phantom: boolean | null;
  hasDi: boolean;
  /** The output is home-made (not a commercial, phantom-proof one). */
  isHomeMade: boolean;
}

export interface DeskBudget {
  rows: BudgetRow[];
  used: number;
  available: number | null;
}

/** dB wanted between the highest level expected and what the input takes (common practice, no source). */
const WANTED_DB = 6;

/**
 * What the desk meets in a song: how hot each channel can be against what it takes, where a DI box is needed, and that phantom power is off
 * wherever a home-made output arrives without one.
 * @param available channels the desk has; null: not known
 */
export function budgetDesk(uses: DeskUse[], available: number | null): DeskBudget {
  const used = new Set(uses.map((use) => use.channel)).size;
  const rows = uses.map((use): BudgetRow => {
    const need = use.levelDbu?.max ?? null;
    const have = use.maxDbu;
    const row = { subject: use.channel, need, have, margin: need === null || have === null ? null : have - need, unit: "dBu" };
    if (use.phantom === true && use.isHomeMade && !use.hasDi) {
      return { ...row, standing: "short", text: `Phantom power is on and ${use.source} is home-made.`, mend: "Switch phantom off on this channel, or put a DI box between." };
    }
    if (need !== null && have !== null && need > have) {
      return { ...row, standing: "short", text: `${use.source} can reach ${sayFigure(need)} dBu; the input takes ${sayFigure(have)} dBu.`, mend: `Use a DI box with at least ${sayFigure(need - have + WANTED_DB)} dB of pad, or turn the source down.` };
    }
    const phantom = use.phantom === null && use.isHomeMade && !use.hasDi ? " Make sure phantom power is off." : "";
    if (need === null || have === null) {
      return { ...row, standing: "unproven", text: `${need === null ? `The level of ${use.source}` : "What the input takes"} is missing.${phantom}` };
    }
    const isClose = have - need < WANTED_DB;
    return { ...row, standing: phantom ? "unproven" : isClose ? "close" : "enough", text: `${use.source}: up to ${sayFigure(need)} dBu of ${sayFigure(have)} dBu.${phantom}` };
  });
  return { rows, used, available };
}
