import "server-only";
import { randomUUID } from "node:crypto";
import type { Transaction } from "sequelize";
import { AppError, fieldFault } from "@/lib/errors";
import type { Song, SongFields } from "@/lib/schemas/song";
import { PatchRevision, SetEntry, SetListRow, SongRow } from "@/models";
import type { Actor } from "./actor";
import { writeTx } from "./database";
import { findPatch } from "./find-song";
import { presentSong } from "./present-song";
import { requireRight } from "./require-right";

const MOST_SONGS = 200;

/** A new song at the end of the rig's songs and of its first set, empty or with another song's patch. */
export async function createSong(actor: Actor, rigId: string, fields: SongFields, copyFrom: string | null): Promise<Song> {
  await requireRight(actor, rigId, "editSongs");
  return writeTx(async (transaction) => {
    const count = await SongRow.count({ where: { rigId }, transaction });
    if (count >= MOST_SONGS) throw new AppError("unprocessable", { userMessage: `A rig holds at most ${MOST_SONGS} songs.` });
    const highest = (await SongRow.max<number | null, SongRow>("position", { where: { rigId }, transaction })) ?? -1;
    const source = copyFrom === null ? null : await SongRow.findOne({ where: { id: copyFrom, rigId }, transaction });
    if (copyFrom !== null && !source) {
      throw new AppError("unprocessable", { userMessage: "The song to copy is not in this rig.", fields: [fieldFault(["copyFrom"], "Choose a song of this rig.")] });
    }
    const id = randomUUID();
    const hasPatch = source !== null && source.revision > 0;
    const song = await SongRow.create({ id, rigId, ...fields, position: highest + 1, revision: hasPatch ? 1 : 0 }, { transaction });
    if (hasPatch) {
      await PatchRevision.create(
        { songId: id, revision: 1, authorId: actor.userId, savedAt: new Date(), patch: await findPatch(source, transaction) },
        { transaction },
      );
    }
    await appendToFirstSet(rigId, id, transaction);
    return presentSong(song);
  });
}

async function appendToFirstSet(rigId: string, songId: string, transaction: Transaction): Promise<void> {
  const set = await SetListRow.findOne({ where: { rigId }, order: [["position", "ASC"]], transaction });
  if (!set) return;
  const last = (await SetEntry.max<number | null, SetEntry>("position", { where: { setId: set.id }, transaction })) ?? -1;
  await SetEntry.create({ setId: set.id, songId, position: last + 1 }, { transaction });
  await set.update({ revision: set.revision + 1 }, { transaction });
}
