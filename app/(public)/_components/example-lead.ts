/** The example's figures as people write them, and where each stands in the calculator's request. */
export const FIGURES = [
  { key: "activeV", box: "9 V box", label: "When struck", unit: "V", start: "4.5–8.1", at: "outputs.0.activeV" },
  { key: "sourceOhm", box: "9 V box", label: "In series", unit: "Ω", start: "1k", at: "outputs.0.sourceOhm" },
  { key: "onV", box: "5 V input", label: "Fires within", unit: "V", start: "0.8–2", at: "inputs.0.onV" },
  { key: "offV", box: "5 V input", label: "Lets go below", unit: "V", start: "0.8", at: "inputs.0.offV" },
  { key: "safeMax", box: "5 V input", label: "Stands up to", unit: "V", start: "5.5", at: "inputs.0.safeV.max" },
  { key: "loadOhm", box: "5 V input", label: "Own load", unit: "Ω", start: "100k", at: "inputs.0.loadOhm" },
] as const;

export const BOXES = ["9 V box", "5 V input"] as const;

export type Figures = Record<(typeof FIGURES)[number]["key"], string>;

export const START = Object.fromEntries(FIGURES.map(({ key, start }) => [key, start])) as Figures;

/** What the open connection calculator is asked. */
export function exampleRequest(figures: Figures) {
  const { activeV, sourceOhm, onV, offV, safeMax, loadOhm } = figures;
  return {
    outputs: [{ signal: "trigger", restV: 0, activeV, sourceOhm }],
    inputs: [{ id: "input", accepts: ["trigger", "gate"], onV, offV, safeV: { min: -0.5, max: safeMax }, loadOhm }],
  };
}

/** The figure a refusal is about: the one it names, or the only one within what it names. */
export function figureAt(field: string): keyof Figures | undefined {
  return FIGURES.find(({ at }) => at === field || at.startsWith(`${field}.`) || field.startsWith(`${at}.`))?.key;
}
