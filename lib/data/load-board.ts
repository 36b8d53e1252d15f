import "server-only";
import type { PatchCheck } from "@/lib/core/electrics/patch-types";
import type { Can } from "@/lib/rights/can";
import type { Gear } from "@/lib/schemas/gear";
import type { Patch } from "@/lib/schemas/patch";
import type { Song } from "@/lib/schemas/song";
import type { Actor } from "./actor";
import { checkGearPatch } from "./check-gear-patch";
import { findAllGear } from "./find-gear";
import { findPatch, findSong } from "./find-song";
import { loadRig } from "./load-rig";
import { presentGear } from "./present-gear";
import { presentSong } from "./present-song";

export interface BoardView {
  rig: { id: string; name: string };
  song: Song;
  /** Retired gear only where the patch still uses it. */
  gear: Gear[];
  patch: Patch;
  revision: number;
  check: PatchCheck;
  can: Can;
}

/** Everything the board of one song shows. */
export async function loadBoard(actor: Actor, rigId: string, songId: string): Promise<BoardView> {
  const { rig, can } = await loadRig(actor, rigId);
  const song = await findSong(rigId, songId);
  const [patch, rows] = await Promise.all([findPatch(song), findAllGear(rigId)]);
  const all = rows.map(presentGear);
  const used = new Set(patch.leads.flatMap((lead) => [lead.outputId, lead.inputId]));
  const gear = all.filter((item) => !item.retired || item.jacks.some((jack) => used.has(jack.id)));
  return { rig, song: presentSong(song), gear, patch, revision: song.revision, check: checkGearPatch(all, patch), can };
}
