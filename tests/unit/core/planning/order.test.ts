import { describe, expect, it } from "vitest";
import { findOrderIssues, orderSet, type OrderRequest } from "@/lib/core/planning";
import { makeArborescenceFinder } from "@/lib/core/planning/order/find-arborescence";
import { solveAssignment } from "@/lib/core/planning/solve-assignment";
import { makePlanningSource } from "../../../factories/planning";

const table = (ids: string, changeoverS: number[][], setup = 0): OrderRequest => {
  const songs = [...ids];
  return { songs, setupS: Object.fromEntries(songs.map((id) => [id, setup])), changeoverS };
};
const four = table("abcd", [[0, 5, 1, 9], [5, 0, 2, 3], [1, 2, 0, 4], [9, 3, 4, 0]], 1);

function* ordersOf(items: number[]): Generator<number[]> {
  if (items.length === 0) yield [];
  for (const [k, item] of items.entries()) for (const rest of ordersOf([...items.slice(0, k), ...items.slice(k + 1)])) yield [item, ...rest];
}

function totalOf({ songs, setupS, changeoverS }: OrderRequest, order: number[]): number {
  return order.slice(1).reduce((sum, song, k) => sum + changeoverS[order[k]!]![song]!, setupS[songs[order[0]!]!]!);
}

function keeps(request: OrderRequest, order: number[]): boolean {
  const at = new Map(order.map((song, position) => [request.songs[song]!, position]));
  return Object.entries(request.pinned ?? {}).every(([id, position]) => at.get(id) === position)
    && (request.together ?? []).every(([a, b]) => at.get(b) === at.get(a)! + 1)
    && (request.apart ?? []).every(([a, b]) => Math.abs(at.get(a)! - at.get(b)!) !== 1);
}

describe("the best order, by hand and by exhaustive search", () => {
  it("finds the path a, c, b, d: 1 + 1 + 2 + 3", () => {
    expect(orderSet(four)).toEqual({ ok: true, order: ["a", "c", "b", "d"], totalS: 7, lowerBoundS: 7, provenOptimal: true });
  });

  it("counts the opener's set-up", () => {
    expect(orderSet({ ...four, setupS: { a: 100, b: 100, c: 100, d: 1 } })).toMatchObject({ order: ["d", "b", "c", "a"], totalS: 7 });
  });

  it("takes the changeover from row to column", () => {
    expect(orderSet(table("ab", [[0, 9], [1, 0]]))).toMatchObject({ order: ["b", "a"], totalS: 1 });
  });

  it("a set of equal songs costs 0 and keeps its order, at any size", () => {
    for (const n of [1, 2, 7, 18, 30]) {
      const songs = Array.from({ length: n }, (_, k) => `s${k}`);
      const answer = orderSet({ songs, setupS: Object.fromEntries(songs.map((id) => [id, 0])), changeoverS: songs.map(() => songs.map(() => 0)) });
      expect(answer).toEqual({ ok: true, order: songs, totalS: 0, lowerBoundS: 0, provenOptimal: true });
    }
  });

  it("equals exhaustive search with and without rules, and picks the first of equals in the performer's order", () => {
    const source = makePlanningSource(21);
    let tied = 0;
    for (let k = 0; k < 150; k += 1) {
      const n = 1 + source.whole(7);
      const request = source.orderOfTimes(n, "any");
      // Few different figures: many ties.
      if (k % 3 === 0) {
        request.changeoverS = request.changeoverS.map((row) => row.map((s) => s % 4));
        request.setupS = Object.fromEntries(request.songs.map((id) => [id, 1]));
      }
      // Tenths and thirds: sums that do not come out even in binary.
      if (k % 3 === 1) request.changeoverS = request.changeoverS.map((row) => row.map((s) => s / (k % 2 === 0 ? 10 : 3)));
      const two = () => source.shuffled(n).slice(0, 2).map((song) => request.songs[song]!) as [string, string];
      if (k % 2 === 0 && n > 2) {
        request.pinned = source.whole(2) === 0 ? { [request.songs[source.whole(n)]!]: source.whole(n) } : {};
        request.together = source.whole(2) === 0 ? [two()] : [];
        request.apart = [two()];
      }
      const all = [...ordersOf(Array.from({ length: n }, (_, song) => song))].filter((order) => keeps(request, order));
      const least = Math.min(...all.map((order) => totalOf(request, order)));
      const best = all.filter((order) => totalOf(request, order) <= least + 1e-9 * Math.max(1, least));
      if (best.length > 1) tied += 1;
      const answer = orderSet(request);
      if (best.length === 0) {
        expect(answer.ok, `set ${k}`).toBe(false);
        continue;
      }
      if (!answer.ok) throw new Error(`set ${k}: ${answer.conflicts.join(" ")}`);
      expect(answer.totalS, `set ${k}`).toBeCloseTo(least, 9);
      // Exhaustive search runs in lexicographic order.
      expect(answer.order, `set ${k}`).toEqual(best[0]!.map((song) => request.songs[song]!));
    }
    expect(tied).toBeGreaterThan(20);
  });

  it("joins songs that must follow each other, so that 30 songs in 15 pairs are solved exactly", () => {
    const request = makePlanningSource(5).orderOfTimes(30, "any");
    const together = Array.from({ length: 15 }, (_, k): [string, string] => [request.songs[2 * k]!, request.songs[2 * k + 1]!]);
    const answer = orderSet({ ...request, together }, { rounds: 0 });
    if (!answer.ok) throw new Error("possible");
    expect(answer.provenOptimal).toBe(true);
    for (const [a, b] of together) expect(answer.order.indexOf(b)).toBe(answer.order.indexOf(a) + 1);
  });
});

