import fc from "fast-check";
import { describe, expect, it } from "vitest";
import {
  applyStep, applySteps, planChangeover, planSet, startState,
  type ChangeoverRequest, type Connection, type PatchState, type PluggedLead, type Step, type StockLead,
} from "@/lib/core/planning";
import { makePlanningSource } from "../../../factories/planning";

const wire = (text: string): PluggedLead[] =>
  text.split(" ").filter(Boolean).map((part) => {
    const [output, input, lead] = part.split(/[>#]/);
    return { output: output!, input: input!, ...(lead ? { lead: Number(lead) } : {}) };
  });
const pairs = (connections: { output: string | null; input: string | null }[]) => connections.map(({ output, input }) => `${output}>${input}`).sort();
const textOf = (steps: Step[]) => steps.map((step) => step.text);

describe("least end moves, counted by hand", () => {
  it.each([
    ["nothing changes", "a>1 b>2", "b>2 a>1", 0],
    ["one input end moves", "a>1", "a>2", 1],
    ["one output end moves", "a>1", "b>1", 1],
    ["both ends move", "a>1", "b>2", 2],
    ["one lead put away", "a>1 b>2", "a>1", 2],
    ["one lead fetched", "a>1", "a>1 b>2", 2],
    ["everything put away", "a>1 b>2", "", 4],
    ["from an empty rig", "", "a>1 b>2", 4],
    ["two empty patches", "", "", 0],
    ["two inputs trade places: two ends", "a>1 b>2", "a>2 b>1", 2],
    ["three go round: three ends", "a>1 b>2 c>3", "a>2 b>3 c>1", 3],
    // Greedy gives a>1 to a>2 (1) and leaves b>2 → c>1 (2): 3. The assignment gives a>1 → c>1 (1), b>2 → a>2 (1).
    ["a greedy choice would cost 3", "a>1 b>2", "a>2 c>1", 2],
    ["a mult: one output, two inputs", "a>1 a>2", "a>1 a>3", 1],
    ["two outputs joined through an OR", "a>1 b>1", "a>1 c>1", 1],
  ])("%s", (_, from, to, ends) => {
    const plan = planChangeover({ from: wire(from), to: wire(to) });
    expect(plan.endMoves).toBe(ends);
    expect(plan.steps.reduce((sum, step) => sum + (step.kind === "turn" ? 0 : step.ends), 0)).toBe(ends);
  });

  it("gives exactly the open calculator's fields where nothing more was asked", () => {
    expect(Object.keys(planChangeover({ from: wire("a>1"), to: wire("a>2") }))).toEqual(["endMoves", "knobTurns", "seconds", "steps"]);
  });

  it("keeps output and input jacks of one name apart", () => {
    expect(planChangeover({ from: wire("x>y"), to: wire("y>x") }).endMoves).toBe(2);
  });

  it("copes with jacks called like parts of an object", () => {
    const plan = planChangeover({ from: wire("constructor>toString"), to: wire("constructor>valueOf"), outputs: {}, knobsFrom: {}, knobsTo: { hasOwnProperty: 1 } });
    expect(plan).toMatchObject({ endMoves: 1, knobTurns: 1 });
    expect(plan.steps[1]!.text).toBe("hasOwnProperty: set to 1");
  });
});

describe("seconds", () => {
  it("are ends × 4 + knobs × 2 + fetched × 3 unless a pace is given", () => {
    const request = { from: wire("a>1"), to: wire("a>2 b>3"), knobsFrom: { tone: 1, decay: 2 }, knobsTo: { tone: 1, decay: 3, level: "noon" } };
    // 1 end + 2 for the fetched lead; decay differs, level's position before is not known.
    expect(planChangeover(request)).toMatchObject({ endMoves: 3, knobTurns: 2, seconds: 3 * 4 + 2 * 2 + 1 * 3 });
    expect(planChangeover({ ...request, pace: { endS: 10 } }).seconds).toBe(3 * 10 + 2 * 2 + 3);
    expect(planChangeover({ ...request, pace: { endS: 0, knobS: 0, fetchS: 0.5 } }).seconds).toBe(0.5);
  });

  it("leave alone a knob the new patch does not mention", () => {
    expect(planChangeover({ from: [], to: [], knobsFrom: { tone: 1 }, knobsTo: {} }).knobTurns).toBe(0);
  });
});

describe("what a person reads", () => {
  const stock: StockLead[] = [{ lead: 4, colour: "red", lengthM: 0.6 }, { lead: 5, lengthM: 1.5 }];

  it("names lead, colour, length and what stays", () => {
    const plan = planChangeover({ from: [{ output: "Pad B", input: "Low drum trig", lead: 4 }], to: [{ output: "Pad B", input: "Snare trig" }], leads: stock });
    expect(textOf(plan.steps)).toEqual(["Lead 4 (red, 60 cm): leave in Pad B · move from Low drum trig to Snare trig"]);
  });

  it("pulls the input end first and plugs it last", () => {
    const both = planChangeover({ from: wire("a>1#4"), to: wire("b>2"), leads: stock });
    expect(textOf(both.steps)).toEqual(["Lead 4 (red, 60 cm): pull from 1, then from a · plug into b, then into 2"]);
    const away = planChangeover({ from: wire("a>1#5"), to: [], leads: stock });
    expect(textOf(away.steps)).toEqual(["Lead 5 (1.5 m): pull from 1, then from a · put away"]);
    const fetch = planChangeover({ from: [], to: wire("a>1"), leads: stock });
    expect(textOf(fetch.steps)).toEqual(["Lead 4 (red, 60 cm): fetch · plug into a, then into 1"]);
  });

  it("tells knobs with both positions", () => {
    const plan = planChangeover({ from: [], to: [], knobsFrom: { "Snare decay": "2 o'clock", mute: true }, knobsTo: { "Snare decay": "9 o'clock", mute: false } });
    expect(textOf(plan.steps)).toEqual(["Snare decay: 2 o'clock → 9 o'clock", "mute: on → off"]);
  });

  it("breaks a ring by naming the end to pull first, which is not counted twice", () => {
    const plan = planChangeover({ from: wire("a>1#1 b>2#2"), to: wire("a>2 b>1") });
    expect(plan.endMoves).toBe(2);
    expect(textOf(plan.steps)).toEqual([
      "First pull Lead 2 out of b and let that end hang · Lead 1: leave in 1 · move from a to b",
      "Lead 2: leave in 2 · plug the end left hanging (it was in b) into a",
    ]);
  });

  it("lowers the desk channels concerned first and raises them last", () => {
    const desk = [{ channel: "Desk 1", inputs: ["1", "2"] }, { channel: "Desk 2", inputs: ["9"] }];
    expect(planChangeover({ from: wire("a>1"), to: wire("a>2"), desk })).toMatchObject({ before: ["Lower Desk 1"], after: ["Raise Desk 1 again"] });
  });

  it("flags an output that does not stand a short", () => {
    const outputs = { a: { sourceOhm: 47 }, b: { sourceOhm: 47, limitA: 0.02 }, c: { sourceOhm: 1000 } };
    const cautions = (output: string) => planChangeover({ from: [], to: [{ output, input: "1" }], outputs }).steps.flatMap((step) => ("cautions" in step ? step.cautions ?? [] : []));
    expect(cautions("a")).toEqual(["a does not stand a short (47 Ω, no current limit): switch its box off while this plug goes in or out."]);
    expect([...cautions("b"), ...cautions("c")]).toEqual([]);
  });
});

describe("leads as things", () => {
  const place = (xM: number) => ({ xM, yM: 0 });

  it("takes no lead that is too short", () => {
    // Lead 1 reaches 1 m; moving its input end to a jack 2 m away is one end too cheap, so it goes away (2) and lead 2 is fetched (2).
    const request: ChangeoverRequest = {
      from: wire("a>1#1"), to: wire("a>2"), outputs: { a: place(0) }, inputs: { "1": place(0.5), "2": place(2) },
      leads: [{ lead: 1, lengthM: 1 }, { lead: 2, lengthM: 2 }],
    };
    const plan = planChangeover(request);
    expect(plan.endMoves).toBe(4);
    expect(plan.steps.map((step) => [step.kind, "lead" in step && step.lead])).toEqual([["put-away", 1], ["fetch", 2]]);
  });

  it("takes an adapter where the rig has one, and lists it", () => {
    const request: ChangeoverRequest = {
      from: wire("a>1#1"), to: wire("a>2"),
      inputs: { "1": { connector: "6.35 mm TS" }, "2": { connector: "3.5 mm TS" } },
      leads: [{ lead: 1, connectors: { output: "6.35 mm TS", input: "6.35 mm TS" } }],
    };
    expect(planChangeover(request)).toMatchObject({ endMoves: 4, shortages: [{ toRow: 0, text: "No free lead fits from a to 2." }] });
    const plan = planChangeover({ ...request, adapters: [{ plug: "6.35 mm TS", jack: "3.5 mm TS" }] });
    expect(plan.endMoves).toBe(1);
    expect(plan.steps[0]).toMatchObject({ adapters: [{ plug: "6.35 mm TS", jack: "3.5 mm TS" }] });
    expect(plan.steps[0]!.text).toContain("adapter 6.35 mm TS to 3.5 mm TS");
  });

  it("keeps each lead's number through a set", () => {
    const { changeovers, songs } = planSet([{ connections: wire("a>1#1 b>2#2") }, { connections: wire("a>3 b>2") }, { connections: wire("b>2 c>3") }]);
    expect(changeovers.map(({ endMoves }) => endMoves)).toEqual([1, 1]);
    expect(songs[2]).toEqual([{ output: "b", input: "2", lead: 2 }, { output: "c", input: "3", lead: 1 }]);
  });
});

/** Jacks that hold more plugs than the fuller of the two patches puts into them (or more than one). */
function overfull(state: PatchState, from: Connection[], to: Connection[], end: "output" | "input"): string[] {
  const count = (all: { output: string | null; input: string | null }[], jack: string) => all.filter((one) => one[end] === jack).length;
  const jacks = new Set(state.leads.map((lead) => lead[end]).filter((jack) => jack !== null));
  return [...jacks].filter((jack) => count(state.leads, jack) > Math.max(1, count(from, jack), count(to, jack)));
}

describe("steps applied one by one", () => {
  const connection = (outputs: number, inputs: number) => fc.record({ output: fc.integer({ min: 1, max: outputs }).map((k) => `o${k}`), input: fc.integer({ min: 1, max: inputs }).map((k) => `i${k}`) });
  const patchOf = (outputs: number, inputs: number) => fc.uniqueArray(connection(outputs, inputs), { maxLength: 12, selector: ({ input }) => input });
  const walk = (request: ChangeoverRequest, check: (state: PatchState) => void) => {
    const plan = planChangeover(request);
    let state = startState(request.from, request.knobsFrom);
    for (const step of plan.steps) {
      state = applyStep(state, step);
      check(state);
    }
    expect(pairs(state.leads)).toEqual(pairs(request.to));
    return { plan, state };
  };

  it("give the new patch, and never put two outputs on one input on the way", () => {
    fc.assert(fc.property(patchOf(4, 6), patchOf(4, 6), (from, to) => {
      walk({ from, to }, (state) => {
        const inputs = state.leads.map((lead) => lead.input).filter((jack) => jack !== null);
        expect(new Set(inputs).size).toBe(inputs.length);
        expect(overfull(state, from, to, "output")).toEqual([]);
      });
    }), { numRuns: 2000, seed: 3 });
  });

  it("do so where inputs are shared by an OR, no fuller than in either patch", () => {
    const shared = fc.uniqueArray(connection(4, 3), { maxLength: 8, selector: ({ output, input }) => `${output}>${input}` });
    fc.assert(fc.property(shared, shared, (from, to) => {
      walk({ from, to }, (state) => expect([...overfull(state, from, to, "input"), ...overfull(state, from, to, "output")]).toEqual([]));
    }), { numRuns: 1000, seed: 4 });
  });

  it("do so where leads fit only some places, so that leads themselves must trade inputs", () => {
    let rings = 0;
    fc.assert(fc.property(fc.integer({ min: 3, max: 7 }), fc.integer({ min: 1, max: 1e6 }), (size, seed) => {
      const source = makePlanningSource(seed);
      // Each lead fits one output only, and the inputs are dealt anew.
      const from = source.shuffled(size).map((input, k) => ({ output: `o${k}`, input: `i${input}`, lead: k }));
      const to = source.shuffled(size).map((input, k) => ({ output: `o${k}`, input: `i${input}` }));
      const leads = from.map(({ lead, output }): StockLead => ({ lead, connectors: { output, input: "any" } }));
      const outputs = Object.fromEntries(from.map(({ output }) => [output, { connector: output }]));
      const { plan } = walk({ from, to, leads, outputs }, (state) => {
        const inputs = state.leads.map((lead) => lead.input).filter((jack) => jack !== null);
        expect(new Set(inputs).size).toBe(inputs.length);
      });
      if (plan.steps.some((step) => "pullFirst" in step && step.pullFirst)) rings += 1;
      expect(plan.endMoves).toBe(from.filter((one, k) => one.input !== to[k]!.input).length);
    }), { numRuns: 300, seed: 5 });
    expect(rings).toBeGreaterThan(100);
  });

  it("set the knobs as well, and the same request always gives the same steps", () => {
    const source = makePlanningSource(9);
    const [a, b] = source.setOfSongs(2, 30, 1);
    const request = { from: a!.connections, to: b!.connections, knobsFrom: a!.knobs, knobsTo: b!.knobs };
    const { state, plan } = walk(request, () => undefined);
    expect(state.knobs).toEqual(b!.knobs);
    expect(planChangeover(request)).toEqual(plan);
  });

  it("are refused on a rig they were not made for", () => {
    const plan = planChangeover({ from: wire("a>1"), to: wire("a>2") });
    expect(() => applySteps(startState(wire("a>3")), plan.steps)).toThrow("not in 1");
    expect(() => applySteps(startState([]), plan.steps)).toThrow("no lead of row 0");
  });
});
