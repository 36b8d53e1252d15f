/** Thermal voltage at 27 °C, V: kT/q with k = 1.380649e-23, q = 1.602176634e-19, T = 300.15 K. */
export const THERMAL_V = (1.380649e-23 * 300.15) / 1.602176634e-19;

/** 1N4148: saturation current, A; emission voltage nV_T, V; series resistance, Ω. Source: electrics §3, the model of many public files. */
export const DIODE_A = 2.52e-9;
export const DIODE_NV = 1.752 * THERMAL_V;
export const DIODE_OHM = 0.568;

/** Further below 0 V than this a junction passes its saturation current and nothing more, to one part in 60,000. */
const BLOCKED_V = -0.5;
const MOST_ROUNDS = 100;

/** A diode in series with a resistor across a voltage; kept between calls, as the last answer is the best first guess. */
export class DiodeBranch {
  junctionV = -1e-9;
  ampere = 1e-300;
  /** Of diode and resistor together, S. */
  siemens = 1e-300;

  /**
   * Solves v = V_j + R·I_s(exp(V_j/nV_T) − 1) by Newton. The left side is convex and rising, so that from above it comes
   * down without a jump; a step up past the root is cut at the least of two upper bounds.
   * @param volt over both, V. @param ohm in series, the diode's own included.
   * Source: Shockley's equation.
   */
  solve(volt: number, ohm: number): void {
    if (volt < BLOCKED_V) {
      this.junctionV = volt;
      this.ampere = -DIODE_A;
      this.siemens = 0;
      return;
    }
    let junction = this.junctionV;
    if (!(junction > BLOCKED_V && junction <= Math.max(volt, 0.05))) junction = highestJunction(volt, ohm);
    let exp = 0;
    for (let i = 0; i < MOST_ROUNDS; i += 1) {
      exp = Math.exp(junction / DIODE_NV);
      const step = (volt - junction - ohm * DIODE_A * (exp - 1)) / (1 + (ohm * DIODE_A * exp) / DIODE_NV);
      if (step > 4 * DIODE_NV) junction = Math.min(junction + step, highestJunction(volt, ohm));
      else junction += step;
      if (step < 1e-5 && step > -1e-5) {
        // One part in 10⁷ of current is left: follow it to first order.
        exp *= 1 + step / DIODE_NV;
        break;
      }
    }
    this.junctionV = junction;
    this.ampere = DIODE_A * (exp - 1);
    const own = (DIODE_A * exp) / DIODE_NV;
    this.siemens = own / (1 + ohm * own);
  }
}

/** The resistor alone, or the junction alone, would let the junction rise to this: the lesser is nearer. */
function highestJunction(volt: number, ohm: number): number {
  if (volt <= 0 || ohm <= 0) return volt;
  return Math.min(volt, DIODE_NV * Math.log1p(volt / (ohm * DIODE_A)));
}

/** The junction's voltage at a current, V. @param ampere above −I_s. */
export function junctionAt(ampere: number): number {
  return DIODE_NV * Math.log1p(ampere / DIODE_A);
}
