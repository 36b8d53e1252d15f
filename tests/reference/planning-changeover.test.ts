import { describe, expect, it } from "vitest";
import { fitLead, planChangeover, type ChangeoverRequest, type StockLead } from "@/lib/core/planning";
import { makePlanningSource } from "../factories/planning";
import { leastEndMoves } from "./planning-solver";

describe("least end moves against a MIP solver (HiGHS)", () => {
  it("agrees on 500 random pairs of patches, unlike and alike", () => {
    const source = makePlanningSource(41);
    let inBetween = 0;
    for (let pair = 0; pair < 500; pair += 1) {
      const inputs = 2 + source.whole(14);
      const outputs = 1 + source.whole(12);
      const from = source.patch(source.whole(inputs + 1), outputs, inputs);
      const to = pair % 2 === 0 ? source.patch(source.whole(inputs + 1), outputs, inputs) : source.variant(from, source.whole(8), outputs, inputs, 2);
      const { endMoves } = planChangeover({ from, to });
      expect(endMoves, `pair ${pair}`).toBe(leastEndMoves(from, to));
      if (endMoves > 0 && endMoves < 2 * Math.max(from.length, to.length)) inBetween += 1;
    }
    // More than half lie between the trivial ends of the range.
    expect(inBetween).toBeGreaterThan(250);
  });

  it("agrees on 120 pairs where leads differ in length and connectors", () => {
    const source = makePlanningSource(42);
    const plugs = ["6.35 mm TS", "3.5 mm TS"];
    let ruledOut = 0;
    for (let pair = 0; pair < 120; pair += 1) {
      const from = source.patch(2 + source.whole(8), 8, 12).map((one, lead) => ({ ...one, lead: lead + 1 }));
      const to = source.variant(from, 8, 8, 12, 2).map(({ output, input }) => ({ output, input }));
      const jack = () => ({ connector: plugs[source.whole(2)]!, xM: source.random() * 2, yM: source.random() });
      const outputs = Object.fromEntries(Array.from({ length: 8 }, (_, k) => [`out ${k}`, jack()]));
      const inputs = Object.fromEntries(Array.from({ length: 12 }, (_, k) => [`in ${k}`, jack()]));
      // Those on the rig fit where they are; the stock has one lead more a connection that fits everywhere, so nothing runs short.
      const own = from.map(({ lead, output, input }): StockLead => ({
        lead, lengthM: 0.6 + source.random() * 1.4,
        connectors: { output: outputs[output]!.connector, input: inputs[input]!.connector },
      }));
      const spare = to.map((_, k): StockLead => ({ lead: `spare ${k}` }));
      const request: ChangeoverRequest = { from, to, outputs, inputs, leads: [...own, ...spare], adapters: source.random() < 0.3 ? [{ plug: plugs[0]!, jack: plugs[1]! }] : [] };
      const fits = (i: number, j: number) => fitLead(own[i], to[j]!, request) !== null;
      const free = planChangeover({ from, to }).endMoves;
      const plan = planChangeover(request);
      expect(plan.shortages).toBeUndefined();
      expect(plan.endMoves, `pair ${pair}`).toBe(leastEndMoves(from, to, fits));
      if (plan.endMoves > free) ruledOut += 1;
    }
    expect(ruledOut).toBeGreaterThan(40);
  });
});
