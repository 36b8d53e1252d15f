import { describe, expect, it } from "vitest";
import { orderSet, type OrderRequest } from "@/lib/core/planning";
import { modelOrder } from "@/lib/core/planning/order/model-order";
import { searchAndBound } from "@/lib/core/planning/order/search-and-bound";
import { makePlanningSource } from "../factories/planning";
import { leastOrder } from "./planning-solver";

type Source = ReturnType<typeof makePlanningSource>;

function withRules(request: OrderRequest, source: Source): OrderRequest {
  const n = request.songs.length;
  const some = (most: number) => Array.from({ length: source.whole(most + 1) });
  const pair = (): [string, string] => {
    const [a, b] = source.shuffled(n);
    return [request.songs[a!]!, request.songs[b!]!];
  };
  return {
    ...request,
    pinned: Object.fromEntries(some(2).map(() => [request.songs[source.whole(n)]!, source.whole(n)])),
    together: some(2).map(pair),
    apart: some(Math.ceil(n / 2)).map(pair),
  };
}

/** That an order is one of all songs, keeps every rule, and costs what is said. */
function check(request: OrderRequest, order: string[], totalS: number): void {
  expect([...order].sort()).toEqual([...request.songs].sort());
  const at = new Map(order.map((id, position) => [id, position]));
  for (const [id, position] of Object.entries(request.pinned ?? {})) expect(at.get(id)).toBe(position);
  for (const [a, b] of request.together ?? []) expect(at.get(b)).toBe(at.get(a)! + 1);
  for (const [a, b] of request.apart ?? []) expect(Math.abs(at.get(a)! - at.get(b)!)).toBeGreaterThan(1);
  const index = order.map((id) => request.songs.indexOf(id));
  const sum = index.slice(1).reduce((total, song, k) => total + request.changeoverS[index[k]!]![song]!, request.setupS[order[0]!]!);
  expect(totalS).toBeCloseTo(sum, 9);
}

describe("the best order against a MIP solver (HiGHS)", () => {
  it("equals the solver's optimum on 110 sets of 2 to 12 songs without rules", () => {
    const source = makePlanningSource(7);
    for (let k = 0; k < 110; k += 1) {
      const n = 2 + (k % 11);
      const request = k % 3 === 0 ? source.orderOfSet(n, 10, 2) : source.orderOfTimes(n, k % 3 === 1 ? "near" : "any");
      const answer = orderSet(request);
      if (!answer.ok) throw new Error(`set ${k} has no rules`);
      check(request, answer.order, answer.totalS);
      expect(answer.provenOptimal).toBe(true);
      expect(answer.lowerBoundS).toBe(answer.totalS);
      expect(answer.totalS, `set ${k}`).toBeCloseTo(leastOrder(request)!, 6);
    }
  });

  it("equals it on 110 sets with pins, together and apart, and agrees when nothing can be done", () => {
    const source = makePlanningSource(8);
    const met = { possible: 0, impossible: 0 };
    for (let k = 0; k < 110; k += 1) {
      const request = withRules(source.orderOfTimes(2 + (k % 11), k % 2 === 0 ? "near" : "any"), source);
      const answer = orderSet(request);
      const least = leastOrder(request);
      expect(answer.ok, `set ${k}`).toBe(least !== null);
      if (answer.ok) {
        check(request, answer.order, answer.totalS);
        expect(answer.totalS, `set ${k}`).toBeCloseTo(least!, 6);
        met.possible += 1;
      } else {
        expect(answer.conflicts.length).toBeGreaterThan(0);
        met.impossible += 1;
      }
    }
    expect(met.possible).toBeGreaterThan(55);
    expect(met.impossible).toBeGreaterThan(10);
  });

  it.each([16, 17, 18, 19, 20])("the search beyond the exact method finds Held–Karp's optimum at %i songs, and bounds it from below", (n) => {
    const source = makePlanningSource(n);
    for (const kind of ["near", "any"] as const) {
      const request = source.orderOfTimes(n, kind);
      const exact = orderSet(request);
      if (!exact.ok) throw new Error("no rules");
      const model = modelOrder(request, []);
      const found = searchAndBound(model, Int32Array.from({ length: n }, (_, k) => k), {});
      const totalS = exact.totalS - model.insideS;
      expect(found!.boundS).toBeLessThanOrEqual(totalS + 1e-6);
      expect(found!.boundS).toBeGreaterThan(0.99 * totalS);
      check(request, Array.from(found!.sequence, (song) => request.songs[song]!), totalS);
    }
  });

  it.each([40, 60])("on generated sets of %i songs the gap is at most 1 % and the solver's optimum lies in it", (n) => {
    const source = makePlanningSource(100 + n);
    for (const request of [source.orderOfSet(n, 24, 3), source.orderOfTimes(n, "near")]) {
      const answer = orderSet(request, { now: () => performance.now(), budgetMs: 5000 });
      if (!answer.ok) throw new Error("no rules");
      check(request, answer.order, answer.totalS);
      const least = leastOrder(request)!;
      expect(answer.lowerBoundS).toBeLessThanOrEqual(least + 1e-6);
      expect(answer.totalS).toBeGreaterThanOrEqual(least - 1e-6);
      expect((answer.totalS - answer.lowerBoundS) / answer.totalS).toBeLessThanOrEqual(0.01);
    }
  });
});
