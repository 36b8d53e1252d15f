import { describe, expect, it } from "vitest";
import { checkPatch, recheckPatch } from "@/lib/core/electrics/check-patch";
import type { Input, Output } from "@/lib/core/electrics/jacks";
import type { ConditionerCircuit, ConditionerSimulator, GearModel, JackModel, PatchModel, RigModel } from "@/lib/core/electrics/patch-types";
import { nominalOf, toRange } from "@/lib/core/units/spread";

const out = (id: string, output: Partial<Output>, role: JackModel["role"] = "plain"): JackModel => ({ id, name: "Out", direction: "output", role, output });
const into = (id: string, input: Omit<Input, "id">, role: JackModel["role"] = "plain"): JackModel => ({ id, name: "In", direction: "input", role, input });
const triggerIn: Omit<Input, "id"> = { accepts: ["trigger", "gate"], onV: { min: 1, max: 2 }, safeV: { min: -12, max: 12 }, loadOhm: 100e3, pulseS: { min: 1e-3 } };
const circuit: ConditionerCircuit = {
  supply: { highV: { min: 6, max: 9.6 }, lowV: 0 }, padLeg: "upper", divider: { ohm: 10e3 }, coupling: { farad: 100e-9, ohm: 22e3 },
  threshold: { topOhm: 100e3, potOhm: 10e3, bottomOhm: 1e3 }, comparator: { highDropV: 1.5, lowDropV: 0.02, limitA: 0.02 },
  output: { seriesOhm: 2200, shuntOhm: null }, envelope: null,
};

const pad = (id: string, hitOhm = 10e3): GearModel => ({
  id, kind: "pad", name: `Pad ${id}`, pad: { sensor: "resistive", restOhm: { min: 20e3, max: 50e3 }, hitOhm },
  jacks: [out(`${id}.out`, { signal: "sensor" })], assumed: ["pad.restOhm"],
});
const conditioner = (id: string): GearModel => ({
  id, kind: "conditioner", name: `Conditioner ${id}`, circuit, knobs: [{ id: "sens", turns: "threshold" }],
  jacks: [into(`${id}.pad`, { accepts: ["sensor"], loadOhm: null }, "pad-in"), out(`${id}.trig`, { signal: "trigger" }, "trigger-out")], assumed: ["circuit.threshold.topOhm"],
});
const voice = (id: string, input: Partial<Omit<Input, "id">> = {}): GearModel => ({
  id, kind: "voice", name: `Voice ${id}`, jacks: [into(`${id}.in`, { ...triggerIn, ...input }), out(`${id}.out`, { signal: "audio", restV: 0, activeV: 2, sourceOhm: 1e3 }, "through")], assumed: [],
});
const desk = (id: string): GearModel => ({
  id, kind: "desk-channel", name: `Channel ${id}`, jacks: [into(`${id}.in`, { accepts: ["audio"], safeV: { min: -20, max: 20 }, loadOhm: 20e3, maxDbu: 20 })], assumed: [],
});

/** Stands in for the circuit's solver: fires below 15 kΩ, pulse RC long, counted. */
function standIn() {
  const asked: Parameters<ConditionerSimulator>[0][] = [];
  const simulate: ConditionerSimulator = (question) => {
    asked.push(question);
    const hit = question.pad.hitOhm === undefined ? Infinity : toRange(question.pad.hitOhm).max;
    const fires = hit < 15e3 && question.turn < 0.9;
    const supply = toRange(question.circuit.supply.highV);
    const { farad, ohm } = question.circuit.coupling;
    return {
      verdict: fires ? "good" : "dead",
      reasons: [{ verdict: fires ? "good" : "dead", text: fires ? "Fires with room to spare." : "This hit cannot fire it." }],
      trigger: {
        restV: 0, activeV: fires ? { min: supply.min - 1.5, max: supply.max - 1.5 } : 0, sourceOhm: 2200, limitA: 0.02,
        pulseS: nominalOf(farad) * nominalOf(ohm),
      },
    };
  };
  return { simulate, asked };
}

const lead = (number: number, outputId: string, inputId: string) => ({ id: `l${number}`, number, outputId, inputId });
const rig: RigModel = {
  gear: [pad("p1"), pad("p2", 30e3), conditioner("c1"), conditioner("c2"), voice("v1"), voice("v2", { safeV: { min: -0.5, max: 5.5 } }), voice("v3"), desk("d1"), desk("d2")],
};
const patch: PatchModel = {
  leads: [lead(1, "p1.out", "c1.pad"), lead(2, "c1.trig", "v1.in"), lead(3, "v1.out", "d1.in"), lead(4, "p2.out", "c2.pad"), lead(5, "c2.trig", "v3.in")],
  knobs: [],
};
const plug = (leads: PatchModel["leads"], knobs: PatchModel["knobs"] = []): PatchModel => ({ leads, knobs });

