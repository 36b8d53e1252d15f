import { assume, outputJack, PRACTICE, type GearTemplate } from "./template";

const contact = [outputJack({ key: "out", name: "Pad out" }, { signal: "sensor" })];
const strike = `${PRACTICE}; a firm hit with a stick, depends on pad and player`;

export const padTemplates: GearTemplate[] = [
  {
    kind: "pad", variant: "foam", label: "Conductive foam", hint: "Foam or film whose resistance falls when it is hit.",
    name: "Foam pad", wants: null, jacks: contact, knobs: [],
    details: {
      kind: "pad", sensor: "resistive",
      restOhm: assume({ min: 20e3, max: 50e3 }, PRACTICE),
      hitOhm: assume({ nominal: 10e3, tol: 0.2 }, `${PRACTICE}; the ±20 % is our allowance`),
      riseS: assume(1e-3, strike), holdS: assume(5e-3, strike), fallS: assume(30e-3, strike),
      farad: null, peakV: null,
    },
  },
  {
    kind: "pad", variant: "piezo", label: "Piezo disc", hint: "A 27 mm disc glued to a board or a rim.",
    name: "Piezo pad", wants: null, jacks: contact, knobs: [],
    details: {
      kind: "pad", sensor: "piezo",
      restOhm: null, hitOhm: null,
      riseS: assume(0.2e-3, strike), holdS: null, fallS: assume(20e-3, strike),
      farad: assume({ nominal: 16e-9, tol: 0.3 }, "16 nF ± 30 %: CUI CEB-27D44 data sheet, a 27 mm disc"),
      peakV: assume({ min: 5, max: 40 }, "“a few volts or many tens” when struck: secondary texts; our ends of that range"),
    },
  },
  {
    kind: "pad", variant: "foot-switch", label: "Foot switch", hint: "A contact that closes while it is pressed.",
    name: "Foot switch", wants: null, jacks: contact, knobs: [],
    details: {
      kind: "pad", sensor: "switch",
      restOhm: assume(10e6, `${PRACTICE}; an open contact and its lead leak less than this`),
      hitOhm: assume(1, `${PRACTICE}; closed contact and lead`),
      riseS: assume(10e-6, `${PRACTICE}; without bounce`), holdS: assume(0.1, PRACTICE), fallS: assume(10e-6, `${PRACTICE}; without bounce`),
      farad: null, peakV: null,
    },
  },
];
