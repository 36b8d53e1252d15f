/** Thermal voltage at 27 °C, V: kT/q with k = 1.380649e-23, q = 1.602176634e-19, T = 300.15 K. */
const THERMAL_V = (1.380649e-23 * 300.15) / 1.602176634e-19;

/** 1N4148: saturation current, emission coefficient, series resistance. Source: electrics §3; the model of many public files. */
const DIODE = { isA: 2.52e-9, n: 1.752, rsOhm: 0.568 };
const DIODE_NV = DIODE.n * THERMAL_V;

/** 2N3904-like follower. Source: electrics §3 (Fairchild's model). */
const NPN = { isA: 6.734e-15, bf: 416.4, iseA: 6.734e-15, ne: 1.259, vafV: 74, ikfA: 66.78e-3 };

const STEPS = 60;

/**
 * Current through a diode with a resistor in series, A, for the voltage over both.
 * @param volt anode end minus cathode end.
 * @param ohm extra resistance in series with the diode's own.
 * Source: Shockley's equation, solved by Newton on the junction voltage.
 */
export function diodeCurrent(volt: number, ohm: number): number {
  if (volt < -0.5) return -DIODE.isA;
  const total = ohm + DIODE.rsOhm;
  // Start on the resistive side where much current flows, on the exponential side where little does.
  let junction = Math.min(volt, DIODE_NV * Math.log(Math.max(volt, 0) / (total * DIODE.isA) + 1) || volt);
  for (let i = 0; i < STEPS; i += 1) {
    const exp = Math.exp(Math.min(junction / DIODE_NV, 200));
    const current = DIODE.isA * (exp - 1);
    const slope = 1 + (total * DIODE.isA * exp) / DIODE_NV;
    const step = (volt - junction - total * current) / slope;
    junction += step;
    if (Math.abs(step) < 1e-13) break;
  }
  return DIODE.isA * (Math.exp(junction / DIODE_NV) - 1);
}

/** Base and emitter current of the follower for its junction voltages, A. Source: Gummel–Poon, forward half. */
function npnCurrents(vbe: number, vbc: number): { base: number; emitter: number } {
  const forward = NPN.isA * (Math.exp(Math.min(vbe / THERMAL_V, 80)) - 1);
  const leak = NPN.iseA * (Math.exp(Math.min(vbe / (NPN.ne * THERMAL_V), 80)) - 1);
  const q1 = 1 / (1 - vbc / NPN.vafV);
  const qb = (q1 / 2) * (1 + Math.sqrt(1 + (4 * Math.max(forward, 0)) / NPN.ikfA));
  const transport = (forward - NPN.isA * (Math.exp(Math.min(vbc / THERMAL_V, 80)) - 1)) / qb;
  const base = forward / NPN.bf + leak;
  return { base, emitter: transport + base };
}

/**
 * Emitter voltage and base current of the follower.
 * @param baseV voltage on the envelope capacitor. @param highV its collector. @param emitterOhm to 0 V.
 */
export function follower(baseV: number, highV: number, emitterOhm: number): { emitterV: number; baseA: number } {
  let low = Math.min(0, baseV) - 0.1;
  let high = Math.max(baseV, 0) + 0.01;
  let emitterV = Math.max(0, baseV - 0.6);
  const vbc = baseV - highV;
  for (let i = 0; i < STEPS; i += 1) {
    const excess = npnCurrents(baseV - emitterV, vbc).emitter - emitterV / emitterOhm;
    if (excess > 0) low = emitterV;
    else high = emitterV;
    const near = npnCurrents(baseV - emitterV - 1e-6, vbc).emitter - (emitterV + 1e-6) / emitterOhm;
    const slope = (near - excess) / 1e-6;
    let next = emitterV - excess / slope;
    if (!(next > low && next < high)) next = (low + high) / 2;
    if (Math.abs(next - emitterV) < 1e-12) break;
    emitterV = next;
  }
  return { emitterV, baseA: npnCurrents(baseV - emitterV, vbc).base };
}
