import { countEndMoves } from "./changeover/count-end-moves";
import type { Connection } from "./changeover/types";

/** Boxes of which any may do another's work: each lists its jacks, the same ones in the same order. */
export interface DutyGroup {
  gear: { id: string; outputs: string[]; inputs: string[] }[];
}

export interface DutyRequest {
  /** Patches in the order of the set. */
  songs: Connection[][];
  groups: DutyGroup[];
  /** Whether a song's patch so changed still has every lead `good` or `tight`. */
  isSound: (song: number, connections: Connection[]) => boolean;
  /** Arrangements to weigh for one song, at most; default 60. */
  mostArrangements?: number;
}

export interface Duty {
  /** For each song: which box does whose work (gear id → gear id), only where it changes. */
  swaps: Record<string, string>[];
  songs: Connection[][];
  endMovesNow: number;
  endMovesThen: number;
  /** False where a song had more arrangements than were weighed. */
  isComplete: boolean;
}

interface Arrangement {
  swaps: Record<string, string>;
  connections: Connection[];
}

/**
 * Which of several equal boxes to use in which song, so that the whole set's end moves are least: every arrangement of each song that the check finds sound,
 * and the cheapest way through them (dynamic programming along the set, exact over the arrangements weighed). Among equals, the one that changes the fewest songs.
 */
export function proposeDuty({ songs, groups, isSound, mostArrangements = 60 }: DutyRequest): Duty {
  let isComplete = true;
  const choices = songs.map((song, index) => {
    const { arrangements, hasAll } = arrange(song, groups, mostArrangements);
    isComplete &&= hasAll;
    // The song as it stands is always a choice, whatever the check says of it.
    return arrangements.filter((one, k) => k === 0 || isSound(index, one.connections));
  });
  const endMovesNow = songs.slice(1).reduce((sum, song, k) => sum + countEndMoves(songs[k]!, song), 0);
  // Ends first; among equals the fewest songs changed.
  const changed = (one: Arrangement): number => (Object.keys(one.swaps).length > 0 ? 1 : 0);
  const END = songs.length + 1;
  let costs = choices[0]?.map(changed) ?? [];
  const back: number[][] = [];
  for (let k = 1; k < choices.length; k += 1) {
    const came: number[] = [];
    costs = choices[k]!.map((here) => {
      let best = Infinity;
      let from = 0;
      choices[k - 1]!.forEach((there, index) => {
        const sum = costs[index]! + END * countEndMoves(there.connections, here.connections);
        if (sum < best) [best, from] = [sum, index];
      });
      came.push(from);
      return best + changed(here);
    });
    back.push(came);
  }
  const least = costs.length > 0 ? Math.min(...costs) : 0;
  const endMovesThen = Math.floor(least / END);
  let at = Math.max(0, costs.indexOf(least));
  const chosen: Arrangement[] = [];
  for (let k = choices.length - 1; k >= 0; k -= 1) {
    chosen.unshift(choices[k]![at]!);
    at = back[k - 1]?.[at] ?? 0;
  }
  return { swaps: chosen.map(({ swaps }) => swaps), songs: chosen.map(({ connections }) => connections), endMovesNow, endMovesThen, isComplete };
}

/** All ways to deal the work of each group's boxes out anew; the song as it stands comes first. */
function arrange(song: Connection[], groups: DutyGroup[], most: number): { arrangements: Arrangement[]; hasAll: boolean } {
  let arrangements: Record<string, string>[] = [{}];
  let hasAll = true;
  const jacksInUse = { outputs: new Set(song.map(({ output }) => output)), inputs: new Set(song.map(({ input }) => input)) };
  for (const { gear } of groups) {
    const working = gear.filter((box) => box.outputs.some((jack) => jacksInUse.outputs.has(jack)) || box.inputs.some((jack) => jacksInUse.inputs.has(jack)));
    const ways: Record<string, string>[] = [];
    const deal = (k: number, swaps: Record<string, string>, taken: Set<string>): void => {
      if (ways.length > most) return;
      const box = working[k];
      if (!box) {
        ways.push(swaps);
        return;
      }
      // Its own work first, so that the first way of all changes nothing.
      for (const other of [box, ...gear.filter((one) => one !== box)]) {
        if (taken.has(other.id)) continue;
        deal(k + 1, other === box ? swaps : { ...swaps, [box.id]: other.id }, new Set([...taken, other.id]));
      }
    };
    deal(0, {}, new Set());
    const all = arrangements.flatMap((sofar) => ways.map((way) => ({ ...sofar, ...way })));
    if (all.length > most) hasAll = false;
    arrangements = all.slice(0, most);
  }
  return { arrangements: arrangements.map((swaps) => ({ swaps, connections: rewire(song, groups, swaps) })), hasAll };
}

function rewire(song: Connection[], groups: DutyGroup[], swaps: Record<string, string>): Connection[] {
  const outputs = new Map<string, string>();
  const inputs = new Map<string, string>();
  for (const { gear } of groups) {
    for (const box of gear) {
      const other = gear.find((one) => one.id === swaps[box.id]);
      if (!other) continue;
      box.outputs.forEach((jack, k) => outputs.set(jack, other.outputs[k] ?? jack));
      box.inputs.forEach((jack, k) => inputs.set(jack, other.inputs[k] ?? jack));
    }
  }
  return song.map(({ output, input }) => ({ output: outputs.get(output) ?? output, input: inputs.get(input) ?? input }));
}
