import type { Song } from "@/lib/schemas/song";
import type { SongRow } from "@/models";

export function presentSong(row: SongRow): Song {
  const { id, title, tempoBpm, notes, revision, position } = row;
  return { id, title, tempoBpm, notes, revision, position };
}
