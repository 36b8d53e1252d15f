/** One equation y′ = f(t, y), looked at in one moment. */
export interface Moment {
  /** f, its slope ∂f/∂y and its drift ∂f/∂t, as of the last look. */
  f: number;
  slope: number;
  drift: number;
  look(timeS: number, y: number): void;
}

/** What one step came to. */
export class Step {
  y = NaN;
  error = NaN;
}

/**
 * One step of RODAS3: order 3 with an error estimate of order 2, L-stable and stiffly accurate, so that a step may be far
 * longer than the circuit's own time constants; three looks a step, no equation to iterate.
 * Source: Sandu, Verwer, Blom, Spee, Carmichael, Potra, Atmos. Environ. 31 (1997); coefficients from memory, the order is tested.
 * @param f slope drift at the step's start.
 */
export function stepRosenbrock(moment: Moment, timeS: number, y: number, h: number, f: number, slope: number, drift: number, out: Step): void {
  const w = 1 / (2 / h - slope);
  const k1 = (f + 0.5 * h * drift) * w;
  const k2 = (f + (4 / h) * k1 + 1.5 * h * drift) * w;
  const third = y + 2 * k1;
  moment.look(timeS + h, third);
  const k3 = (moment.f + (k1 - k2) / h) * w;
  const fourth = third + k3;
  moment.look(timeS + h, fourth);
  const k4 = (moment.f + (k1 - k2 - (8 / 3) * k3) / h) * w;
  out.y = fourth + k4;
  out.error = k4 < 0 ? -k4 : k4;
}

/** Length of the next step from the last one's error. */
export function nextStep(h: number, error: number, tolerance: number): number {
  if (!(error < 1e9 * tolerance)) return h * 0.1;
  const factor = 0.85 * Math.cbrt(tolerance / (error + 1e-300));
  return h * (factor > 5 ? 5 : factor < 0.1 ? 0.1 : factor);
}
