import { exactSpreadText, formatSpread, parseQuantity, parseSpread, type Parsed, type Spread } from "@/lib/core/units";
import type { FigureInfo } from "./figure-catalogue";

/** A stored figure as text for an edit field: the short form where it reads back to the same numbers, else the exact one. */
export function figureText(value: Spread | null | undefined, unit: FigureInfo["unit"]): string {
  if (value === null || value === undefined) return "";
  if (unit === "dBu") return String(value);
  const short = formatSpread(value, unit);
  const back = parseSpread(short, unit);
  return back.ok && sameSpread(back.value, value) ? short : exactSpreadText(value, unit);
}

/** Reads what was typed, as the schema will. */
export function readFigure(text: string, info: Pick<FigureInfo, "unit" | "spread">): Parsed<Spread> {
  if (info.unit === "dBu") {
    const number = Number(text.trim().replace("−", "-").replace(/\s*dBu$/i, ""));
    return Number.isFinite(number) && text.trim() !== "" ? { ok: true, value: number } : { ok: false, message: "Write a level in dBu, for example 22." };
  }
  return info.spread ? parseSpread(text, info.unit) : parseQuantity(text, info.unit);
}

/** A figure with its unit and at most 3 significant figures; an em dash where it is not known. */
export function showFigure(value: Spread | null | undefined, unit: FigureInfo["unit"]): string {
  if (value === null || value === undefined) return "—";
  if (unit === "dBu") return typeof value === "number" ? `${Number(value.toPrecision(3))} dBu`.replace("-", "−") : "—";
  return formatSpread(value, unit);
}

/** What the text is taken for, shown beside the field: `= 4.7 kΩ`. Empty while it cannot be read, or where it says just that already. */
export function readBack(text: string, info: Pick<FigureInfo, "unit" | "spread">): string {
  if (text.trim() === "") return "";
  const parsed = readFigure(text, info);
  if (!parsed.ok) return "";
  const shown = showFigure(parsed.value, info.unit);
  return shown === text.trim() ? "" : `= ${shown}`;
}

export function sameSpread(a: Spread, b: Spread): boolean {
  if (typeof a === "number" || typeof b === "number") return a === b;
  if ("nominal" in a || "nominal" in b) return "nominal" in a && "nominal" in b && a.nominal === b.nominal && a.tol === b.tol;
  return a.min === b.min && a.max === b.max;
}
