import { describe, expect, it } from "vitest";
import type { ConditionerSpec } from "@/lib/core/electrics/conditioner/conditioner-types";
import { Follower } from "@/lib/core/electrics/conditioner/follower";
import { DIODE_A, DIODE_OHM, DiodeBranch, junctionAt } from "@/lib/core/electrics/conditioner/junctions";
import { settleCircuit } from "@/lib/core/electrics/conditioner/settle-circuit";
import { solveCircuit } from "@/lib/core/electrics/conditioner/solve-circuit";
import { Step, stepRosenbrock, type Moment } from "@/lib/core/electrics/conditioner/step-rosenbrock";
import { randomConditioner } from "../../../factories/conditioner";

/** The contract's own example (electrics §3). */
const example: ConditionerSpec = {
  supply: { highV: 9, lowV: 0 }, pad: { kind: "resistive", restOhm: 47e3, hitOhm: 9100, leg: "upper" }, strike: { riseS: 1e-3, holdS: 5e-3, fallS: 30e-3 },
  divider: { ohm: 10e3 }, coupling: { farad: 1e-7, ohm: 22e3 }, threshold: { topOhm: 100e3, potOhm: 10e3, bottomOhm: 1e3, turn: 0.5 },
  comparator: { highDropV: 1.5, lowDropV: 0.02, limitA: 0.02 }, output: { seriesOhm: 2200, shuntOhm: 4700 }, envelope: null, load: { ohm: 100e3 },
};
const solve = (change: Partial<ConditionerSpec> = {}, whole = false) => solveCircuit(settleCircuit({ ...example, ...change }), whole);
/** A divider so stiff, and a coupling so light, that each stage is the textbook's. */
const stiff = (change: Partial<ConditionerSpec> = {}): Partial<ConditionerSpec> => ({ divider: { ohm: 1 }, ...change });

describe("devices", () => {
  it.each([[1e-4, 0.47989], [1e-3, 0.58474], [1e-2, 0.69419]])("1N4148 at %f A: %f V at 27 °C (run in ngspice 39, sources §5)", (ampere, volt) => {
    expect(junctionAt(ampere) + ampere * DIODE_OHM).toBeCloseTo(volt, 4);
  });

  it("a diode behind a resistor keeps to its own equation from nanoamperes to amperes, in any order", () => {
    const diode = new DiodeBranch();
    for (const [volt, ohm] of [[0.3, 1e6], [9, 100], [0.01, 10], [1000, 1e-2 + DIODE_OHM], [0.6, 1e9], [-0.4, 1e5], [12, 1e12], [0.7, DIODE_OHM]] as const) {
      diode.solve(volt, ohm);
      const over = junctionAt(diode.ampere) + diode.ampere * ohm;
      expect(Math.abs(over - volt)).toBeLessThan(3e-5 * Math.max(1, Math.abs(volt)));
    }
    diode.solve(-5, 1e3);
    expect(diode.ampere).toBe(-DIODE_A);
  });

  it.each([[2300, 0.6653], [23e3, 0.6059]])("follower from 3 V into %d Ω drops %f V (run in ngspice, sources §5)", (ohm, drop) => {
    const follower = new Follower(9, ohm);
    follower.solve(3);
    expect(3 - follower.emitterV).toBeCloseTo(drop, 2);
    expect(Math.abs(3 - follower.emitterV - drop)).toBeLessThan(0.003);
  });
});

describe("the stepper", () => {
  /** y′ = −2y + cos t, whose answer is known: order 3 divides the error by 8 where the step is halved. */
  it("is of third order on an equation driven by time", () => {
    const moment: Moment = { f: 0, slope: 0, drift: 0, look(t, y) { this.f = -2 * y + Math.cos(t); this.slope = -2; this.drift = -Math.sin(t); } };
    const errorWith = (count: number) => {
      const step = new Step();
      let y = 1;
      for (let i = 0; i < count; i += 1) {
        const t = (i * 2) / count;
        moment.look(t, y);
        stepRosenbrock(moment, t, y, 2 / count, moment.f, moment.slope, moment.drift, step);
        y = step.y;
      }
      return Math.abs(y - ((2 * Math.cos(2) + Math.sin(2)) / 5 + (1 - 2 / 5) * Math.exp(-4)));
    };
    expect(errorWith(32) / errorWith(64)).toBeGreaterThan(7);
    expect(errorWith(64) / errorWith(128)).toBeLessThan(9);
  });

  it("stays put on an equation a million times faster than its step", () => {
    const moment: Moment = { f: 0, slope: 0, drift: 0, look(_t, y) { this.f = -1e9 * (y - 3); this.slope = -1e9; this.drift = 0; } };
    const step = new Step();
    moment.look(0, 0);
    stepRosenbrock(moment, 0, 0, 1e-3, moment.f, moment.slope, moment.drift, step);
    expect(step.y).toBeCloseTo(3, 4);
  });
});

