import { gearInputSchema, type Gear, type GearInput } from "@/lib/schemas/gear";
import { figureInfo } from "./figure-catalogue";

/** The stored version with one person's changes put onto it. */
export interface MergedGear {
  gear: GearInput;
  /** How many things both had changed, differently; those are as in mine. */
  clashes: number;
}

/**
 * Three-way merge: what only one side changed since `base` is taken from that side.
 * @returns null where the two do not fit together into gear that can be saved.
 */
export function mergeGear(base: GearInput, mine: GearInput, stored: GearInput): MergedGear | null {
  let clashes = 0;
  const clash = (kept: unknown): unknown => {
    clashes += 1;
    return kept;
  };
  const merged = mergeNode(strip(base), strip(mine), strip(stored), "", clash);
  const parsed = gearInputSchema.safeParse(merged);
  return parsed.success ? { gear: parsed.data, clashes } : null;
}

/** A stored piece of gear carries its id and revision beside what can be edited. */
function strip({ name, notes, supplyId, details, jacks, knobs, assumed }: GearInput | Gear): GearInput {
  return { name, notes, supplyId, details, jacks, knobs, assumed };
}

type Clash = (kept: unknown) => unknown;
type WithId = { id: string };

function mergeNode(base: unknown, mine: unknown, stored: unknown, path: string, clash: Clash): unknown {
  if (same(mine, stored) || same(stored, base)) return mine;
  if (same(mine, base)) return stored;
  if (path === "assumed" || path.endsWith(".accepts")) return mergeSets(base as string[], mine as string[], stored as string[]);
  if (isList(mine) && isList(stored)) return mergeLists(isList(base) ? base : [], mine, stored, path, clash);
  if (figureInfo(path) !== null || !isPlain(mine) || !isPlain(stored)) return clash(mine);
  const before = isPlain(base) ? base : {};
  const keys = [...new Set([...Object.keys(mine), ...Object.keys(stored)])];
  return Object.fromEntries(keys.map((key) => [key, mergeNode(before[key], mine[key], stored[key], path === "" ? key : `${path}.${key}`, clash)]));
}

/** Jacks and knobs by their ids: those both have are merged, those one side added are kept, those one side removed go unless the other changed them. */
function mergeLists(base: WithId[], mine: WithId[], stored: WithId[], path: string, clash: Clash): WithId[] {
  const find = (list: WithId[], id: string) => list.find((item) => item.id === id);
  const ids = [...stored.map((item) => item.id), ...mine.filter((item) => !find(stored, item.id)).map((item) => item.id)];
  return ids.flatMap((id) => {
    const [before, here, there] = [find(base, id), find(mine, id), find(stored, id)];
    if (here && there) return [mergeNode(before, here, there, `${path}.0`, clash) as WithId];
    const left = here ?? there;
    if (!before || !left) return left ? [left] : [];
    return same(left, before) ? [] : [clash(left) as WithId];
  });
}

function mergeSets(base: string[], mine: string[], stored: string[]): string[] {
  const removed = base.filter((item) => !mine.includes(item) || !stored.includes(item));
  return [...new Set([...stored, ...mine])].filter((item) => !removed.includes(item));
}

function same(a: unknown, b: unknown): boolean {
  if (Object.is(a, b)) return true;
  if (Array.isArray(a) && Array.isArray(b)) return a.length === b.length && a.every((item, index) => same(item, b[index]));
  if (!isPlain(a) || !isPlain(b)) return false;
  const keys = Object.keys(a);
  return keys.length === Object.keys(b).length && keys.every((key) => same(a[key], b[key]));
}

const isPlain = (node: unknown): node is Record<string, unknown> => typeof node === "object" && node !== null && !Array.isArray(node);
const isList = (node: unknown): node is WithId[] => Array.isArray(node) && node.every((item) => isPlain(item) && typeof item.id === "string");
