import "server-only";
import { ROLES, type Member } from "@/lib/schemas/rig";
import { Membership, User } from "@/models";
import type { Actor } from "./actor";
import { requireRight } from "./require-right";

/** Everybody in the rig, owners first. */
export async function listMembers(actor: Actor, rigId: string): Promise<Member[]> {
  await requireRight(actor, rigId, "seeRig");
  const rows = await Membership.findAll({ where: { rigId }, include: [{ model: User, as: "user" }] });
  return rows
    .map((row) => ({ userId: row.userId, name: row.user?.name ?? "", email: row.user?.email ?? "", role: row.role }))
    .sort((a, b) => ROLES.indexOf(a.role) - ROLES.indexOf(b.role) || a.name.localeCompare(b.name, "en-GB"));
}