describe("a patch, from pad to desk", () => {
  it("computes a conditioner from the pad plugged into it, and what follows from that", () => {
    const check = checkPatch(rig, patch, standIn());
    expect(Object.fromEntries(Object.entries(check.leads).map(([id, l]) => [id, l.verdict]))).toEqual({ l1: "good", l2: "good", l3: "good", l4: "dead", l5: "dead" });
    expect(check.leads.l2!.highV!.max).toBeCloseTo((8.1 * 100) / 102.2, 9);
    expect(check.worst).toBe("dead");
    expect(check.counts).toMatchObject({ good: 3, dead: 2, hot: 0 });
  });
  it("another pad on the same conditioner changes every lead after it", () => {
    const swapped = plug([lead(1, "p2.out", "c1.pad"), ...patch.leads.slice(1, 3)]);
    expect(checkPatch(rig, swapped, standIn()).leads.l2!.verdict).toBe("dead");
  });
  it("runs are chains of jacks and leads, complete from pad to desk or as far as they go", () => {
    const { runs } = checkPatch(rig, patch, standIn());
    expect(runs).toHaveLength(2);
    expect(runs[0]).toMatchObject({ leadIds: ["l1", "l2", "l3"], gearIds: ["p1", "c1", "v1", "d1"], verdict: "good", complete: true });
    expect(runs[0]!.steps.map((s) => s.id)).toEqual(["p1.out", "l1", "c1.pad", "c1.trig", "l2", "v1.in", "v1.out", "l3", "d1.in"]);
    expect(runs[1]).toMatchObject({ leadIds: ["l4", "l5"], verdict: "dead", complete: false });
  });
  it("leads from one output share its level: each load pulls at both", () => {
    const mult = plug([...patch.leads.slice(0, 2), lead(6, "c1.trig", "v3.in")]);
    const check = checkPatch(rig, mult, standIn());
    expect(check.leads.l2!.highV!.max).toBeCloseTo((8.1 * 50) / 52.2, 9);
    expect(check.leads.l2!.highV).toEqual(check.leads.l6!.highV);
    expect(check.runs.map((run) => run.leadIds)).toEqual([["l1", "l2"], ["l1", "l6"]]);
  });
  it("several outputs into one input clash, on every lead there", () => {
    const check = checkPatch(rig, plug([lead(1, "v1.out", "d1.in"), lead(2, "v2.out", "d1.in")]), standIn());
    expect([check.leads.l1!.verdict, check.leads.l2!.verdict]).toEqual(["clash", "clash"]);
  });
  it("a 9 V conditioner hurts a bare 5 V input, and the fix fits", () => {
    const check = checkPatch({ gear: rig.gear.map((g) => (g.id === "c1" ? { ...g, circuit: { ...circuit, supply: { highV: 9, lowV: 0 } } } : g)) },
      plug([lead(1, "p1.out", "c1.pad"), lead(2, "c1.trig", "v2.in")]), standIn());
    expect(check.leads.l2!.verdict).toBe("hot");
    expect(check.leads.l2!.fixes[0]).toMatchObject({ kind: "divider", verdict: "good" });
  });
  it("a pulse too short is mended by a capacitor, the circuit being solved again for each", () => {
    const short = { ...circuit, coupling: { farad: 22e-9, ohm: 22e3 } };
    const { simulate, asked } = standIn();
    const check = checkPatch({ gear: rig.gear.map((g) => (g.id === "c1" ? { ...g, circuit: short } : g)) }, plug(patch.leads.slice(0, 2)), { simulate });
    expect(check.leads.l2!.verdict).toBe("brief");
    expect(check.leads.l2!.fixes).toMatchObject([{ kind: "pulse-width", part: "farad", value: 68e-9, verdict: "good" }]);
    expect(asked.length).toBeGreaterThan(1);
  });
});

