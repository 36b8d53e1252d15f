import fc from "fast-check";
import { beforeAll, describe, expect, it } from "vitest";
import { checkConnection } from "@/lib/core/electrics/check-connection";
import type { ConnectionCheck } from "@/lib/core/electrics/connection-types";
import type { Input, Output } from "@/lib/core/electrics/jacks";
import { toRange, type Range, type Spread } from "@/lib/core/units/spread";
import { corners, ends } from "../unit/core/electrics/connection-oracle";
import { spiceCrossings, spiceLevels, type Circuit, type Element } from "./connection-spice";

/**
 * Never a false good: whatever the check calls good (or tight) is built in ngspice at every corner of its spreads, at rest
 * and active, and must cross its thresholds and stay within its limits there.
 */
const PAIRINGS = 2000;

interface Pairing { outputs: Output[]; inputs: Input[]; check: ConnectionCheck }

const round3 = (value: number) => Number(value.toPrecision(3));
const volt = (min: number, max: number): fc.Arbitrary<Spread> => {
  const level = fc.double({ min, max, noNaN: true }).map((v) => Math.round(v * 100) / 100);
  return fc.oneof({ weight: 2, arbitrary: level }, { weight: 1, arbitrary: fc.tuple(level, fc.constantFrom(0.02, 0.1)).map(([nominal, tol]) => ({ nominal, tol })) });
};
const ohm = (decades: [number, number]): fc.Arbitrary<Spread> => {
  const value = fc.double({ min: decades[0], max: decades[1], noNaN: true }).map((e) => round3(10 ** e));
  return fc.oneof({ weight: 1, arbitrary: value }, { weight: 2, arbitrary: fc.tuple(value, fc.constantFrom(0.05, 0.2)).map(([nominal, tol]) => ({ nominal, tol })) });
};
const inputArb = (id: string): fc.Arbitrary<Input> => fc.record({
  polarity: fc.constantFrom<("rising" | "falling")[]>("rising", "rising", "falling"),
  onV: fc.tuple(fc.double({ min: 0.5, max: 4, noNaN: true }), fc.double({ min: 0, max: 1, noNaN: true })).map(([a, w]) => ({ min: round3(a), max: round3(a + w) })),
  loadOhm: ohm([3.5, 6]), biasV: fc.oneof({ weight: 3, arbitrary: fc.constant<Spread>(0) }, { weight: 1, arbitrary: volt(0, 5) }),
  safeV: fc.constantFrom({ min: -0.5, max: 5.5 }, { min: -12, max: 12 }, { min: -5, max: 15 }),
  clamp: fc.option(fc.record({ lowV: fc.constant(-0.6), highV: volt(5.2, 5.8), seriesOhm: ohm([2, 4]), maxA: fc.constant(0.01) }), { nil: undefined, freq: 3 }),
}).map(({ clamp, ...rest }) => ({ id, accepts: ["trigger"], ...rest, ...(clamp ? { clamp } : {}) }));
const outputArb: fc.Arbitrary<Output> = fc.record({ restV: volt(-1, 1), activeV: volt(3, 10), sourceOhm: ohm([1.5, 4]) })
  .map((o) => ({ signal: "trigger" as const, ...o }));
/** Falling outputs rest high and go low. */
const suit = (output: Output, polarity: Output["polarity"]): Output =>
  polarity === "falling" ? { ...output, polarity, restV: output.activeV, activeV: output.restV } : output;
const pairingArb = fc.tuple(fc.array(outputArb, { minLength: 1, maxLength: 2 }), fc.array(inputArb("x"), { minLength: 1, maxLength: 2 })).map(([outs, ins]) => {
  const polarity = ins[0]?.polarity ?? "rising";
  // Several outputs join through diodes; those that pull down are left to single outputs.
  const outputs = (outs.length > 1 && polarity === "rising" ? outs.map((o) => ({ ...o, or: true })) : outs.slice(0, 1)).map((o) => suit(o, polarity));
  return { outputs, inputs: ins.map((input, i) => ({ ...input, polarity, id: `in${i}` })) };
});

