import fc from "fast-check";
import type { ChartCard, ChartInput, ChartLead, ChartMetrics, LaneIndex } from "@/lib/core/chart";

const anyCard = fc.record({
  lane: fc.constantFrom<LaneIndex>(0, 1, 2, 3),
  folded: fc.boolean(),
  ins: fc.integer({ min: 0, max: 4 }),
  outs: fc.integer({ min: 0, max: 3 }),
  footHeight: fc.constantFrom(0, 0, 17, 30),
});

/** Sizes as on the board, as on paper, at an odd scale, and anything between; a tag is never higher than a row. */
const anyMetrics: fc.Arbitrary<ChartMetrics> = fc.record({
  cardWidth: fc.integer({ min: 60, max: 200 }),
  tapeHeight: fc.integer({ min: 12, max: 60 }),
  jackPitch: fc.integer({ min: 16, max: 32 }),
  cardGap: fc.integer({ min: 2, max: 24 }),
  trackPitch: fc.integer({ min: 4, max: 14 }),
  outTagWidth: fc.integer({ min: 10, max: 40 }),
  inTagWidth: fc.integer({ min: 20, max: 160 }),
  gutterMin: fc.integer({ min: 10, max: 110 }),
  tagHeight: fc.integer({ min: 8, max: 16 }),
  scale: fc.constantFrom(1, 0.72, 0.833),
}).map(({ scale, ...sizes }) => Object.fromEntries(Object.entries(sizes).map(([name, value]) => [name, value * scale])) as unknown as ChartMetrics);

/** Boards with everything a patch may hold: mults, several leads into one input, leads back and across, doubled leads, folded cards. */
export const anyBoard: fc.Arbitrary<ChartInput> = fc
  .tuple(fc.array(anyCard, { maxLength: 24 }), fc.array(fc.tuple(fc.nat(), fc.nat()), { maxLength: 40 }), anyMetrics)
  .map(([shapes, pairs, metrics]) => {
    const cards = shapes.map(({ lane, folded, ins, outs, footHeight }, i): ChartCard => ({
      id: `c${i}`,
      lane,
      folded: folded && i % 4 === 0,
      footHeight: footHeight * (metrics.jackPitch / 28),
      jacks: [...Array.from({ length: ins }, (_, j) => ({ id: `c${i}i${j}`, side: "in" as const })), ...Array.from({ length: outs }, (_, j) => ({ id: `c${i}o${j}`, side: "out" as const }))],
    }));
    const jacks = cards.flatMap((card) => card.jacks);
    const [outs, ins] = [jacks.filter((jack) => jack.side === "out"), jacks.filter((jack) => jack.side === "in")];
    const leads: ChartLead[] = outs.length === 0 || ins.length === 0 ? [] : pairs.map(([from, to], i) => ({ id: `l${i}`, from: outs[from % outs.length]?.id ?? "", to: ins[to % ins.length]?.id ?? "" }));
    return { cards, leads, metrics };
  });
