import "server-only";
import { Rig } from "@/models";
import type { Actor } from "./actor";
import { writeTx } from "./database";
import { requireRight } from "./require-right";

export async function renameRig(actor: Actor, rigId: string, name: string): Promise<{ id: string; name: string }> {
  await requireRight(actor, rigId, "manageRig");
  await writeTx((transaction) => Rig.update({ name }, { where: { id: rigId }, transaction }));
  return { id: rigId, name };
}
