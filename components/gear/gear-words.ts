import type { GearKind } from "@/lib/schemas/gear";
import type { JackRole } from "@/lib/schemas/jack";
import type { Polarity, Signal } from "@/lib/core/electrics/jacks";

export const KIND_WORD: Record<GearKind, string> = {
  pad: "Pad",
  conditioner: "Conditioner",
  shaper: "Shaper",
  voice: "Voice",
  "desk-channel": "Desk channel",
  supply: "Supply",
};

export const KIND_HINT: Record<GearKind, string> = {
  pad: "What you hit.",
  conditioner: "What turns a hit into a pulse.",
  shaper: "What turns a pulse into an envelope or a gate.",
  voice: "What sounds.",
  "desk-channel": "Where a voice arrives at the desk.",
  supply: "What the boxes run on.",
};

export const SENSOR_WORD = { resistive: "Resistive (foam, film)", piezo: "Piezo disc", switch: "Switch contact" } as const;
export const BUILD_WORD = { circuit: "Known by its parts", "black-box": "Black box, known by readings" } as const;
export const SOURCE_WORD = { battery: "Battery", "mains-adapter": "Mains adapter" } as const;
export const LEG_WORD = { upper: "Pad to the supply, resistor to 0 V", lower: "Pad to 0 V, resistor to the supply" } as const;
export const TURNS_WORD = { threshold: "The threshold", nothing: "Nothing the check follows" } as const;

export const SIGNAL_WORD: Record<Signal, string> = {
  sensor: "Sensor (bare contact)",
  trigger: "Trigger (short pulse)",
  gate: "Gate (held level)",
  envelope: "Envelope",
  control: "Control voltage",
  audio: "Audio",
};
export const SIGNAL_SHORT: Record<Signal, string> = { sensor: "sensor", trigger: "trigger", gate: "gate", envelope: "envelope", control: "control", audio: "audio" };

export const POLARITY_WORD: Record<Polarity, string> = { rising: "Rising (0 V up)", falling: "Falling (down to 0 V)" };

export const ROLE_WORD: Record<JackRole, string> = {
  plain: "Plain jack",
  "pad-in": "Takes the pad",
  "trigger-out": "The circuit's trigger",
  "envelope-out": "The circuit's envelope",
  through: "Passed through",
};

export const COLUMN_WORD = { name: "Name", kind: "Kind", figures: "Figures", assumed: "Assumed", supply: "Runs on", state: "State" } as const;

/** Pads are bare contacts and desk channels have the desk's own power: only these run on a supply of the rig. */
export const isPowered = (kind: GearKind): boolean => kind === "conditioner" || kind === "shaper" || kind === "voice";
