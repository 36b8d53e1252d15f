import type { Pulse } from "./conditioner-types";

/** The envelope capacitor at the solver's own steps, for drawing. */
export interface EnvelopeNodes {
  timeS: number[];
  capacitorV: number[];
  outV: number[];
  emitterV: number[];
}

export interface OutputSignal {
  /** Of the trigger output, V. */
  restV: number;
  /** With the comparator held high until everything has settled. */
  settledV: number;
  highestV: number;
  pulses: Pulse[];
  envelope: null | { restV: number; peakV: number; fullV: number; decayS: number };
  nodes: EnvelopeNodes | null;
}
