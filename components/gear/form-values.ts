import type { Spread } from "@/lib/core/units";
import type { Polarity, Signal } from "@/lib/core/electrics/jacks";
import type { GearInput, GearKind } from "@/lib/schemas/gear";
import type { JackRole } from "@/lib/schemas/jack";
import { figureInfo } from "./figure-catalogue";
import { figureText } from "./figure-text";

/** Figures are the text people wrote; an empty text means not known. */
type Text = string;

export interface CircuitValues {
  padLeg: "upper" | "lower";
  divider: { ohm: Text };
  coupling: { farad: Text; ohm: Text };
  threshold: { topOhm: Text; potOhm: Text; bottomOhm: Text };
  comparator: { highDropV: Text; lowDropV: Text; limitA: Text };
  output: { seriesOhm: Text; shuntOhm: Text };
  envelope: null | { seriesOhm: Text; farad: Text; ohm: Text; emitterOhm: Text };
}

export type DetailsValues =
  | { kind: "pad"; sensor: "resistive" | "piezo" | "switch"; restOhm: Text; hitOhm: Text; riseS: Text; holdS: Text; fallS: Text; farad: Text; peakV: Text }
  | { kind: "conditioner"; build: "circuit" | "black-box"; circuit: CircuitValues | null }
  | { kind: "shaper" }
  | { kind: "voice" }
  | { kind: "desk-channel"; channel: Text }
  | { kind: "supply"; source: "battery" | "mains-adapter"; highV: Text; lowV: Text; ratingA: Text };

export interface OutputValues {
  signal: Signal;
  polarity: Polarity;
  restV: Text;
  activeV: Text;
  sourceOhm: Text;
  pulseS: Text;
  decayS: Text;
  limitA: Text;
  or: boolean;
}

export interface ClampValues {
  lowV: Text;
  highV: Text;
  seriesOhm: Text;
  maxA: Text;
}

export interface InputValues {
  accepts: Signal[];
  polarity: Polarity;
  onV: Text;
  offV: Text;
  safeLowV: Text;
  safeHighV: Text;
  loadOhm: Text;
  biasV: Text;
  pulseMinS: Text;
  pulseMaxS: Text;
  decayMinS: Text;
  clamp: ClampValues | null;
  maxDbu: Text;
  phantom: boolean;
}

interface JackShared {
  id: string;
  name: string;
  connector: string;
  role: JackRole;
}
export type JackValues = (JackShared & { direction: "output"; output: OutputValues }) | (JackShared & { direction: "input"; input: InputValues });

export interface KnobValues {
  id: string;
  name: string;
  turns: "threshold" | "nothing";
}

/** What the form holds; `gearInputSchema` reads the same shape on both sides of the wire. */
export interface GearFormValues {
  name: string;
  notes: string;
  supplyId: string;
  details: DetailsValues;
  jacks: JackValues[];
  knobs: KnobValues[];
  assumed: string[];
}

/** Gear as stored, or as it starts, into what the form holds. */
export function toFormValues(gear: GearInput): GearFormValues {
  const { name, notes, supplyId, details, jacks, knobs, assumed } = gear;
  const texts = writeTexts({ details, jacks }, "") as Pick<GearFormValues, "details" | "jacks">;
  if (texts.details.kind === "desk-channel") texts.details.channel = String(texts.details.channel);
  return { name, notes, supplyId: supplyId ?? "", ...texts, knobs: knobs.map((knob) => ({ ...knob })), assumed: [...assumed] };
}

function writeTexts(node: unknown, path: string): unknown {
  const info = figureInfo(path);
  if (info) return figureText(node as Spread | null, info.unit);
  if (Array.isArray(node)) return node.map((child: unknown, index) => writeTexts(child, `${path}.${index}`));
  if (typeof node !== "object" || node === null) return node;
  return Object.fromEntries(Object.entries(node).map(([key, child]) => [key, writeTexts(child, path === "" ? key : `${path}.${key}`)]));
}

export const emptyOutput = (signal: Signal): OutputValues => ({
  signal, polarity: "rising", restV: "", activeV: "", sourceOhm: "", pulseS: "", decayS: "", limitA: "", or: false,
});

export const emptyInput = (accepts: Signal[]): InputValues => ({
  accepts, polarity: "rising", onV: "", offV: "", safeLowV: "", safeHighV: "", loadOhm: "", biasV: "",
  pulseMinS: "", pulseMaxS: "", decayMinS: "", clamp: null, maxDbu: "", phantom: false,
});

export const emptyClamp = (): ClampValues => ({ lowV: "", highV: "", seriesOhm: "", maxA: "" });

/** A jack to add, of the sort this kind of gear most often has. */
export function newJack(kind: GearKind, direction: "input" | "output", id: string): JackValues {
  const shared: JackShared = { id, name: "", connector: "6.35 mm TS", role: "plain" };
  if (direction === "output") {
    const signal: Signal = kind === "pad" ? "sensor" : kind === "voice" ? "audio" : kind === "shaper" ? "envelope" : "trigger";
    return { ...shared, direction, output: emptyOutput(signal) };
  }
  const accepts: Signal[] = kind === "desk-channel" ? ["audio"] : kind === "conditioner" ? ["sensor"] : ["trigger", "gate"];
  return { ...shared, role: kind === "conditioner" ? "pad-in" : "plain", direction, input: emptyInput(accepts) };
}
