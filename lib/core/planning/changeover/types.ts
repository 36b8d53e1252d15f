/** A lead's number or name; text and numbers are compared as text. */
export type LeadId = string | number;
/** A knob's or switch's position: text ("9 o'clock", "on"), a number, or on/off. */
export type KnobPosition = string | number | boolean;

export interface Connection {
  output: string;
  input: string;
}

/** A connection with the physical lead that makes it, where known. */
export interface PluggedLead extends Connection {
  lead?: LeadId | undefined;
}

export interface Pace {
  /** Seconds to pull or plug one end. */
  endS: number;
  /** Seconds to set one knob or switch. */
  knobS: number;
  /** Seconds to find and bring one lead that is not on the rig. */
  fetchS: number;
}

/** Typical pace, common practice with no source: a rig's own timing replaces it. */
export const TYPICAL_PACE: Pace = { endS: 4, knobS: 2, fetchS: 3 };

/** One lead the rig owns; absent facts are unknown and never rule it out. */
export interface StockLead {
  lead: LeadId;
  colour?: string | undefined;
  lengthM?: number | undefined;
  /** Connector at the output end and at the input end. */
  connectors?: Connection | undefined;
}

export interface JackFacts {
  name?: string | undefined;
  connector?: string | undefined;
  /** Where the jack is, in metres from any common corner; counted only where both are given. */
  xM?: number | undefined;
  yM?: number | undefined;
}

export interface OutputFacts extends JackFacts {
  sourceOhm?: number | undefined;
  /** The most current it can be asked for; present: it limits itself and stands a short. */
  limitA?: number | undefined;
}

/** Lets a `plug` connector go into a `jack` connector. */
export interface Adapter {
  plug: string;
  jack: string;
}

/** A desk channel and every input whose lead is heard on it. */
export interface DeskChannel {
  channel: string;
  inputs: string[];
}

export interface ChangeoverRequest {
  from: PluggedLead[];
  /** Leads named here are ignored: which lead serves what is the answer. */
  to: PluggedLead[];
  knobsFrom?: Record<string, KnobPosition> | undefined;
  knobsTo?: Record<string, KnobPosition> | undefined;
  pace?: Partial<Pace> | undefined;
  /** All leads the rig owns, those on the rig included. Absent: as many as needed, each fitting everywhere. */
  leads?: StockLead[] | undefined;
  outputs?: Record<string, OutputFacts> | undefined;
  inputs?: Record<string, JackFacts> | undefined;
  adapters?: Adapter[] | undefined;
  desk?: DeskChannel[] | undefined;
}

/** An end to pull and let hang before the step itself, to free a jack in a ring of swaps. Its plugging is counted in its own lead's step. */
export interface PullFirst {
  fromRow: number;
  lead: LeadId | null;
  end: "output" | "input";
  jack: string;
}

interface LeadStep {
  lead: LeadId | null;
  /** Ends touched: what this step adds to `endMoves`. */
  ends: number;
  text: string;
  pullFirst?: PullFirst[];
  /** Adapters the lead needs in its new place. */
  adapters?: Adapter[];
  cautions?: string[];
}

export interface MoveStep extends LeadStep {
  kind: "move-input" | "move-output" | "move-both";
  /** Row of `from` whose lead this is, and row of `to` it serves. */
  fromRow: number;
  toRow: number;
  from: Connection;
  to: Connection;
}

export interface PutAwayStep extends LeadStep {
  kind: "put-away";
  fromRow: number;
  from: Connection;
}

export interface FetchStep extends LeadStep {
  kind: "fetch";
  toRow: number;
  to: Connection;
}

export interface TurnStep {
  kind: "turn";
  knob: string;
  /** Null: its position before is not known. */
  from: KnobPosition | null;
  to: KnobPosition;
  text: string;
}

export type Step = MoveStep | PutAwayStep | FetchStep | TurnStep;

export interface Changeover {
  endMoves: number;
  knobTurns: number;
  seconds: number;
  steps: Step[];
  /** Rows of `to` for which the stock holds no lead that fits (only where `leads` was given and something is missing). */
  shortages?: { toRow: number; text: string }[];
  /** What to do at the desk before the first step and after the last (only where `desk` was given and a channel is concerned). */
  before?: string[];
  after?: string[];
}
