import "server-only";
import type { Transaction } from "sequelize";
import { AppError } from "@/lib/errors";
import { emptyPatch, type Patch } from "@/lib/schemas/patch";
import { PatchRevision, SongRow } from "@/models";

/** One song of this rig. @throws AppError not-found */
export async function findSong(rigId: string, songId: string, transaction?: Transaction): Promise<SongRow> {
  const song = await SongRow.findOne({ where: { id: songId, rigId }, transaction });
  if (!song) throw new AppError("not-found");
  return song;
}

/** The current patch of a song; the empty one before its first save. */
export async function findPatch(song: SongRow, transaction?: Transaction): Promise<Patch> {
  if (song.revision === 0) return emptyPatch;
  const row = await PatchRevision.findOne({ where: { songId: song.id, revision: song.revision }, transaction });
  return row?.patch ?? emptyPatch;
}
