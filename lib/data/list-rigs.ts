import "server-only";
import type { RigSummary } from "@/lib/schemas/rig";
import { GearRow, Membership, Rig, SongRow } from "@/models";
import type { Actor } from "./actor";
import { database } from "./database";

/** The rigs this person belongs to, by name. */
export async function listRigs(actor: Actor): Promise<RigSummary[]> {
  database();
  const memberships = await Membership.findAll({ where: { userId: actor.userId } });
  const summaries = await Promise.all(
    memberships.map(async ({ rigId, role }) => {
      const [rig, gearCount, songCount] = await Promise.all([
        Rig.findByPk(rigId),
        GearRow.count({ where: { rigId, retired: false } }),
        SongRow.count({ where: { rigId } }),
      ]);
      return { id: rigId, name: rig?.name ?? "", role, gearCount, songCount };
    }),
  );
  return summaries.sort((a, b) => a.name.localeCompare(b.name, "en-GB"));
}
