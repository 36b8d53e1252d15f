import "server-only";
import type { Song, SongFields } from "@/lib/schemas/song";
import type { Actor } from "./actor";
import { writeTx } from "./database";
import { findSong } from "./find-song";
import { presentSong } from "./present-song";
import { requireRight } from "./require-right";

export async function editSong(actor: Actor, rigId: string, songId: string, fields: SongFields): Promise<Song> {
  await requireRight(actor, rigId, "editSongs");
  return writeTx(async (transaction) => {
    const song = await findSong(rigId, songId, transaction);
    await song.update(fields, { transaction });
    return presentSong(song);
  });
}
