import type { SetList } from "@/lib/schemas/set";
import type { SetListRow } from "@/models";

export function presentSet(row: SetListRow): SetList {
  const songIds = [...(row.entries ?? [])].sort((a, b) => a.position - b.position).map((entry) => entry.songId);
  return { id: row.id, name: row.name, revision: row.revision, songIds };
}
