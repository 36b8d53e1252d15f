import "server-only";
import type { Transaction } from "sequelize";
import { AppError, fieldFault } from "@/lib/errors";
import { GearRow } from "@/models";

/** Refuses a supply that is not a supply of this rig. @throws AppError unprocessable naming the field */
export async function requireSupply(rigId: string, supplyId: string | null, path: readonly string[], transaction: Transaction): Promise<void> {
  if (supplyId === null) return;
  const supply = await GearRow.findOne({ where: { id: supplyId, rigId, kind: "supply" }, transaction });
  if (supply) return;
  throw new AppError("unprocessable", {
    userMessage: "That supply is not in this rig.",
    fields: [fieldFault(path, "Choose a supply of this rig, or none.")],
  });
}
