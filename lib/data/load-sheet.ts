import "server-only";
import { AppError } from "@/lib/errors";
import type { SheetSource } from "@/lib/paper/build-sheet-view";
import { Rig, SetEntry, SetListRow, type SongRow } from "@/models";
import type { Actor } from "./actor";
import { checkGearPatch } from "./check-gear-patch";
import { findAllGear } from "./find-gear";
import { findPatch, findSong } from "./find-song";
import { presentGear } from "./present-gear";
import { presentSet } from "./present-set";
import { presentSong } from "./present-song";
import { requireRight } from "./require-right";

/** What a song's patch sheet is made from; the date of the print is the caller's. */
export type StoredSheet = Omit<SheetSource, "printedAt">;

/** The song with its patch, its place in the first set list that holds it, and the song before it there. */
export async function loadSheet(actor: Actor, rigId: string, songId: string): Promise<StoredSheet> {
  await requireRight(actor, rigId, "print");
  const row = await findSong(rigId, songId);
  const [rig, patch, gearRows, place] = await Promise.all([Rig.findByPk(rigId), findPatch(row), findAllGear(rigId), findPlace(rigId, songId)]);
  if (!rig) throw new AppError("not-found");
  const gear = gearRows.map(presentGear);
  const { before, ...where } = place ?? { before: null };
  return {
    rigName: rig.name,
    song: presentSong(row),
    place: "set" in where ? where : null,
    gear,
    patch,
    revision: row.revision,
    check: checkGearPatch(gear, patch),
    before: before ? { title: before.title, patch: await findPatch(before) } : null,
  };
}

async function findPlace(rigId: string, songId: string): Promise<{ set: string; position: number; of: number; before: SongRow | null } | null> {
  const rows = await SetListRow.findAll({ where: { rigId }, include: [{ model: SetEntry, as: "entries" }], order: [["position", "ASC"], ["id", "ASC"]] });
  const set = rows.map(presentSet).find((one) => one.songIds.includes(songId));
  if (!set) return null;
  const index = set.songIds.indexOf(songId);
  const beforeId = set.songIds[index - 1];
  const before = beforeId === undefined ? null : await findSong(rigId, beforeId);
  return { set: set.name, position: index + 1, of: set.songIds.length, before };
}
