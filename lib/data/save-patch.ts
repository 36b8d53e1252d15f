import "server-only";
import type { PatchCheck } from "@/lib/core/electrics/patch-types";
import { AppError } from "@/lib/errors";
import type { Patch } from "@/lib/schemas/patch";
import { PatchRevision } from "@/models";
import type { Actor } from "./actor";
import { checkGearPatch } from "./check-gear-patch";
import { writeTx } from "./database";
import { findAllGear } from "./find-gear";
import { findPatch, findSong } from "./find-song";
import { findPatchFaults } from "./find-patch-faults";
import { presentGear } from "./present-gear";
import { requireRight } from "./require-right";

/**
 * Saves a song's patch as its next revision.
 * @throws AppError stale with `current: {revision, patch}` when somebody saved since `baseRevision`; unprocessable naming leads and knobs that are not of this rig.
 */
export async function savePatch(actor: Actor, rigId: string, songId: string, baseRevision: number, patch: Patch): Promise<{ revision: number; check: PatchCheck }> {
  await requireRight(actor, rigId, "editPatch");
  const { revision, gear } = await writeTx(async (transaction) => {
    const song = await findSong(rigId, songId, transaction);
    const gear = (await findAllGear(rigId, transaction)).map(presentGear);
    if (song.revision !== baseRevision) {
      throw new AppError("stale", {
        userMessage: "Somebody saved this patch after you opened it. Nothing was overwritten.",
        extra: { current: { revision: song.revision, patch: await findPatch(song, transaction) } },
      });
    }
    const faults = findPatchFaults(gear, patch, ["patch"]);
    if (faults.length > 0) throw new AppError("unprocessable", { userMessage: faults[0]?.detail, fields: faults });
    const revision = song.revision + 1;
    await PatchRevision.create({ songId, revision, authorId: actor.userId, savedAt: new Date(), patch }, { transaction });
    await song.update({ revision }, { transaction });
    return { revision, gear };
  });
  return { revision, check: checkGearPatch(gear, patch) };
}
