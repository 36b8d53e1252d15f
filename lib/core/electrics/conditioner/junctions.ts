/** Thermal voltage at 27 °C, V: kT/q with k = 1.380649e-23, q = 1.602176634e-19, T = 300.15 K. */
export const THERMAL_V = (1.380649e-23 * 300.15) / 1.602176634e-19;

/** 1N4148: saturation current, A; emission voltage nV_T, V; series resistance, Ω. Source: electrics §3, the model of many public files. */
export const DIODE_A = 2.52e-9;
export const DIODE_NV = 1.752 * THERMAL_V;
export const DIODE_OHM = 0.568;
const PER_NV = 1 / DIODE_NV;

/** Further below 0 V than this a junction passes its saturation current and nothing more, to one part in 60,000. */
const BLOCKED_V = -0.5;
const MOST_ROUNDS = 100;

/** A last step this small leaves 10⁻⁵ of the current, which one more term of the series takes away. */
const CLOSE_V = 2e-4;

/** A diode in series with a resistor across a voltage; kept between calls, as the last answer leads to a good first guess. */
export class DiodeBranch {
  ampere = 1e-300;
  /** Of diode and resistor together, S. */
  siemens = 1e-300;
  private junctionV = -1e-9;
  private volt = 1e-300;
  private ohm = 1e-300;

  /**
   * Solves v = V_j + R·I_s(exp(V_j/nV_T) − 1) by Newton. The left side is convex and rising, so that from above it comes
   * down without a jump; a step up past the root is cut at the least of two upper bounds.
   * @param volt over both, V. @param ohm in series, the diode's own included.
   * Source: Shockley's equation.
   */
  solve(volt: number, ohm: number): void {
    if (volt < BLOCKED_V) {
      this.volt = volt;
      this.ampere = -DIODE_A;
      this.siemens = 0;
      this.junctionV = volt;
      this.ohm = ohm;
      return;
    }
    const change = volt - this.volt;
    // Near the last answer the junction takes what the resistor leaves of a change.
    let junction = change < 0.3 && change > -0.3 && ohm < 3 * this.ohm && this.junctionV > BLOCKED_V
      ? this.junctionV + change * (1 - ohm * this.siemens)
      : highestJunction(volt, ohm);
    let exp = 0;
    for (let i = 0; i < MOST_ROUNDS; i += 1) {
      exp = Math.exp(junction * PER_NV);
      const step = (volt - junction - ohm * DIODE_A * (exp - 1)) / (1 + ohm * DIODE_A * PER_NV * exp);
      junction += step;
      if (step < CLOSE_V && step > -CLOSE_V) {
        const turn = step * PER_NV;
        exp *= 1 + turn + 0.5 * turn * turn;
        break;
      }
      if (step > 4 * DIODE_NV) junction = Math.min(junction, highestJunction(volt, ohm));
    }
    this.junctionV = junction;
    this.volt = volt;
    this.ohm = ohm;
    this.ampere = DIODE_A * (exp - 1);
    const own = DIODE_A * PER_NV * exp;
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
