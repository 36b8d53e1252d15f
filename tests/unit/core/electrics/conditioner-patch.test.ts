import { describe, expect, it } from "vitest";
import { simulateForPatch, type ConditionerQuestion } from "@/lib/core/electrics";
import type { ConditionerSpec } from "@/lib/core/electrics/conditioner/conditioner-types";
import { settleCircuit } from "@/lib/core/electrics/conditioner/settle-circuit";
import { solveCircuit } from "@/lib/core/electrics/conditioner/solve-circuit";
import { listParts } from "@/lib/core/electrics/tolerance/list-parts";
import { nominalOf, toRange, type Range, type Spread } from "@/lib/core/units/spread";
import { randomConditioner } from "../../../factories/conditioner";
import { seededRandom } from "@/lib/core/electrics/tolerance/seeded-random";

const foam: ConditionerQuestion = {
  circuit: {
    supply: { highV: { min: 6, max: 9.6 }, lowV: 0 }, padLeg: "upper", divider: { ohm: 10e3 }, coupling: { farad: 1e-7, ohm: 22e3 },
    threshold: { topOhm: 100e3, potOhm: 10e3, bottomOhm: 1e3 }, comparator: { highDropV: 1.5, lowDropV: 0.02, limitA: 0.02 },
    output: { seriesOhm: 2200, shuntOhm: 4700 }, envelope: null,
  },
  pad: { sensor: "resistive", restOhm: { min: 20e3, max: 50e3 }, hitOhm: { nominal: 10e3, tol: 0.2 }, riseS: 1e-3, holdS: 5e-3, fallS: 30e-3 },
  turn: 0.3,
  loadOhm: 100e3,
};
const ask = (change: Partial<ConditionerQuestion> = {}) => simulateForPatch({ ...foam, ...change });
const rangeOf = (spread: Spread | undefined): Range => toRange(spread as Spread);

describe("a conditioner with its pad, for the patch", () => {
  it("open-circuit level: (6 to 9.6 V less 1.5 V) through 2.2 kΩ over 4.7 kΩ, each ±5 % (divider rule)", () => {
    const active = rangeOf(ask().trigger.activeV);
    expect(active.min).toBeCloseTo(4.5 * (4700 * 0.95) / (4700 * 0.95 + 2200 * 1.05), 9);
    expect(active.max).toBeCloseTo(8.1 * (4700 * 1.05) / (4700 * 1.05 + 2200 * 0.95), 9);
  });

  it("source: 2.2 kΩ ∥ 4.7 kΩ, ±5 %", () => {
    const source = rangeOf(ask().trigger.sourceOhm);
    expect([source.min, source.max].map((ohm) => ohm / ((2200 * 4700) / 6900))).toEqual([expect.closeTo(0.95, 9), expect.closeTo(1.05, 9)]);
  });

  it("verdicts go with the pot: at the bottom is stuck, low is good, high is weak, too high is dead", () => {
    const threshold = { topOhm: 10e3, potOhm: 47e3, bottomOhm: 0 };
    const at = (turn: number) => ask({ circuit: { ...foam.circuit, threshold }, turn }).verdict;
    expect(at(0)).toBe("stuck");
    expect(at(0.05)).toBe("good");
    expect(at(0.25)).toBe("weak");
    expect(at(1)).toBe("dead");
  });

  it("a blank figure of the pad is named, a piezo disc and an unknown sensor are unproven", () => {
    const { hitOhm: _hit, ...blank } = foam.pad;
    expect(ask({ pad: blank })).toMatchObject({ verdict: "unproven", reasons: [{ figure: "pad.hitOhm" }] });
    expect(ask({ pad: { sensor: "piezo" } }).verdict).toBe("unproven");
    expect(ask({ pad: { sensor: "unknown" } }).verdict).toBe("unproven");
  });

  it("a switch without figures is a contact that goes all the way", () => {
    expect(["good", "tight"]).toContain(ask({ pad: { sensor: "switch", riseS: 1e-5, holdS: 0.1, fallS: 1e-5 } }).verdict);
  });

  it("an upside-down figure is an answer, not an exception", () => {
    expect(ask({ circuit: { ...foam.circuit, divider: { ohm: { min: 2, max: 1 } } } }).verdict).toBe("unproven");
  });

  it("what is called good fires at 20 random builds of each of 150 circuits, within the figures told (seeded)", () => {
    const next = seededRandom(3);
    let good = 0;
    for (let seed = 0; seed < 400 && good < 150; seed += 1) {
      const spec = randomConditioner(seed);
      if ("samples" in spec.strike) continue;
      const { pad, strike, threshold: { turn, ...threshold }, load } = spec;
      const wide = (spread: Spread, tol: number): Spread => ({ nominal: nominalOf(spread), tol });
      const { offsetV: _offset, hysteresisV: _hysteresis, slewVperS: _slew, sinkA: _sink, ...comparator } = spec.comparator;
      const question: ConditionerQuestion = {
        circuit: { supply: { ...spec.supply, highV: wide(spec.supply.highV, 0.15) }, padLeg: pad.leg, divider: spec.divider, coupling: spec.coupling, threshold, comparator, output: spec.output, envelope: spec.envelope },
        pad: { sensor: "resistive", restOhm: wide(pad.restOhm, 0.1), hitOhm: wide(pad.hitOhm, 0.1), ...strike }, turn, loadOhm: load.ohm,
      };
      const outcome = simulateForPatch(question);
      if (outcome.verdict !== "good") continue;
      good += 1;
      const built: ConditionerSpec = { ...spec, comparator, supply: question.circuit.supply, pad: { ...pad, restOhm: question.pad.restOhm as Spread, hitOhm: question.pad.hitOhm as Spread } };
      const parts = new Map(listParts(built).map((part) => [part.path, part.range]));
      for (let build = 0; build < 20; build += 1) {
        const circuit = settleCircuit(built, (spread, path) => {
          const range = parts.get(path);
          return range ? range.min + (range.max - range.min) * next() : nominalOf(spread);
        });
        const found = solveCircuit(circuit);
        expect(found.pulses.length, `seed ${seed}`).toBe(1);
        const within = (value: number, spread: Spread | undefined, slack: number) => {
          const { min, max } = rangeOf(spread);
          expect(value >= min * (1 - slack) - 1e-6 && value <= max * (1 + slack) + 1e-6, `seed ${seed}: ${value} in ${min}…${max}`).toBe(true);
        };
        within(found.pulses[0]!.widthS, outcome.trigger.pulseS, 2e-3);
        if (found.envelope) within(found.envelope.peakV, outcome.envelope?.activeV, 2e-3);
      }
    }
    expect(good).toBeGreaterThan(60);
  });
});
