import { preferredAbove } from "@/lib/core/units/e-series";
import type { Finding } from "../conditioner-types";
import { farads, isSound, ohms, percent, risingEdgeS, seconds, times, travel, trySettled, tryTurn, turnFor, volts, type Scene } from "./scene";

/** Common practice for a trigger's length, no source (electrics §5). */
const PRACTICE = { min: 1e-3, max: 5e-3 };
const SLIP = { least: 3, most: 30 };

/** R·C a decade off practice, where one part a decade away mends it. */
export function findDecadeSlip(scene: Scene): Finding[] {
  const { couplingF, couplingOhm } = scene.circuit;
  const rc = couplingF * couplingOhm;
  const isShort = rc < PRACTICE.min;
  const off = isShort ? PRACTICE.min / rc : rc / PRACTICE.max;
  const decade = isShort ? 10 : 0.1;
  const mended = rc * decade;
  if (off < SLIP.least || off > SLIP.most || mended < PRACTICE.min || mended > PRACTICE.max) return [];
  const text = `${farads(couplingF)} with ${ohms(couplingOhm)} is ${seconds(rc)}, ${times(off)} ${isShort ? "below" : "above"} the usual 1–5 ms; one part a decade off would do that.`;
  const tries = [
    { change: { couplingF: couplingF * decade }, part: { coupling: { farad: couplingF * decade } }, name: `${farads(couplingF * decade)} in place of ${farads(couplingF)}` },
    { change: { couplingOhm: couplingOhm * decade }, part: { coupling: { ohm: couplingOhm * decade } }, name: `${ohms(couplingOhm * decade)} in place of ${ohms(couplingOhm)}` },
  ];
  for (const { change, part, name } of tries) {
    const solution = trySettled(scene, change);
    if (isSound(solution)) return [{ code: "decade-slip", text, fix: { text: `${name} makes it ${seconds(mended)}: this hit then gives one pulse of ${seconds(solution.pulses[0]?.widthS ?? 0)}.`, ...part } }];
  }
  return [{ code: "decade-slip", text }];
}

/** A hit slower than the coupling: the capacitor follows it, and little gets through. */
export function findSlowHit(scene: Scene): Finding[] {
  const { circuit, solution } = scene;
  const rc = circuit.couplingF * circuit.couplingOhm;
  const edgeS = risingEdgeS(scene);
  const swing = Math.abs(solution.padHitV - solution.padRestV);
  if (!(edgeS > rc) || !(swing > 0)) return [];
  const through = solution.shapedPeakV / swing;
  const edge = circuit.leg === "upper" ? "The hit rises" : "The hit lets go";
  const text = `${edge} in ${seconds(edgeS)}, slower than the coupling's ${seconds(rc)}: ${percent(through)} of the pad's swing gets through.`;
  const farad = preferredAbove((2 * edgeS) / circuit.couplingOhm, "E6");
  const better = trySettled(scene, { couplingF: farad });
  const share = better.shapedPeakV / Math.abs(better.padHitV - better.padRestV);
  if (farad > 1e-4 || !isSound(better) || !(share > through * 1.1)) return [{ code: "slow-hit", text }];
  return [{ code: "slow-hit", text, fix: { text: `${farads(farad)} lets ${percent(share)} through; the pulse then lasts ${seconds(better.pulses[0]?.widthS ?? 0)}.`, coupling: { farad } } }];
}

/** Pulse upon pulse from one strike. */
export function findDoubleTrigger(scene: Scene): Finding[] {
  const { circuit, solution } = scene;
  if (solution.pulses.length < 2) return [];
  const starts = solution.pulses.slice(0, 4).map(({ startS }) => seconds(startS)).join(", ");
  const text = `One strike gives ${solution.pulses.length} pulses, at ${starts}${solution.pulses.length > 4 ? " …" : ""}.`;
  const peakV = solution.shapedPeakV;
  for (const share of [0.5, 0.65, 0.8]) {
    const turn = turnFor(scene, share * peakV);
    if (turn === null || turn <= scene.spec.threshold.turn) continue;
    const higher = tryTurn(scene, turn);
    if (isSound(higher.solution)) {
      return [{ code: "double-trigger", text, fix: { text: `With the pot at ${travel(turn)} the threshold is ${volts(higher.circuit.thresholdV)}, over all but one of them: one pulse of ${seconds(higher.solution.pulses[0]?.widthS ?? 0)}.`, threshold: { turn } } }];
    }
  }
  for (const factor of [1.5, 2.2, 3.3, 4.7, 6.8, 10, 22, 47]) {
    const farad = preferredAbove(circuit.couplingF * factor * 0.99, "E6");
    const longer = trySettled(scene, { couplingF: farad });
    if (farad <= 1e-4 && isSound(longer)) {
      return [{ code: "double-trigger", text, fix: { text: `${farads(farad)} as the coupling capacitor makes one pulse of it, ${seconds(longer.pulses[0]?.widthS ?? 0)} long.`, coupling: { farad } } }];
    }
  }
  return [{ code: "double-trigger", text }];
}
