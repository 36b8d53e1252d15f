import { seededRandom } from "@/lib/core/electrics/tolerance/seeded-random";
import type { ChartCard, ChartLead, ChartMetrics, LaneIndex } from "@/lib/core/chart";

export const boardMetrics: ChartMetrics = {
  cardWidth: 168, tapeHeight: 32, jackPitch: 28, cardGap: 12, trackPitch: 10, outTagWidth: 34, inTagWidth: 120, gutterMin: 32, tagHeight: 20,
};

/** Cards with random jacks in random lanes, and leads between random outputs and inputs. */
export function randomBoard(seed: number, cardCount: number, leadCount: number): { cards: ChartCard[]; leads: ChartLead[] } {
  const next = seededRandom(seed);
  const int = (n: number) => Math.floor(next() * n);
  const cards = Array.from({ length: cardCount }, (_, i): ChartCard => ({
    id: `c${i}`,
    lane: int(4) as LaneIndex,
    folded: next() < 0.1,
    footHeight: next() < 0.3 ? 30 : 0,
    jacks: [
      ...Array.from({ length: int(4) }, (_unused, j) => ({ id: `c${i}i${j}`, side: "in" as const })),
      ...Array.from({ length: int(4) }, (_unused, j) => ({ id: `c${i}o${j}`, side: "out" as const })),
    ],
  }));
  const outs = cards.flatMap((card) => card.jacks.filter((jack) => jack.side === "out").map((jack) => jack.id));
  const ins = cards.flatMap((card) => card.jacks.filter((jack) => jack.side === "in").map((jack) => jack.id));
  const leads: ChartLead[] = [];
  for (let i = 0; i < leadCount && outs.length > 0 && ins.length > 0; i += 1) {
    leads.push({ id: `l${i}`, from: outs[int(outs.length)] as string, to: ins[int(ins.length)] as string });
  }
  return { cards, leads };
}
