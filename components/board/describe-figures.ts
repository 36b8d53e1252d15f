import type { Gear } from "@/lib/schemas/gear";
import { figureInfo } from "../gear/figure-catalogue";

/** Several figures of one box, in words. */
export interface NamedFigures {
  gearId: string;
  gearName: string;
  figures: string[];
}

const WHOLE: Record<string, string> = { supply: "its supply", safeV: "what it stands", pulseS: "the pulse's length", decayS: "the envelope's fall" };

/** Figures as a check names them (`<gearId>:<path>`), box by box in words; each said once. */
export function describeFigures(keys: readonly string[], gear: readonly Gear[]): NamedFigures[] {
  const boxes = new Map<string, NamedFigures>();
  for (const key of keys) {
    const cut = key.indexOf(":");
    const item = gear.find(({ id }) => id === key.slice(0, cut));
    if (!item) continue;
    const box = boxes.get(item.id) ?? { gearId: item.id, gearName: item.name, figures: [] };
    boxes.set(item.id, box);
    const words = sayFigure(item, key.slice(cut + 1));
    if (!box.figures.includes(words)) box.figures.push(words);
  }
  return [...boxes.values()];
}

function sayFigure(gear: Gear, path: string): string {
  const field = path.slice(path.lastIndexOf(".") + 1);
  const jack = gear.jacks.find(({ id }) => path.startsWith(`jacks.${id}.`));
  if (jack) {
    const figure = path.slice(`jacks.${jack.id}.`.length);
    const label = figureInfo(`jacks.0.${jack.direction}.${figure}`)?.label.toLowerCase() ?? WHOLE[figure] ?? WHOLE[field] ?? figure;
    return `${jack.name}: ${label}`;
  }
  const inForm = path.startsWith("details.") ? path : `details.${path.replace(/^pad\./, "")}`;
  return figureInfo(inForm)?.label.toLowerCase() ?? WHOLE[field] ?? field;
}