describe("hand checks (electrics §5, sources §2)", () => {
  it("50 kΩ over 10 kΩ at 9 V, hit to 10 kΩ, hardly loaded: 1.5 V and 4.5 V (divider rule)", () => {
    const light = solve({ pad: { kind: "resistive", restOhm: 50e3, hitOhm: 10e3, leg: "upper" }, coupling: { farad: 1e-12, ohm: 1e9 } });
    expect(light.padRestV).toBeCloseTo(1.5, 9);
    expect(light.padHitV).toBeCloseTo(4.5, 2);
  });

  it("the same pad in the lower leg: 7.5 V and 4.5 V", () => {
    const light = solve({ pad: { kind: "resistive", restOhm: 50e3, hitOhm: 10e3, leg: "lower" }, coupling: { farad: 1e-12, ohm: 1e9 } });
    expect(light.padRestV).toBeCloseTo(7.5, 9);
    expect(light.padHitV).toBeCloseTo(4.5, 2);
  });

  // 5 V step: a 1 Ω pad against a 1 Ω divider from 10 V, 10 nF·100 kΩ; electrics §5, sources §2: RC·ln(V/V_th).
  it.each([[2.5, 0.693147e-3], [1, 1.609438e-3]])("a CR step of 5 V stays above %f V for %f s", (tripV, widthS) => {
    const step = solve(stiff({
      supply: { highV: 10, lowV: 0 }, pad: { kind: "resistive", restOhm: 1e9, hitOhm: 1, leg: "upper" }, strike: { riseS: 0, holdS: 0.02, fallS: 0.01 },
      coupling: { farad: 1e-8, ohm: 1e5 }, threshold: { topOhm: 10e3 - tripV * 1e3, potOhm: 0, bottomOhm: tripV * 1e3, turn: 0 },
    }));
    expect(step.shapedPeakV).toBeCloseTo(5, 3);
    expect(step.pulses).toHaveLength(1);
    expect(step.pulses[0]!.startS).toBeLessThan(1e-6);
    expect(Math.abs(step.pulses[0]!.widthS / widthS - 1)).toBeLessThan(2e-3);
  });

  it("a ramp of 5 V in 2 ms through τ = 1 ms peaks at 2.161662 V and is above 1.5 V for 1.449121 ms (arithmetic and ngspice, sources §2)", () => {
    // A pad whose conductance goes straight, against one far more conductive, is a straight ramp: 1 kV·g/(g + G) with g ≪ G.
    const ramp = solve({
      supply: { highV: 1000, lowV: 0 }, pad: { kind: "resistive", restOhm: 1e12, hitOhm: 199, leg: "upper" }, strike: { riseS: 2e-3, holdS: 0.02, fallS: 0.01 },
      divider: { ohm: 1 }, coupling: { farad: 1e-8, ohm: 1e5 }, threshold: { topOhm: 998_500, potOhm: 0, bottomOhm: 1500, turn: 0 },
      comparator: { ...example.comparator, limitA: 1 },
    });
    expect(Math.abs(ramp.shapedPeakV / 2.161662 - 1)).toBeLessThan(3e-3);
    expect(Math.abs(ramp.pulses[0]!.widthS / 1.449121e-3 - 1)).toBeLessThan(5e-3);
  });

  it("trigger levels: (9 − 1.5 V) and 20 mV over 2.2 kΩ into 4.7 kΩ ∥ 100 kΩ (divider rule)", () => {
    const share = (4700 * 100e3) / (4700 + 100e3) / ((4700 * 100e3) / (4700 + 100e3) + 2200);
    const found = solve();
    expect(found.activeV).toBeCloseTo(7.5 * share, 9);
    expect(found.restV).toBeCloseTo(0.02 * share, 9);
    expect(found.sourceOhm).toBeCloseTo((2200 * 4700) / 6900, 6);
    expect(found.thresholdV).toBeCloseTo((9 * 6) / 111, 9);
  });
});