describe("boxes that are free in a song", () => {
  it("a bare pad on a voice is led through a free conditioner that it fires", () => {
    const check = checkPatch(rig, plug([lead(1, "p1.out", "v1.in")]), standIn());
    expect(check.leads.l1!.verdict).toBe("wrong-kind");
    expect(check.leads.l1!.fixes).toMatchObject([{ kind: "conditioner", gearId: "c1", verdict: "good", feedVerdict: "good", through: { inputId: "c1.pad", outputId: "c1.trig" } }]);
    expect(checkPatch(rig, plug([lead(1, "p2.out", "v1.in")]), standIn()).leads.l1!.fixes).toEqual([]);
  });
  it("a trigger on an envelope input goes through a free shaper, until that is taken", () => {
    const shaper: GearModel = { id: "s", kind: "shaper", name: "Long tail", jacks: [into("s.in", triggerIn), out("s.out", { signal: "envelope", restV: 0, activeV: 5, sourceOhm: 1e3, decayS: 0.2 })], assumed: [] };
    const wants = voice("e", { accepts: ["envelope"], onV: undefined, pulseS: undefined, decayS: { min: 0.1 } });
    const gear = { gear: [...rig.gear, shaper, wants] };
    const leads = [...patch.leads.slice(0, 1), lead(7, "c1.trig", "e.in")];
    const before = checkPatch(gear, plug(leads), standIn());
    expect(before.leads.l7!.fixes).toMatchObject([{ kind: "shaper", gearId: "s", through: { inputId: "s.in", outputId: "s.out" } }]);
    const taken = plug([...leads, lead(8, "v3.out", "s.in")]);
    const after = recheckPatch(before, gear, taken, [], standIn());
    expect(after.leads.l7!.fixes).toEqual([]);
    expect(after).toEqual(checkPatch(gear, taken, standIn()));
  });
});

describe("what cannot be known says so", () => {
  it("no pad on the conditioner", () => {
    const check = checkPatch(rig, plug([patch.leads[1]!]), standIn());
    expect(check.leads.l2!.verdict).toBe("unproven");
    expect(check.leads.l2!.reasons).toHaveLength(1);
    expect(check.leads.l2!.reasons[0]!.text).toContain("No pad is plugged into Conditioner c1");
  });
  it("a pad that feeds two conditioners, and two pads on one", () => {
    const shared = checkPatch(rig, plug([lead(1, "p1.out", "c1.pad"), lead(2, "p1.out", "c2.pad")]), standIn());
    expect([shared.leads.l1!.verdict, shared.leads.l2!.verdict]).toEqual(["unproven", "unproven"]);
    const both = checkPatch(rig, plug([lead(1, "p1.out", "c1.pad"), lead(2, "p2.out", "c1.pad")]), standIn());
    expect(both.leads.l1!.reasons[0]!.text).toContain("Several pads");
  });
  it("without a solver", () => expect(checkPatch(rig, patch).leads.l1!.verdict).toBe("unproven"));
  it("a black box asks to be tried with this pad", () => {
    const box: GearModel = { ...conditioner("b"), circuit: undefined };
    const check = checkPatch({ gear: [...rig.gear, box] }, plug([lead(1, "p1.out", "b.pad")]), standIn());
    expect(check.leads.l1!.reasons[0]!.text).toContain("known only by its readings");
  });
  it("a lead on a jack the rig does not have", () => {
    const check = checkPatch(rig, plug([lead(9, "gone", "v1.in"), lead(8, "v1.in", "v1.out")]), standIn());
    expect([check.leads.l9!.verdict, check.leads.l8!.verdict]).toEqual(["unproven", "unproven"]);
  });
  it("a pad straight into a voice is the wrong kind; a voice into a pad input too", () => {
    const check = checkPatch(rig, plug([lead(1, "p1.out", "v1.in"), lead(2, "v3.out", "c1.pad")]), standIn());
    expect([check.leads.l1!.verdict, check.leads.l2!.verdict]).toEqual(["wrong-kind", "wrong-kind"]);
  });
  it("an empty patch is good and has no runs", () => {
    expect(checkPatch(rig, plug([]), standIn())).toMatchObject({ leads: {}, runs: [], worst: "good" });
  });
  it("a loop of leads ends where it meets itself", () => {
    const loop: GearModel[] = ["a", "b"].map((id) => voice(id));
    const check = checkPatch({ gear: loop }, plug([lead(1, "a.out", "b.in"), lead(2, "b.out", "a.in")]));
    expect(check.runs).toHaveLength(1);
  });
});

describe("assumed figures and what to measure next", () => {
  it("marks each verdict with the assumed figures upstream", () => {
    const check = checkPatch(rig, patch, standIn());
    expect(check.leads.l2!.assumed).toEqual(["c1:circuit.threshold.topOhm", "p1:pad.restOhm"]);
    expect(check.leads.l3!.assumed).toEqual([]);
  });
  it("names the one figure that settles most leads", () => {
    const some: RigModel = { gear: [{ ...voice("a"), assumed: ["jacks.a.out.activeV"] }, desk("d"), { ...desk("e"), assumed: ["jacks.e.in.safeV"] }] };
    const check = checkPatch(some, plug([lead(1, "a.out", "d.in"), lead(2, "a.out", "e.in")]));
    expect(check.nextMeasurement).toMatchObject({ gearId: "a", figure: "jacks.a.out.activeV", leadIds: ["l1", "l2"] });
    expect(check.leads.l2!.assumed).toEqual(["a:jacks.a.out.activeV", "e:jacks.e.in.safeV"]);
  });
  it("names a missing figure by its gear and jack", () => {
    const blank: RigModel = { gear: [voice("a"), { ...desk("d"), jacks: [into("d.in", { accepts: ["audio"], loadOhm: 20e3 })] }] };
    const check = checkPatch(blank, plug([lead(1, "a.out", "d.in")]));
    expect(check.leads.l1!.nextMeasurement).toMatchObject({ gearId: "d", figure: "jacks.d.in.safeV", text: "Measure what the input stands of Channel d, In: one lead leans on it." });
  });
});

