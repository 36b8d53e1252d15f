import { assume, inputJack, outputJack, PRACTICE, type GearTemplate, type InputFigures, type OutputFigures } from "./template";

const GATE_SPEC = "off below 1 V, on above 2 V: one published modular specification (practice)";
const LOAD = "input 100 kΩ: convention, from memory";
const SOURCE = "output 1 kΩ: convention, from memory";
const RAILS = `${PRACTICE}; a module on ±12 V that stands its own rails`;

/** What a module of the modular trade listens for. */
const moduleInput: Pick<InputFigures, "onV" | "safeLowV" | "safeHighV" | "loadOhm" | "pulseMinS"> = {
  onV: assume({ min: 1, max: 2 }, GATE_SPEC),
  safeLowV: assume(-12, RAILS),
  safeHighV: assume(12, RAILS),
  loadOhm: assume(100e3, LOAD),
  pulseMinS: assume(1e-3, `1–5 ms: ${PRACTICE}`),
};

const audioOut: Partial<OutputFigures> & Pick<OutputFigures, "signal"> = {
  signal: "audio",
  restV: assume(0, PRACTICE),
  activeV: assume(5, `peak of 5 V: ${PRACTICE}`),
  sourceOhm: assume(1e3, SOURCE),
};

export const shaperTemplates: GearTemplate[] = [
  {
    kind: "shaper", variant: "envelope", label: "Trigger to envelope", hint: "A pulse goes in, a fast rise and a slow fall come out.",
    name: "Envelope shaper", wants: { highV: 12, lowV: -12 }, details: { kind: "shaper" }, knobs: [{ name: "Decay", turns: "nothing" }],
    jacks: [
      inputJack({ key: "in", name: "Trigger in" }, { accepts: ["trigger", "gate"], ...moduleInput }),
      outputJack({ key: "out", name: "Envelope out" }, {
        signal: "envelope",
        restV: assume(0, PRACTICE),
        activeV: assume({ nominal: 8, tol: 0.1 }, `8 V: ${PRACTICE}; the ±10 % is our allowance`),
        sourceOhm: assume(1e3, SOURCE),
        decayS: assume({ nominal: 0.1, tol: 0.2 }, "RC of 100 kΩ and 1 µF, part tolerances of 20 %"),
      }),
    ],
  },
  {
    kind: "shaper", variant: "gate", label: "Trigger to gate", hint: "A short pulse goes in, a longer held level comes out.",
    name: "Gate shaper", wants: { highV: 12, lowV: -12 }, details: { kind: "shaper" }, knobs: [{ name: "Length", turns: "nothing" }],
    jacks: [
      inputJack({ key: "in", name: "Trigger in" }, { accepts: ["trigger", "gate"], ...moduleInput }),
      outputJack({ key: "out", name: "Gate out" }, {
        signal: "gate",
        restV: assume(0, PRACTICE),
        activeV: assume({ nominal: 5, tol: 0.1 }, `5 V: ${PRACTICE}; the ±10 % is our allowance`),
        sourceOhm: assume(1e3, SOURCE),
        pulseS: assume({ nominal: 0.1, tol: 0.2 }, `${PRACTICE}; a one-shot with parts of 20 % in all`),
      }),
    ],
  },
];

export const voiceTemplates: GearTemplate[] = [
  {
    kind: "voice", variant: "trigger", label: "Trigger input", hint: "An analogue drum voice that starts on a pulse.",
    name: "Drum voice", wants: { highV: 12, lowV: -12 }, details: { kind: "voice" },
    knobs: [{ name: "Tune", turns: "nothing" }, { name: "Decay", turns: "nothing" }],
    jacks: [
      inputJack({ key: "in", name: "Trigger in" }, { accepts: ["trigger", "gate"], ...moduleInput }),
      outputJack({ key: "out", name: "Audio out" }, audioOut),
    ],
  },
  {
    kind: "voice", variant: "envelope", label: "Envelope input", hint: "A voice whose loudness follows an envelope; a bare pulse only clicks.",
    name: "Envelope voice", wants: { highV: 12, lowV: -12 }, details: { kind: "voice" }, knobs: [{ name: "Tune", turns: "nothing" }],
    jacks: [
      inputJack({ key: "in", name: "Envelope in" }, {
        accepts: ["envelope"],
        safeLowV: assume(-12, RAILS), safeHighV: assume(12, RAILS), loadOhm: assume(100e3, LOAD),
        decayMinS: assume(0.05, `${PRACTICE}; shorter sounds as a click`),
      }),
      outputJack({ key: "out", name: "Audio out" }, audioOut),
    ],
  },
  {
    kind: "voice", variant: "logic-5v", label: "Bare 5 V logic input", hint: "The pin of a 5 V CMOS part straight at the jack: a 9 V pulse can destroy it.",
    name: "Logic voice", wants: { highV: 5, lowV: 0 }, details: { kind: "voice" }, knobs: [],
    jacks: [
      inputJack({ key: "in", name: "Logic in" }, {
        accepts: ["trigger", "gate"],
        onV: assume({ min: 2.2, max: 3.6 }, "CD40106B at 5 V, VT+: UTC data sheet (other makers differ)"),
        offV: assume({ min: 0.9, max: 2.8 }, "CD40106B at 5 V, VT−: UTC data sheet (other makers differ)"),
        safeLowV: assume(-0.5, "CD40106B: TI SCHS097F, −0.5 V"),
        safeHighV: assume(5.5, "CD40106B: TI SCHS097F, V_DD + 0.5 V at V_DD = 5 V"),
        loadOhm: assume(1e6, `${PRACTICE}; the pull-down that keeps a bare CMOS pin at 0 V`),
      }),
      outputJack({ key: "out", name: "Audio out" }, { ...audioOut, activeV: assume(2.5, `half of a 5 V supply: ${PRACTICE}`) }),
    ],
  },
];
