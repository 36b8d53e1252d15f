import { DIODE_OHM, DiodeBranch } from "../conditioner/junctions";
import type { Moment } from "../conditioner/step-rosenbrock";
import type { PiezoSpec } from "./piezo-types";

/**
 * A struck disc into its bleed resistor and, behind a series resistor, a comparator's input clamped by a diode to 0 V and
 * one to the clamp's rail. The state is the disc's terminal voltage v: C·(ė − v̇) is what bleed and clamps take.
 */
export class DiscMoment implements Moment {
  f = 1e-300;
  slope = 1e-300;
  drift = 1e-300;
  /** At the comparator, V. */
  inputV = 1e-300;
  inputRate = 1e-300;
  /** Through the conducting clamp, A. */
  clampA = 1e-300;
  private readonly up = new DiodeBranch();
  private readonly down = new DiodeBranch();

  constructor(private readonly spec: PiezoSpec) {}

  /** Open-circuit voltage: a sine that dies away, from nothing. */
  openV(timeS: number): number {
    const { peakV, ringHz, decayS } = this.spec.disc;
    return timeS <= 0 ? 0 : peakV * Math.exp(-timeS / decayS) * Math.sin(2 * Math.PI * ringHz * timeS);
  }

  look(timeS: number, v: number): void {
    const { disc, bleedOhm, clamp } = this.spec;
    const omega = 2 * Math.PI * disc.ringHz;
    const fade = timeS < 0 ? 0 : disc.peakV * Math.exp(-timeS / disc.decayS);
    const [sin, cos] = [Math.sin(omega * timeS), Math.cos(omega * timeS)];
    const openRate = fade * (omega * cos - sin / disc.decayS);
    const openBend = fade * ((1 / disc.decayS ** 2 - omega * omega) * sin - (2 * omega * cos) / disc.decayS);
    let taken = v / bleedOhm;
    let siemens = 1 / bleedOhm;
    let into = 0;
    let share = 1;
    if (clamp) {
      const ohm = clamp.seriesOhm + DIODE_OHM;
      this.up.solve(v - clamp.highV, ohm);
      this.down.solve(-v, ohm);
      into = this.up.ampere - this.down.ampere;
      const through = this.up.siemens + this.down.siemens;
      taken += into;
      siemens += through;
      share = 1 - through * clamp.seriesOhm;
    }
    this.f = openRate - taken / disc.farad;
    this.slope = -siemens / disc.farad;
    this.drift = openBend;
    this.inputV = v - into * (clamp?.seriesOhm ?? 0);
    this.inputRate = this.f * share;
    this.clampA = into;
  }
}
