import { startingGear, type StartingVariant } from "@/lib/core/electrics/starting-figures";
import { toRange } from "@/lib/core/units";
import { gearInputSchema, type Gear, type GearInput } from "@/lib/schemas/gear";

/** Starting figures fitted to a rig: on a supply the rig already has, on the next free desk channel. */
export function startForRig({ kind, variant, wants }: StartingVariant, gear: readonly Gear[], makeId: () => string): GearInput {
  const start = gearInputSchema.parse(startingGear(kind, variant, makeId));
  if (wants) start.supplyId = gear.find((item) => suits(item, wants))?.id ?? null;
  if (start.details.kind === "desk-channel") start.details.channel = nextChannel(gear);
  return start;
}

function suits({ details, retired }: Gear, wants: { highV: number; lowV: number }): boolean {
  if (retired || details.kind !== "supply") return false;
  const range = toRange(details.highV);
  return range.min <= wants.highV && wants.highV <= range.max && details.lowV < 0 === wants.lowV < 0;
}

function nextChannel(gear: readonly Gear[]): number {
  const taken = new Set(gear.flatMap(({ details, retired }) => (details.kind === "desk-channel" && !retired ? [details.channel] : [])));
  for (let channel = 1; channel < 96; channel += 1) if (!taken.has(channel)) return channel;
  return 96;
}