function gather(): { kept: Pairing[]; tried: number } {
  const kept: Pairing[] = [];
  let tried = 0;
  for (let round = 0; kept.length < PAIRINGS; round += 1) {
    for (const { outputs, inputs } of fc.sample(pairingArb, { seed: 1000 + round, numRuns: 2000 })) {
      if (kept.length >= PAIRINGS) break;
      tried += 1;
      const check = checkConnection({ outputs, inputs }, { fixes: false });
      if (check.listeners.some((l) => l.verdict === "good")) kept.push({ outputs, inputs, check });
    }
  }
  return { kept, tried };
}

/** Which outputs are active, and what is asked of the levels then. */
interface Corner { pairing: number; state: "rest" | "active" | "alone"; circuit: Circuit; /** By input. */ diodes: (Element[] | null)[] }

function build(pairing: Pairing, index: number): Corner[] {
  const { outputs, inputs } = pairing;
  const states: { state: Corner["state"]; active: boolean[] }[] = [
    { state: "rest", active: outputs.map(() => false) },
    { state: "active", active: outputs.map(() => true) },
    ...(outputs.length > 1 ? outputs.map((_, i) => ({ state: "alone" as const, active: outputs.map((__, j) => i === j) })) : []),
  ];
  return states.flatMap(({ state, active }) => {
    const lists = [
      ...outputs.flatMap((o, i) => [ends(active[i] ? o.activeV : o.restV), ends(o.sourceOhm)]),
      ...inputs.flatMap((i) => [ends(i.loadOhm as Spread), ends(i.biasV ?? 0), ...(i.clamp ? [ends(i.clamp.highV), ends(i.clamp.seriesOhm)] : [])]),
    ];
    return [...corners(lists)].map((values): Corner => {
      let next = 0;
      const take = () => values[next++] as number;
      const circuit: Element[] = outputs.map((o): Element => ({ kind: o.or ? "or" : "source", volt: take(), ohm: take() }));
      const diodes: Corner["diodes"] = [];
      for (const input of inputs) {
        const loadOhm = take();
        circuit.push({ kind: "load", ohm: loadOhm, volt: take() });
        if (!input.clamp) {
          diodes.push(null);
          continue;
        }
        const [highV, seriesOhm] = [take(), take()];
        const pair: Element[] = [{ kind: "clamp-high", volt: highV, ohm: seriesOhm }, { kind: "clamp-low", volt: input.clamp.lowV as number, ohm: seriesOhm }];
        diodes.push(pair);
        circuit.push(...pair);
      }
      return { pairing: index, state, circuit, diodes };
    });
  });
}

