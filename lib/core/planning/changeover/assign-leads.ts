import { solveAssignment } from "../solve-assignment";
import { fitLead } from "./fit-lead";
import type { Adapter, ChangeoverRequest, StockLead } from "./types";

/** Where one new connection's lead comes from. */
export type Source =
  | { kind: "on-rig"; fromRow: number; adapters: Adapter[] }
  | { kind: "stock"; lead: StockLead; adapters: Adapter[] }
  /** No lead in particular: the stock was not given, or (`isShort`) holds none that fits. */
  | { kind: "any"; isShort: boolean };

/** At most this many connections in a patch: beyond it the weighted sums below would no longer be exact whole numbers. */
export const MOST_CONNECTIONS = 200;

/**
 * What a choice costs, most important first, folded into one whole number: leads the rig does not have, ends touched, leads
 * fetched, adapters, leads touched, input ends touched. Each weight exceeds the largest sum of everything below it for 200
 * connections, and the total stays below 2^53, so the cheapest sum is the true lexicographic minimum.
 */
const SHORT = 2 ** 43;
const END = 2 ** 33;
const FETCH = 2 ** 25;
const ADAPTER = 2 ** 16;
const TOUCHED = 2 ** 8;
const INPUT_MOVED = 1;
const NEVER = 2 ** 51;

/**
 * Chooses which lead serves each connection of the new patch so that the fewest ends are touched (0 stay, 1 one end, 2 both,
 * 2 put away, 2 fetch and plug). Among equals: fewer fetched, fewer adapters, fewer leads handled, and fewer input ends — the last
 * also rules out rings in which leads only trade inputs wherever every lead fits everywhere, since serving each input with the
 * lead already in it touches no more ends.
 * @returns the source of each row of `to`
 * @throws RangeError over 200 connections in either patch or 200 spare leads
 */
export function assignLeads(request: ChangeoverRequest): Source[] {
  const { from, to } = request;
  const stock = new Map((request.leads ?? []).map((lead) => [String(lead.lead), lead]));
  const onRig = from.map((one) => (one.lead === undefined ? undefined : stock.get(String(one.lead))));
  const used = new Set(from.map((one) => (one.lead === undefined ? "" : String(one.lead))));
  const spares = (request.leads ?? []).filter((lead) => !used.has(String(lead.lead)));
  if (Math.max(from.length, to.length, spares.length) > MOST_CONNECTIONS) {
    throw new RangeError(`a changeover takes at most ${MOST_CONNECTIONS} connections and spare leads`);
  }
  const hasStock = request.leads !== undefined;
  const columns = from.length + spares.length + to.length;
  const cost = new Float64Array(to.length * columns).fill(NEVER);
  to.forEach((want, row) => {
    const at = row * columns;
    from.forEach((have, column) => {
      const adapters = fitLead(onRig[column], want, request);
      if (!adapters) return;
      const inputMoved = have.input === want.input ? 0 : 1;
      const ends = inputMoved + (have.output === want.output ? 0 : 1);
      // Less the two ends of putting it away, which every lead on the rig costs unless it serves again.
      cost[at + column] = (ends - 2) * END + adapters.length * ADAPTER + (ends > 0 ? TOUCHED : 0) + inputMoved * INPUT_MOVED;
    });
    const fetched = 2 * END + FETCH + TOUCHED + INPUT_MOVED;
    spares.forEach((lead, index) => {
      const adapters = fitLead(lead, want, request);
      if (adapters) cost[at + from.length + index] = fetched + adapters.length * ADAPTER;
    });
    cost.fill(fetched + (hasStock ? SHORT : 0), at + from.length + spares.length, at + columns);
  });
  const columnOf = solveAssignment(to.length, columns, cost);
  return to.map((want, row): Source => {
    const column = columnOf[row]!;
    if (column < from.length) return { kind: "on-rig", fromRow: column, adapters: fitLead(onRig[column], want, request) ?? [] };
    const lead = spares[column - from.length];
    if (lead) return { kind: "stock", lead, adapters: fitLead(lead, want, request) ?? [] };
    return { kind: "any", isShort: hasStock };
  });
}
