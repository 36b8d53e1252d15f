import "server-only";
import { AppError, fieldFault } from "@/lib/errors";
import type { SetList } from "@/lib/schemas/set";
import { SetEntry, SongRow } from "@/models";
import type { Actor } from "./actor";
import { writeTx } from "./database";
import { findSet } from "./find-set";
import { presentSet } from "./present-set";
import { requireRight } from "./require-right";

interface SetOrder {
  baseRevision: number;
  name: string;
  songIds: string[];
}

/** Replaces a set's name and order. @throws AppError stale with `current`, unprocessable for a song of another rig */
export async function orderSet(actor: Actor, rigId: string, setId: string, order: SetOrder): Promise<SetList> {
  await requireRight(actor, rigId, "editSets");
  return writeTx(async (transaction) => {
    const set = await findSet(rigId, setId, transaction);
    if (set.revision !== order.baseRevision) {
      throw new AppError("stale", {
        userMessage: "Somebody changed this set list after you opened it. Nothing was overwritten.",
        extra: { current: presentSet(set) },
      });
    }
    const known = new Set((await SongRow.findAll({ where: { rigId }, attributes: ["id"], transaction })).map((song) => song.id));
    const strangers = order.songIds.flatMap((id, index) => (known.has(id) ? [] : [fieldFault(["songIds", index], "This song is not in the rig.")]));
    if (strangers.length > 0) throw new AppError("unprocessable", { userMessage: "Some songs are not in this rig.", fields: strangers });
    await SetEntry.destroy({ where: { setId }, transaction });
    await SetEntry.bulkCreate(order.songIds.map((songId, position) => ({ setId, songId, position })), { transaction });
    await set.update({ name: order.name, revision: set.revision + 1 }, { transaction });
    return presentSet(await findSet(rigId, setId, transaction));
  });
}
