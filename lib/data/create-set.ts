import "server-only";
import { randomUUID } from "node:crypto";
import { AppError } from "@/lib/errors";
import type { SetList } from "@/lib/schemas/set";
import { SetListRow } from "@/models";
import type { Actor } from "./actor";
import { writeTx } from "./database";
import { presentSet } from "./present-set";
import { requireRight } from "./require-right";

const MOST_SETS = 50;

export async function createSet(actor: Actor, rigId: string, name: string): Promise<SetList> {
  await requireRight(actor, rigId, "editSets");
  return writeTx(async (transaction) => {
    const count = await SetListRow.count({ where: { rigId }, transaction });
    if (count >= MOST_SETS) throw new AppError("unprocessable", { userMessage: `A rig holds at most ${MOST_SETS} set lists.` });
    return presentSet(await SetListRow.create({ id: randomUUID(), rigId, name, position: count }, { transaction }));
  });
}
