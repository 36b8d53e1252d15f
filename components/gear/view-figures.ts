import type { GearInput } from "@/lib/schemas/gear";
import type { Spread } from "@/lib/core/units";
import { figureInfo } from "./figure-catalogue";
import { showFigure } from "./figure-text";

/** One figure as it is read: its words, its value with unit, whether anybody has measured it. */
export interface ShownFigure {
  path: string;
  label: string;
  text: string;
  assumed: boolean;
  help: string;
}

/** Every known figure below a part of the gear, in the order of the form. */
export function shownFigures(node: unknown, infoPath: string, assumedPrefix: string, assumed: readonly string[]): ShownFigure[] {
  if (typeof node !== "object" || node === null) return [];
  return Object.entries(node).flatMap(([key, value]) => {
    const info = figureInfo(`${infoPath}.${key}`);
    const path = `${assumedPrefix}.${key}`;
    if (!info) return Array.isArray(value) ? [] : shownFigures(value, `${infoPath}.${key}`, path, assumed);
    if (value === null || value === undefined) return [];
    return [{ path, label: info.label, text: showFigure(value as Spread, info.unit), assumed: assumed.includes(path), help: info.help }];
  });
}

export const detailFigures = (gear: GearInput): ShownFigure[] => shownFigures(gear.details, "details", "details", gear.assumed);

export const jackFigures = (gear: GearInput, jack: GearInput["jacks"][number]): ShownFigure[] =>
  shownFigures(jack.direction === "output" ? jack.output : jack.input, `jacks.0.${jack.direction}`, `jacks.${jack.id}`, gear.assumed);
