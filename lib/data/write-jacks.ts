import "server-only";
import { randomUUID } from "node:crypto";
import type { Transaction } from "sequelize";
import type { GearInput } from "@/lib/schemas/gear";
import { JackRow } from "@/models";

/**
 * Gives every jack that is not among `known` an id of the server's making, and
 * follows the change in the assumed paths, so that no client can name another rig's jack.
 */
export function withOwnJackIds(gear: GearInput, known: ReadonlySet<string>): GearInput {
  const renamed = new Map(gear.jacks.map((jack) => [jack.id, known.has(jack.id) ? jack.id : randomUUID()]));
  return {
    ...gear,
    jacks: gear.jacks.map((jack) => ({ ...jack, id: renamed.get(jack.id) ?? jack.id })),
    assumed: gear.assumed.map((path) => {
      const [root, jackId, ...rest] = path.split(".");
      return root === "jacks" && jackId !== undefined ? ["jacks", renamed.get(jackId) ?? jackId, ...rest].join(".") : path;
    }),
  };
}

/** Replaces a gear's jacks with these, in this order. */
export async function writeJacks(gearId: string, jacks: GearInput["jacks"], transaction: Transaction): Promise<void> {
  await JackRow.destroy({ where: { gearId }, transaction });
  await JackRow.bulkCreate(
    jacks.map((jack, position) => ({
      id: jack.id,
      gearId,
      direction: jack.direction,
      name: jack.name,
      connector: jack.connector,
      role: jack.role,
      position,
      figures: jack.direction === "output" ? jack.output : jack.input,
    })),
    { transaction },
  );
}
