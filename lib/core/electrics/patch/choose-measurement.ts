import type { LeadCheck, Measurement } from "../patch-types";
import type { PatchIndex } from "./index-patch";

/** A figure that is missing or assumed, `<gearId>:<path>`. */
type FigureKey = string;

/** Asked first where several would do: what most often decides a lead. */
const ASK_FIRST = ["activeV", "onV", "safeV", "sourceOhm", "loadOhm", "pulseS", "pulse", "restV", "hitOhm", "restOhm", "decayS", "offV"];

/** The figure of one lead to measure next, or nothing where all is measured. */
export function nextOfLead(index: PatchIndex, lead: LeadCheck): Measurement | undefined {
  const missing = missingFigures(index, lead);
  const keys = missing.length > 0 ? missing : lead.assumed;
  const first = [...keys].sort((a, b) => urgency(a) - urgency(b) || (a < b ? -1 : 1))[0];
  return first === undefined ? undefined : describe(index, first, [lead.leadId]);
}

/** The one figure of the whole patch that settles most leads: alone first, then together with others. */
export function nextOfPatch(index: PatchIndex, leads: readonly LeadCheck[]): Measurement | undefined {
  const open = new Map<FigureKey, { alone: number; leadIds: string[] }>();
  for (const lead of leads) {
    const keys = new Set([...missingFigures(index, lead), ...lead.assumed]);
    for (const key of keys) {
      const entry = open.get(key) ?? { alone: 0, leadIds: [] };
      entry.leadIds.push(lead.leadId);
      if (keys.size === 1) entry.alone += 1;
      open.set(key, entry);
    }
  }
  const ranked = [...open].sort(([a, x], [b, y]) =>
    y.alone - x.alone || y.leadIds.length - x.leadIds.length || urgency(a) - urgency(b) || (a < b ? -1 : 1));
  const best = ranked[0];
  return best && describe(index, best[0], best[1].leadIds);
}

/** `unproven` reasons name their figure by its place in the connection; here by its gear and jack. */
function missingFigures(index: PatchIndex, { leadId, reasons }: LeadCheck): FigureKey[] {
  const lead = index.patch.leads.find(({ id }) => id === leadId);
  const node = lead && index.nodeOfJack.get(lead.inputId);
  if (!lead || !node) return [];
  return reasons.flatMap(({ figure }) => {
    const [side, place, name] = figure?.split(".") ?? [];
    const placed = side === "input" ? index.jacks.get(lead.inputId) : node.outputs[Number(place)];
    const field = side === "input" ? place : name;
    return placed && field ? [`${placed.gear.id}:jacks.${placed.jack.id}.${field}`] : [];
  });
}

function urgency(key: FigureKey): number {
  const field = key.slice(key.lastIndexOf(".") + 1);
  const place = ASK_FIRST.findIndex((name) => field.startsWith(name));
  return place === -1 ? ASK_FIRST.length : place;
}

const WORDS: Record<string, string> = {
  activeV: "the level when struck", restV: "the level at rest", sourceOhm: "the output's own resistance", onV: "the level at which it fires",
  offV: "the level at which it lets go", safeV: "what the input stands", safeLowV: "what the input stands", safeHighV: "what the input stands",
  loadOhm: "the load", pulseS: "the pulse's length", decayS: "the envelope's fall", limitA: "the most current it gives", signal: "what it gives",
  restOhm: "the resistance at rest", hitOhm: "the resistance when hit", riseS: "how fast the hit comes", holdS: "how long the hit lasts", fallS: "how fast it lets go",
  farad: "the capacitance", peakV: "the peak of a firm hit", ohm: "the resistor", highDropV: "how far below its supply the comparator's output stays",
  lowDropV: "how far above its lower rail the comparator's output stays", seriesOhm: "the output resistor", shuntOhm: "the resistor across the output",
  topOhm: "the threshold's top resistor", potOhm: "the threshold pot", bottomOhm: "the threshold's bottom resistor", emitterOhm: "the emitter resistor",
  supply: "its supply, fresh and near empty", biasV: "where the load returns to", clamp: "the protection diodes", maxDbu: "the strongest level it takes",
};

function describe(index: PatchIndex, key: FigureKey, leadIds: string[]): Measurement {
  const cut = key.indexOf(":");
  const [gearId, figure] = [key.slice(0, cut), key.slice(cut + 1)];
  const gear = index.rig.gear.find(({ id }) => id === gearId);
  const jack = gear?.jacks.find(({ id }) => figure.startsWith(`jacks.${id}.`));
  const field = figure.slice(figure.lastIndexOf(".") + 1);
  const what = WORDS[field] ?? `“${field}”`;
  const where = jack ? `${gear?.name ?? "the box"}, ${jack.name}` : (gear?.name ?? "the box");
  const count = leadIds.length === 1 ? "one lead leans on it" : `${leadIds.length} leads lean on it`;
  return { gearId, figure, leadIds, text: `Measure ${what} of ${where}: ${count}.` };
}
