import "server-only";
import { AppError } from "@/lib/errors";
import type { Can } from "@/lib/rights/can";
import { Rig } from "@/models";
import type { Actor } from "./actor";
import { requireRight } from "./require-right";

export interface RigView {
  rig: { id: string; name: string };
  role: Can["role"];
  can: Can;
}

export async function loadRig(actor: Actor, rigId: string): Promise<RigView> {
  const can = await requireRight(actor, rigId, "seeRig");
  const rig = await Rig.findByPk(rigId);
  if (!rig) throw new AppError("not-found");
  return { rig: { id: rig.id, name: rig.name }, role: can.role, can };
}