describe("rules that cannot all hold are named", () => {
  const says = (rules: Partial<OrderRequest>) => {
    const answer = orderSet({ ...four, ...rules });
    return answer.ok ? [] : answer.conflicts;
  };
  it.each<[string, Partial<OrderRequest>, string]>([
    ["two songs in one place", { pinned: { a: 0, b: 0 } }, "“a” and “b” would both stand at position 0: “a” pinned to position 0, “b” pinned to position 0."],
    ["two followers", { together: [["a", "b"], ["a", "c"]] }, "“b” and “c” cannot both come right after “a”."],
    ["two leaders", { together: [["a", "c"], ["b", "c"]] }, "“c” cannot come right after both “a” and “b”."],
    ["a ring", { together: [["a", "b"], ["b", "a"]] }, "“b” right after “a”, “a” right after “b”: that goes round in a ring, so none can come first."],
    ["together and apart", { together: [["a", "b"]], apart: [["b", "a"]] }, "“b” right after “a”, yet “b” and “a” never next to each other."],
    ["a pin with no room after it", { pinned: { a: 3 }, together: [["a", "b"]] }, "“a” pinned to position 3 leaves no room for “b” right after “a”."],
    ["pins that pull a pair apart", { pinned: { a: 0, b: 2 }, together: [["a", "b"]] }, "“a” pinned to position 0 does not go with “b” pinned to position 2: “b” right after “a”."],
    ["a follower in a taken place", { pinned: { a: 0, c: 1 }, together: [["a", "b"]] }, "“b” and “c” would both stand at position 1: “a” pinned to position 0, “b” right after “a”, “c” pinned to position 1."],
    ["neighbouring pins that must be apart", { pinned: { b: 0, c: 1 }, apart: [["c", "b"]] }, "“b” pinned to position 0, “c” pinned to position 1, yet “c” and “b” never next to each other."],
    ["a chain that fits no gap", { pinned: { a: 1 }, together: [["b", "c"], ["c", "d"]] }, "These cannot all hold: “a” pinned to position 1; “c” right after “b”; “d” right after “c”."],
    ["a song apart from all, and nothing that does not matter", { apart: [["a", "b"], ["a", "c"], ["c", "d"], ["a", "d"]] }, "These cannot all hold: “a” and “b” never next to each other; “a” and “c” never next to each other; “a” and “d” never next to each other."],
  ])("%s", (_, rules, sentence) => {
    expect(says(rules)).toContain(sentence);
  });

  it("above 20 songs as well", () => {
    const request = makePlanningSource(6).orderOfTimes(26, "near");
    const apart = request.songs.slice(1).map((id): [string, string] => [request.songs[0]!, id]);
    const answer = orderSet({ ...request, apart }, { rounds: 2 });
    expect(answer).toMatchObject({ ok: false, undecided: false });
    const gap = orderSet({ ...request, pinned: { "song 0": 1, "song 1": 3 }, together: Array.from({ length: 12 }, (_, k): [string, string] => [`song ${2 + 2 * k}`, `song ${3 + 2 * k}`]) }, { rounds: 2 });
    expect(gap).toMatchObject({ ok: false, undecided: false });
  });

  it("rules said twice do no harm", () => {
    expect(orderSet({ ...four, together: [["a", "b"], ["a", "b"]], apart: [["a", "d"], ["d", "a"]] }).ok).toBe(true);
  });
});

