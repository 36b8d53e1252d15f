import "server-only";
import type { Gear } from "@/lib/schemas/gear";
import type { Actor } from "./actor";
import { findGear } from "./find-gear";
import { presentGear } from "./present-gear";
import { requireRight } from "./require-right";

export async function loadGear(actor: Actor, rigId: string, gearId: string): Promise<Gear> {
  await requireRight(actor, rigId, "seeRig");
  return presentGear(await findGear(rigId, gearId));
}
