import { THERMAL_V } from "./junctions";

/** The follower's transistor, as in a 2N3904. Source: electrics §3 (Fairchild's model). */
const NPN = { isA: 6.734e-15, bf: 416.4, iseA: 6.734e-15, neV: 1.259 * THERMAL_V, vafV: 74, ikfA: 66.78e-3 };

const MOST_ROUNDS = 100;
const PER_VT = 1 / THERMAL_V;
const PER_LEAK_VT = 1 / NPN.neV;
/** A last step this small leaves some 10⁻⁵ of the current. */
const CLOSE_V = 1e-4;

/**
 * Emitter follower: base at the envelope capacitor, collector at the supply, resistor to 0 V. Forward half of the
 * Gummel–Poon model with recombination, Early effect and high injection; the collector junction never conducts here, as
 * the base stays below the supply.
 */
export class Follower {
  private baseEmitterV = 1e-9;
  private baseV = -1e3;
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
    const change = baseV - this.baseV;
    // Near the last answer the junction takes what the emitter does not follow of a change.
    let vbe = change < 0.5 && change > -0.5 ? this.baseEmitterV + change * (1 - this.gain) : Math.min(baseV, 0.65);
    let base = 0;
    let baseSlope = 0;
    let emitterSlope = 0;
    for (let i = 0; i < MOST_ROUNDS; i += 1) {
      const exp = Math.exp(vbe * PER_VT);
      const leakExp = Math.exp(vbe * PER_LEAK_VT);
      const forward = NPN.isA * (exp - 1);
      const forwardSlope = NPN.isA * PER_VT * exp;
      const root = Math.sqrt(1 + (4 * (forward > 0 ? forward : 0)) / NPN.ikfA);
      const qb = 0.5 * q1 * (1 + root);
      const transport = forward / qb;
      base = forward / NPN.bf + NPN.iseA * (leakExp - 1);
      baseSlope = forwardSlope / NPN.bf + NPN.iseA * PER_LEAK_VT * leakExp;
      emitterSlope = (forwardSlope - (transport * q1 * forwardSlope) / (NPN.ikfA * root)) / qb + baseSlope;
      const step = (baseV - vbe - emitterOhm * (transport + base)) / (1 + emitterOhm * emitterSlope);
      vbe += step > 2 * THERMAL_V ? THERMAL_V * (1 + Math.log(step / THERMAL_V)) : step;
      if (step < CLOSE_V && step > -CLOSE_V) {
        base += baseSlope * step;
        break;
      }
    }
    this.baseV = baseV;
    this.baseEmitterV = vbe;
    this.emitterV = baseV - vbe;
    this.baseA = base;
    this.baseSiemens = baseSlope / (1 + emitterOhm * emitterSlope);
    this.gain = (emitterOhm * emitterSlope) / (1 + emitterOhm * emitterSlope);
  }
}
