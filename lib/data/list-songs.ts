import "server-only";
import type { Song } from "@/lib/schemas/song";
import { SongRow } from "@/models";
import type { Actor } from "./actor";
import { presentSong } from "./present-song";
import { requireRight } from "./require-right";

export async function listSongs(actor: Actor, rigId: string): Promise<Song[]> {
  await requireRight(actor, rigId, "seeRig");
  return (await SongRow.findAll({ where: { rigId }, order: [["position", "ASC"], ["id", "ASC"]] })).map(presentSong);
}
