import { THERMAL_V } from "./junctions";

/** The follower's transistor, as in a 2N3904. Source: electrics §3 (Fairchild's model). */
const NPN = { isA: 6.734e-15, bf: 416.4, iseA: 6.734e-15, neV: 1.259 * THERMAL_V, vafV: 74, ikfA: 66.78e-3 };

const MOST_ROUNDS = 100;

/**
 * Emitter follower: base at the envelope capacitor, collector at the supply, resistor to 0 V. Forward half of the
 * Gummel–Poon model with recombination, Early effect and high injection; the collector junction never conducts here, as
 * the base stays below the supply.
 */
export class Follower {
  baseEmitterV = 1e-9;
  emitterV = 1e-300;
  baseA = 1e-300;
  /** ∂I_b/∂V_b, S. */
  baseSiemens = 1e-300;
  /** ∂V_e/∂V_b. */
  gain = 1e-300;

  constructor(private readonly collectorV: number, private readonly emitterOhm: number) {}

  /** Of the output at a level, Ω: V_T/I_E beside the resistor; the capacitor holds the base. */
  static sourceOhm(emitterV: number, emitterOhm: number): number {
    return emitterV > 0 ? 1 / (emitterV / emitterOhm / THERMAL_V + 1 / emitterOhm) : emitterOhm;
  }

  solve(baseV: number): void {
    const { collectorV, emitterOhm } = this;
    const q1 = 1 / (1 + (collectorV - baseV) / NPN.vafV);
    let vbe = this.baseEmitterV < baseV + 0.05 ? this.baseEmitterV : baseV;
    if (vbe > 1) vbe = 0.7;
    let base = 0;
    let baseSlope = 0;
    let emitterSlope = 0;
    for (let i = 0; i < MOST_ROUNDS; i += 1) {
      const exp = Math.exp(vbe / THERMAL_V);
      const leakExp = Math.exp(vbe / NPN.neV);
      const forward = NPN.isA * (exp - 1);
      const forwardSlope = (NPN.isA * exp) / THERMAL_V;
      const root = Math.sqrt(1 + (4 * (forward > 0 ? forward : 0)) / NPN.ikfA);
      const qb = 0.5 * q1 * (1 + root);
      const transport = forward / qb;
      base = forward / NPN.bf + NPN.iseA * (leakExp - 1);
      baseSlope = forwardSlope / NPN.bf + (NPN.iseA * leakExp) / NPN.neV;
      emitterSlope = (forwardSlope - (transport * q1 * forwardSlope) / (NPN.ikfA * root)) / qb + baseSlope;
      const step = (baseV - vbe - emitterOhm * (transport + base)) / (1 + emitterOhm * emitterSlope);
      vbe += step > 2 * THERMAL_V ? THERMAL_V * (1 + Math.log(step / THERMAL_V)) : step;
      if (step < 1e-5 && step > -1e-5) {
        base += baseSlope * step;
        break;
      }
    }
    this.baseEmitterV = vbe;
    this.emitterV = baseV - vbe;
    this.baseA = base;
    this.baseSiemens = baseSlope / (1 + emitterOhm * emitterSlope);
    this.gain = (emitterOhm * emitterSlope) / (1 + emitterOhm * emitterSlope);
  }
}
