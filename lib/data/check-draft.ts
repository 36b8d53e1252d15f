import "server-only";
import type { Verdict } from "@/lib/core/electrics/jacks";
import type { PatchCheck } from "@/lib/core/electrics/patch-types";
import type { Patch } from "@/lib/schemas/patch";
import type { Actor } from "./actor";
import { checkGearPatch } from "./check-gear-patch";
import { findAllGear } from "./find-gear";
import { findSong } from "./find-song";
import { judgeCandidates } from "./judge-candidates";
import { presentGear } from "./present-gear";
import { requireRight } from "./require-right";

export interface Candidate {
  jackId: string;
  verdict: Verdict;
  text: string;
}

/** Checks a patch that is not saved; with `from`, also what every free jack would get if joined to it. */
export async function checkDraft(actor: Actor, rigId: string, songId: string, patch: Patch, from: string | null): Promise<{ check: PatchCheck; candidates?: Candidate[] }> {
  await requireRight(actor, rigId, "seeRig");
  await findSong(rigId, songId);
  const gear = (await findAllGear(rigId)).map(presentGear);
  const check = checkGearPatch(gear, patch);
  return from === null ? { check } : { check, candidates: judgeCandidates(gear, patch, from) };
}
