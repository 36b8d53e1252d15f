import "server-only";
import type { SetList } from "@/lib/schemas/set";
import { SetEntry, SetListRow } from "@/models";
import type { Actor } from "./actor";
import { presentSet } from "./present-set";
import { requireRight } from "./require-right";

export async function listSets(actor: Actor, rigId: string): Promise<SetList[]> {
  await requireRight(actor, rigId, "seeRig");
  const rows = await SetListRow.findAll({ where: { rigId }, include: [{ model: SetEntry, as: "entries" }], order: [["position", "ASC"]] });
  return rows.map(presentSet);
}
