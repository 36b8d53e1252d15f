import { formatQuantity, formatRange } from "@/lib/core/units/format-quantity";
import type { Range } from "@/lib/core/units/spread";
import type { Output, Reason } from "../jacks";
import type { ConditionerOutcome, ConditionerQuestion, ConditionerSimulator } from "../patch-types";
import { findCorners, rangeOf, type MetricCorners } from "../tolerance/find-corners";
import { listParts } from "../tolerance/list-parts";
import type { Circuit, ConditionerSpec, Solution } from "./conditioner-types";
import { findConditionerIssues } from "./find-conditioner-issues";
import { nominal, settleCircuit } from "./settle-circuit";
import { solveCircuit } from "./solve-circuit";
import { Follower } from "./follower";

/** Room over the threshold below which a hit fires with little to spare, as for levels at a jack (electrics §2). */
const TIGHT = { share: 0.1, leastV: 0.2 };
/** Where a pad states no strike: common practice, no source. */
const STRIKE = { riseS: 1e-3, holdS: 5e-3, fallS: 30e-3 };
/** A contact, open and closed, Ω: a switch is a pad that goes all the way. Common practice, no source. */
const CONTACT = { restOhm: 10e6, hitOhm: 1 };
/** Answers kept: the same box and pad come again in every song, and the same question has the same answer. */
const MOST_KEPT = 500;
const kept = new Map<string, ConditionerOutcome>();

const METRICS = ["marginV", "shapedPeakV", "tripV", "activeV", "restV", "sourceOhm", "pulseS", "limitA", "peakV", "envelopeRestV", "decayS", "followerOhm"] as const;
type Metric = (typeof METRICS)[number];

/**
 * What a conditioner's outputs do with the pad on it, over every spread and the parts' tolerances, for the patch's check.
 * @returns open-circuit figures of its outputs as ranges, and whether this pad fires it at all, surely, or with little to spare.
 * Limits: those of `simulateConditioner`; corners as in `findCorners`; piezo pads and pads with blank figures are `unproven`.
 */
export const simulateForPatch: ConditionerSimulator = (question) => {
  const key = JSON.stringify(question);
  const known = kept.get(key);
  if (known) return known;
  const outcome = answer(question);
  if (kept.size >= MOST_KEPT) kept.clear();
  kept.set(key, outcome);
  return outcome;
};

function answer(question: ConditionerQuestion): ConditionerOutcome {
  const blank = blankFigures(question);
  if (blank.length > 0) return unproven(blank);
  const spec = specOf(question);
  const issue = findConditionerIssues(spec)[0];
  if (issue) return unproven([{ verdict: "unproven", text: `This circuit cannot be computed: ${issue.path.join(".")}. ${issue.message}` }]);
  const parts = listParts(spec);
  let pulsesMost = 0;
  let underfilled = false;
  let latches = false;
  const corners = findCorners(parts, (choice) => {
    const circuit = settleCircuit(spec, (spread, path) => choice[path] ?? nominal(spread, path));
    const solution = solveCircuit(circuit);
    pulsesMost = Math.max(pulsesMost, solution.pulses.length);
    latches ||= solution.latches;
    underfilled ||= solution.tripped && !solution.fires;
    return measure(circuit, solution);
  }, 0);
  const of = (metric: Metric) => corners[METRICS.indexOf(metric)] as MetricCorners;
  const range = (metric: Metric) => rangeOf(of(metric));
  const trigger: Partial<Output> = { signal: "trigger", restV: range("restV"), sourceOhm: range("sourceOhm"), limitA: range("limitA") };
  const reasons = judge({ margin: range("marginV"), peak: range("shapedPeakV"), trip: range("tripV"), width: range("pulseS"), pulses: pulsesMost, latches, underfilled });
  const verdict = reasons[0]?.verdict as ConditionerOutcome["verdict"];
  // A pulse that some corner lacks is no pulse to count on: the verdict says so, and the length is that of the ones that come.
  const width = range("pulseS");
  if (verdict !== "dead" && verdict !== "stuck") {
    trigger.activeV = range("activeV");
    if (width.min > 0) trigger.pulseS = width;
  } else trigger.activeV = range("restV");
  if (!question.circuit.envelope) return { verdict, reasons, trigger };
  const envelope: Partial<Output> = { signal: "envelope", restV: range("envelopeRestV"), activeV: range("peakV"), sourceOhm: range("followerOhm") };
  if (range("decayS").min > 0) envelope.decayS = range("decayS");
  return { verdict, reasons, trigger, envelope };
}