describe("the comparator's output", () => {
  it("stops at its limit: 1 mA into 2.2 kΩ + 4.5 kΩ lifts the output to 1 mA × 4.5 kΩ", () => {
    const loadOhm = 1 / (1 / 4700 + 1 / 100e3);
    const limited = solve({ comparator: { ...example.comparator, limitA: 1e-3 } });
    expect(limited.fires).toBe(true);
    expect(limited.activeV).toBeCloseTo(1e-3 * loadOhm, 9);
  });

  it("never fires where the limit keeps the trigger below half its level", () => {
    const starved = solve({ comparator: { ...example.comparator, limitA: 0.4e-3 } });
    expect(starved.tripped).toBe(true);
    expect(starved.fires).toBe(false);
    expect(starved.pulses).toEqual([]);
  });

  it("is held down while the envelope fills, and then rises", () => {
    const free = solve();
    const held = solve({ envelope: { seriesOhm: 100, farad: 1e-6, ohm: 100e3, emitterOhm: 10e3 } });
    expect(held.pulses[0]!.startS).toBeGreaterThan(free.pulses[0]!.startS + 40e-6);
    const [end, freeEnd] = [held, free].map(({ pulses }) => pulses[0]!.startS + pulses[0]!.widthS);
    expect(end).toBeCloseTo(freeEnd!, 9);
  });

  it("a slew of 10 kV/s takes the half swing's time to reach the half level", () => {
    const [ideal, slewed] = [solve(), solve({ comparator: { ...example.comparator, slewVperS: 1e4 } })];
    const halfS = (9 - 1.5 - 0.02) / 2 / 1e4;
    expect(slewed.pulses[0]!.startS - ideal.pulses[0]!.startS).toBeCloseTo(halfS, 9);
    expect(slewed.pulses[0]!.widthS).toBeCloseTo(ideal.pulses[0]!.widthS, 9);
  });

  it("rests high, and never fires, with the threshold at or below its offset", () => {
    for (const offsetV of [0, 0.005]) {
      const high = solve({ threshold: { topOhm: 100e3, potOhm: 10e3, bottomOhm: 0, turn: 0 }, comparator: { ...example.comparator, offsetV } });
      expect(high).toMatchObject({ fires: false, restsHigh: true, pulses: [] });
      expect(high.restV).toBeCloseTo(high.activeV, 12);
    }
  });

  it("gives the settled level where it does not fire", () => {
    const silent = solve({ pad: { kind: "resistive", restOhm: 47e3, hitOhm: 46e3, leg: "upper" } });
    expect(silent.fires).toBe(false);
    expect(silent.activeV).toBeCloseTo(solve().activeV, 9);
  });

  it("stays high after the hit where hysteresis is wider than the threshold", () => {
    const latched = solve({ comparator: { ...example.comparator, hysteresisV: 2 } });
    expect(latched.latches).toBe(true);
  });
});

describe("captured strikes", () => {
  it("the corners of a plain strike as a capture give the same answer", () => {
    const plain = solve();
    const captured = solve({ strike: { samples: [[0, 47e3], [1e-3, 9100], [6e-3, 9100], [36e-3, 47e3]] } });
    expect(captured.padHitV).toBeCloseTo(plain.padHitV, 9);
    expect(captured.pulses).toHaveLength(1);
    expect(captured.pulses[0]!.widthS).toBeCloseTo(plain.pulses[0]!.widthS, 9);
  });

  it("a later start moves every pulse by as much", () => {
    const moved = solve({ strike: { samples: [[2, 47e3], [2.001, 9100], [2.006, 9100], [2.036, 47e3]] } });
    expect(moved.pulses[0]!.startS - 2).toBeCloseTo(solve().pulses[0]!.startS, 9);
  });

  it("10,000 samples are solved in well under a second", () => {
    const samples = Array.from({ length: 10_000 }, (_, i) => [i * 1e-5, 9100 + 30e3 * Math.abs(Math.sin(i * 0.37)) + (i % 7) * 10] as const);
    const startedMs = performance.now();
    expect(solve({ strike: { samples } }, true).trace!.timeS.length).toBeLessThan(600);
    expect(performance.now() - startedMs).toBeLessThan(1000);
  });
});

describe("short cuts and symmetries (300 random circuits)", () => {
  const circuits = Array.from({ length: 300 }, (_, seed) => settleCircuit(randomConditioner(seed)));

  it("following everything to its end changes nothing", () => {
    for (const circuit of circuits) {
      const [short, whole] = [solveCircuit(circuit), solveCircuit(circuit, true)];
      expect(short.pulses.length).toBe(whole.pulses.length);
      expect(Math.abs(short.padHitV - whole.padHitV)).toBeLessThan(1e-3);
      expect(Math.abs(short.activeV - whole.activeV)).toBeLessThan(1e-3);
      short.pulses.forEach((pulse, i) => expect(Math.abs(pulse.widthS - whole.pulses[i]!.widthS)).toBeLessThan(2e-6 + 1e-4 * pulse.widthS));
    }
  });

  it("a thousand times slower with a thousand times the capacitors is the same circuit", () => {
    for (const circuit of circuits) {
      const { strike, envelope } = circuit;
      const slow = solveCircuit({
        ...circuit,
        couplingF: circuit.couplingF * 1000,
        slewVperS: circuit.slewVperS / 1000,
        envelope: envelope && { ...envelope, farad: envelope.farad * 1000 },
        strike: "samples" in strike ? { samples: strike.samples.map(([s, ohm]) => [s * 1000, ohm] as const) } : { riseS: strike.riseS * 1000, holdS: strike.holdS * 1000, fallS: strike.fallS * 1000 },
      });
      const fast = solveCircuit(circuit);
      expect(slow.pulses.length).toBe(fast.pulses.length);
      slow.pulses.forEach((pulse, i) => expect(Math.abs(pulse.widthS / 1000 / fast.pulses[i]!.widthS - 1)).toBeLessThan(1e-3));
      expect(Math.abs(slow.shapedPeakV - fast.shapedPeakV)).toBeLessThan(1e-3);
    }
  });
});
