import { countEndMoves } from "./changeover/count-end-moves";
import type { Connection } from "./changeover/types";

export interface HomePatchRequest {
  /** Patches in the order of the set. */
  songs: Connection[][];
  /** Whether a song may have this lead plugged besides its own (every lead still `good` or `tight`); absent: it may. */
  mayStay?: (song: number, connection: Connection) => boolean;
  /** Whether one output may feed several leads at once; default false. */
  hasMults?: boolean;
  /** Leads the rig owns; absent: enough. */
  leads?: number;
}

export interface HomePatch {
  /** What stays plugged all night. */
  connections: Connection[];
  /** For each song, what stays though the song does not use it: accepted song by song. */
  added: Connection[][];
  /** Ends between songs as the patches stand, and with the home patch. */
  endMovesNow: number;
  endMovesThen: number;
}

/**
 * The connections to leave plugged all night so that the rest moves least: those every song uses, and those that no song is troubled by and that save
 * moves when left. A connection troubles a song that gives its input to another output, or its output to another input where there are no mults.
 * Chosen by taking one lead in or out at a time, whichever saves most over the whole set, once from nothing and once from everything; not proven to be the
 * best choice. `mayStay` judges one lead at a time: check each song again with all that is added before it is accepted.
 */
export function proposeHomePatch({ songs, mayStay = () => true, hasMults = false, leads = Infinity }: HomePatchRequest): HomePatch {
  const all = new Map(songs.flat().map((connection) => [keyOf(connection), { output: connection.output, input: connection.input }]));
  const uses = songs.map((song) => new Set(song.map(keyOf)));
  const troubles = (song: number, one: Connection) =>
    songs[song]!.some((other) => other.input === one.input || (!hasMults && other.output === one.output)) || !mayStay(song, one);
  const always = [...all.values()].filter((one) => uses.every((used) => used.has(keyOf(one))));
  const sometimes = [...all.values()].filter((one) => !always.includes(one) && uses.every((used, song) => used.has(keyOf(one)) || !troubles(song, one)));
  const countWith = (chosen: Set<Connection>) => {
    const patches = songs.map((song, at) => [...song, ...[...chosen].filter((one) => !uses[at]!.has(keyOf(one)))]);
    if (patches.some((patch) => patch.length > leads)) return Infinity;
    return patches.slice(1).reduce((sum, patch, k) => sum + countEndMoves(patches[k]!, patch), 0);
  };
  const endMovesNow = songs.slice(1).reduce((sum, song, k) => sum + countEndMoves(songs[k]!, song), 0);
  // Leads that only pay together are found from the full side, single ones from the empty side.
  const [few, many] = [new Set<Connection>(), new Set(sometimes)].map((start) => settle(start, sometimes, countWith));
  const best = many!.moves < few!.moves ? many! : few!;
  const isBetter = best.moves < endMovesNow;
  const chosen = isBetter ? [...best.chosen] : [];
  return {
    connections: [...always, ...chosen],
    added: songs.map((_, song) => chosen.filter((one) => !uses[song]!.has(keyOf(one)))),
    endMovesNow,
    endMovesThen: isBetter ? best.moves : endMovesNow,
  };
}

/** Takes one in or out as long as that saves most; at the end also takes out what saves nothing. */
function settle(start: Set<Connection>, candidates: Connection[], countWith: (chosen: Set<Connection>) => number) {
  const chosen = new Set(start);
  let moves = countWith(chosen);
  const flip = (one: Connection) => (chosen.has(one) ? chosen.delete(one) : chosen.add(one));
  for (;;) {
    let best: Connection | undefined;
    let least = moves;
    for (const one of candidates) {
      flip(one);
      const then = countWith(chosen);
      // Fewer leads among equals; where there are too many leads, any out is a step forward.
      if (then < least || (then === least && !best && !chosen.has(one))) [best, least] = [one, then];
      flip(one);
    }
    if (!best) return { chosen, moves };
    flip(best);
    moves = least;
  }
}

function keyOf({ output, input }: Connection): string {
  return JSON.stringify([output, input]);
}
