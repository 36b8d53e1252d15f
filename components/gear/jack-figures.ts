import { INPUT_FIGURES, OUTPUT_FIGURES } from "./figure-catalogue";
import type { DetailsValues, JackValues } from "./form-values";

/** Which figures a jack shows at once, and which lie folded beneath. */
export interface JackFigures {
  main: string[];
  more: string[];
  /** Said instead of figures, where the jack has none of its own. */
  note: string | null;
}

const OUTPUT_MAIN = {
  sensor: [],
  trigger: ["restV", "activeV", "sourceOhm", "pulseS", "limitA"],
  gate: ["restV", "activeV", "sourceOhm", "pulseS", "limitA"],
  envelope: ["restV", "activeV", "sourceOhm", "decayS", "limitA"],
  control: ["restV", "activeV", "sourceOhm", "limitA"],
  audio: ["restV", "activeV", "sourceOhm"],
} as const;

const CLAMP = INPUT_FIGURES.filter((key) => key.startsWith("clamp."));

export function figuresOfJack(jack: JackValues, details: DetailsValues): JackFigures {
  const byParts = details.kind === "conditioner" && details.build === "circuit";
  if (jack.direction === "output") {
    if (byParts && (jack.role === "trigger-out" || jack.role === "envelope-out")) {
      return { main: [], more: OUTPUT_FIGURES, note: "Computed from the circuit's parts and the pad plugged in, song by song." };
    }
    const main: readonly string[] = OUTPUT_MAIN[jack.output.signal];
    const note = jack.output.signal === "sensor" ? "A bare contact drives nothing: what counts are the pad's own figures above." : null;
    return { main: [...main], more: OUTPUT_FIGURES.filter((key) => !main.includes(key)), note };
  }
  const { accepts } = jack.input;
  const listens = (...signals: (typeof accepts)[number][]) => signals.some((signal) => accepts.includes(signal));
  const plain = INPUT_FIGURES.filter((key) => !CLAMP.includes(key));
  if (accepts.length > 0 && accepts.every((signal) => signal === "sensor")) {
    return { main: [], more: plain, note: byParts ? "The pad works straight into the circuit's divider above." : "Takes a pad's bare contact." };
  }
  const main = new Set<string>();
  const show = (...keys: string[]) => keys.forEach((key) => main.add(key));
  if (listens("trigger", "gate")) show("onV", "offV");
  if (accepts.length > 0) show("safeLowV", "safeHighV", "loadOhm");
  if (listens("trigger", "gate")) show("pulseMinS", "pulseMaxS");
  if (listens("envelope")) show("decayMinS");
  if (listens("audio")) show("maxDbu");
  return { main: [...main], more: plain.filter((key) => !main.has(key)), note: null };
}

export const CLAMP_FIGURES = CLAMP;

const PAD_MAIN = {
  resistive: ["restOhm", "hitOhm", "riseS", "holdS", "fallS"],
  piezo: ["peakV", "farad", "riseS", "fallS"],
  switch: ["restOhm", "hitOhm", "holdS"],
} as const;
const PAD_ALL = ["restOhm", "hitOhm", "riseS", "holdS", "fallS", "farad", "peakV"];

export function figuresOfPad(sensor: keyof typeof PAD_MAIN): { main: string[]; more: string[] } {
  const main: readonly string[] = PAD_MAIN[sensor];
  return { main: [...main], more: PAD_ALL.filter((key) => !main.includes(key)) };
}
