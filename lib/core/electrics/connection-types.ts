import type { Range } from "@/lib/core/units/spread";
import type { Input, Output, Reason, Verdict } from "./jacks";

/** Outputs and inputs joined at one node. In a patch, an output's figures may still be blank. */
export interface Connection {
  outputs: readonly Partial<Output>[];
  inputs: readonly Input[];
}

/** What one input of a node gets, and what that means. */
export interface ListenerCheck {
  id: string;
  verdict: Verdict;
  /** Level while active; null where a figure it needs is missing. */
  highV: Range | null;
  /** Level at rest; null where a figure it needs is missing. */
  lowV: Range | null;
  /** Greatest current through its protection diodes, as a magnitude; 0: they stay off. */
  clampA?: number;
  /** Pulse width it sees, where the input cares and it is known and ends. */
  pulseS?: Range;
  /** Every reason that applies, worst first. A good lead has the one that says by how much. */
  reasons: Reason[];
  fixes: Fix[];
  /** Where the input is in danger and no fix exists: why. */
  fixNote?: string;
}

export interface ConnectionCheck {
  /** The worst of the listeners'. */
  verdict: Verdict;
  /** (V_s − V)/R_s of the output over both states; with several outputs, over each of them. */
  source: { currentA: Range | null };
  listeners: ListenerCheck[];
}

interface FixBase {
  text: string;
  /** What the same check says with the fix in place: good or tight. */
  verdict: Verdict;
  highV: Range;
  lowV: Range;
}

export interface DividerFix extends FixBase { kind: "divider"; seriesOhm: number; shuntOhm: number; tol: number }
export interface DiodeDividerFix extends FixBase { kind: "diode-divider"; dropV: Range; seriesOhm: number; shuntOhm: number; tol: number }
export interface SeriesResistorFix extends FixBase { kind: "series-resistor"; seriesOhm: number; tol: number; clampA: number }
export interface SeriesDiodeFix extends FixBase { kind: "series-diode"; dropV: Range; pullDownOhm: number | null }
export interface LighterLoadFix extends FixBase { kind: "lighter-load"; loadOhm: number | null; dropListeners: string[] }
export interface PulseWidthFix extends FixBase { kind: "pulse-width"; part: "ohm" | "farad"; value: number; tol: number; pulseS: Range }
export interface ThroughGearFix extends FixBase { kind: "buffer" | "shaper" | "conditioner"; gearId: string; name: string; feedVerdict: Verdict; through?: ThroughJacks }

/** A way out that has itself been through the check. Parts in SI. */
export type Fix = DividerFix | DiodeDividerFix | SeriesResistorFix | SeriesDiodeFix | LighterLoadFix | PulseWidthFix | ThroughGearFix;

/** The parts that set a pulse's width, which is proportional to ohm × farad. */
export interface PulseParts { ohm: number; farad: number }

/** The jacks of a box that a lead would go into and come out of, where the box stands in a rig. */
export interface ThroughJacks { inputId: string; outputId: string }

/** A free shaper, buffer or conditioner of the rig that a lead could go through. */
export interface FreeGear { gearId: string; name: string; input: Input; output: Output; through?: ThroughJacks }

/** What fixes may be made from. Absent lists: preferred numbers, E12 first, then E24. */
export interface FixOptions {
  /** False: do not look for fixes (the verdicts alone are wanted). */
  fixes?: boolean;
  /** Resistors in the parts drawer, ohm. */
  drawerOhm?: readonly number[];
  /** Capacitors in the parts drawer, farad. */
  drawerFarad?: readonly number[];
  /** Relative tolerance of resistors, default 0.05; of capacitors, default 0.1. */
  resistorTol?: number;
  capacitorTol?: number;
  /** R and C behind the (only) output's pulse, where known. */
  pulseParts?: PulseParts;
  freeGear?: readonly FreeGear[];
}
