import "server-only";
import { AppError } from "@/lib/errors";
import { canOf, holds, type Can, type Right } from "@/lib/rights/can";
import { Membership } from "@/models";
import type { Actor } from "./actor";
import { database } from "./database";

/**
 * The actor's rights in a rig.
 * @throws AppError not-found for somebody outside it (the rig does not exist for them), forbidden without the right.
 */
export async function requireRight(actor: Actor, rigId: string, right: Right): Promise<Can> {
  database();
  const membership = await Membership.findOne({ where: { rigId, userId: actor.userId } });
  if (!membership) throw new AppError("not-found");
  if (!holds(membership.role, right)) throw new AppError("forbidden");
  return canOf(membership.role);
}
