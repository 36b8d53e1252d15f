import type { LaneIndex } from "@/lib/core/chart";
import type { GearKind } from "./gear";

const LANE_OF: Partial<Record<GearKind, LaneIndex>> = { pad: 0, conditioner: 1, shaper: 1, voice: 2, "desk-channel": 3 };

/** The lane a piece of gear stands in, on the board and on paper; supplies stand in none. */
export function laneOf(kind: GearKind): LaneIndex | null {
  return LANE_OF[kind] ?? null;
}
