import "server-only";
import { randomUUID } from "node:crypto";
import type { Transaction } from "sequelize";
import { AppError } from "@/lib/errors";
import { rightToEditGear } from "@/lib/rights/can";
import type { Gear, GearInput } from "@/lib/schemas/gear";
import { GearRow } from "@/models";
import type { Actor } from "./actor";
import { writeTx } from "./database";
import { findGear } from "./find-gear";
import { presentGear } from "./present-gear";
import { requireRight } from "./require-right";
import { requireSupply } from "./require-supply";
import { withOwnJackIds, writeJacks } from "./write-jacks";

const MOST_GEAR = 400;

/** Adds gear at the end of the rig's list. @throws AppError */
export async function createGear(actor: Actor, rigId: string, input: GearInput): Promise<Gear> {
  await requireRight(actor, rigId, rightToEditGear(input.details.kind));
  return writeTx((transaction) => insertGear(rigId, input, transaction));
}

/** The same inside a transaction, rights already asked. */
export async function insertGear(rigId: string, input: GearInput, transaction: Transaction, id: string = randomUUID()): Promise<Gear> {
  await requireSupply(rigId, input.supplyId, ["supplyId"], transaction);
  const count = await GearRow.count({ where: { rigId }, transaction });
  if (count >= MOST_GEAR) throw new AppError("unprocessable", { userMessage: `A rig holds at most ${MOST_GEAR} pieces of gear.` });
  const highest = (await GearRow.max<number | null, GearRow>("position", { where: { rigId }, transaction })) ?? -1;
  const gear = withOwnJackIds(input, new Set());
  await GearRow.create(
    {
      id,
      rigId,
      kind: gear.details.kind,
      name: gear.name,
      notes: gear.notes,
      supplyId: gear.supplyId,
      details: gear.details,
      knobs: gear.knobs,
      assumed: gear.assumed,
      position: highest + 1,
    },
    { transaction },
  );
  await writeJacks(id, gear.jacks, transaction);
  return presentGear(await findGear(rigId, id, transaction));
}
