import type { Box, ChartLayout, Point } from "@/lib/core/chart";

/** The same chart in another unit. */
export function scaleLayout(layout: ChartLayout, by: number): ChartLayout {
  const point = <T extends Point>(item: T): T => ({ ...item, x: item.x * by, y: item.y * by });
  const box = <T extends Box>(item: T): T => ({ ...point(item), width: item.width * by, height: item.height * by });
  return {
    width: layout.width * by,
    height: layout.height * by,
    cards: layout.cards.map(box),
    jacks: layout.jacks.map(point),
    tracks: layout.tracks.map((track) => ({ ...track, points: track.points.map(point) })),
    tags: layout.tags.map(box),
    junctions: layout.junctions.map(point),
    lanes: layout.lanes.map(({ x, width }) => ({ x: x * by, width: width * by })),
    cardsTop: layout.cardsTop * by,
  };
}
