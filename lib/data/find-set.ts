import "server-only";
import type { Transaction } from "sequelize";
import { AppError } from "@/lib/errors";
import { SetEntry, SetListRow } from "@/models";

/** One set of this rig with its entries. @throws AppError not-found */
export async function findSet(rigId: string, setId: string, transaction?: Transaction): Promise<SetListRow> {
  const set = await SetListRow.findOne({ where: { id: setId, rigId }, include: [{ model: SetEntry, as: "entries" }], transaction });
  if (!set) throw new AppError("not-found");
  return set;
}
