import { solveAssignment } from "../solve-assignment";
import { fitLead } from "./fit-lead";
import type { Adapter, ChangeoverRequest, Connection, StockLead } from "./types";

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
  if (request.leads === undefined) return assignAlike(from, to);
  const columns = from.length + spares.length + to.length;
  const cost = new Float64Array(to.length * columns).fill(NEVER);
  to.forEach((want, row) => {
    const at = row * columns;
    from.forEach((have, column) => {
      const adapters = fitLead(onRig[column], want, request);
      if (!adapters) return;
      cost[at + column] = moveCost(have, want) + adapters.length * ADAPTER;
    });
    const fetched = 2 * END + FETCH + TOUCHED + INPUT_MOVED;
    spares.forEach((lead, index) => {
      const adapters = fitLead(lead, want, request);
      if (adapters) cost[at + from.length + index] = fetched + adapters.length * ADAPTER;
    });
    cost.fill(fetched + SHORT, at + from.length + spares.length, at + columns);
  });
  const columnOf = solveAssignment(to.length, columns, cost);
  return to.map((want, row): Source => {
    const column = columnOf[row]!;
    if (column < from.length) return { kind: "on-rig", fromRow: column, adapters: fitLead(onRig[column], want, request) ?? [] };
    const lead = spares[column - from.length];
    if (lead) return { kind: "stock", lead, adapters: fitLead(lead, want, request) ?? [] };
    return { kind: "any", isShort: true };
  });
}

/**
 * The same choice where every lead fits everywhere. A lead already in place may then be left there first: were it moved to x and its
 * place filled from y, moving y to x instead touches no more leads, ends or inputs. What is left is usually a small table.
 */
function assignAlike(from: Connection[], to: Connection[]): Source[] {
  const rowsAt = new Map<string, number[]>();
  from.forEach((have, row) => {
    const key = keyOf(have);
    const rows = rowsAt.get(key);
    if (rows) rows.push(row);
    else rowsAt.set(key, [row]);
  });
  const stays = to.map((want) => rowsAt.get(keyOf(want))?.shift());
  const free = [...rowsAt.values()].flat().sort((a, b) => a - b);
  const open = to.flatMap((_, row) => (stays[row] === undefined ? [row] : []));
  // Serving with a lead at hand always beats putting it away and fetching another, so only the surplus is fetched.
  const columns = Math.max(free.length, open.length);
  const cost = new Float64Array(open.length * columns).fill(2 * END + FETCH + TOUCHED + INPUT_MOVED);
  open.forEach((row, k) => free.forEach((fromRow, column) => (cost[k * columns + column] = moveCost(from[fromRow]!, to[row]!))));
  const columnOf = solveAssignment(open.length, columns, cost);
  const chosen = new Map(open.map((row, k) => [row, free[columnOf[k]!]]));
  return to.map((_, row): Source => {
    const fromRow = stays[row] ?? chosen.get(row);
    return fromRow === undefined ? { kind: "any", isShort: false } : { kind: "on-rig", fromRow, adapters: [] };
  });
}

/** What moving a lead costs, less the two ends of putting it away, which every lead on the rig costs unless it serves again. */
function moveCost(have: Connection, want: Connection): number {
  const inputMoved = have.input === want.input ? 0 : 1;
  const ends = inputMoved + (have.output === want.output ? 0 : 1);
  return (ends - 2) * END + (ends > 0 ? TOUCHED : 0) + inputMoved * INPUT_MOVED;
}

function keyOf({ output, input }: Connection): string {
  return `${output.length}:${output}${input}`;
}
