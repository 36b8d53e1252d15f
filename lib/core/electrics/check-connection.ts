import { checkBare } from "./check-bare";
import type { Connection, ConnectionCheck, FixOptions } from "./connection-types";
import { suggestFixes } from "./fixes/suggest-fixes";

/** Fixes are looked for where so many inputs share a node at most; beyond that each can be asked about alone. */
const MOST_JOINED = 16;

/**
 * Says of outputs joined to inputs — a lead, or a passive mult — whether each input is safe and will fire,
 * at the worst its figures allow, why, and what would mend it.
 *
 * @param connection outputs (figures may be blank in a patch) and inputs, all at one node; SI. Call
 *   `findConnectionIssues` first: a figure that is not one is a broken precondition.
 * @param options what fixes may be made from; `fixes: false` leaves them out.
 * @returns a verdict for each listener with every reason that applies, the exact range of the level at rest and while
 *   active, the exact range of the current each output gives, the greatest current through each input's diodes, and
 *   fixes that have been through this same check.
 * @throws RangeError on a spread that is upside down, not finite, or has a tolerance outside 0…1.
 *
 * Sources: Millman's theorem and Kirchhoff's current law for the levels; the verdict table and its margins are this
 * project's own, from common practice. Limits: resistive at each instant (no cable or input capacitance), ideal diodes
 * whose drop is part of the clamp's voltage, an OR output's drop part of its stated level. Two ideal outputs that fight are
 * taken as 1 mΩ each.
 */
export function checkConnection(connection: Connection, options: FixOptions = {}): ConnectionCheck {
  const check = checkBare(connection);
  if (options.fixes === false) return check;
  const listeners = check.listeners.map((listener, place) => {
    if (listener.verdict === "good" || listener.verdict === "tight" || listener.verdict === "unproven") return listener;
    if (connection.inputs.length <= MOST_JOINED) return { ...listener, ...suggestFixes(connection, place, listener, options) };
    return listener.verdict === "hot" ? { ...listener, fixNote: "Many inputs hang here: check this one alone to see its fix." } : listener;
  });
  return { ...check, listeners };
}
