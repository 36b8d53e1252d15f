import { applySteps, startState } from "./apply-step";
import { planChangeover } from "./plan-changeover";
import type { Changeover, ChangeoverRequest, Connection, KnobPosition, PluggedLead } from "./types";

export interface SongPatch {
  connections: PluggedLead[];
  knobs?: Record<string, KnobPosition> | undefined;
}

/**
 * The changeovers of a whole set, one after the other: a lead keeps its number from song to song, because each changeover begins with the
 * leads as the last one left them. Knobs a song does not mention stay where they were.
 * @param songs patches in the order played; the first one's leads keep the numbers given there
 * @param facts what is known of leads, jacks, adapters, desk and pace, as for `planChangeover`
 * @returns one changeover for each gap, and each song's connections with the lead that serves them
 */
export function planSet(songs: SongPatch[], facts: Omit<ChangeoverRequest, "from" | "to" | "knobsFrom" | "knobsTo"> = {}): { changeovers: Changeover[]; songs: PluggedLead[][] } {
  const [first, ...rest] = songs;
  if (!first) return { changeovers: [], songs: [] };
  let from = first.connections;
  let knobsFrom = first.knobs ?? {};
  const carried = [from];
  const changeovers = rest.map((song) => {
    const plan = planChangeover({ ...facts, from, to: song.connections, knobsFrom, knobsTo: song.knobs ?? {} });
    from = findCarried(from, plan, song.connections);
    knobsFrom = { ...knobsFrom, ...song.knobs };
    carried.push(from);
    return plan;
  });
  return { changeovers, songs: carried };
}

/** The new patch's rows, each with the lead that now makes it. */
function findCarried(from: PluggedLead[], plan: Changeover, to: Connection[]): PluggedLead[] {
  const after = applySteps(startState(from), plan.steps.filter((step) => step.kind !== "turn"));
  const byPair = new Map<string, PluggedLead[]>();
  for (const { lead, output, input } of after.leads) {
    if (output === null || input === null) continue;
    const key = `${output.length}:${output}${input}`;
    byPair.set(key, [...(byPair.get(key) ?? []), { output, input, ...(lead === null ? {} : { lead }) }]);
  }
  return to.flatMap(({ output, input }) => byPair.get(`${output.length}:${output}${input}`)?.shift() ?? []);
}
