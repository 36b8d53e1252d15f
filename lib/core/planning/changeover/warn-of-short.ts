import { fact } from "./fit-lead";
import type { ChangeoverRequest } from "./types";

/** Below this an output without a current limit is taken not to stand a short (common practice, no source). */
const STANDS_SHORT_OHM = 100;

/**
 * A caution for outputs that do not stand the short a plug makes between tip and sleeve on its way in: source under 100 Ω and
 * no current limit stated. An output with no source resistance on record is not flagged.
 */
export function warnOfShort(outputs: string[], request: ChangeoverRequest): { cautions?: string[] } {
  const cautions = [...new Set(outputs)].flatMap((id) => {
    const output = fact(request.outputs, id);
    if (output?.sourceOhm === undefined || output.sourceOhm >= STANDS_SHORT_OHM || output.limitA !== undefined) return [];
    const ohm = Number(output.sourceOhm.toPrecision(3));
    return [`${output.name ?? id} does not stand a short (${ohm} Ω, no current limit): switch its box off while this plug goes in or out.`];
  });
  return cautions.length > 0 ? { cautions } : {};
}
