import type { Finding } from "../conditioner-types";
import { isSound, tryFigures, volts, type Scene } from "./scene";

/** A 9 V battery over its life: 9.6 V new, 6 V done (electrics §3). */
const BATTERY = { newV: 9.6, doneV: 6 };
/** What one published modular specification asks of a gate to be on (sources §3; practice). */
const GATE_ON_V = 2;
const ROUNDS = 24;

/** The lowest supply at which a single-supply circuit still fires, and at which its output still counts. */
export function findLowestSupply(scene: Scene): Finding[] {
  const { circuit, solution } = scene;
  if (circuit.lowV !== 0 || circuit.highV < BATTERY.doneV - 0.5 || circuit.highV > BATTERY.newV + 0.5 || !isSound(solution)) return [];
  const at = (highV: number) => tryFigures(scene, { "supply.highV": highV });
  const least = (works: (highV: number) => boolean) => {
    let [low, high] = [0.2, circuit.highV];
    if (!works(high)) return null;
    for (let i = 0; i < ROUNDS; i += 1) {
      const middle = (low + high) / 2;
      if (works(middle)) high = middle;
      else low = middle;
    }
    return high;
  };
  const room = (highV: number) => {
    const settled = at(highV);
    return settled.circuit.outHighV > settled.circuit.outLowV ? settled.solution : null;
  };
  const firesV = least((highV) => { const found = room(highV); return found !== null && isSound(found); });
  if (firesV === null) return [];
  const levelV = least((highV) => { const found = room(highV); return found !== null && isSound(found) && found.activeV >= GATE_ON_V; });
  const done = at(BATTERY.doneV).solution;
  const says = levelV === null ? `its output never comes to ${volts(GATE_ON_V)}` : `its output stays above ${volts(GATE_ON_V)}, a usual gate threshold, down to ${volts(levelV)}`;
  const end = isSound(done) ? `with the battery down to 6 V it gives ${volts(done.activeV)}` : "with the battery down to 6 V it no longer gives one clean pulse";
  return [{ code: "battery", text: `Pad and threshold follow the supply together, so this hit fires it down to ${volts(firesV)}; ${says}; ${end}. The voice it plays is usually what gives out first.` }];
}
