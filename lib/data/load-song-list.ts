import "server-only";
import type { Verdict } from "@/lib/core/electrics/jacks";
import type { Can } from "@/lib/rights/can";
import type { Song } from "@/lib/schemas/song";
import { SongRow } from "@/models";
import type { Actor } from "./actor";
import { checkGearPatch } from "./check-gear-patch";
import { findAllGear } from "./find-gear";
import { findPatch } from "./find-song";
import { presentGear } from "./present-gear";
import { presentSong } from "./present-song";
import { requireRight } from "./require-right";

export interface SongLine extends Song {
  leadCount: number;
  worst: Verdict;
}

/** The rig's songs with how their leads stand. */
export async function loadSongList(actor: Actor, rigId: string): Promise<{ songs: SongLine[]; can: Can }> {
  const can = await requireRight(actor, rigId, "seeRig");
  const gear = (await findAllGear(rigId)).map(presentGear);
  const rows = await SongRow.findAll({ where: { rigId }, order: [["position", "ASC"], ["id", "ASC"]] });
  const songs = await Promise.all(rows.map(async (row) => {
    const patch = await findPatch(row);
    return { ...presentSong(row), leadCount: patch.leads.length, worst: checkGearPatch(gear, patch).worst };
  }));
  return { songs, can };
}
