import "server-only";
import { rightToEditGear } from "@/lib/rights/can";
import type { Gear } from "@/lib/schemas/gear";
import type { Actor } from "./actor";
import { insertGear } from "./create-gear";
import { writeTx } from "./database";
import { findGear } from "./find-gear";
import { presentGear } from "./present-gear";
import { requireRight } from "./require-right";

/** A second piece of gear with the same figures; what was assumed stays assumed. */
export async function copyGear(actor: Actor, rigId: string, gearId: string): Promise<Gear> {
  await requireRight(actor, rigId, "seeRig");
  const original = presentGear(await findGear(rigId, gearId));
  await requireRight(actor, rigId, rightToEditGear(original.kind));
  const { supplyId, details, notes, jacks, knobs, assumed } = original;
  return writeTx((transaction) => insertGear(rigId, { name: copyName(original.name), notes, supplyId, details, jacks, knobs, assumed }, transaction));
}

/** `Snare pad` → `Snare pad (copy)`, kept within 60 characters. */
export function copyName(name: string): string {
  const suffix = " (copy)";
  return `${[...name].slice(0, 60 - suffix.length).join("").trimEnd()}${suffix}`;
}
