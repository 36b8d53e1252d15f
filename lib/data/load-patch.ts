import "server-only";
import type { PatchCheck } from "@/lib/core/electrics/patch-types";
import type { Patch } from "@/lib/schemas/patch";
import type { Actor } from "./actor";
import { checkGearPatch } from "./check-gear-patch";
import { findAllGear } from "./find-gear";
import { findPatch, findSong } from "./find-song";
import { presentGear } from "./present-gear";
import { requireRight } from "./require-right";

export interface PatchView {
  patch: Patch;
  revision: number;
  check: PatchCheck;
}

export async function loadPatch(actor: Actor, rigId: string, songId: string): Promise<PatchView> {
  await requireRight(actor, rigId, "seeRig");
  const song = await findSong(rigId, songId);
  const [patch, gear] = await Promise.all([findPatch(song), findAllGear(rigId)]);
  return { patch, revision: song.revision, check: checkGearPatch(gear.map(presentGear), patch) };
}
