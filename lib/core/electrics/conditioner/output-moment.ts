import type { Circuit } from "./conditioner-types";
import { DIODE_A, DIODE_OHM, DiodeBranch, junctionAt } from "./junctions";
import { Follower } from "./follower";
import type { Moment } from "./step-rosenbrock";

type Envelope = NonNullable<Circuit["envelope"]>;

/**
 * Comparator, trigger branch and envelope at one moment; the state is the voltage on the envelope's capacitor. The
 * comparator is a source of its wanted level that turns into a source of current at its limit, for both branches together.
 */
export class OutputMoment implements Moment {
  f = 1e-300;
  slope = 1e-300;
  drift = 1e-300;
  /** Comparator's output, V. */
  outV = 1e-300;
  private startS = 1e-300;
  private wantedV = 1e-300;
  private wantedRate = 1e-300;
  private readonly diode = new DiodeBranch();
  readonly follower: Follower;
  private readonly seriesOhm: number;

  constructor(private readonly circuit: Circuit, private readonly envelope: Envelope) {
    this.follower = new Follower(circuit.highV, envelope.emitterOhm);
    this.seriesOhm = envelope.seriesOhm + DIODE_OHM;
  }

  /** From here on the comparator wants this level, changing at this rate (its slew). */
  want(startS: number, volt: number, rate: number): void {
    this.startS = startS;
    this.wantedV = volt;
    this.wantedRate = rate;
  }

  /** Capacitor voltage at which the limit lets the comparator just reach a level; −Infinity: always, Infinity: never. */
  capacitorReaching(outV: number): number {
    const left = this.circuit.limitA - outV * this.circuit.triggerS;
    if (left <= -DIODE_A) return Infinity;
    return outV - left * this.seriesOhm - junctionAt(left);
  }

  look(timeS: number, capacitorV: number): void {
    const { diode, seriesOhm, follower } = this;
    const { triggerS, limitA, sinkA } = this.circuit;
    let out = this.wantedV + this.wantedRate * (timeS - this.startS);
    let rate = this.wantedRate;
    diode.solve(out - capacitorV, seriesOhm);
    const total = out * triggerS + diode.ampere;
    let into = diode.ampere;
    let siemens = diode.siemens;
    if (total > limitA || total < -sinkA) {
      const limit = total > limitA ? limitA : -sinkA;
      rate = 0;
      if (triggerS > 0) {
        diode.solve(limit / triggerS - capacitorV, seriesOhm + 1 / triggerS);
        into = diode.ampere;
        siemens = diode.siemens;
        out = (limit - into) / triggerS;
      } else {
        into = Math.max(limit, -DIODE_A);
        siemens = 0;
        if (limit > 0) out = capacitorV + limit * seriesOhm + junctionAt(limit);
      }
    }
    follower.solve(capacitorV);
    const { farad, ohm } = this.envelope;
    this.f = (into - capacitorV / ohm - follower.baseA) / farad;
    this.slope = (-siemens - 1 / ohm - follower.baseSiemens) / farad;
    this.drift = (siemens * rate) / farad;
    this.outV = out;
  }

  /** The voltage at which the capacitor stays with the comparator held at a level: bisection guarding Newton, as f falls with the voltage. */
  settledV(wantedV: number): number {
    this.want(0, wantedV, 0);
    let low = Math.min(0, wantedV) - 1;
    let high = Math.max(0, wantedV) + 1;
    let volt = Math.max(0, wantedV - 0.5);
    for (let i = 0; i < 200; i += 1) {
      this.look(0, volt);
      if (this.f > 0) low = volt;
      else high = volt;
      const next = volt - this.f / this.slope;
      const guarded = next > low && next < high ? next : (low + high) / 2;
      if (Math.abs(guarded - volt) < 1e-10) break;
      volt = guarded;
    }
    return volt;
  }
}
