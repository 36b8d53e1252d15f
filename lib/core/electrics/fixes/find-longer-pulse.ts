import { formatQuantity } from "@/lib/core/units/format-quantity";
import { toRange, type Range, type Spread } from "@/lib/core/units/spread";
import { checkBare } from "../check-bare";
import type { Connection, FixOptions, PulseWidthFix } from "../connection-types";
import type { Output } from "../jacks";
import { capacitorLists, resistorLists } from "./part-lists";
import { isFit } from "./try-lead";

/** Tolerance a replacement brings with it: that of the part it replaces is already in the stated width. */
const NOTE_TOL = { ohm: 0.05, farad: 0.1 } as const;

/**
 * The C, and the R, that stretch (or shorten) a pulse to what the input wants; the width is proportional to R·C.
 * @param options `pulseParts` must hold the R and C that set the width now.
 * @returns up to two fixes, the capacitor first.
 * Source: τ = RC; IEC 60063 for the values.
 */
export function findPulseParts(connection: Connection, place: number, options: FixOptions): PulseWidthFix[] {
  const parts = options.pulseParts;
  const driving = connection.outputs.filter((output) => output.signal !== "sensor");
  if (!parts || driving.length !== 1) return [];
  return (["farad", "ohm"] as const).flatMap((part) => {
    const lists = part === "farad" ? capacitorLists(options) : resistorLists(options);
    const found = lists.map((list) => bestOf(list, part, parts[part], connection, place, options));
    const best = found.find((fix) => fix?.verdict === "good") ?? found.find((fix) => fix !== null);
    return best ? [best] : [];
  });
}

function bestOf(list: readonly number[], part: "ohm" | "farad", now: number, connection: Connection, place: number, options: FixOptions): PulseWidthFix | null {
  let tight: PulseWidthFix | null = null;
  // Nearest first by ratio: the least change that does it.
  for (const value of [...list].sort((a, b) => Math.abs(Math.log(a / now)) - Math.abs(Math.log(b / now)))) {
    const fix = tryValue(value, part, now, connection, place, options);
    if (fix?.verdict === "good") return fix;
    tight ??= fix;
  }
  return tight;
}

function tryValue(value: number, part: "ohm" | "farad", now: number, { outputs, inputs }: Connection, place: number, options: FixOptions): PulseWidthFix | null {
  const scaled = outputs.map((output) => (output.signal === "sensor" ? output : stretch(output, value / now)));
  const check = checkBare({ outputs: scaled, inputs }).listeners[place] ?? null;
  if (!isFit(check) || !check.pulseS) return null;
  const unit = part === "ohm" ? "Ohm" : "F";
  const tol = part === "ohm" ? (options.resistorTol ?? NOTE_TOL.ohm) : (options.capacitorTol ?? NOTE_TOL.farad);
  const text = `${formatQuantity(value, unit)} in place of ${formatQuantity(now, unit)}: the pulse then lasts ${formatQuantity(check.pulseS.min, "s")} or more.`;
  return { kind: "pulse-width", part, value, tol, pulseS: check.pulseS, text, verdict: check.verdict, highV: check.highV, lowV: check.lowV };
}

function stretch(output: Partial<Output>, factor: number): Partial<Output> {
  const scale = (spread: Spread): Range => {
    const { min, max } = toRange(spread);
    return { min: min * factor, max: max * factor };
  };
  return {
    ...output,
    ...(output.pulseS === undefined ? {} : { pulseS: scale(output.pulseS) }),
    ...(output.decayS === undefined || output.signal !== "envelope" ? {} : { decayS: scale(output.decayS) }),
  };
}