describe("what cannot be meant is refused by path", () => {
  const paths = (change: Partial<OrderRequest>) => findOrderIssues({ ...four, ...change }).map(({ path }) => path.join("."));
  it.each<[string, Partial<OrderRequest>, string]>([
    ["no songs", { songs: [], setupS: {}, changeoverS: [] }, "songs"],
    ["a song twice", { songs: ["a", "b", "c", "a"], setupS: { a: 0, b: 0, c: 0 } }, "songs.3"],
    ["a missing row", { changeoverS: four.changeoverS.slice(1) }, "changeoverS"],
    ["a short row", { changeoverS: [[0, 1, 2], ...four.changeoverS.slice(1)] }, "changeoverS.0"],
    ["a negative time", { changeoverS: [[0, -1, 2, 3], ...four.changeoverS.slice(1)] }, "changeoverS.0.1"],
    ["a time that is none", { changeoverS: [[0, Number.NaN, 2, 3], ...four.changeoverS.slice(1)] }, "changeoverS.0.1"],
    ["an endless time", { setupS: { ...four.setupS, a: Infinity } }, "setupS.a"],
    ["a missing set-up", { setupS: { a: 1, b: 1, c: 1 } }, "setupS.d"],
    ["a stranger's set-up", { setupS: { ...four.setupS, z: 1 } }, "setupS.z"],
    ["a pin past the end", { pinned: { a: 4 } }, "pinned.a"],
    ["a pin before the start", { pinned: { a: -1 } }, "pinned.a"],
    ["a pin between places", { pinned: { a: 1.5 } }, "pinned.a"],
    ["a stranger pinned", { pinned: { z: 0 } }, "pinned.z"],
    ["a stranger in a pair", { together: [["a", "z"]] }, "together.0.1"],
    ["a pair of one", { apart: [["a", "a"]] }, "apart.0"],
  ])("%s", (_, change, path) => {
    expect(paths(change)).toContain(path);
    expect(() => orderSet({ ...four, ...change })).toThrow(RangeError);
  });

  it("and nothing else", () => {
    expect(paths({ pinned: { a: 0, d: 3 }, together: [["a", "b"]], apart: [["c", "a"]] })).toEqual([]);
  });
});

