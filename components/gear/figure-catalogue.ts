import type { FigureUnit } from "@/lib/schemas/figures";

/** What a person needs beside one figure. */
export interface FigureInfo {
  label: string;
  unit: FigureUnit | "dBu";
  /** May be a range or carry a tolerance. */
  spread: boolean;
  /** An empty box means “not known”; otherwise a value is needed. */
  optional: boolean;
  /** What it is and how to measure it. */
  help: string;
}

type Entry = [label: string, unit: FigureInfo["unit"], form: "spread" | "single", need: "optional" | "needed", help: string];

/** Every figure of a gear's details, by its path under `details`. */
const DETAILS: Record<string, Entry> = {
  restOhm: ["Resistance at rest", "Ohm", "spread", "optional", "Nobody touching it: a multimeter on ohms across the pad's two wires; give the range over several tries."],
  hitOhm: ["Resistance when hit", "Ohm", "spread", "optional", "The lowest a firm hit reaches: press as hard as you hit and read ohms, or work it back from a scope trace over a known resistor."],
  riseS: ["Rise of the hit", "s", "single", "optional", "From first contact to hardest: read the leading slope on a scope across the pad's divider."],
  holdS: ["Hold", "s", "single", "optional", "How long the pad stays at its hardest: the flat top of the same scope trace."],
  fallS: ["Fall", "s", "single", "optional", "From hardest back to rest: the trailing slope of the same scope trace."],
  farad: ["Capacitance of the disc", "F", "spread", "optional", "A capacitance meter across the disc's two wires, nothing else connected."],
  peakV: ["Peak of a hit", "V", "spread", "optional", "The disc alone on a scope with a 10× probe: a soft and a firm hit give the two ends of the range."],
  "circuit.divider.ohm": ["Divider resistor", "Ohm", "single", "needed", "The fixed resistor that makes a divider with the pad: read its bands, or unsolder one end and measure."],
  "circuit.coupling.farad": ["Coupling capacitor", "F", "single", "needed", "Passes the hit and blocks the resting level: read its print, or measure it out of the circuit."],
  "circuit.coupling.ohm": ["Resistor after the capacitor", "Ohm", "single", "needed", "From the coupling capacitor to 0 V; with it, it sets the pulse's length: read its bands."],
  "circuit.threshold.topOhm": ["Threshold, top resistor", "Ohm", "single", "needed", "From the supply to the threshold pot: read its bands."],
  "circuit.threshold.potOhm": ["Threshold pot", "Ohm", "single", "needed", "The whole track of the sensitivity pot: measure between its outer lugs, unpowered."],
  "circuit.threshold.bottomOhm": ["Threshold, bottom resistor", "Ohm", "single", "needed", "From the pot to 0 V: read its bands; 0 if the pot goes straight to 0 V."],
  "circuit.comparator.highDropV": ["Comparator, lost at the top", "V", "single", "needed", "How far below the supply the output stays when high: supply minus output, on a voltmeter, while it is held high."],
  "circuit.comparator.lowDropV": ["Comparator, left at the bottom", "V", "single", "needed", "How far above the lower rail the output stays when low: a voltmeter from output to that rail, at rest."],
  "circuit.comparator.limitA": ["Comparator, most current", "A", "single", "needed", "The least output current the chip's data sheet promises."],
  "circuit.output.seriesOhm": ["Output resistor", "Ohm", "single", "needed", "Between the comparator and the trigger jack: read its bands; 0 if there is none."],
  "circuit.output.shuntOhm": ["Resistor across the output", "Ohm", "single", "optional", "From the trigger jack to 0 V, which lowers the level: read its bands; leave empty if there is none."],
  "circuit.envelope.seriesOhm": ["Envelope, resistor before the diode", "Ohm", "single", "needed", "Limits how fast the envelope fills: read its bands; 0 if there is none."],
  "circuit.envelope.farad": ["Envelope, capacitor", "F", "single", "needed", "Holds the envelope: read its print; electrolytics may be 20 % off."],
  "circuit.envelope.ohm": ["Envelope, decay resistor", "Ohm", "single", "needed", "Empties the capacitor and sets the decay: read its bands, or measure the decay pot as it stands."],
  "circuit.envelope.emitterOhm": ["Envelope, emitter resistor", "Ohm", "single", "needed", "From the follower's emitter to 0 V: read its bands."],
  highV: ["Upper rail", "V", "spread", "needed", "A voltmeter from the rail to 0 V with the boxes on; for a battery, from fresh to the lowest you will play on."],
  lowV: ["Lower rail", "V", "single", "needed", "0 for a single supply; for a split one, a voltmeter from the negative rail to 0 V."],
  ratingA: ["Current it can give", "A", "single", "optional", "What the adapter's plate says; leave empty for a battery."],
};

