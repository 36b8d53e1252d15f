import { assume, inputJack, outputJack, OWN_CHOICE, PRACTICE, type CircuitTemplate, type GearTemplate } from "./template";

const LM358 = "TI SLOS068R (LM358)";
const TL072 = "ST TL072 data sheet: ±13.5 V typical at ±15 V into 10 kΩ";

const padIn = inputJack({ key: "pad", name: "Pad in", role: "pad-in" }, { accepts: ["sensor"] });
// Levels and widths of a circuit's own outputs are computed from its parts and the pad plugged in.
const triggerOut = outputJack({ key: "trigger", name: "Trigger out", role: "trigger-out" }, { signal: "trigger" });
const envelopeOut = outputJack({ key: "envelope", name: "Envelope out", role: "envelope-out" }, { signal: "envelope" });
const sensitivity = [{ name: "Sensitivity", turns: "threshold" as const }];

const singleCircuit: CircuitTemplate = {
  padLeg: "upper",
  divider: { ohm: assume(10e3, "divider resistor near the pad's pressed resistance: common practice") },
  coupling: { farad: assume(100e-9, OWN_CHOICE), ohm: assume(22e3, `${OWN_CHOICE}; with 100 nF it gives 2.2 ms, inside the 1–5 ms of common practice`) },
  threshold: { topOhm: assume(100e3, OWN_CHOICE), potOhm: assume(10e3, OWN_CHOICE), bottomOhm: assume(1e3, OWN_CHOICE) },
  comparator: {
    highDropV: assume(1.5, `${LM358}: high output at least V_CC − 1.5 V`),
    lowDropV: assume(0.02, `${LM358}: low output 20 mV at most`),
    limitA: assume(0.02, `${LM358}: sources 20 mA at least`),
  },
  output: { seriesOhm: assume(2.2e3, OWN_CHOICE), shuntOhm: assume(4.7e3, OWN_CHOICE) },
  envelope: null,
};

const envelope: CircuitTemplate["envelope"] = {
  seriesOhm: assume(100, OWN_CHOICE), farad: assume(1e-6, OWN_CHOICE), ohm: assume(100e3, OWN_CHOICE), emitterOhm: assume(10e3, OWN_CHOICE),
};

const splitCircuit: CircuitTemplate = {
  ...singleCircuit,
  comparator: {
    highDropV: assume(1.5, TL072),
    lowDropV: assume(1.5, TL072),
    limitA: assume(0.01, PRACTICE),
  },
  output: { seriesOhm: assume(1e3, "output resistor of 1 kΩ: convention, from memory"), shuntOhm: null },
};

export const conditionerTemplates: GearTemplate[] = [
  {
    kind: "conditioner", variant: "single-9v", label: "9 V, trigger out", hint: "One comparator on a battery: the pad's hit comes out as a short pulse.",
    name: "Conditioner", wants: { highV: 9, lowV: 0 }, jacks: [padIn, triggerOut], knobs: sensitivity,
    details: { kind: "conditioner", build: "circuit", circuit: singleCircuit },
  },
  {
    kind: "conditioner", variant: "single-9v-envelope", label: "9 V, trigger and envelope out", hint: "The same, with an envelope made beside the pulse.",
    name: "Conditioner", wants: { highV: 9, lowV: 0 }, jacks: [padIn, triggerOut, envelopeOut], knobs: sensitivity,
    details: { kind: "conditioner", build: "circuit", circuit: { ...singleCircuit, envelope } },
  },
  {
    kind: "conditioner", variant: "split-12v", label: "±12 V split supply", hint: "An operational amplifier between two rails; its output rests far below 0 V.",
    name: "Conditioner", wants: { highV: 12, lowV: -12 }, jacks: [padIn, triggerOut], knobs: sensitivity,
    details: { kind: "conditioner", build: "circuit", circuit: splitCircuit },
  },
  {
    kind: "conditioner", variant: "black-box", label: "Black box", hint: "The inside is unknown: only what was read at its jacks counts.",
    name: "Black box", wants: null, knobs: [{ name: "Sensitivity", turns: "nothing" }],
    details: { kind: "conditioner", build: "black-box", circuit: null },
    jacks: [
      padIn,
      outputJack({ key: "trigger", name: "Trigger out", role: "trigger-out" }, {
        signal: "trigger",
        restV: assume(0, PRACTICE),
        activeV: assume({ nominal: 5, tol: 0.1 }, `5 V pulse: ${PRACTICE}; the ±10 % is our allowance`),
        sourceOhm: assume(1e3, "output 1 kΩ: convention, from memory"),
        pulseS: assume({ min: 1e-3, max: 5e-3 }, `1–5 ms: ${PRACTICE}`),
      }),
    ],
  },
];
