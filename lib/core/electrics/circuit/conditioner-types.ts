import type { Range, Spread } from "@/lib/core/units/spread";

/** A pad, its trigger conditioner and what hangs on it. SI; every exact figure may be a spread. */
export interface ConditionerSpec {
  supply: { highV: Spread; lowV: Spread };
  pad: { kind: "resistive"; restOhm: Spread; hitOhm: Spread; leg: "upper" | "lower" };
  strike: { riseS: number; holdS: number; fallS: number } | { samples: readonly (readonly [s: number, ohm: number])[] };
  divider: { ohm: Spread };
  coupling: { farad: Spread; ohm: Spread };
  threshold: { topOhm: Spread; potOhm: Spread; bottomOhm: Spread; turn: number };
  comparator: {
    highDropV: Spread;
    lowDropV: Spread;
    limitA: number;
    sinkA?: number;
    slewVperS?: number;
    offsetV?: number;
    hysteresisV?: number;
    noiseV?: number;
    commonMode?: { lowV: number; highV: number };
  };
  output: { seriesOhm: Spread; shuntOhm: Spread | null };
  envelope: null | { seriesOhm: Spread; farad: Spread; ohm: Spread; emitterOhm: Spread };
  load: { ohm: Spread | null };
}

/** The same with every spread settled to one value. */
export interface Circuit {
  highV: number;
  lowV: number;
  leg: "upper" | "lower";
  restOhm: number;
  hitOhm: number;
  strike: ConditionerSpec["strike"];
  dividerOhm: number;
  couplingF: number;
  couplingOhm: number;
  thresholdV: number;
  /** Comparator trips above / lets go below, V; equal without hysteresis. */
  tripV: number;
  releaseV: number;
  outHighV: number;
  outLowV: number;
  limitA: number;
  sinkA: number;
  seriesOhm: number;
  /** Shunt and load together; Infinity: open. */
  loadOhm: number;
  shuntOhm: number;
  envelope: null | { seriesOhm: number; farad: number; ohm: number; emitterOhm: number };
}

export interface Pulse {
  startS: number;
  widthS: number;
}

export interface Finding {
  code: string;
  text: string;
  fix?: { text: string; [figure: string]: unknown };
}

export interface Trace {
  timeS: number[];
  padV: number[];
  shapedV: number[];
  outputV: number[];
  envelopeV: number[] | null;
}

/** One circuit with exact figures, solved. */
export interface Solution {
  fires: boolean;
  restsHigh: boolean;
  padRestV: number;
  padHitV: number;
  shapedPeakV: number;
  shapedLeastV: number;
  thresholdV: number;
  pulses: Pulse[];
  restV: number;
  activeV: number;
  sourceOhm: number;
  envelope: null | { peakV: number; decayS: number };
  /** True where the comparator tripped, whatever its output then reached. */
  tripped: boolean;
  trace: Trace | null;
}

export interface ConditionerResult {
  fires: boolean;
  pad: { restV: number; hitV: number };
  shaped: { peakV: number };
  thresholdV: number;
  pulses: Pulse[];
  trigger: { restV: number; activeV: number; sourceOhm: number };
  envelope: null | { peakV: number; decayS: number };
  ruleOfThumbS: number;
  /** Greatest struck resistance that still fires; null where none does. */
  weakestHitOhm: number | null;
  findings: Finding[];
  trace: Trace;
  spread: { activeV: Range; restV: Range; shapedPeakV: Range; pulseS: Range | null; envelopePeakV: Range | null };
  /** Share of a seeded sample of part values that fires. */
  yield: number;
  /** What was taken as ideal. */
  assumptions: string[];
}