/** Every figure of an output jack. */
const OUTPUT: Record<string, Entry> = {
  restV: ["Level at rest", "V", "spread", "optional", "A voltmeter from tip to sleeve, nothing patched, nobody hitting."],
  activeV: ["Level when it fires", "V", "spread", "optional", "A scope from tip to sleeve, nothing patched: the top of the pulse; for audio, the peak of the loudest note."],
  sourceOhm: ["Source resistance", "Ohm", "spread", "optional", "Read the level open, then with a known resistor R across it: R × (open − loaded) ÷ loaded; 0 for an ideal output."],
  pulseS: ["Pulse length", "s", "spread", "optional", "A scope on the jack: the width at half height, soft and hard hits as the two ends."],
  decayS: ["Fall to 37 %", "s", "spread", "optional", "A scope on the jack: from the peak to 37 % of it."],
  limitA: ["Most current", "A", "spread", "optional", "The output current the chip's data sheet promises; leave empty if a resistor limits it anyway."],
};

/** Every figure of an input jack. */
const INPUT: Record<string, Entry> = {
  onV: ["Fires at", "V", "spread", "optional", "Turn a bench supply up slowly through 1 kΩ until it fires; give the range within which it may, over several tries."],
  offV: ["Lets go at", "V", "spread", "optional", "Then turn it down until it lets go; leave empty if that is the same level."],
  safeLowV: ["Lowest safe level", "V", "single", "optional", "The most negative level the jack stands: from the data sheet of the part at the jack, never by trying."],
  safeHighV: ["Highest safe level", "V", "single", "optional", "The highest level the jack stands: from the data sheet of the part at the jack, never by trying."],
  loadOhm: ["Load", "Ohm", "spread", "optional", "Switched off, a multimeter on ohms from tip to sleeve; leave empty if it draws next to nothing."],
  biasV: ["Load returns to", "V", "spread", "optional", "A voltmeter from tip to sleeve with nothing patched; leave empty for 0 V."],
  pulseMinS: ["Shortest pulse it takes", "s", "single", "optional", "Shorten a test pulse until it misses; the last length that never missed."],
  pulseMaxS: ["Longest pulse it takes", "s", "single", "optional", "Lengthen a test pulse until it fires twice or hangs; leave empty if it never does."],
  decayMinS: ["Shortest decay it wants", "s", "single", "optional", "Shorten an envelope until it only clicks; the last that sounded right."],
  maxDbu: ["Strongest level it takes", "dBu", "single", "optional", "The desk's manual calls it maximum input level; 0 dBu is 0.775 V rms."],
  "clamp.lowV": ["Lower diode goes to", "V", "spread", "needed", "The rail the lower protection diode is tied to, less the diode's own drop (about −0.6 V for 0 V)."],
  "clamp.highV": ["Upper diode goes to", "V", "spread", "needed", "The rail the upper protection diode is tied to, plus the diode's own drop."],
  "clamp.seriesOhm": ["Resistor before the diodes", "Ohm", "spread", "needed", "Between the jack and the diodes: read its bands."],
  "clamp.maxA": ["Current the diodes stand", "A", "single", "needed", "From the data sheet: 10 mA for many CMOS inputs."],
};

function infoOf(table: Record<string, Entry>, key: string): FigureInfo | null {
  const entry = table[key];
  if (!entry) return null;
  const [label, unit, form, need, help] = entry;
  return { label, unit, spread: form === "spread", optional: need === "optional", help };
}

/**
 * What a figure is, by its path in the form (`details.restOhm`, `jacks.0.input.onV`).
 * Null where the path is not a figure.
 */
export function figureInfo(formPath: string): FigureInfo | null {
  const steps = formPath.split(".");
  if (steps[0] === "details") return infoOf(DETAILS, steps.slice(1).join("."));
  if (steps[0] !== "jacks") return null;
  return infoOf(steps[2] === "output" ? OUTPUT : INPUT, steps.slice(3).join("."));
}

export const OUTPUT_FIGURES = Object.keys(OUTPUT);
export const INPUT_FIGURES = Object.keys(INPUT);
export const DETAIL_FIGURES = Object.keys(DETAILS);
