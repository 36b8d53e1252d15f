import { formatQuantity, formatRange } from "@/lib/core/units/format-quantity";
import { nominalOf } from "@/lib/core/units/spread";
import { checkBare } from "../check-bare";
import type { Connection, FixOptions, LighterLoadFix } from "../connection-types";
import type { Input } from "../jacks";
import { RESISTOR_TOL, resistorLists } from "./part-lists";
import { isFit } from "./try-lead";

/** For a level that a load pulls down: take the other listeners off, or give this input a lighter load, whichever does it. */
export function findLighterLoad(connection: Connection, place: number, options: FixOptions): LighterLoadFix | null {
  return withoutOthers(connection, place) ?? withLighterLoad(connection, place, options);
}

function withoutOthers({ outputs, inputs }: Connection, place: number): LighterLoadFix | null {
  const input = inputs[place];
  if (!input || inputs.length < 2) return null;
  const check = checkBare({ outputs, inputs: [input] }).listeners[0] ?? null;
  if (!isFit(check)) return null;
  const dropListeners = inputs.filter((_, i) => i !== place).map((other) => other.id);
  const text = `Alone on this output, without the other ${dropListeners.length === 1 ? "listener" : `${dropListeners.length} listeners`}, it gets ${formatRange(check.highV, "V")} when struck.`;
  return { kind: "lighter-load", loadOhm: null, dropListeners, text, verdict: check.verdict, highV: check.highV, lowV: check.lowV };
}

function withLighterLoad(connection: Connection, place: number, options: FixOptions): LighterLoadFix | null {
  const input = connection.inputs[place];
  if (!input || input.loadOhm === null) return null;
  const now = nominalOf(input.loadOhm);
  // Judged open first: where even that does not fire it, no load does.
  if (!isFit(tryLoad(connection, place, input, null))) return null;
  const tol = options.resistorTol ?? RESISTOR_TOL;
  for (const loadOhm of (resistorLists(options)[0] ?? []).filter((value) => value > now)) {
    const check = tryLoad(connection, place, input, { nominal: loadOhm, tol });
    if (!isFit(check)) continue;
    const text = `With a load of ${formatQuantity(loadOhm, "Ohm")} or more in place of ${formatQuantity(now, "Ohm")} it gets ${formatRange(check.highV, "V")} when struck.`;
    return { kind: "lighter-load", loadOhm, dropListeners: [], text, verdict: check.verdict, highV: check.highV, lowV: check.lowV };
  }
  return null;
}

function tryLoad({ outputs, inputs }: Connection, place: number, input: Input, loadOhm: Input["loadOhm"]) {
  return checkBare({ outputs, inputs: inputs.map((other, i) => (i === place ? { ...input, loadOhm } : other)) }).listeners[place] ?? null;
}
