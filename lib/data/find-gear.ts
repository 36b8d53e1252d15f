import "server-only";
import type { Transaction } from "sequelize";
import { AppError } from "@/lib/errors";
import { GearRow, JackRow } from "@/models";

/** One gear row of this rig with its jacks. @throws AppError not-found */
export async function findGear(rigId: string, gearId: string, transaction?: Transaction): Promise<GearRow> {
  const row = await GearRow.findOne({ where: { id: gearId, rigId }, include: [{ model: JackRow, as: "jacks" }], transaction });
  if (!row) throw new AppError("not-found");
  return row;
}

/** Every gear row of this rig, in its order. */
export function findAllGear(rigId: string, transaction?: Transaction): Promise<GearRow[]> {
  return GearRow.findAll({ where: { rigId }, include: [{ model: JackRow, as: "jacks" }], order: [["position", "ASC"], ["id", "ASC"]], transaction });
}
