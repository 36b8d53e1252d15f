import type { GearKind } from "@/lib/schemas/gear";
import type { Role } from "@/lib/schemas/rig";

/** Everything a member of a rig may or may not do. One row here is one row of the rights table. */
const TABLE = {
  seeRig: ["sound-helper", "collaborator", "performer"],
  print: ["sound-helper", "collaborator", "performer"],
  editDesk: ["sound-helper", "collaborator", "performer"],
  editGear: ["collaborator", "performer"],
  editPatch: ["collaborator", "performer"],
  editSongs: ["performer"],
  editSets: ["performer"],
  manageRig: ["performer"],
} as const satisfies Record<string, readonly Role[]>;

export type Right = keyof typeof TABLE;
export const RIGHTS = Object.keys(TABLE) as Right[];

/** The answers for one person in one rig, as plain data that a client can be given. */
export type Can = { role: Role } & Record<Right, boolean>;

/** Whether a role holds a right. */
export function holds(role: Role, right: Right): boolean {
  return (TABLE[right] as readonly Role[]).includes(role);
}

/** All answers for a role. */
export function canOf(role: Role): Can {
  const answers = Object.fromEntries(RIGHTS.map((right) => [right, holds(role, right)])) as Record<Right, boolean>;
  return { role, ...answers };
}

/** The right that creating or changing a piece of gear of this kind asks for. */
export function rightToEditGear(kind: GearKind): Right {
  return kind === "desk-channel" ? "editDesk" : "editGear";
}
