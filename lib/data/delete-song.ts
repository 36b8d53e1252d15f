import "server-only";
import type { Actor } from "./actor";
import { writeTx } from "./database";
import { findSong } from "./find-song";
import { requireRight } from "./require-right";

/** Removes a song with its patch and its places in sets. */
export async function deleteSong(actor: Actor, rigId: string, songId: string): Promise<void> {
  await requireRight(actor, rigId, "editSongs");
  await writeTx(async (transaction) => {
    await (await findSong(rigId, songId, transaction)).destroy({ transaction });
  });
}
