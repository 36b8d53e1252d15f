import { assume, inputJack, PRACTICE, type GearTemplate } from "./template";

const SURVIVES = `${PRACTICE}; what a protected desk input stands, read the desk's manual`;
const LEVEL = `${PRACTICE}; read the desk's manual`;

export const deskTemplates: GearTemplate[] = [
  {
    kind: "desk-channel", variant: "line", label: "Line input", hint: "A channel that takes line level, phantom power off.",
    name: "Desk channel", wants: null, details: { kind: "desk-channel", channel: 1 }, knobs: [],
    jacks: [
      inputJack({ key: "in", name: "Line in", connector: "6.35 mm TRS" }, {
        accepts: ["audio"],
        safeLowV: assume(-15, SURVIVES), safeHighV: assume(15, SURVIVES),
        loadOhm: assume(10e3, LEVEL), maxDbu: assume(22, LEVEL),
      }),
    ],
  },
  {
    kind: "desk-channel", variant: "mic", label: "Mic input, phantom power on", hint: "A channel for microphones and DI boxes: 48 V stands on it.",
    name: "Mic channel", wants: null, details: { kind: "desk-channel", channel: 1 }, knobs: [],
    jacks: [
      inputJack({ key: "in", name: "Mic in", connector: "XLR" }, {
        accepts: ["audio"],
        safeLowV: assume(-15, SURVIVES), safeHighV: assume(15, SURVIVES),
        loadOhm: assume(2e3, LEVEL), maxDbu: assume(0, LEVEL), phantom: true,
      }),
    ],
  },
];

const ADAPTER = `${PRACTICE}; a regulated adapter within 5 %`;

export const supplyTemplates: GearTemplate[] = [
  {
    kind: "supply", variant: "battery-9v", label: "9 V battery", hint: "A 6LR61: 9.6 V fresh, 6 V when it is done.",
    name: "9 V battery", wants: null, jacks: [], knobs: [],
    details: {
      kind: "supply", source: "battery",
      highV: assume({ min: 6, max: 9.6 }, "9 V alkaline ends at 5–6 V and many circuits stop at 6–7 V: secondary texts; 9.6 V fresh: common practice"),
      lowV: assume(0, "one battery has no negative rail"),
      ratingA: null,
    },
  },
  {
    kind: "supply", variant: "split-12v", label: "±12 V adapter", hint: "Two rails either side of 0 V, for modules.",
    name: "±12 V supply", wants: null, jacks: [], knobs: [],
    details: {
      kind: "supply", source: "mains-adapter",
      highV: assume({ nominal: 12, tol: 0.05 }, ADAPTER), lowV: assume(-12, ADAPTER), ratingA: null,
    },
  },
  {
    kind: "supply", variant: "adapter-5v", label: "5 V adapter", hint: "A single rail for logic.",
    name: "5 V supply", wants: null, jacks: [], knobs: [],
    details: {
      kind: "supply", source: "mains-adapter",
      highV: assume({ nominal: 5, tol: 0.05 }, ADAPTER), lowV: assume(0, "a single rail"), ratingA: null,
    },
  },
];
