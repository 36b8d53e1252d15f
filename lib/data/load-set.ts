import "server-only";
import type { SetList } from "@/lib/schemas/set";
import type { Actor } from "./actor";
import { findSet } from "./find-set";
import { presentSet } from "./present-set";
import { requireRight } from "./require-right";

export async function loadSet(actor: Actor, rigId: string, setId: string): Promise<SetList> {
  await requireRight(actor, rigId, "seeRig");
  return presentSet(await findSet(rigId, setId));
}
