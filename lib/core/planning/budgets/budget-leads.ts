import { solveAssignment } from "../solve-assignment";
import { fitLead } from "../changeover/fit-lead";
import { sayLength } from "../changeover/say-step";
import type { Adapter, Connection, JackFacts, OutputFacts, StockLead } from "../changeover/types";
import type { BudgetRow } from "./margin";

export interface LeadBudgetRequest {
  songs: { id: string; connections: Connection[] }[];
  stock: StockLead[];
  outputs?: Record<string, OutputFacts>;
  inputs?: Record<string, JackFacts>;
  adapters?: Adapter[];
}

export interface LeadToBuy {
  /** Connectors at the output end and the input end; null: not known. */
  connectors: { output: string | null; input: string | null };
  /** Metres it must reach; 0: places not known. */
  lengthM: number;
  count: number;
}

export interface LeadBudget {
  /** One row a song. */
  rows: BudgetRow[];
  /** What would cover every song: leads bought for one serve the others. */
  toBuy: LeadToBuy[];
  /** Most adapters of each kind in use at once. */
  adapters: (Adapter & { count: number })[];
}

const MISSING = 1e9;
const ADAPTER = 1e5;

/**
 * Whether the stock covers each song's patch: as many connections as can be are given a lead that fits and reaches (an assignment, so a long lead
 * is not spent on a short run that another could serve), with as few adapters and as little spare length as may be.
 * @param request jacks' connectors and places where known; what is unknown rules nothing out
 */
export function budgetLeads(request: LeadBudgetRequest): LeadBudget {
  const { stock } = request;
  const shortBySong: LeadToBuy[][] = [];
  const adapterPeak = new Map<string, Adapter & { count: number }>();
  const rows = request.songs.map(({ id, connections }): BudgetRow => {
    const columns = stock.length + connections.length;
    const cost = new Float64Array(connections.length * columns).fill(MISSING);
    connections.forEach((connection, row) => stock.forEach((lead, column) => {
      const adapters = fitLead(lead, connection, { ...request, from: [], to: [] });
      if (adapters) cost[row * columns + column] = adapters.length * ADAPTER + Math.round((lead.lengthM ?? 0) * 100);
    }));
    const columnOf = solveAssignment(connections.length, columns, cost);
    const used = new Map<string, Adapter & { count: number }>();
    const missing: LeadToBuy[] = [];
    connections.forEach((connection, row) => {
      const column = columnOf[row]!;
      const lead = cost[row * columns + column]! < MISSING ? stock[column] : undefined;
      if (!lead) missing.push(describe(connection, request));
      for (const adapter of lead ? fitLead(lead, connection, { ...request, from: [], to: [] }) ?? [] : []) {
        const key = `${adapter.plug} → ${adapter.jack}`;
        used.set(key, { ...adapter, count: (used.get(key)?.count ?? 0) + 1 });
      }
    });
    for (const [key, one] of used) if (one.count > (adapterPeak.get(key)?.count ?? 0)) adapterPeak.set(key, one);
    shortBySong.push(missing);
    const need = connections.length;
    const have = need - missing.length;
    return {
      subject: id, need, have, margin: missing.length > 0 ? -missing.length : stock.length - need, unit: "leads",
      standing: missing.length > 0 ? "short" : stock.length === need ? "close" : "enough",
      text: missing.length > 0 ? `${need} leads at once; ${missing.length} of them the stock does not hold.` : `${need} leads at once of ${stock.length} in stock.`,
      ...(missing.length > 0 ? { mend: `Buy or borrow: ${merge(missing).map(sayLead).join("; ")}.` } : {}),
    };
  });
  return { rows, toBuy: coverAll(shortBySong), adapters: [...adapterPeak.values()] };
}

/** A lead to buy in words: `2 × 6.35 mm TS to 3.5 mm TS, at least 1.2 m`. */
export function sayLead({ connectors, lengthM, count }: LeadToBuy): string {
  const length = lengthM > 0 ? `, at least ${sayLength(lengthM)}` : "";
  return `${count} × ${connectors.output ?? "any"} to ${connectors.input ?? "any"}${length}`;
}

function describe({ output, input }: Connection, request: LeadBudgetRequest): LeadToBuy {
  const a = request.outputs?.[output];
  const b = request.inputs?.[input];
  const isKnown = a?.xM !== undefined && a.yM !== undefined && b?.xM !== undefined && b.yM !== undefined;
  // Rounded up to what shops sell: whole decimetres.
  const lengthM = isKnown ? Math.ceil(Math.hypot(a.xM! - b.xM!, a.yM! - b.yM!) * 10 - 1e-9) / 10 : 0;
  return { connectors: { output: a?.connector ?? null, input: b?.connector ?? null }, lengthM, count: 1 };
}

function kindOf({ connectors }: LeadToBuy): string {
  return JSON.stringify([connectors.output, connectors.input]);
}

/** For each kind, the k-th longest lead must reach as far as the k-th longest that any song misses. */
function coverAll(bySong: LeadToBuy[][]): LeadToBuy[] {
  const longest = new Map<string, LeadToBuy[]>();
  for (const missing of bySong) {
    const seen = new Map<string, number>();
    for (const lead of [...missing].sort((a, b) => b.lengthM - a.lengthM)) {
      const kind = kindOf(lead);
      const rank = seen.get(kind) ?? 0;
      seen.set(kind, rank + 1);
      const list = longest.get(kind) ?? [];
      if (!list[rank] || list[rank].lengthM < lead.lengthM) list[rank] = lead;
      longest.set(kind, list);
    }
  }
  return merge([...longest.values()].flat());
}

/** Equal leads counted together, longest first. */
function merge(leads: LeadToBuy[]): LeadToBuy[] {
  const merged = new Map<string, LeadToBuy>();
  for (const lead of leads) {
    const key = `${kindOf(lead)} ${lead.lengthM}`;
    merged.set(key, { ...lead, count: (merged.get(key)?.count ?? 0) + 1 });
  }
  return [...merged.values()].sort((a, b) => b.lengthM - a.lengthM);
}
