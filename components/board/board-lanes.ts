import type { ChartCard } from "@/lib/core/chart";
import type { Gear } from "@/lib/schemas/gear";
import { laneOf } from "@/lib/schemas/lane-of";
import type { Patch } from "@/lib/schemas/patch";

export const LANE_NAMES = ["Pads", "Conditioning", "Voices", "Desk"] as const;

/** Gear that stands on the board, lane by lane, in this song's order; gear the song does not name follows in the rig's order. */
export function orderCards(gear: readonly Gear[], lanes: Patch["lanes"]): Gear[] {
  const rank = new Map(lanes.flatMap((lane) => lane.map((id, index) => [id, index] as const)));
  return gear
    .filter((item) => laneOf(item.kind) !== null)
    .map((item, index) => ({ item, index, rank: rank.get(item.id) ?? Infinity }))
    .sort((a, b) => (laneOf(a.item.kind) ?? 0) - (laneOf(b.item.kind) ?? 0) || (a.rank === b.rank ? a.index - b.index : a.rank - b.rank))
    .map(({ item }) => item);
}

/** The order of cards as a patch keeps it. */
export function lanesOf(cards: readonly Gear[]): Patch["lanes"] {
  const lanes: Patch["lanes"] = [[], [], [], []];
  for (const card of cards) {
    const lane = laneOf(card.kind);
    if (lane !== null) lanes[lane].push(card.id);
  }
  return lanes;
}

export function sideOf(direction: "input" | "output"): "in" | "out" {
  return direction === "input" ? "in" : "out";
}

/** Cards as the chart lays them out. */
export function toChartCards(cards: readonly Gear[], options: { folded: (id: string) => boolean; footHeight: (id: string) => number }): ChartCard[] {
  return cards.map((card) => ({
    id: card.id,
    lane: laneOf(card.kind) ?? 0,
    folded: options.folded(card.id),
    footHeight: options.footHeight(card.id),
    jacks: card.jacks.map((jack) => ({ id: jack.id, side: sideOf(jack.direction) })),
  }));
}
