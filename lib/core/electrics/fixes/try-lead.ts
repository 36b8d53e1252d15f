import { toRange, type Range, type Spread } from "@/lib/core/units/spread";
import { checkBare } from "../check-bare";
import type { Connection, ListenerCheck } from "../connection-types";
import type { Input, Output } from "../jacks";
import { severityOf } from "../judge/order-verdicts";
import { buildNode } from "../node/build-node";

/** What is put into one listener's lead. Both figures are spreads: a part is never exact. */
export interface LeadParts {
  seriesOhm: Spread;
  /** From the listener's side of the series part to 0 V; null: none. */
  shuntOhm: Spread | null;
  /** In front of the series part, pointing the way the output drives; its drop, V. */
  diodeDropV?: Range;
}

/** Names of the stand-ins below; no jack has one. */
const SHUNT = "\u0000shunt";
const BRANCH = "\u0000branch";

/**
 * The listener's check with parts put into its lead, or null where the rest of the node would be worse off.
 *
 * With one listener the parts belong to the output's own circuit and the result is exact. In a mult they hang behind
 * the common node: that node's range is taken with the new branch at any value it can have, which encloses what can
 * happen — it may call a fix too tight, never too good.
 * @param connection one driving output.
 */
export function tryInLead(connection: Connection, place: number, parts: LeadParts): ListenerCheck | null {
  const found = checkInLead(connection, place, parts);
  if (!found || !found.joined || !isFit(found.check)) return found?.check ?? null;
  const before = checkBare(connection).listeners.filter((_, i) => i !== place);
  const after = checkBare(found.joined).listeners;
  return before.some((was, i) => severityOf(after[i]?.verdict ?? "hot") > severityOf(was.verdict)) ? null : found.check;
}

/** The listener's check with the parts in place, whatever it does to the others; `joined` is the node as those see it, in a mult. */
export function checkInLead(connection: Connection, place: number, parts: LeadParts): { check: ListenerCheck | null; joined: Connection | null } | null {
  const driver = connection.outputs.find((output) => output.signal !== "sensor");
  const listener = connection.inputs[place];
  if (!driver || !listener || driver.sourceOhm === undefined) return null;
  const output = parts.diodeDropV ? withDiode(driver, parts.diodeDropV) : driver;
  if (!output) return null;
  if (connection.inputs.length === 1) {
    const sourceOhm = add(driver.sourceOhm, parts.seriesOhm);
    return { check: first(checkBare({ outputs: [{ ...output, sourceOhm }], inputs: withShunt(listener, parts.shuntOhm) }).listeners), joined: null };
  }
  if (parts.diodeDropV) return null;
  return tryInMult(connection, place, output, listener, parts);
}

function tryInMult(connection: Connection, place: number, output: Partial<Output>, listener: Input, parts: LeadParts): { check: ListenerCheck | null; joined: Connection } | null {
  const others = connection.inputs.filter((_, i) => i !== place);
  const joined: Connection = { outputs: connection.outputs, inputs: [...others, branchLoad(listener, parts)] };
  const node = buildNode(joined);
  if (!node.highV || !node.lowV) return null;
  const behind: Partial<Output> = { ...output, restV: node.lowV, activeV: node.highV, sourceOhm: parts.seriesOhm };
  delete behind.limitA;
  return { check: first(checkBare({ outputs: [behind], inputs: withShunt(listener, parts.shuntOhm) }).listeners), joined };
}

export function isFit(check: ListenerCheck | null): check is ListenerCheck & { highV: Range; lowV: Range } {
  return check !== null && (check.verdict === "good" || check.verdict === "tight") && check.highV !== null && check.lowV !== null;
}

/** The output behind a diode that lets it drive one way only. */
function withDiode(output: Partial<Output>, dropV: Range): Partial<Output> | null {
  if (output.restV === undefined || output.activeV === undefined) return null;
  const falling = output.polarity === "falling";
  const shift = (spread: Spread): Range => {
    const { min, max } = toRange(spread);
    return falling ? { min: min + dropV.min, max: max + dropV.max } : { min: min - dropV.max, max: max - dropV.min };
  };
  return { ...output, or: true, restV: shift(output.restV), activeV: shift(output.activeV) };
}

function withShunt(listener: Input, shuntOhm: Spread | null): Input[] {
  return shuntOhm === null ? [listener] : [listener, { id: SHUNT, accepts: [], loadOhm: shuntOhm }];
}

/** The new branch as the common node sees it: any Thévenin equivalent of parts, load, bias and diodes lies in here. */
export function branchLoad(listener: Input, parts: LeadParts): Input {
  const series = toRange(parts.seriesOhm);
  const ends = [parts.shuntOhm, listener.loadOhm].filter((s): s is Spread => s !== null).map((s) => toRange(s).max);
  const volts = [0, listener.biasV ?? 0, listener.clamp?.lowV ?? 0, listener.clamp?.highV ?? 0].map(toRange);
  return {
    id: BRANCH,
    accepts: [],
    loadOhm: { min: Math.max(series.min, 1e-3), max: series.max + (ends.length === 0 ? 1e12 : Math.min(...ends)) },
    biasV: { min: Math.min(...volts.map((v) => v.min)), max: Math.max(...volts.map((v) => v.max)) },
  };
}

function add(a: Spread, b: Spread): Range {
  const [left, right] = [toRange(a), toRange(b)];
  return { min: left.min + right.min, max: left.max + right.max };
}

function first(listeners: readonly ListenerCheck[]): ListenerCheck | null {
  return listeners[0] ?? null;
}
