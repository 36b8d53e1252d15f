import type { KnobPosition, Lead, Patch } from "@/lib/schemas/patch";

/** Something both changed, differently, since the version they began from. Null: not there in that version. */
export type Conflict =
  | { kind: "lead"; id: string; mine: Lead | null; theirs: Lead | null }
  | { kind: "knob"; id: string; mine: KnobPosition | null; theirs: KnobPosition | null };

export interface Merge {
  /** Both sides' changes; where they conflict, theirs. */
  patch: Patch;
  conflicts: Conflict[];
}

const knobKey = (knob: KnobPosition) => `${knob.gearId}/${knob.knobId}`;
const same = (a: unknown, b: unknown) => JSON.stringify(a ?? null) === JSON.stringify(b ?? null);

/**
 * Three-way merge of a patch: what only one side changed is taken from it, what both changed alike is taken once,
 * and the rest is a conflict to be asked. The order of cards is mine where I changed it.
 * New leads that both gave one number: mine takes the lowest free one.
 */
export function mergePatches(base: Patch, mine: Patch, theirs: Patch): Merge {
  const leads = mergeRows(base.leads, mine.leads, theirs.leads, (lead) => lead.id);
  const knobs = mergeRows(base.knobs, mine.knobs, theirs.knobs, knobKey);
  return {
    patch: {
      leads: withoutTwins(leads.rows, theirs.leads),
      knobs: knobs.rows,
      lanes: same(base.lanes, mine.lanes) ? theirs.lanes : mine.lanes,
    },
    conflicts: [
      ...leads.conflicts.map((conflict) => ({ kind: "lead" as const, ...conflict })),
      ...knobs.conflicts.map((conflict) => ({ kind: "knob" as const, ...conflict })),
    ],
  };
}

/** The merge with some conflicts settled my way. */
export function settleConflicts(merge: Merge, takeMine: ReadonlySet<string>): Patch {
  let { leads, knobs } = merge.patch;
  for (const conflict of merge.conflicts) {
    if (!takeMine.has(conflict.id)) continue;
    if (conflict.kind === "lead") {
      leads = leads.filter((lead) => lead.id !== conflict.id);
      if (conflict.mine) leads = [...leads, conflict.mine];
    } else {
      knobs = knobs.filter((knob) => knobKey(knob) !== conflict.id);
      if (conflict.mine) knobs = [...knobs, conflict.mine];
    }
  }
  return { ...merge.patch, leads: withoutTwins(leads, leads), knobs };
}

function mergeRows<T>(base: readonly T[], mine: readonly T[], theirs: readonly T[], keyOf: (row: T) => string) {
  const [from, my, their] = [base, mine, theirs].map((rows) => new Map(rows.map((row) => [keyOf(row), row]))) as [Map<string, T>, Map<string, T>, Map<string, T>];
  const rows: T[] = [];
  const conflicts: { id: string; mine: T | null; theirs: T | null }[] = [];
  for (const id of new Set([...their.keys(), ...my.keys()])) {
    const [b, m, t] = [from.get(id), my.get(id), their.get(id)];
    const changedByMe = !same(b, m);
    const changedByThem = !same(b, t);
    if (changedByMe && changedByThem && !same(m, t)) conflicts.push({ id, mine: m ?? null, theirs: t ?? null });
    const kept = changedByMe && !changedByThem ? m : t;
    if (kept !== undefined) rows.push(kept);
  }
  return { rows, conflicts };
}

/** One lead between two jacks, and one lead to a number: of twins the one they have stays. */
function withoutTwins(leads: readonly Lead[], first: readonly Lead[]): Lead[] {
  const preferred = new Set(first.map((lead) => lead.id));
  const ordered = [...leads].sort((a, b) => Number(preferred.has(b.id)) - Number(preferred.has(a.id)));
  const pairs = new Set<string>();
  const numbers = new Set<number>();
  const kept: Lead[] = [];
  const crowded: Lead[] = [];
  for (const lead of ordered) {
    const pair = `${lead.outputId}>${lead.inputId}`;
    if (pairs.has(pair)) continue;
    pairs.add(pair);
    if (numbers.has(lead.number)) {
      crowded.push(lead);
      continue;
    }
    numbers.add(lead.number);
    kept.push(lead);
  }
  for (const lead of crowded) {
    let number = 1;
    while (numbers.has(number)) number += 1;
    numbers.add(number);
    kept.push({ ...lead, number });
  }
  return kept;
}
