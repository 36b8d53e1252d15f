import type { Range } from "@/lib/core/units/spread";
import type { Connection, Fix, FixOptions, ListenerCheck } from "../connection-types";
import type { Verdict } from "../jacks";
import { DIODE_DROP_V, findSeriesDiode } from "./find-series-diode";
import { findDivider } from "./find-divider";
import { findFreeGear } from "./find-free-gear";
import { findLighterLoad } from "./find-lighter-load";
import { findPulseParts } from "./find-longer-pulse";
import { findSeriesResistor } from "./find-series-resistor";
import { explainNoFix } from "./explain-no-fix";

/**
 * Ways out for one listener, each of which has been through the same check and come out good or tight.
 * @param listener the check of `connection.inputs[place]` as it stands.
 * @returns the fixes, the simplest first; for `hot` without any, why there is none.
 */
export function suggestFixes(connection: Connection, place: number, listener: ListenerCheck, options: FixOptions): { fixes: Fix[]; fixNote?: string } {
  const says = (...verdicts: Verdict[]) => listener.reasons.some((reason) => verdicts.includes(reason.verdict));
  const single = connection.outputs.filter((output) => output.signal !== "sensor").length === 1;
  const fixes: (Fix | null)[] = [];
  if (single && says("hot")) fixes.push(...tameLevel(connection, place, listener, options));
  if (single && says("stuck") && !says("hot")) fixes.push(findSeriesDiode(connection, place));
  if (says("weak", "dead")) fixes.push(findLighterLoad(connection, place, options));
  if (says("brief", "long")) fixes.push(...findPulseParts(connection, place, options));
  fixes.push(findFreeGear(connection, place, options));
  const found = fixes.filter((fix): fix is Fix => fix !== null);
  if (found.length === 0 && says("hot")) return { fixes: found, fixNote: explainNoFix(connection, place, listener) };
  return { fixes: found };
}

function tameLevel(connection: Connection, place: number, listener: ListenerCheck, options: FixOptions): (Fix | null)[] {
  const { highV, lowV } = listener;
  if (!highV || !lowV) return [];
  const extreme: Range = { min: Math.min(highV.min, lowV.min), max: Math.max(highV.max, lowV.max) };
  const resistor = findSeriesResistor(connection, place, options);
  if (resistor) return [resistor];
  // A diode would cut half of a sound away.
  const isAudio = connection.outputs.some((output) => output.signal === "audio");
  if (isAudio) return [findDivider(connection, place, extreme, options)];
  const diode = findSeriesDiode(connection, place);
  const divider = findDivider(connection, place, extreme, options);
  if (diode || divider) return [divider, diode];
  return [findDivider(connection, place, extreme, options, DIODE_DROP_V)];
}
