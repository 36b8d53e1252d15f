import "server-only";
import type { Gear } from "@/lib/schemas/gear";
import type { Actor } from "./actor";
import { findAllGear } from "./find-gear";
import { presentGear } from "./present-gear";
import { requireRight } from "./require-right";

/** The rig's gear in its order; retired gear too unless asked not to. */
export async function listGear(actor: Actor, rigId: string, options: { retired?: "with" | "without" } = {}): Promise<Gear[]> {
  await requireRight(actor, rigId, "seeRig");
  const gear = (await findAllGear(rigId)).map(presentGear);
  return options.retired === "without" ? gear.filter((item) => !item.retired) : gear;
}
