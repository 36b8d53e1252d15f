import type { Circuit } from "./conditioner-types";
import { DIODE_A, DIODE_OHM, DiodeBranch } from "./junctions";
import type { Moment } from "./step-rosenbrock";

/** Above this the clamp passes its saturation current and nothing more, to one part in a hundred of that, V. */
export const BLOCKED_V = 0.2;

/**
 * Pad, divider, coupling capacitor, its resistor and the clamp, at one moment. The state is the voltage on the capacitor;
 * everything else follows from it: pad and divider are a source e behind r, and i flows through the capacitor into the
 * resistor and out of the clamp, e − v − s = r·i, i = s/R − I_d(−s).
 */
export class ShaperMoment implements Moment {
  f = 1e-300;
  slope = 1e-300;
  drift = 1e-300;
  /** Shaped level and its rate; pad level and its rate. */
  shapedV = 1e-300;
  shapedRate = 1e-300;
  padV = 1e-300;
  padRate = 1e-300;
  /** Of the source, Ω. */
  sourceOhm = 1e-300;
  private startS = 1e-300;
  private siemens = 1e-300;
  siemensRate = 1e-300;
  private readonly clamp = new DiodeBranch();
  private readonly fixed: number;

  constructor(private readonly circuit: Circuit) {
    this.fixed = 1 / circuit.dividerOhm;
  }

  /** From here on the pad's conductance goes straight. */
  enter(startS: number, siemens: number, rate: number): void {
    this.startS = startS;
    this.siemens = siemens;
    this.siemensRate = rate;
  }

  /** Time in which the source would change by as much as it is, s. */
  sourceScaleS(): number {
    return (this.siemens + this.fixed) / Math.abs(this.siemensRate);
  }

  /** Level of the unloaded divider, V. */
  openV(): number {
    return (this.circuit.highV * (this.circuit.leg === "upper" ? this.siemens : this.fixed)) / (this.siemens + this.fixed);
  }

  look(timeS: number, capacitorV: number): void {
    const { highV, couplingOhm, couplingF, leg } = this.circuit;
    const { fixed, siemensRate } = this;
    const siemens = this.siemens + siemensRate * (timeS - this.startS);
    const r = 1 / (siemens + fixed);
    const upper = leg === "upper";
    const over = highV * (upper ? siemens : fixed) * r - capacitorV;
    const share = couplingOhm / (couplingOhm + r);
    let shaped = (over - DIODE_A * r) * share;
    let ampere = shaped / couplingOhm + DIODE_A;
    let into = 1 / couplingOhm;
    if (shaped < BLOCKED_V) {
      // Seen from the clamp: −over·share behind r ∥ R and its own resistance.
      this.clamp.solve(-over * share, r * share + DIODE_OHM);
      shaped = over * share + this.clamp.ampere * r * share;
      ampere = shaped / couplingOhm - this.clamp.ampere;
      // The branch's own conductance, without r ∥ R.
      into += this.clamp.siemens / (1 - this.clamp.siemens * r * share);
    }
    const gain = 1 / (1 + r * into);
    const sourceRate = (upper ? highV : -highV) * fixed * siemensRate * r * r + siemensRate * r * r * ampere;
    this.f = ampere / couplingF;
    this.slope = (-into * gain) / couplingF;
    this.drift = (into * sourceRate * gain) / couplingF;
    this.shapedV = shaped;
    this.shapedRate = (sourceRate - this.f) * gain;
    this.padV = capacitorV + shaped;
    this.padRate = this.f + this.shapedRate;
    this.sourceOhm = r;
  }
}
