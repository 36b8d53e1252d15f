import "server-only";
import { randomUUID } from "node:crypto";
import { AppError } from "@/lib/errors";
import { Membership, Rig, SetListRow } from "@/models";
import type { Actor } from "./actor";
import { writeTx } from "./database";

const MOST_RIGS = 50;

/** A new rig owned by whoever made it, with one empty set list to put songs in. */
export async function createRig(actor: Actor, name: string): Promise<{ id: string; name: string }> {
  return writeTx(async (transaction) => {
    const owned = await Membership.count({ where: { userId: actor.userId }, transaction });
    if (owned >= MOST_RIGS) throw new AppError("unprocessable", { userMessage: `One person can be in at most ${MOST_RIGS} rigs.` });
    const id = randomUUID();
    await Rig.create({ id, name, createdAt: new Date() }, { transaction });
    await Membership.create({ rigId: id, userId: actor.userId, role: "performer" }, { transaction });
    await SetListRow.create({ id: randomUUID(), rigId: id, name: "Set list", position: 0 }, { transaction });
    return { id, name };
  });
}
