import { formatQuantity, formatRange } from "@/lib/core/units/format-quantity";
import { toRange, type Range } from "@/lib/core/units/spread";
import type { Connection, DiodeDividerFix, DividerFix, FixOptions, ListenerCheck } from "../connection-types";
import type { Input } from "../jacks";
import { peakOfDbu } from "../judge/judge-audio";
import { around, closerResistorLists, RESISTOR_TOL } from "./part-lists";
import { isFit, tryInLead } from "./try-lead";

/** Divider resistors to the listener's side: low enough for its load, high enough for most outputs. */
const LEAST_SHUNT_OHM = 1e3;
const MOST_SHUNT_OHM = 220e3;

interface Candidate {
  seriesOhm: number;
  shuntOhm: number;
  tol: number;
  check: ListenerCheck & { highV: Range; lowV: Range };
  /** Lower is better: verdict, then how it loads the source, then the margin it leaves. */
  rank: [number, number, number];
}

/**
 * The best divider from parts that exist that makes a too-high level fit, load and spreads included.
 * @param extreme levels the output reaches without it, V.
 * @param dropV where given, a diode stands before the divider.
 * @returns null where no pair is good or tight.
 * Source: loaded divider, *Lessons in Electric Circuits* vol. I ch. 6.
 */
export function findDivider(connection: Connection, place: number, extreme: Range, options: FixOptions, dropV?: Range): DividerFix | DiodeDividerFix | null {
  const input = connection.inputs[place];
  const driver = connection.outputs.find((output) => output.signal !== "sensor");
  if (!input || driver?.activeV === undefined || isTooWide(input, toRange(driver.activeV))) return null;
  let best: Candidate | null = null;
  for (const { list, tol } of closerResistorLists(options)) {
    for (const candidate of candidatesFrom(list, connection, place, extreme, tol, dropV)) {
      if (!best || isBetter(candidate.rank, best.rank)) best = candidate;
    }
    if (best?.check.verdict === "good") break;
  }
  return best && present(best, dropV);
}

function* candidatesFrom(list: readonly number[], connection: Connection, place: number, extreme: Range, tol: number, dropV?: Range): Generator<Candidate> {
  const input = connection.inputs[place];
  const driver = connection.outputs.find((output) => output.signal !== "sensor");
  if (!input || driver?.sourceOhm === undefined) return;
  const sourceOhm = toRange(driver.sourceOhm).max;
  const share = wantedShare(input, extreme);
  if (share === null) return;
  const load = input.loadOhm === null ? Infinity : toRange(input.loadOhm).min;
  for (const shuntOhm of list) {
    if (shuntOhm < LEAST_SHUNT_OHM || shuntOhm > MOST_SHUNT_OHM) continue;
    const loaded = load === Infinity ? shuntOhm : (shuntOhm * load) / (shuntOhm + load);
    const wanted = loaded * (1 / share - 1) - sourceOhm;
    if (wanted <= 0) continue;
    for (const seriesOhm of around(list, wanted)) {
      const parts = { seriesOhm: { nominal: seriesOhm, tol }, shuntOhm: { nominal: shuntOhm, tol }, ...(dropV ? { diodeDropV: dropV } : {}) };
      const check = tryInLead(connection, place, parts);
      if (!isFit(check)) continue;
      const loads = seriesOhm + shuntOhm >= 10 * sourceOhm ? 0 : 1;
      yield { seriesOhm, shuntOhm, tol, check, rank: [check.verdict === "good" ? 0 : 1, loads, -leastMargin(input, check)] };
    }
  }
}

/** The share of the output's level to let through: midway between what fires and what is safe; null where they do not meet. */
export function wantedShare(input: Input, extreme: Range): number | null {
  const ceiling = ceilingOf(input);
  if (ceiling === Infinity || ceiling <= 0 || extreme.max <= 0) return null;
  const most = Math.min(1, ceiling / extreme.max);
  const on = input.onV === undefined || input.polarity === "falling" ? 0 : toRange(input.onV).max;
  const least = on > 0 ? on / extreme.max : 0.8 * most;
  return least >= most ? most : (most + least) / 2;
}

function ceilingOf(input: Input): number {
  return Math.min(
    input.safeV ? toRange(input.safeV).max : input.clamp ? toRange(input.clamp.highV).min : Infinity,
    input.maxDbu === undefined ? Infinity : peakOfDbu(input.maxDbu),
  );
}

/** A divider takes the same share of the output's own highest and lowest level: where these lie further apart than limit and threshold, none fits. */
function isTooWide(input: Input, activeV: Range): boolean {
  if (input.onV === undefined || input.polarity === "falling" || activeV.min <= 0) return false;
  const bias = toRange(input.biasV ?? 0);
  if (bias.min !== 0 || bias.max !== 0 || input.clamp) return false;
  return activeV.max * toRange(input.onV).max > ceilingOf(input) * activeV.min;
}

function leastMargin(input: Input, check: { highV: Range; lowV: Range }): number {
  const top = Math.max(check.highV.max, check.lowV.max);
  const above = input.safeV ? toRange(input.safeV).max - top : 0;
  const on = input.onV === undefined ? null : toRange(input.onV).max;
  return on === null ? above : Math.min(above, check.highV.min - on);
}

function isBetter(a: Candidate["rank"], b: Candidate["rank"]): boolean {
  const place = a.findIndex((value, i) => value !== b[i]);
  return place !== -1 && (a[place] ?? 0) < (b[place] ?? 0);
}

function present({ seriesOhm, shuntOhm, tol, check }: Candidate, dropV?: Range): DividerFix | DiodeDividerFix {
  const close = tol < RESISTOR_TOL ? `, both ±${tol * 100} %,` : "";
  const pair = `${formatQuantity(seriesOhm, "Ohm")} in series and ${formatQuantity(shuntOhm, "Ohm")} from the input to 0 V${close}`;
  const leaves = `${formatRange(check.highV, "V")} when struck, ${formatRange(check.lowV, "V")} at rest`;
  const result = { seriesOhm, shuntOhm, tol, verdict: check.verdict, highV: check.highV, lowV: check.lowV };
  return dropV
    ? { kind: "diode-divider", dropV, text: `A diode, then ${pair}: ${leaves}.`, ...result }
    : { kind: "divider", text: `A divider of ${pair}: ${leaves}.`, ...result };
}
