import { describe, expect, it } from "vitest";
import { orderSet, planChangeover } from "@/lib/core/planning";
import { changeoverRequestSchema, changeoverResultSchema } from "@/lib/schemas/changeover";
import { orderRequestSchema, orderResultSchema } from "@/lib/schemas/order";
import { makePlanningSource } from "../../../factories/planning";

const paths = (schema: { safeParse(data: unknown): { success: boolean; error?: { issues: { path: PropertyKey[] }[] } } }, data: unknown) =>
  schema.safeParse(data).error?.issues.map((issue) => issue.path.join(".")) ?? [];

describe("what the open calculators take", () => {
  const two = { songs: ["a", "b"], setupS: { a: 1, b: 2 }, changeoverS: [[0, 3], [4, 0]] };
  it.each<[string, object, string]>([
    ["a hole off the diagonal", { changeoverS: [[0, null], [4, 0]] }, "changeoverS.0.1"],
    ["a pin outside", { pinned: { a: 2 } }, "pinned.a"],
    ["a word for a time", { setupS: { a: "x", b: 1 } }, "setupS.a"],
    ["three in a pair", { together: [["a", "b", "a"]] }, "together.0"],
    ["a stranger", { apart: [["a", "c"]] }, "apart.0.1"],
    ["no rows", { changeoverS: [] }, "changeoverS"],
    ["a negative time", { changeoverS: [[0, -3], [4, 0]] }, "changeoverS.0.1"],
  ])("order: %s is named", (_, change, path) => {
    expect(paths(orderRequestSchema, { ...two, ...change })).toContain(path);
  });

  it("order: the diagonal may be null, and unknown fields are refused", () => {
    expect(orderRequestSchema.parse({ ...two, changeoverS: [[null, 3], [4, null]] }).changeoverS).toEqual([[0, 3], [4, 0]]);
    expect(orderRequestSchema.safeParse({ ...two, pins: {} }).success).toBe(false);
  });

  it.each<[string, object, string]>([
    ["a connection without an input", { from: [{ output: "a" }] }, "from.0.input"],
    ["a lead in two places", { from: [{ output: "a", input: "1", lead: 4 }, { output: "b", input: "2", lead: "4" }] }, "from.1.lead"],
    ["the same two jacks twice", { to: [{ output: "a", input: "1" }, { output: "a", input: "1" }] }, "to.1.input"],
    ["a negative pace", { pace: { endS: -1 } }, "pace.endS"],
    ["a knob at no position", { knobsTo: { tone: null } }, "knobsTo.tone"],
    ["too many leads", { from: Array.from({ length: 201 }, (_, k) => ({ output: "a", input: `${k}` })) }, "from"],
  ])("changeover: %s is named", (_, change, path) => {
    expect(paths(changeoverRequestSchema, { from: [], to: [], ...change })).toContain(path);
  });

  it("the answers are what the document says", () => {
    const source = makePlanningSource(61);
    const [a, b] = source.setOfSongs(2, 20, 1);
    const request = changeoverRequestSchema.parse({ from: a!.connections, to: b!.connections, knobsFrom: a!.knobs, knobsTo: b!.knobs });
    const plan = planChangeover(request);
    expect(plan.steps.length).toBeGreaterThan(5);
    expect(changeoverResultSchema.parse(plan)).toEqual(plan);
    const { ok, ...order } = orderSet(orderRequestSchema.parse(two)) as { ok: true };
    expect(ok).toBe(true);
    expect(orderResultSchema.parse(order)).toEqual({ order: ["a", "b"], totalS: 4, lowerBoundS: 4, provenOptimal: true });
  });
});