describe("the search beyond 20 songs", () => {
  const request = makePlanningSource(11).orderOfTimes(40, "near");

  it("gives the same answer every time without a clock, and never one worse than the performer's", () => {
    const first = orderSet(request, { rounds: 6 });
    expect(orderSet(request, { rounds: 6 })).toEqual(first);
    if (!first.ok) throw new Error("no rules");
    const own = totalOf(request, request.songs.map((_, k) => k));
    expect(first.totalS).toBeLessThan(own);
    expect(first.lowerBoundS).toBeLessThanOrEqual(first.totalS);
  });

  it("keeps pins, pairs and distances, and says a bound", () => {
    const ruled: OrderRequest = {
      ...request,
      pinned: { "song 3": 0, "song 30": 20, "song 8": 39 },
      together: [["song 1", "song 2"], ["song 2", "song 9"], ["song 30", "song 31"]],
      apart: [["song 4", "song 5"], ["song 6", "song 7"], ["song 3", "song 10"]],
    };
    const answer = orderSet(ruled, { rounds: 20 });
    if (!answer.ok) throw new Error(answer.conflicts.join(" "));
    expect(keeps(ruled, answer.order.map((id) => request.songs.indexOf(id)))).toBe(true);
    expect(new Set(answer.order).size).toBe(40);
    const free = orderSet(request, { rounds: 60 });
    expect(free.ok && free.totalS).toBeLessThanOrEqual(answer.totalS);
  });

  it("returns the performer's order where nothing beats it", () => {
    const best = orderSet(request);
    if (!best.ok) throw new Error("no rules");
    const at = best.order.map((id) => request.songs.indexOf(id));
    const sorted: OrderRequest = { ...request, songs: best.order, changeoverS: at.map((from) => at.map((to) => request.changeoverS[from]![to]!)) };
    expect(orderSet(sorted)).toMatchObject({ order: best.order, totalS: best.totalS });
  });

  it("stops when told, reports as it goes, and keeps to a budget of time", () => {
    const hard = makePlanningSource(12).orderOfTimes(60, "near");
    const seen: number[] = [];
    let calls = 0;
    const answer = orderSet(hard, {
      shouldStop: () => (calls += 1) > 180,
      onProgress: ({ done, bestS, lowerBoundS }) => {
        expect(lowerBoundS).toBeLessThanOrEqual(bestS + 1e-6);
        seen.push(done);
      },
    });
    expect(answer.ok).toBe(true);
    expect(calls).toBeLessThan(200);
    expect(seen.length).toBeGreaterThan(2);
    expect(seen.every((done, k) => done > 0 && done <= 1 && done >= (seen[k - 1] ?? 0))).toBe(true);
    let clockMs = 0;
    const timed = orderSet(hard, { now: () => (clockMs += 1), budgetMs: 100 });
    expect(timed.ok).toBe(true);
    expect(clockMs).toBeLessThan(110);
  });
});

describe("the methods underneath, against exhaustive search", () => {
  it("the assignment is the cheapest of all", () => {
    const source = makePlanningSource(31);
    for (let k = 0; k < 200; k += 1) {
      const rows = 1 + source.whole(5);
      const columns = rows + source.whole(2);
      const cost = Float64Array.from({ length: rows * columns }, () => source.whole(20) - 8);
      const columnOf = solveAssignment(rows, columns, cost);
      expect(new Set(columnOf).size).toBe(rows);
      const sum = (chosen: ArrayLike<number>) => Array.from({ length: rows }, (_, row) => cost[row * columns + chosen[row]!]!).reduce((a, b) => a + b, 0);
      const least = Math.min(...[...ordersOf(Array.from({ length: columns }, (_, column) => column))].map(sum));
      expect(sum(columnOf)).toBe(least);
    }
    expect(() => solveAssignment(2, 1, new Float64Array(2))).toThrow(RangeError);
  });

  it("the arborescence is the cheapest of all, and its arc prices are true lower bounds", () => {
    const source = makePlanningSource(32);
    for (let k = 0; k < 200; k += 1) {
      const n = 2 + source.whole(4);
      const root = n - 1;
      const cost = Float64Array.from({ length: n * n }, () => source.whole(20));
      const finder = makeArborescenceFinder(n, root);
      const parentOf = new Int32Array(n);
      const added = new Float64Array(n * n);
      const value = finder.find(cost, parentOf);
      finder.priceArcs(cost, added);
      const hangs = (parents: number[]) => parents.every((_, v) => {
        let node = v;
        for (let step = 0; step < n && node !== root; step += 1) node = parents[node]!;
        return node === root;
      });
      const all = Array.from({ length: n ** (n - 1) }, (_, code) => Array.from({ length: n - 1 }, (__, v) => Math.floor(code / n ** v) % n))
        .filter((parents) => parents.every((parent, v) => parent !== v) && hangs(parents));
      const sum = (parents: ArrayLike<number>) => Array.from({ length: n - 1 }, (_, v) => cost[parents[v]! * n + v]!).reduce((a, b) => a + b, 0);
      expect(value).toBeCloseTo(Math.min(...all.map(sum)), 9);
      expect(sum(parentOf)).toBeCloseTo(value, 9);
      for (let v = 0; v < n - 1; v += 1) {
        for (let w = 0; w < n; w += 1) {
          if (w === v) continue;
          const forced = Math.min(...all.filter((parents) => parents[v] === w).map(sum));
          expect(value + added[w * n + v]!).toBeLessThanOrEqual(forced + 1e-9);
        }
      }
    }
  });
});
