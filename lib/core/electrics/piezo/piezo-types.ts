import type { Pulse } from "../conditioner/conditioner-types";

/** A piezo disc on a comparator. SI, exact figures. */
export interface PiezoSpec {
  /** The disc's capacitance, and what it gives open: peakV·exp(−t/decayS)·sin(2π·ringHz·t). */
  disc: { farad: number; peakV: number; ringHz: number; decayS: number };
  /** Across the disc. */
  bleedOhm: number;
  /** A resistor, then a 1N4148 to 0 V and one to `highV`; null: none. */
  clamp: null | { seriesOhm: number; highV: number };
  comparator: { thresholdV: number; hysteresisV: number };
  /** A pulse of its own, R·C·ln 3 long, for each rise that meets it at rest; null: none. */
  oneShot: null | { ohm: number; farad: number };
}

export interface PiezoResult {
  fires: boolean;
  /** Extremes at the comparator's input, V. */
  inputPeakV: number;
  inputLeastV: number;
  /** Most through either clamp, A. */
  clampA: number;
  /** Of the comparator. */
  pulses: Pulse[];
  /** Behind the one-shot, where there is one. */
  oneShotPulses: Pulse[] | null;
  /** Below this bleed and disc pass little, Hz: 1/(2π·R·C). */
  cornerHz: number;
  trace: { timeS: number[]; inputV: number[] };
}