describe("supplies", () => {
  const clamp = { lowV: -0.6, highV: 5.6, seriesOhm: 1e3, maxA: 5e-3 };
  const from = (gear: GearModel): RigModel => ({ gear: [voice("a"), gear] });
  const gate: GearModel = { ...voice("a"), jacks: [out("a.out", { signal: "trigger", restV: 0, activeV: 5, sourceOhm: 100, pulseS: 2e-3 })] };
  it("limits that follow a supply are taken at its lowest", () => {
    const box: GearModel = { ...voice("b"), supplyV: { min: 4.2, max: 5 }, jacks: [{ ...into("b.in", { ...triggerIn, safeV: undefined }), followsSupply: { aboveV: 0.5, belowV: 0.5 } }] };
    const check = checkPatch({ gear: [gate, box] }, plug([lead(1, "a.out", "b.in")]));
    expect(check.leads.l1!.reasons[0]).toMatchObject({ verdict: "hot", limit: 4.7 });
  });
  it("an unpowered box is a caution with the current into its dead rail", () => {
    const box: GearModel = { ...voice("b"), supplyV: 5, jacks: [into("b.in", { ...triggerIn, loadOhm: null, clamp })] };
    const check = checkPatch({ gear: [gate, box] }, plug([lead(1, "a.out", "b.in")]));
    expect(check.leads.l1!.verdict).toBe("good");
    expect(check.leads.l1!.cautions[0]!.measured).toBeCloseTo((5 - 0.6) / 1100, 9);
    expect(checkPatch(from(desk("d")), plug([lead(1, "a.out", "d.in")])).leads.l1!.cautions).toEqual([]);
  });
});

describe("re-checking after a change", () => {
  const changes: [string, (rig: RigModel, patch: PatchModel) => { rig: RigModel; patch: PatchModel; ids: string[]; kept: string[] }][] = [
    ["a figure of the last voice", (r, p) => ({ rig: edit(r, "v1", (g) => ({ ...g, jacks: g.jacks.map((j) => (j.id === "v1.out" ? out("v1.out", { signal: "audio", restV: 0, activeV: 3, sourceOhm: 1e3 }, "through") : j)) })), patch: p, ids: ["v1.out"], kept: ["l1", "l2", "l4", "l5"] })],
    ["the pad's figures", (r, p) => ({ rig: edit(r, "p1", (g) => ({ ...g, pad: { ...g.pad!, hitOhm: 40e3 } })), patch: p, ids: ["p1"], kept: ["l3", "l4", "l5"] })],
    ["a knob", (r, p) => ({ rig: r, patch: { ...p, knobs: [{ gearId: "c1", knobId: "sens", position: 1 }] }, ids: ["c1"], kept: ["l3", "l4", "l5"] })],
    ["a lead pulled upstream, not named", (r, p) => ({ rig: r, patch: plug(p.leads.slice(1)), ids: [], kept: ["l3", "l4", "l5"] })],
    ["a lead plugged into the mult, not named", (r, p) => ({ rig: r, patch: plug([...p.leads, lead(6, "c1.trig", "v2.in")]), ids: [], kept: ["l3", "l4", "l5"] })],
    ["nothing", (r, p) => ({ rig: r, patch: p, ids: [], kept: ["l1", "l2", "l3", "l4", "l5"] })],
  ];
  it.each(changes)("%s: the same answer as a whole check, and nothing out of reach touched", (_name, change) => {
    const before = checkPatch(rig, patch, standIn());
    const after = change(rig, patch);
    const again = recheckPatch(before, after.rig, after.patch, after.ids, standIn());
    expect(again).toEqual(checkPatch(after.rig, after.patch, standIn()));
    const same = Object.keys(again.leads).filter((id) => again.leads[id] === before.leads[id]);
    expect(same).toEqual(after.kept);
  });
  it("asks a conditioner only where the change reaches it", () => {
    const before = checkPatch(rig, patch, standIn());
    const { simulate, asked } = standIn();
    recheckPatch(before, rig, patch, ["p2"], { simulate });
    expect(asked).toHaveLength(1);
    expect(asked[0]!.pad.hitOhm).toBe(30e3);
  });
});

function edit(from: RigModel, id: string, change: (gear: GearModel) => GearModel): RigModel {
  return { gear: from.gear.map((gear) => (gear.id === id ? change(gear) : gear)) };
}
