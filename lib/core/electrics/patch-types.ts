import type { Range, Spread } from "@/lib/core/units/spread";
import type { Fix } from "./connection-types";
import type { Input, Output, Reason, Verdict } from "./jacks";

export type GearModelKind = "pad" | "conditioner" | "shaper" | "voice" | "desk-channel" | "supply";

/** What a jack is on its box. `through`: the sound a voice makes. */
export type JackRole = "plain" | "pad-in" | "trigger-out" | "envelope-out" | "through";

/** One jack of a rig. An input without figures is known only by its name. */
export interface JackModel {
  id: string;
  name: string;
  direction: "input" | "output";
  role: JackRole;
  output?: Partial<Output>;
  input?: Omit<Input, "id">;
  /** Input limits that follow the box's supply: the supply's lowest plus `aboveV`, and −`belowV`. Taken beside `safeV`, whichever is nearer. */
  followsSupply?: { aboveV: number; belowV: number };
}

/** A pad as a contact: what its resistance does when it is struck. */
export interface PadModel {
  sensor: "resistive" | "piezo" | "switch" | "unknown";
  restOhm?: Spread;
  hitOhm?: Spread;
  riseS?: number;
  holdS?: number;
  fallS?: number;
  /** Piezo discs: capacitance and open-circuit peak. */
  farad?: Spread;
  peakV?: Spread;
}

/** A conditioner's parts; names and meaning as in the conditioner's own calculator. */
export interface ConditionerCircuit {
  supply: { highV: Spread; lowV: Spread };
  padLeg: "upper" | "lower";
  divider: { ohm: Spread };
  coupling: { farad: Spread; ohm: Spread };
  threshold: { topOhm: Spread; potOhm: Spread; bottomOhm: Spread };
  comparator: { highDropV: Spread; lowDropV: Spread; limitA: Spread };
  output: { seriesOhm: Spread; shuntOhm: Spread | null };
  envelope: null | { seriesOhm: Spread; farad: Spread; ohm: Spread; emitterOhm: Spread };
}

export interface GearModel {
  id: string;
  kind: GearModelKind;
  name: string;
  jacks: JackModel[];
  pad?: PadModel;
  circuit?: ConditionerCircuit;
  /** What the box runs from, where known; for a split supply the upper rail. */
  supplyV?: Spread;
  /** Knobs the check follows. */
  knobs?: { id: string; turns: "threshold" | "nothing" }[];
  /** Figures nobody has measured: `pad.restOhm`, `jacks.<jackId>.safeV`, `circuit.threshold`. */
  assumed: string[];
}

export interface RigModel {
  gear: GearModel[];
}

/** Parts soldered into one lead, at its input end; how a fix becomes part of the patch. `tol` is the resistors' tolerance. */
export type InlineParts =
  | { kind: "divider" | "diode-divider"; seriesOhm: number; shuntOhm: number; tol: number }
  | { kind: "series-resistor"; seriesOhm: number; tol: number }
  | { kind: "series-diode"; pullDownOhm: number | null };

export interface PatchModel {
  leads: { id: string; number: number; outputId: string; inputId: string; inline?: InlineParts }[];
  /** `position` 0…1. */
  knobs: { gearId: string; knobId: string; position: number }[];
}

/** What a conditioner is asked: its parts, the pad on it, and what hangs on its outputs. */
export interface ConditionerQuestion {
  circuit: ConditionerCircuit;
  pad: PadModel;
  /** Wiper of the threshold pot, 0 = at the bottom resistor … 1. */
  turn: number;
  /** What the trigger output drives, all loads in parallel; null: open. */
  loadOhm: Spread | null;
}

/** What a conditioner does with that pad, over every spread it was given. */
export interface ConditionerOutcome {
  /** `dead`: no hit of this pad can fire it. `weak`: some allowed hit may not. `stuck`: it fires or stays high without a hit. */
  verdict: Extract<Verdict, "good" | "tight" | "weak" | "dead" | "stuck" | "unproven">;
  reasons: Reason[];
  /** Open-circuit figures of the trigger output. Blank where it cannot be known. */
  trigger: Partial<Output>;
  /** The same for the envelope output, where the circuit has one. */
  envelope?: Partial<Output>;
}

/** Solves a conditioner. Given to `checkPatch`, so that the patch's check knows no circuit. Must be pure. */
export type ConditionerSimulator = (question: ConditionerQuestion) => ConditionerOutcome;

/** One figure to measure, and how many leads it would settle. */
export interface Measurement {
  gearId: string;
  /** The figure's path on that gear: `pad.restOhm`, `jacks.<jackId>.safeV`. */
  figure: string;
  text: string;
  leadIds: string[];
}

export interface LeadCheck {
  leadId: string;
  verdict: Verdict;
  highV: Range | null;
  lowV: Range | null;
  currentA: Range | null;
  clampA?: number;
  pulseS?: Range;
  reasons: Reason[];
  fixes: Fix[];
  fixNote?: string;
  /** Said beside the verdict, and no part of it. */
  cautions: Caution[];
  /** Assumed figures this verdict leans on, as `<gearId>:<path>`. */
  assumed: string[];
  /** Every lead this verdict depends on, itself included, sorted: those of its node, and those that feed the boxes driving it. */
  relatedLeadIds: string[];
  nextMeasurement?: Measurement;
}

/** `unpowered`: what flows into the rail of a box that is switched off. */
export interface Caution {
  kind: "unpowered";
  text: string;
  measured: number;
  unit: "A";
}

/** The chain from one pad (or the first output) to what is heard. */
export interface Run {
  /** Jack, lead, jack, lead, jack … in order, by id. */
  steps: { kind: "jack" | "lead"; id: string }[];
  leadIds: string[];
  /** Gear passed through, first to last. */
  gearIds: string[];
  verdict: Verdict;
  /** True where it begins at a pad and ends at a desk channel. */
  complete: boolean;
}

export interface PatchCheck {
  leads: Record<string, LeadCheck>;
  runs: Run[];
  /** Worst verdict of all leads; `good` where there are none. */
  worst: Verdict;
  counts: Record<Verdict, number>;
  /** Boxes that fixes could lead through when this was checked. */
  freeGearIds: string[];
  /** The one figure that would settle most leads. */
  nextMeasurement?: Measurement;
}
