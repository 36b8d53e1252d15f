import type { Limits, Range, Spread } from "@/lib/core/units/spread";

/** What travels on a jack. `sensor` is a pad's bare contact: it drives nothing. */
export type Signal = "sensor" | "trigger" | "gate" | "envelope" | "control" | "audio";

export const SIGNALS: readonly Signal[] = ["sensor", "trigger", "gate", "envelope", "control", "audio"];

/** Which way the active edge goes. */
export type Polarity = "rising" | "falling";

/**
 * What an output jack puts out. Volts are open-circuit (before `sourceOhm`);
 * for `audio`, `activeV` is the peak of the loudest sine and `restV` its DC offset.
 */
export interface Output {
  signal: Signal;
  /** Absent: rising. */
  polarity?: Polarity;
  restV: Spread;
  activeV: Spread;
  /** 0 = ideal. */
  sourceOhm: Spread;
  pulseS?: Spread;
  /** Fall of an envelope from peak to peak/e. */
  decayS?: Spread;
  /** Most current the output gives, as a magnitude. */
  limitA?: Spread;
  /** True: leaves through a diode, so that several may share an input. */
  or?: boolean;
}

/** Protection diodes behind a series resistor. */
export interface Clamp {
  lowV: Spread;
  highV: Spread;
  seriesOhm: Spread;
  /** Current the diodes stand. */
  maxA: number;
}

/** What an input jack takes in. Absent figures are unknown, and a verdict that needs one says so. */
export interface Input {
  id: string;
  accepts: Signal[];
  polarity?: Polarity;
  /** Below min it surely has not fired, at or above max it surely has. */
  onV?: Spread;
  /** Likewise for letting go; absent: equals `onV`. */
  offV?: Spread;
  /** Absolute limits of the jack. */
  safeV?: Range;
  /** Null: open. */
  loadOhm: Spread | null;
  /** Where the load returns to; absent: 0 V. */
  biasV?: Spread;
  pulseS?: Limits;
  decayS?: { min?: number };
  clamp?: Clamp;
  /** Desk inputs: strongest level taken, dBu (0 dBu = √0.6 V rms). */
  maxDbu?: number;
  /** Desk inputs: phantom power is switched on for this channel. */
  phantom?: boolean;
}

/** From fine to worst. */
export const VERDICTS = [
  "good", "tight", "unproven", "brief", "long", "weak", "dead", "stuck",
  "wrong-kind", "reversed", "overload", "clash", "hot",
] as const;

/** What the server says of a lead. */
export type Verdict = (typeof VERDICTS)[number];

/** One reason behind a verdict, in one plain sentence, with its numbers where it has them. */
export interface Reason {
  verdict: Verdict;
  text: string;
  measured?: number;
  limit?: number;
  unit?: "V" | "A" | "s" | "Ohm" | "dBu" | "ratio";
  /** `unproven`: the missing figure as a path, `input.safeV` or `outputs.0.pulseS`. */
  figure?: string;
}
