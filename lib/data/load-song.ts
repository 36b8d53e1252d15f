import "server-only";
import type { Song } from "@/lib/schemas/song";
import type { Actor } from "./actor";
import { findSong } from "./find-song";
import { presentSong } from "./present-song";
import { requireRight } from "./require-right";

export async function loadSong(actor: Actor, rigId: string, songId: string): Promise<Song> {
  await requireRight(actor, rigId, "seeRig");
  return presentSong(await findSong(rigId, songId));
}
