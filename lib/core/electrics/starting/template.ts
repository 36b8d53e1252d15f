import type { Polarity, Signal } from "@/lib/core/electrics/jacks";
import type { Spread } from "@/lib/core/units/spread";

/** A figure nobody has measured yet, and where it was taken from. */
export interface Assumed<T> {
  value: T;
  source: string;
}

export const PRACTICE = "common practice, no source";
export const OWN_CHOICE = "our own starting part, in the preferred series; read yours off the board";

export const assume = <T>(value: T, source: string): Assumed<T> => ({ value, source });

type Known<T> = Assumed<T> | null;

export interface PadTemplate {
  kind: "pad";
  sensor: "resistive" | "piezo" | "switch";
  restOhm: Known<Spread>;
  hitOhm: Known<Spread>;
  riseS: Known<number>;
  holdS: Known<number>;
  fallS: Known<number>;
  farad: Known<Spread>;
  peakV: Known<Spread>;
}

export interface CircuitTemplate {
  padLeg: "upper" | "lower";
  divider: { ohm: Assumed<number> };
  coupling: { farad: Assumed<number>; ohm: Assumed<number> };
  threshold: { topOhm: Assumed<number>; potOhm: Assumed<number>; bottomOhm: Assumed<number> };
  comparator: { highDropV: Assumed<number>; lowDropV: Assumed<number>; limitA: Assumed<number> };
  output: { seriesOhm: Assumed<number>; shuntOhm: Known<number> };
  envelope: null | { seriesOhm: Assumed<number>; farad: Assumed<number>; ohm: Assumed<number>; emitterOhm: Assumed<number> };
}

export interface ConditionerTemplate {
  kind: "conditioner";
  build: "circuit" | "black-box";
  circuit: CircuitTemplate | null;
}

export interface SupplyTemplate {
  kind: "supply";
  source: "battery" | "mains-adapter";
  highV: Assumed<Spread>;
  lowV: Assumed<number>;
  ratingA: Known<number>;
}

export type DetailsTemplate =
  | PadTemplate
  | ConditionerTemplate
  | { kind: "shaper" }
  | { kind: "voice" }
  | { kind: "desk-channel"; channel: number }
  | SupplyTemplate;

export type Connector = "6.35 mm TS" | "6.35 mm TRS" | "3.5 mm TS" | "3.5 mm TRS" | "XLR" | "RCA" | "4 mm" | "wire";
type Role = "plain" | "pad-in" | "trigger-out" | "envelope-out" | "through";

export interface OutputFigures {
  signal: Signal;
  polarity: Polarity;
  restV: Known<Spread>;
  activeV: Known<Spread>;
  sourceOhm: Known<Spread>;
  pulseS: Known<Spread>;
  decayS: Known<Spread>;
  limitA: Known<Spread>;
  or: boolean;
}

export interface InputFigures {
  accepts: Signal[];
  polarity: Polarity;
  onV: Known<Spread>;
  offV: Known<Spread>;
  safeLowV: Known<number>;
  safeHighV: Known<number>;
  loadOhm: Known<Spread>;
  biasV: Known<Spread>;
  pulseMinS: Known<number>;
  pulseMaxS: Known<number>;
  decayMinS: Known<number>;
  clamp: null | { lowV: Assumed<Spread>; highV: Assumed<Spread>; seriesOhm: Assumed<Spread>; maxA: Assumed<number> };
  maxDbu: Known<number>;
  phantom: boolean;
}

interface JackBase {
  /** Names the jack inside its template; the built jack gets an id of its own. */
  key: string;
  name: string;
  connector: Connector;
  role: Role;
}
export interface OutputTemplate extends JackBase {
  direction: "output";
  output: OutputFigures;
}
export interface InputTemplate extends JackBase {
  direction: "input";
  input: InputFigures;
}
export type JackTemplate = OutputTemplate | InputTemplate;

export interface GearTemplate {
  kind: DetailsTemplate["kind"];
  /** Short name of the variant in addresses, such as `foam`. */
  variant: string;
  /** What a person picks it by. */
  label: string;
  hint: string;
  name: string;
  /** Volts of the supply it wants, to pick one the rig has. */
  wants: { highV: number; lowV: number } | null;
  details: DetailsTemplate;
  jacks: JackTemplate[];
  knobs: { name: string; turns: "threshold" | "nothing" }[];
}

type JackIntro = Pick<JackBase, "key" | "name"> & Partial<Pick<JackBase, "connector" | "role">>;

/** An output jack on which nothing is known but what is stated. */
export function outputJack(intro: JackIntro, figures: Partial<OutputFigures> & Pick<OutputFigures, "signal">): OutputTemplate {
  return {
    connector: "6.35 mm TS",
    role: "plain",
    ...intro,
    direction: "output",
    output: { polarity: "rising", restV: null, activeV: null, sourceOhm: null, pulseS: null, decayS: null, limitA: null, or: false, ...figures },
  };
}

/** An input jack on which nothing is known but what is stated. */
export function inputJack(intro: JackIntro, figures: Partial<InputFigures> & Pick<InputFigures, "accepts">): InputTemplate {
  return {
    connector: "6.35 mm TS",
    role: "plain",
    ...intro,
    direction: "input",
    input: {
      polarity: "rising", onV: null, offV: null, safeLowV: null, safeHighV: null, loadOhm: null, biasV: null,
      pulseMinS: null, pulseMaxS: null, decayMinS: null, clamp: null, maxDbu: null, phantom: false, ...figures,
    },
  };
}
