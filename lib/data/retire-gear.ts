import "server-only";
import { rightToEditGear } from "@/lib/rights/can";
import type { Gear } from "@/lib/schemas/gear";
import type { Actor } from "./actor";
import { writeTx } from "./database";
import { findGear } from "./find-gear";
import { presentGear } from "./present-gear";
import { requireRight } from "./require-right";

/** Takes gear out of use, or back into it. Patches that name it keep their leads. */
export async function retireGear(actor: Actor, rigId: string, gearId: string, retired: boolean): Promise<Gear> {
  await requireRight(actor, rigId, "seeRig");
  const kind = (await findGear(rigId, gearId)).kind;
  await requireRight(actor, rigId, rightToEditGear(kind));
  return writeTx(async (transaction) => {
    const row = await findGear(rigId, gearId, transaction);
    await row.update({ retired, revision: row.revision + 1 }, { transaction });
    return presentGear(row);
  });
}
