import "server-only";
import { AppError, fieldFault } from "@/lib/errors";
import { rightToEditGear } from "@/lib/rights/can";
import type { Gear, GearInput } from "@/lib/schemas/gear";
import type { Actor } from "./actor";
import { writeTx } from "./database";
import { findGear } from "./find-gear";
import { presentGear } from "./present-gear";
import { requireRight } from "./require-right";
import { requireSupply } from "./require-supply";
import { withOwnJackIds, writeJacks } from "./write-jacks";

/** Replaces a gear's figures. @throws AppError stale, with the stored gear as `current`, when it changed since `baseRevision` */
export async function replaceGear(actor: Actor, rigId: string, gearId: string, baseRevision: number, input: GearInput): Promise<Gear> {
  await requireRight(actor, rigId, "seeRig");
  await requireRight(actor, rigId, rightToEditGear(input.details.kind));
  return writeTx(async (transaction) => {
    const row = await findGear(rigId, gearId, transaction);
    if (row.kind !== input.details.kind) {
      throw new AppError("unprocessable", {
        userMessage: "The kind of a piece of gear cannot be changed; make a new one instead.",
        fields: [fieldFault(["gear", "details", "kind"], `This is a ${row.kind.replace("-", " ")}.`)],
      });
    }
    if (row.revision !== baseRevision) {
      throw new AppError("stale", {
        userMessage: "Somebody changed this gear after you opened it. Nothing was overwritten.",
        extra: { current: presentGear(row) },
      });
    }
    await requireSupply(rigId, input.supplyId, ["gear", "supplyId"], transaction);
    const known = new Set((row.jacks ?? []).map((jack) => jack.id));
    const gear = withOwnJackIds(input, known);
    await row.update(
      {
        name: gear.name,
        notes: gear.notes,
        supplyId: gear.supplyId,
        details: gear.details,
        knobs: gear.knobs,
        assumed: gear.assumed,
        revision: row.revision + 1,
      },
      { transaction },
    );
    await writeJacks(gearId, gear.jacks, transaction);
    return presentGear(await findGear(rigId, gearId, transaction));
  });
}