describe("against ngspice, at every corner", () => {
  let kept: Pairing[] = [];
  let seen: Corner[] = [];
  let levels: number[] = [];

  beforeAll(async () => {
    const gathered = gather();
    kept = gathered.kept;
    seen = kept.flatMap(build);
    const began = performance.now();
    levels = await spiceLevels(seen.map((corner) => corner.circuit));
    const verdicts = kept.flatMap((p) => p.check.listeners.map((l) => l.verdict));
    const good = verdicts.filter((v) => v === "good").length;
    console.log(`${gathered.tried} pairings tried, ${kept.length} kept (${good} good and ${verdicts.filter((v) => v === "tight").length} tight listeners), ${seen.length} corners in ngspice, ${Math.round(performance.now() - began)} ms`);
  }, 240_000);

  it("has enough of them, and every level is a number", () => {
    expect(kept).toHaveLength(PAIRINGS);
    expect(kept.flatMap((p) => p.check.listeners).filter((l) => l.verdict === "good").length).toBeGreaterThanOrEqual(PAIRINGS);
    expect(levels).toHaveLength(seen.length);
    expect(levels.every(Number.isFinite)).toBe(true);
  });

  it("nothing called good or tight misses its threshold or passes a limit", () => {
    // Room for the simulator's own tolerance (reltol 1e-6), far below any margin that good asks for.
    const slack = 1e-4;
    const failures: string[] = [];
    seen.forEach(({ pairing, state, diodes }, i) => {
      const level = levels[i] as number;
      const { inputs, check } = kept[pairing] as Pairing;
      check.listeners.forEach((listener, place) => {
        if (listener.verdict !== "good" && listener.verdict !== "tight") return;
        const input = inputs[place] as Input;
        const on = toRange(input.onV as Spread);
        const falling = input.polarity === "falling";
        const fires = state === "rest" || (falling ? level <= on.min + slack : level >= on.max - slack);
        const releases = state !== "rest" || (falling ? level > on.max - slack : level < on.min + slack);
        const safe = input.clamp
          ? diodes[place]!.every((d) => (d.kind === "clamp-high" ? level - d.volt : d.volt - level) / d.ohm <= input.clamp!.maxA * (1 + slack))
          : level <= input.safeV!.max + slack && level >= input.safeV!.min - slack;
        if (!fires || !releases || !safe) failures.push(`${listener.verdict} at ${level} V, ${state}: ${JSON.stringify(kept[pairing]!.outputs)} ${JSON.stringify(input)}`);
      });
    });
    expect(failures.slice(0, 3)).toEqual([]);
  });

  it("the ranges are the simulator's own extremes: nothing missed, nothing overestimated", () => {
    const extremes = new Map<string, Range>();
    seen.forEach(({ pairing, state }, i) => {
      const key = `${pairing} ${state}`;
      const range = extremes.get(key) ?? { min: Infinity, max: -Infinity };
      extremes.set(key, { min: Math.min(range.min, levels[i]!), max: Math.max(range.max, levels[i]!) });
    });
    let worst = 0;
    kept.forEach(({ check }, pairing) => {
      const first = check.listeners[0]!;
      for (const [state, range] of [["active", first.highV!], ["rest", first.lowV!]] as const) {
        const simulated = extremes.get(`${pairing} ${state}`)!;
        worst = Math.max(worst, Math.abs(range.min - simulated.min), Math.abs(range.max - simulated.max));
      }
    });
    console.log(`largest difference from the simulator's extremes: ${worst.toExponential(2)} V`);
    // The contract allows 1 % or 20 mV; a resistive node should agree to the simulator's own tolerance.
    expect(worst).toBeLessThan(1e-4);
  });
});

describe("envelope widths against ngspice", () => {
  it("the width an input sees, load included, within 0.5 %", async () => {
    const nodes = fc.sample(fc.record({
      active: fc.double({ min: 4, max: 10, noNaN: true }), rest: fc.double({ min: 0, max: 0.5, noNaN: true }), decayS: fc.double({ min: 0.01, max: 0.1, noNaN: true }),
      sourceOhm: fc.constantFrom(100, 1e3, 10e3), loadOhm: fc.constantFrom(22e3, 100e3), on: fc.double({ min: 1, max: 2, noNaN: true }),
    }), { seed: 77, numRuns: 60 });
    const crossings = await spiceCrossings(nodes, 0.4, 4000);
    nodes.forEach((n, i) => {
      const { listeners } = checkConnection({
        outputs: [{ signal: "envelope", restV: n.rest, activeV: n.active, sourceOhm: n.sourceOhm, decayS: n.decayS }],
        inputs: [{ id: "e", accepts: ["envelope"], onV: n.on, safeV: { min: -12, max: 12 }, loadOhm: n.loadOhm, pulseS: { min: 1e-6 } }],
      });
      expect(Math.abs(listeners[0]!.pulseS!.min / crossings[i]! - 1)).toBeLessThan(5e-3);
    });
  });
});
