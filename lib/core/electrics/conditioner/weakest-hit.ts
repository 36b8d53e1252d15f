import type { Circuit } from "./conditioner-types";
import { solveCircuit } from "./solve-circuit";

/** Hits up to this many times as strong (in conductance) are tried where the given one does not fire. */
const STRONGEST = 1e6;
const ROUNDS = 30;
const CLOSE = 2e-4;

/**
 * The greatest struck resistance that still fires, Ω: the weakest hit of the same shape. A captured strike is scaled
 * as a whole, and its resistance at the deepest point is told. Null where no hit fires.
 */
export function weakestHit(circuit: Circuit): number | null {
  const rest = "samples" in circuit.strike ? 1 / (circuit.strike.samples[0]?.[1] ?? circuit.restOhm) : 1 / circuit.restOhm;
  const depth = ("samples" in circuit.strike ? Math.max(...circuit.strike.samples.map(([, ohm]) => 1 / ohm)) : 1 / circuit.hitOhm) - rest;
  const bare: Circuit = { ...circuit, envelope: null };
  const fires = (share: number) => solveCircuit(scaled(bare, rest, depth, share)).fires && (circuit.envelope === null || solveCircuit(scaled(circuit, rest, depth, share)).fires);
  if (circuit.tripV <= 0 || depth === 0) return null;
  let high = 1;
  if (!fires(1)) {
    // A hit that raises the pad's resistance cannot be stronger than an open circuit.
    const most = depth > 0 ? STRONGEST : (0.999 * rest) / -depth;
    if (most <= 1) return null;
    while (!fires(high)) {
      if (high >= most) return null;
      high = Math.min(most, high * 4);
    }
  }
  let low = high > 1 ? high / 4 : 1e-6;
  if (fires(low)) return 1 / (rest + low * depth);
  for (let i = 0; i < ROUNDS && high / low > 1 + CLOSE; i += 1) {
    const middle = Math.sqrt(low * high);
    if (fires(middle)) high = middle;
    else low = middle;
  }
  return 1 / (rest + high * depth);
}

function scaled(circuit: Circuit, rest: number, depth: number, share: number): Circuit {
  const { strike } = circuit;
  if (!("samples" in strike)) return { ...circuit, hitOhm: 1 / (rest + share * depth) };
  const samples = strike.samples.map(([s, ohm]) => [s, 1 / Math.max(1e-18, rest + share * (1 / ohm - rest))] as const);
  return { ...circuit, strike: { samples } };
}
