import type { GearDraft } from "@/lib/schemas/gear";

/** Short ways to write the demo rig's gear down. Figures are invented, written as a builder would. */

type JackDraft = GearDraft["jacks"][number];
type OutputFigures = Extract<JackDraft, { direction: "output" }>["output"];
type InputFigures = Extract<JackDraft, { direction: "input" }>["input"];

export interface SeedGear {
  id: string;
  gear: GearDraft;
}

const unknownOutput = { polarity: "rising", restV: null, activeV: null, sourceOhm: null, pulseS: null, decayS: null, limitA: null, or: false } as const;
const unknownInput = {
  polarity: "rising", onV: null, offV: null, safeLowV: null, safeHighV: null, loadOhm: null, biasV: null,
  pulseMinS: null, pulseMaxS: null, decayMinS: null, clamp: null, maxDbu: null, phantom: false,
} as const;

export function output(id: string, name: string, figures: Partial<OutputFigures> & Pick<OutputFigures, "signal">, role: JackDraft["role"] = "plain"): JackDraft {
  return { id, direction: "output", name, connector: "6.35 mm TS", role, output: { ...unknownOutput, ...figures } };
}

export function input(id: string, name: string, figures: Partial<InputFigures> & Pick<InputFigures, "accepts">, role: JackDraft["role"] = "plain"): JackDraft {
  return { id, direction: "input", name, connector: "6.35 mm TS", role, input: { ...unknownInput, ...figures } };
}

/** A pad with one sensor jack. */
export function pad(id: string, name: string, notes: string, figures: Partial<Extract<GearDraft["details"], { kind: "pad" }>>, assumed: string[] = []): SeedGear {
  return {
    id,
    gear: {
      name,
      notes,
      supplyId: null,
      details: { kind: "pad", sensor: "resistive", restOhm: null, hitOhm: null, riseS: "1 ms", holdS: "5 ms", fallS: "30 ms", farad: null, peakV: null, ...figures },
      jacks: [output(`${id}-out`, "Pad", { signal: "sensor" })],
      knobs: [],
      assumed,
    },
  };
}

type Circuit = NonNullable<Extract<GearDraft["details"], { kind: "conditioner" }>["circuit"]>;

const plainCircuit: Circuit = {
  padLeg: "upper",
  divider: { ohm: "10k" },
  coupling: { farad: "100n", ohm: "22k" },
  threshold: { topOhm: "100k", potOhm: "10k", bottomOhm: "1k" },
  comparator: { highDropV: "1.5", lowDropV: "20m", limitA: "20m" },
  output: { seriesOhm: "2k2", shuntOhm: "4k7" },
  envelope: null,
};

/** A conditioner known by its parts. */
export function conditioner(id: string, name: string, notes: string, supplyId: string, parts: Partial<Circuit>): SeedGear {
  const circuit = { ...plainCircuit, ...parts };
  const outputs = [output(`${id}-trig`, "Trig out", { signal: "trigger" }, "trigger-out")];
  if (circuit.envelope) outputs.push(output(`${id}-env`, "Env out", { signal: "envelope" }, "envelope-out"));
  return {
    id,
    gear: {
      name,
      notes,
      supplyId,
      details: { kind: "conditioner", build: "circuit", circuit },
      jacks: [input(`${id}-pad`, "Pad in", { accepts: ["sensor"] }, "pad-in"), ...outputs],
      knobs: [{ id: "threshold", name: "Threshold", turns: "threshold" }],
      assumed: [],
    },
  };
}

/** Anything that is known by the figures of its jacks. */
export function box(id: string, kind: "shaper" | "voice", name: string, notes: string, supplyId: string | null, jacks: JackDraft[], knobs: string[] = [], assumed: string[] = []): SeedGear {
  return {
    id,
    gear: { name, notes, supplyId, details: { kind }, jacks, knobs: knobs.map((knob) => ({ id: knob.toLowerCase().replaceAll(" ", "-"), name: knob, turns: "nothing" })), assumed },
  };
}

export function deskChannel(channel: number, name: string, figures: Partial<InputFigures> = {}): SeedGear {
  const id = `desk-${channel}`;
  return {
    id,
    gear: {
      name,
      notes: "",
      supplyId: null,
      details: { kind: "desk-channel", channel },
      jacks: [input(`${id}-in`, "Line in", { accepts: ["audio"], loadOhm: "10k", safeLowV: "-15", safeHighV: "15", maxDbu: 22, ...figures })],
      knobs: [],
      assumed: [],
    },
  };
}

export function supply(id: string, name: string, details: Omit<Extract<GearDraft["details"], { kind: "supply" }>, "kind">): SeedGear {
  return { id, gear: { name, notes: "", supplyId: null, details: { kind: "supply", ...details }, jacks: [], knobs: [], assumed: [] } };
}
