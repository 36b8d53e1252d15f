import { formatQuantity, formatRange } from "@/lib/core/units/format-quantity";
import { toRange, type Range, type Spread } from "@/lib/core/units/spread";
import type { Output, Reason } from "../jacks";
import type { ConditionerOutcome, ConditionerQuestion } from "../patch-types";
import { findCorners, rangeOf, type MetricCorners } from "../tolerance/find-corners";
import { listParts } from "../tolerance/list-parts";
import type { Circuit, ConditionerSpec, Solution } from "./conditioner-types";
import { findConditionerIssues } from "./find-conditioner-issues";
import { nominal, settleCircuit } from "./settle-circuit";
import { solveCircuit } from "./solve-circuit";
import { Follower } from "./follower";

/** Peak over threshold below which a hit fires with little to spare: a tenth, as for levels at a jack (electrics §2). */
const TIGHT = 1.1;

const METRICS = ["margin", "tripV", "activeV", "restV", "sourceOhm", "pulseS", "limitA", "peakV", "envelopeRestV", "decayS", "followerOhm"] as const;
type Metric = (typeof METRICS)[number];

/**
 * What a conditioner's outputs do with the pad on it, over every spread and the parts' tolerances, for the patch's check.
 * @returns open-circuit figures of its outputs as ranges, and whether this pad fires it at all, surely, or with little to spare.
 * Limits: those of `simulateConditioner`; corners as in `findCorners`; piezo pads and pads with blank figures are `unproven`.
 */
export function simulateForPatch(question: ConditionerQuestion): ConditionerOutcome {
  const blank = blankFigures(question);
  if (blank.length > 0) return unproven(blank);
  const spec = specOf(question);
  const issue = findConditionerIssues(spec)[0];
  if (issue) return unproven([{ verdict: "unproven", text: `This circuit cannot be computed: ${issue.path.join(".")}. ${issue.message}` }]);
  const parts = listParts(spec);
  let pulsesMost = 0;
  let latches = false;
  const corners = findCorners(parts, (choice) => {
    const circuit = settleCircuit(spec, (spread, path) => choice[path] ?? nominal(spread, path));
    const solution = solveCircuit(circuit);
    pulsesMost = Math.max(pulsesMost, solution.pulses.length);
    latches ||= solution.latches;
    return measure(circuit, solution);
  }, 0);
  const of = (metric: Metric) => corners[METRICS.indexOf(metric)] as MetricCorners;
  const range = (metric: Metric) => rangeOf(of(metric));
  const trigger: Partial<Output> = { signal: "trigger", restV: range("restV"), sourceOhm: range("sourceOhm"), limitA: range("limitA") };
  const reasons = judge(question, range("margin"), range("tripV"), pulsesMost, latches);
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
    pad: { kind: "resistive", restOhm: pad.restOhm as Spread, hitOhm: pad.hitOhm as Spread, leg: circuit.padLeg },
    strike: { riseS: pad.riseS as number, holdS: pad.holdS as number, fallS: pad.fallS as number },
    divider: circuit.divider,
    coupling: circuit.coupling,
    threshold: { ...circuit.threshold, turn },
    comparator: circuit.comparator,
    output: circuit.output,
    envelope: circuit.envelope,
    load: { ohm: loadOhm },
  };
}

const PAD_FIGURES = { restOhm: "its resistance at rest", hitOhm: "its resistance when hit", riseS: "how fast a hit rises", holdS: "how long a hit is held", fallS: "how long a hit takes to let go" } as const;

function blankFigures({ pad }: ConditionerQuestion): Reason[] {
  if (pad.sensor === "piezo") return [{ verdict: "unproven", text: "This circuit is solved for a pad that is a resistance; a piezo disc gives a voltage of its own. Measure the output with the pad on it." }];
  if (pad.sensor === "unknown") return [{ verdict: "unproven", text: "The pad's kind is not known, so what it gives is not either: say what sort of sensor it is." }];
  return (Object.keys(PAD_FIGURES) as (keyof typeof PAD_FIGURES)[])
    .filter((name) => pad[name] === undefined)
    .map((name) => ({ verdict: "unproven" as const, text: `Of the pad ${PAD_FIGURES[name]} is missing.`, figure: `pad.${name}` }));
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
    circuit.tripV > 0 ? (solution.fires || !solution.tripped ? solution.shapedPeakV / circuit.tripV : 0) : 0,
    circuit.tripV, activeV, open(solution.restV), solution.sourceOhm, solution.pulses[0]?.widthS ?? 0, limitA,
    peakV, solution.envelope?.restV ?? 0, solution.envelope?.decayS ?? 0, envelope ? Follower.sourceOhm(peakV, envelope.emitterOhm) : 0,
  ];
}

function judge({ pad }: ConditionerQuestion, margin: Range, trip: Range, pulses: number, latches: boolean): Reason[] {
  const hit = formatRange(toRange(pad.hitOhm as Spread), "Ohm");
  if (trip.min <= 0) return [{ verdict: "stuck", text: `The threshold can lie at or below 0 V (${formatQuantity(trip.min, "V")}), so the comparator may rest high: turn the pot up.`, measured: trip.min, limit: 0, unit: "V" }];
  if (latches) return [{ verdict: "stuck", text: "After a hit the comparator may never let go: its hysteresis is wider than its threshold." }];
  const shares = { measured: margin.min, limit: 1, unit: "ratio" as const };
  const percent = (ratio: number) => `${Number((ratio * 100).toPrecision(3))} %`;
  if (margin.max <= 1) return [{ ...shares, verdict: "dead", measured: margin.max, text: `A hit down to ${hit} cannot fire it: its peak comes to ${percent(margin.max)} of the threshold at best.` }];
  if (margin.min <= 1) return [{ ...shares, verdict: "weak", text: `A hit to ${hit} may not fire it: at worst its peak comes to ${percent(margin.min)} of the threshold.` }];
  if (pulses > 1) return [{ verdict: "tight", text: `One hit can come out as ${pulses} pulses.`, measured: pulses, limit: 1, unit: "ratio" }];
  if (margin.min < TIGHT) return [{ ...shares, verdict: "tight", text: `A hit to ${hit} just fires it: at worst its peak comes to ${percent(margin.min)} of the threshold.` }];
  return [{ ...shares, verdict: "good", text: `A hit to ${hit} fires it at every corner: at worst its peak comes to ${percent(margin.min)} of the threshold.` }];
}
