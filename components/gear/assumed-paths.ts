import { figureInfo } from "./figure-catalogue";
import type { GearFormValues, JackValues } from "./form-values";

/** The path by which `assumed` knows a figure: `jacks.0.input.onV` → `jacks.<jackId>.onV`. */
export function assumedPath(formPath: string, jacks: readonly Pick<JackValues, "id">[]): string {
  const [root, index, side, ...rest] = formPath.split(".");
  if (root !== "jacks" || index === undefined || side === undefined) return formPath;
  return ["jacks", jacks[Number(index)]?.id ?? index, ...rest].join(".");
}

/** Every figure the form holds: its form path, its assumed path and its text. */
export function listFigures(values: Pick<GearFormValues, "details" | "jacks">): { formPath: string; path: string; text: string }[] {
  const found: { formPath: string; path: string; text: string }[] = [];
  const walk = (node: unknown, formPath: string): void => {
    if (figureInfo(formPath)) {
      found.push({ formPath, path: assumedPath(formPath, values.jacks), text: typeof node === "string" ? node : "" });
      return;
    }
    if (typeof node !== "object" || node === null) return;
    for (const [key, child] of Object.entries(node)) walk(child, formPath === "" ? key : `${formPath}.${key}`);
  };
  walk(values.details, "details");
  values.jacks.forEach((jack, index) => walk(jack, `jacks.${index}`));
  return found;
}

/** Only the paths that still name a figure with a value: a removed jack or an emptied box is no longer assumed. */
export function pruneAssumed(values: GearFormValues): string[] {
  const filled = new Set(listFigures(values).filter((figure) => figure.text.trim() !== "").map((figure) => figure.path));
  return values.assumed.filter((path) => filled.has(path));
}
