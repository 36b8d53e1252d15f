import type { Output, Reason } from "../jacks";
import { nameOutput, type Scene } from "./scene";

/** `unproven`: names each figure a verdict needs and does not have, and how to get it. */
export function judgeMissing(scene: Scene): Reason[] {
  return [...missingOfInput(scene), ...scene.outputs.flatMap((output, i) => missingOfOutput(scene, output, i))];
}

function missingOfInput({ input, outputs }: Scene): Reason[] {
  const reasons: Reason[] = [];
  if (!input.safeV) {
    reasons.push(missing("input.safeV", "What the input stands is not known: look up the limits of the first part behind the jack and the supply it runs from, and enter least and most volts."));
  }
  if (input.onV === undefined && (input.accepts.includes("trigger") || input.accepts.includes("gate"))) {
    reasons.push(missing("input.onV", "The level at which the input fires is not known: raise a voltage on it slowly from 0 V, note where it fires, and repeat ten times."));
  } else if (input.onV === undefined && outputs.some((output) => widthFromLevel(output, input.pulseS))) {
    reasons.push(missing("input.onV", "The level at which the input fires is not known, so the width of the envelope it sees is not either: raise a voltage on it slowly and note where it fires."));
  }
  return reasons;
}

function widthFromLevel(output: Partial<Output>, limits: { min?: number; max?: number } | undefined): boolean {
  return statesLimits(limits) && output.signal === "envelope" && output.pulseS === undefined;
}

const MEASURE: Record<"signal" | "restV" | "activeV" | "sourceOhm", string> = {
  signal: "what it gives is not known: look at it on a scope while the pad is struck, and say whether it is a trigger, a gate or an envelope",
  restV: "its level at rest is not known: measure it with a voltmeter and nothing plugged in or struck",
  activeV: "its level when struck is not known: measure the peak on a scope with nothing plugged in",
  sourceOhm: "its own resistance is not known: measure its level open and again with 10 kΩ across it; R = 10 kΩ × (open ÷ loaded − 1)",
};

function missingOfOutput(scene: Scene, output: Partial<Output>, index: number): Reason[] {
  const name = nameOutput(scene, index);
  const at = `outputs.${index}`;
  const reasons: Reason[] = [];
  if (output.signal === undefined) reasons.push(missing(`${at}.signal`, sentence(name, MEASURE.signal)));
  if (output.signal === "sensor") return reasons;
  for (const figure of ["restV", "activeV", "sourceOhm"] as const) {
    if (output[figure] === undefined) reasons.push(missing(`${at}.${figure}`, sentence(name, MEASURE[figure])));
  }
  const { pulseS, decayS } = scene.input;
  const envelope = output.signal === "envelope";
  if (statesLimits(pulseS) && output.pulseS === undefined && !envelope) {
    reasons.push(missing(`${at}.pulseS`, sentence(name, "how long its pulse lasts is not known: measure it on a scope at half height, softest and hardest hit")));
  }
  if (envelope && output.decayS === undefined && ((statesLimits(pulseS) && output.pulseS === undefined) || decayS?.min !== undefined)) {
    reasons.push(missing(`${at}.decayS`, sentence(name, "how fast its envelope falls is not known: measure on a scope the time from the peak to 37 % of it")));
  }
  return reasons;
}

function statesLimits(limits: { min?: number; max?: number } | undefined): boolean {
  return limits?.min !== undefined || limits?.max !== undefined;
}

function missing(figure: string, text: string): Reason {
  return { verdict: "unproven", text, figure };
}

function sentence(name: string, rest: string): string {
  return `Of ${name}, ${rest}.`;
}
