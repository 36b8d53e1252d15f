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
    limitA: Spread;
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
  /** V/s; Infinity: ideal. */
  slewVperS: number;
  seriesOhm: number;
  /** Shunt and load together; Infinity: open. */
  loadOhm: number;
  /** What the trigger branch draws for each volt of the comparator's output, S. */
  triggerS: number;
  /** Share of the comparator's output that reaches the trigger output. */
  triggerShare: number;
  shuntOhm: number;
  envelope: null | { seriesOhm: number; farad: number; ohm: number; emitterOhm: number };
}

export interface Pulse {
  startS: number;
  widthS: number;
}

export type FindingCode =
  | "rests-high" | "threshold-out-of-reach" | "envelope-underfilled" | "double-trigger" | "decade-slip" | "slow-hit" | "divider-off"
  | "noise-near-threshold" | "rests-negative" | "input-out-of-range" | "input-below-rail" | "battery" | "re-strike";

/** Something a builder should know of this circuit, with its numbers; a fix has been solved before it is told. */
export interface Finding {
  code: FindingCode;
  text: string;
  fix?: { text: string; [figure: string]: unknown };
}

/** The signals over time, all at the same moments; straight lines between them draw it. */
export interface Trace {
  timeS: number[];
  padV: number[];
  shapedV: number[];
  thresholdV: number[];
  /** Of the trigger output. */
  outV: number[];
  /** At the follower's emitter. */
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
  /** True where the comparator is still high when everything has settled again: its hysteresis holds it. */
  latches: boolean;
  pulses: Pulse[];
  restV: number;
  activeV: number;
  sourceOhm: number;
  /** At the emitter; `fullV`, known of a whole solution, is where a pulse without end would take it. */
  envelope: null | { restV: number; peakV: number; fullV: number; decayS: number };
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
  /** Ranges over the parts' tolerances and the given spreads; null where no corner has a pulse, or there is no envelope. */
  spread: {
    padHitV: Range;
    shapedPeakV: Range;
    thresholdV: Range;
    restV: Range;
    activeV: Range;
    /** From 0 where some corner does not fire. */
    pulseS: Range | null;
    envelope: null | { peakV: Range; decayS: Range };
  };
  /** Parts by how far each alone moves the pulse's length through its range, most first. */
  sensitivity: { path: string; name: string; swingS: number }[];
  /** Share of a seeded sample of part values that gives one pulse. */
  yield: number;
  /** What was taken as ideal. */
  assumptions: string[];
}
