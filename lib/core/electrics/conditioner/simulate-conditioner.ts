import { findCorners, rangeOf } from "../tolerance/find-corners";
import { listParts } from "../tolerance/list-parts";
import { sampleYield } from "../tolerance/sample-yield";
import type { ConditionerResult, ConditionerSpec, Solution, Trace } from "./conditioner-types";
import { findConditionerIssues } from "./find-conditioner-issues";
import { findFindings } from "./findings/find-findings";
import { isSound } from "./findings/scene";
import { listAssumptions } from "./list-assumptions";
import { settleCircuit } from "./settle-circuit";
import { solveChoice } from "./solve-choice";
import { solveCircuit } from "./solve-circuit";
import { weakestHit } from "./weakest-hit";

const SAMPLE = 200;
const SEED = 20_261_201;
/** A long capture takes longer to solve; so many samples in all are afforded. */
const AFFORDED = 400_000;

/** Figures whose range over the parts is told, and how each reads off a solution. */
const METRICS = {
  padHitV: (s: Solution) => s.padHitV,
  shapedPeakV: (s: Solution) => s.shapedPeakV,
  thresholdV: (s: Solution) => s.thresholdV,
  restV: (s: Solution) => s.restV,
  activeV: (s: Solution) => s.activeV,
  pulseS: (s: Solution) => s.pulses[0]?.widthS ?? 0,
  envelopePeakV: (s: Solution) => s.envelope?.peakV ?? 0,
  decayS: (s: Solution) => s.envelope?.decayS ?? 0,
} as const;
type Metric = keyof typeof METRICS;

/**
 * What one hit on a pad comes to behind its trigger conditioner: the circuit of electrics §3 solved as a circuit, what a
 * builder should know of it, and how far parts as sold move it.
 * @param spec the circuit, SI; each exact figure may be a spread, solved at its nominal value and ranged over its ends.
 * @returns levels in V, times in s from the start of the strike (of a capture: its own time).
 * @throws RangeError naming the first figure that cannot be meant; `findConditionerIssues` lists them all.
 * Source: circuit theory; Shockley diode, forward Gummel–Poon transistor with the models named in electrics §3; checked
 * against ngspice in tests/reference/conditioner.test.ts.
 * Limits: low-voltage DC, 27 °C, no capacitance but the two drawn; an ideal comparator where no optional figure says otherwise.
 */
export function simulateConditioner(spec: ConditionerSpec): ConditionerResult {
  const issue = findConditionerIssues(spec)[0];
  if (issue) throw new RangeError(`${issue.path.join(".")}: ${issue.message}`);
  const circuit = settleCircuit(spec);
  const solution = solveCircuit(circuit, true);
  const parts = listParts(spec);
  const length = "samples" in spec.strike ? spec.strike.samples.length : 4;
  const rounds = Math.max(1, Math.floor(AFFORDED / length));
  const names = Object.keys(METRICS) as Metric[];
  const corners = findCorners(parts, (choice) => {
    const found = solveChoice(spec, choice);
    return names.map((name) => METRICS[name](found));
  }, rounds > 1000 ? 2 : 0);
  const range = (name: Metric) => rangeOf(corners[names.indexOf(name)] as (typeof corners)[number]);
  const widths = corners[names.indexOf("pulseS")] as (typeof corners)[number];
  return {
    fires: solution.fires,
    pad: { restV: solution.padRestV, hitV: solution.padHitV },
    shaped: { peakV: solution.shapedPeakV },
    thresholdV: solution.thresholdV,
    pulses: solution.pulses,
    trigger: { restV: solution.restV, activeV: solution.activeV, sourceOhm: solution.sourceOhm },
    envelope: solution.envelope && { peakV: solution.envelope.peakV, decayS: solution.envelope.decayS },
    ruleOfThumbS: circuit.couplingOhm * circuit.couplingF,
    weakestHitOhm: weakestHit(circuit),
    findings: findFindings({ spec, circuit, solution }),
    trace: solution.trace as Trace,
    spread: {
      padHitV: range("padHitV"), shapedPeakV: range("shapedPeakV"), thresholdV: range("thresholdV"), restV: range("restV"), activeV: range("activeV"),
      pulseS: widths.most.value > 0 || solution.fires ? range("pulseS") : null,
      envelope: spec.envelope ? { peakV: range("envelopePeakV"), decayS: range("decayS") } : null,
    },
    sensitivity: parts
      .map(({ path, name }, i) => ({ path, name, swingS: Math.abs(widths.swings[i] ?? 0) }))
      .sort((a, b) => b.swingS - a.swingS),
    yield: sampleYield(parts, (choice) => isSound(solveChoice(spec, choice)), Math.min(SAMPLE, Math.ceil(rounds / 10)), SEED),
    assumptions: listAssumptions(spec),
  };
}
