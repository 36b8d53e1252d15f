import { GEAR_KINDS, type Gear, type GearKind } from "@/lib/schemas/gear";
import { KIND_WORD } from "./gear-words";
import { summariseGear } from "./summarise-gear";

export const COLUMNS = ["name", "kind", "figures", "assumed", "supply", "state"] as const;
export type Column = (typeof COLUMNS)[number];

/** How the list is asked for; it lives in the address, so that a view can be kept and sent. */
export interface GearQuery {
  sort: Column | null;
  descending: boolean;
  kind: GearKind | null;
  text: string;
  assumedOnly: boolean;
  retired: boolean;
}

/** One line of the table. */
export interface GearRow {
  gear: Gear;
  kind: string;
  figures: string;
  assumed: number;
  supply: string;
  state: "in use" | "retired";
}

export function readGearQuery(params: Pick<URLSearchParams, "get">): GearQuery {
  const sort = params.get("sort");
  const kind = params.get("kind");
  return {
    sort: COLUMNS.find((column) => column === sort) ?? null,
    descending: params.get("dir") === "down",
    kind: GEAR_KINDS.find((known) => known === kind) ?? null,
    text: (params.get("q") ?? "").slice(0, 80),
    assumedOnly: params.get("assumed") === "yes",
    retired: params.get("retired") === "yes",
  };
}

/** Only what differs from the plain list is written into the address. */
export function writeGearQuery(query: GearQuery): string {
  const params = new URLSearchParams();
  if (query.text) params.set("q", query.text);
  if (query.kind) params.set("kind", query.kind);
  if (query.assumedOnly) params.set("assumed", "yes");
  if (query.retired) params.set("retired", "yes");
  if (query.sort) params.set("sort", query.sort);
  if (query.sort && query.descending) params.set("dir", "down");
  return params.toString();
}

export function buildGearRows(gear: readonly Gear[]): GearRow[] {
  const names = new Map(gear.map((item) => [item.id, item.name]));
  return gear.map((item) => ({
    gear: item,
    kind: KIND_WORD[item.kind],
    figures: summariseGear(item),
    assumed: item.assumed.length,
    supply: item.supplyId === null ? "" : names.get(item.supplyId) ?? "",
    state: item.retired ? "retired" : "in use",
  }));
}

/** The rows asked for, in the order asked for; the rig's own order where none is. */
export function arrangeGearRows(rows: readonly GearRow[], query: GearQuery): GearRow[] {
  const words = query.text.toLocaleLowerCase("en-GB").split(/\s+/).filter(Boolean);
  const kept = rows.filter((row) => {
    if (row.gear.retired && !query.retired) return false;
    if (query.kind && row.gear.kind !== query.kind) return false;
    if (query.assumedOnly && row.assumed === 0) return false;
    const haystack = [row.gear.name, row.kind, row.figures, row.supply, row.gear.notes, ...row.gear.jacks.map((jack) => jack.name)]
      .join(" ").toLocaleLowerCase("en-GB");
    return words.every((word) => haystack.includes(word));
  });
  const { sort } = query;
  if (!sort) return kept;
  const turn = query.descending ? -1 : 1;
  return kept
    .map((row, index) => ({ row, index }))
    .sort((a, b) => turn * compare(a.row, b.row, sort) || a.index - b.index)
    .map(({ row }) => row);
}

const collator = new Intl.Collator("en-GB", { numeric: true, sensitivity: "base" });

function compare(a: GearRow, b: GearRow, column: Column): number {
  switch (column) {
    case "name": return collator.compare(a.gear.name, b.gear.name);
    case "kind": return GEAR_KINDS.indexOf(a.gear.kind) - GEAR_KINDS.indexOf(b.gear.kind);
    case "assumed": return a.assumed - b.assumed;
    case "figures": return collator.compare(a.figures, b.figures);
    case "supply": return collator.compare(a.supply, b.supply);
    case "state": return collator.compare(a.state, b.state);
  }
}
