import type { Gear } from "@/lib/schemas/gear";
import type { Jack } from "@/lib/schemas/jack";
import type { GearRow, JackRow } from "@/models";

function presentJack(row: JackRow): Jack {
  const shared = { id: row.id, name: row.name, connector: row.connector, role: row.role };
  return (row.direction === "output"
    ? { ...shared, direction: "output", output: row.figures }
    : { ...shared, direction: "input", input: row.figures }) as Jack;
}

/** A gear row and its jacks as plain data. */
export function presentGear(row: GearRow): Gear {
  const jacks = [...(row.jacks ?? [])].sort((a, b) => a.position - b.position).map(presentJack);
  return {
    id: row.id,
    kind: row.kind,
    name: row.name,
    notes: row.notes,
    supplyId: row.supplyId,
    details: row.details,
    jacks,
    knobs: row.knobs,
    assumed: row.assumed,
    retired: row.retired,
    revision: row.revision,
    position: row.position,
  };
}
