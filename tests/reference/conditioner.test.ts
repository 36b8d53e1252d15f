import { describe, expect, it } from "vitest";
import type { Circuit, Solution } from "@/lib/core/electrics/conditioner/conditioner-types";
import { settleCircuit } from "@/lib/core/electrics/conditioner/settle-circuit";
import { solveCircuit } from "@/lib/core/electrics/conditioner/solve-circuit";
import { randomConditioner } from "../factories/conditioner";
import { conditionerDeck, EASES, FINE, type Ease } from "./conditioner-deck";
import { readingsOf, type Readings } from "./conditioner-readings";
import { Ngspice } from "./ngspice";

const COUNT = 360;

/** The accuracy of electrics §3, figure by figure: the larger of a share of the simulator's value and an absolute amount. */
const TOLERANCES = {
  // Levels: 1 % is a third of what 5 % resistors do; 20 mV a tenth of the least margin a jack asks for.
  padRestV: { share: 0.01, amount: 0.02 },
  padHitV: { share: 0.01, amount: 0.02 },
  shapedPeakV: { share: 0.01, amount: 0.02 },
  restV: { share: 0.01, amount: 0.02 },
  activeV: { share: 0.01, amount: 0.02 },
  // Times: no input here tells 20 µs apart.
  startS: { share: 0.02, amount: 20e-6 },
  widthS: { share: 0.02, amount: 20e-6 },
  // Two junctions in a row: a tenth of a junction's drop.
  envelopePeakV: { share: 0, amount: 0.06 },
  decayS: { share: 0.03, amount: 0 },
} as const;
type Figure = keyof typeof TOLERANCES;
/** A peak this near to the threshold may go either way (electrics §3). */
const NEAR = 0.01;
/** Below this a follower is not open, and peak/e is nothing to time. */
const LEAST_PEAK_V = 0.1;

interface Comparison {
  /** Differences as a share of what is allowed. */
  differences: [Figure, number][];
  faults: string[];
}

function compare(ours: Solution, theirs: Readings): Comparison {
  const differences: [Figure, number][] = [];
  const faults: string[] = [];
  const check = (figure: Figure, own: number, truth: number) => {
    const { share, amount } = TOLERANCES[figure];
    const off = Math.abs(own - truth) / Math.max(share * Math.abs(truth), amount);
    differences.push([figure, off]);
    if (!(off <= 1)) faults.push(`${figure} ${own} for ${truth}`);
  };
  check("padRestV", ours.padRestV, theirs.padRestV);
  check("padHitV", ours.padHitV, theirs.padHitV);
  check("shapedPeakV", ours.shapedPeakV, theirs.shapedPeakV);
  check("restV", ours.restV, theirs.restV);
  if (ours.pulses.length !== theirs.pulses.length) {
    faults.push(`${ours.pulses.length} pulses for ${theirs.pulses.length}`);
    return { differences, faults };
  }
  if (theirs.pulses.length > 0) check("activeV", ours.activeV, theirs.highestV);
  theirs.pulses.forEach((pulse, i) => {
    check("startS", ours.pulses[i]?.startS ?? NaN, pulse.startS);
    check("widthS", ours.pulses[i]?.widthS ?? NaN, pulse.widthS);
  });
  if (theirs.envelope && ours.envelope) {
    check("envelopePeakV", ours.envelope.peakV, theirs.envelope.peakV);
    if (theirs.envelope.decayS !== null && theirs.envelope.peakV > LEAST_PEAK_V) check("decayS", ours.envelope.decayS, theirs.envelope.decayS);
  }
  return { differences, faults };
}

/** Long enough for every pulse and the fall to peak/e. */
function stopOf(circuit: Circuit, ours: Solution): number {
  const { strike } = circuit;
  const strikeS = "samples" in strike ? (strike.samples.at(-1)?.[0] ?? 0) : strike.riseS + strike.holdS + strike.fallS;
  const last = ours.pulses.at(-1);
  return Math.max(strikeS * 1.05 + 1e-4, (last ? (last.startS + last.widthS) * 1.1 : 0) + 1.15 * (ours.envelope?.decayS ?? 0));
}

async function read(ngspice: Ngspice, circuit: Circuit, stopS: number, eases: readonly Ease[]): Promise<Readings | null> {
  for (const ease of eases) {
    const columns = await ngspice.run(conditionerDeck(circuit, stopS, ease));
    if (columns) return readingsOf(columns, circuit);
  }
  return null;
}

describe(`${COUNT} random conditioners against ngspice (eecircuit-engine)`, () => {
  it("agree in levels, pulses, envelopes, and in whether they fire", { timeout: 290_000 }, async () => {
    const ngspice = new Ngspice();
    const all = new Map<Figure, number[]>();
    const faults: string[] = [];
    const refused: number[] = [];
    const repeated: number[] = [];
    const seen = { fired: 0, several: 0, silent: 0, near: 0 };
    for (let seed = 0; seed < COUNT; seed += 1) {
      const circuit = settleCircuit(randomConditioner(seed));
      const ours = solveCircuit(circuit);
      const stopS = stopOf(circuit, ours);
      let theirs = await read(ngspice, circuit, stopS, EASES);
      if (!theirs) {
        refused.push(seed);
        continue;
      }
      if (Math.abs(theirs.shapedPeakV - circuit.tripV) < NEAR * circuit.tripV) {
        seen.near += 1;
        continue;
      }
      let result = compare(ours, theirs);
      if (result.faults.length > 0) {
        // Where a level grazes the threshold the simulator's own steps are too long to time it.
        repeated.push(seed);
        theirs = (await read(ngspice, circuit, stopS, [FINE])) ?? theirs;
        result = compare(ours, theirs);
      }
      seen[theirs.pulses.length === 0 ? "silent" : "fired"] += 1;
      if (theirs.pulses.length > 1) seen.several += 1;
      for (const [figure, off] of result.differences) all.set(figure, [...(all.get(figure) ?? []), off]);
      if (result.faults.length > 0) faults.push(`seed ${seed}: ${result.faults.join("; ")}`);
    }
    const lines = [...all].map(([figure, offs]) => {
      const sorted = offs.sort((a, b) => a - b);
      const at = (share: number) => ((sorted[Math.floor(share * (sorted.length - 1))] ?? NaN) * 100).toPrecision(2);
      return `${figure.padEnd(14)} ${String(sorted.length).padStart(4)} compared; of the allowed difference: half below ${at(0.5)} %, 95 in 100 below ${at(0.95)} %, largest ${at(1)} %`;
    });
    console.log(`${seen.fired} fired (${seen.several} more than once), ${seen.silent} silent, ${seen.near} too near to call; run again an order finer: ${repeated.join(", ") || "none"}; refused by the simulator: ${refused.join(", ") || "none"}\n${lines.join("\n")}`);
    expect(faults).toEqual([]);
    expect(refused.length).toBeLessThan(COUNT / 50);
    expect(repeated.length).toBeLessThan(COUNT / 30);
    expect(seen.fired).toBeGreaterThan(200);
    expect(seen.silent).toBeGreaterThan(20);
    expect(seen.several).toBeGreaterThan(20);
    expect(seen.near).toBeLessThan(COUNT / 20);
  });
});
