import type { ConditionerSpec } from "@/lib/core/electrics/conditioner/conditioner-types";
import { seededRandom } from "@/lib/core/electrics/tolerance/seeded-random";

/** A random conditioner over every option of the contract, the same for the same seed. */
export function randomConditioner(seed: number): ConditionerSpec {
  const next = seededRandom(seed * 7919 + 13);
  const between = (low: number, high: number) => low + (high - low) * next();
  const decades = (low: number, high: number) => low * (high / low) ** next();
  const chance = (share: number) => next() < share;
  const rest = decades(15e3, 300e3);
  const hit = decades(800, 14e3);
  const strike = (): ConditionerSpec["strike"] => {
    if (chance(0.2)) {
      const pace = decades(3e-4, 4e-3);
      return { samples: Array.from({ length: 14 }, (_, i) => [i * pace, i === 0 || i > 11 ? rest : decades(hit, rest)] as const) };
    }
    return { riseS: chance(0.1) ? 0 : decades(2e-5, 2e-2), holdS: chance(0.1) ? 0 : decades(2e-4, 3e-2), fallS: decades(2e-4, 8e-2) };
  };
  const lowV = chance(0.35) ? -between(5, 15) : 0;
  return {
    supply: { highV: between(5, 15), lowV },
    pad: { kind: "resistive", restOhm: rest, hitOhm: hit, leg: chance(0.7) ? "upper" : "lower" },
    strike: strike(),
    divider: { ohm: decades(2e3, 80e3) },
    coupling: { farad: decades(5e-9, 1e-6), ohm: decades(3.3e3, 470e3) },
    threshold: { topOhm: decades(20e3, 300e3), potOhm: decades(1e3, 50e3), bottomOhm: decades(300, 5e3), turn: next() },
    comparator: {
      highDropV: chance(0.2) ? 0 : between(0, 2), lowDropV: between(0, 0.6), limitA: decades(2e-3, 5e-2),
      ...(chance(0.3) ? { sinkA: decades(1e-3, 3e-2) } : {}),
      ...(chance(0.2) ? { slewVperS: decades(2e4, 2e7) } : {}),
      ...(chance(0.2) ? { offsetV: between(-0.02, 0.02) } : {}),
      ...(chance(0.2) ? { hysteresisV: decades(2e-3, 0.1) } : {}),
    },
    output: { seriesOhm: decades(100, 10e3), shuntOhm: chance(0.5) ? decades(1e3, 47e3) : null },
    envelope: chance(0.5) ? { seriesOhm: decades(22, 4.7e3), farad: decades(5e-8, 1e-5), ohm: decades(10e3, 1e6), emitterOhm: decades(1e3, 100e3) } : null,
    load: { ohm: chance(0.2) ? null : decades(2.2e3, 1e6) },
  };
}