function specOf({ circuit, pad, turn, loadOhm }: ConditionerQuestion): ConditionerSpec {
  return {
    supply: circuit.supply,
    pad: { kind: "resistive", restOhm: pad.restOhm ?? CONTACT.restOhm, hitOhm: pad.hitOhm ?? CONTACT.hitOhm, leg: circuit.padLeg },
    strike: { riseS: pad.riseS ?? STRIKE.riseS, holdS: pad.holdS ?? STRIKE.holdS, fallS: pad.fallS ?? STRIKE.fallS },
    divider: circuit.divider,
    coupling: circuit.coupling,
    threshold: { ...circuit.threshold, turn },
    comparator: circuit.comparator,
    output: circuit.output,
    envelope: circuit.envelope,
    load: { ohm: loadOhm },
  };
}

const PAD_FIGURES = {
  restOhm: "The pad’s resistance at rest is not known: measure it with a meter, nothing touching the pad.",
  hitOhm: "The pad’s resistance when hit is not known: press it as hard as a hit and read a meter.",
} as const;

function blankFigures({ pad }: ConditionerQuestion): Reason[] {
  if (pad.sensor === "piezo") return [{ verdict: "unproven", text: "This circuit is solved for a pad that is a resistance; a piezo disc gives a voltage of its own. Play the pad on this box and record what comes out of it." }];
  if (pad.sensor === "unknown") return [{ verdict: "unproven", text: "The pad’s kind is not known, so what it gives is not either: say what sort of sensor it is." }];
  if (pad.sensor === "switch") return [];
  return (["restOhm", "hitOhm"] as const)
    .filter((name) => pad[name] === undefined)
    .map((name) => ({ verdict: "unproven" as const, text: PAD_FIGURES[name], figure: `pad.${name}` }));
}

function unproven(reasons: Reason[]): ConditionerOutcome {
  return { verdict: "unproven", reasons, trigger: { signal: "trigger" } };
}

/** In the order of METRICS. Levels are those of the open output: the comparator's, through series and shunt alone. */
function measure(circuit: Circuit, solution: Solution): number[] {
  const openShare = circuit.shuntOhm === Infinity ? 1 : circuit.shuntOhm / (circuit.seriesOhm + circuit.shuntOhm);
  const open = (level: number) => (level / circuit.triggerShare) * openShare;
  const activeV = open(solution.activeV);
  // What the jack may draw before comparator and shunt together come to the limit.
  const shuntA = circuit.shuntOhm === Infinity ? 0 : activeV / openShare / (circuit.seriesOhm + circuit.shuntOhm);
  const limitA = Math.max(0, (circuit.limitA - shuntA) / openShare);
  const { envelope } = circuit;
  const peakV = solution.envelope?.peakV ?? 0;
  return [
    solution.shapedPeakV - circuit.tripV, solution.shapedPeakV, circuit.tripV, activeV, open(solution.restV), solution.sourceOhm, solution.pulses[0]?.widthS ?? 0, limitA,
    peakV, solution.envelope?.restV ?? 0, solution.envelope?.decayS ?? 0, envelope ? Follower.sourceOhm(peakV, envelope.emitterOhm) : 0,
  ];
}

interface Found {
  margin: Range;
  peak: Range;
  trip: Range;
  width: Range;
  pulses: number;
  latches: boolean;
  underfilled: boolean;
}

function judge({ margin, peak, trip, width, pulses, latches, underfilled }: Found): Reason[] {
  const numbers = { measured: peak.min, limit: trip.max, unit: "V" as const };
  const levels = `A hit raises ${formatRange(peak, "V")} against a threshold of ${formatRange(trip, "V")}`;
  if (trip.min <= 0) return [{ ...numbers, verdict: "stuck", measured: trip.min, limit: 0, text: `The threshold can lie at ${formatQuantity(trip.min, "V")}, not above the resting signal: turn it up, or the output may stay high.` }];
  if (latches) return [{ ...numbers, verdict: "stuck", text: `${levels}, but after it the comparator may never let go: its hysteresis is wider than its threshold.` }];
  if (margin.max <= 0) return [{ ...numbers, verdict: "dead", text: `${levels}: no hit of this pad can fire it.` }];
  if (width.max <= 0) return [{ ...numbers, verdict: "dead", text: `${levels}, and the comparator trips, but its output never comes up: its load takes all the current it gives.` }];
  if (margin.min <= 0) return [{ ...numbers, verdict: "weak", text: `${levels}: the weakest hit may not fire it.` }];
  if (width.min <= 0 || underfilled) return [{ ...numbers, verdict: "weak", text: `${levels}, but its load may keep the comparator's output down.` }];
  const pulse = `a pulse of ${formatRange(width, "s")}`;
  if (pulses > 1) return [{ verdict: "tight", text: `${levels}: ${pulse}, but one hit can come out as ${pulses} pulses.`, measured: pulses, limit: 1 }];
  if (margin.min < Math.max(TIGHT.share * trip.max, TIGHT.leastV)) return [{ ...numbers, verdict: "tight", text: `${levels}: it fires, ${pulse}, with ${formatQuantity(margin.min, "V")} to spare at the weakest.` }];
  return [{ ...numbers, verdict: "good", text: `${levels}: ${pulse}.` }];
}
