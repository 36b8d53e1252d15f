import type { OrderRequest } from "./types";

/** A broken precondition, named by its path in the request. */
export interface OrderIssue {
  path: (string | number)[];
  message: string;
}

export const MOST_SONGS = 200;
/** Seconds in a day: no set-up or changeover takes longer. */
export const MOST_S = 86_400;

/**
 * Names everything in an order request that cannot be meant: no songs or too many, ids given twice or not in the list, a table that is not
 * square, seconds that are negative, not finite or beyond a day, positions outside 0…n−1, a song paired with itself.
 * @returns an empty list where `orderSet` may be called
 */
export function findOrderIssues(request: OrderRequest): OrderIssue[] {
  const { songs } = request;
  const known = new Set(songs);
  const issues: OrderIssue[] = [];
  const add = (message: string, ...path: (string | number)[]) => issues.push({ path, message });
  if (songs.length === 0) add("Give at least one song.", "songs");
  if (songs.length > MOST_SONGS) add(`At most ${MOST_SONGS} songs.`, "songs");
  songs.forEach((id, index) => {
    if (songs.indexOf(id) !== index) add(`The song “${id}” is given twice.`, "songs", index);
    else if (!Object.hasOwn(request.setupS, id)) add(`The set-up time of “${id}” is missing.`, "setupS", id);
  });
  for (const [id, seconds] of Object.entries(request.setupS)) {
    if (!known.has(id)) add(`There is no song “${id}”.`, "setupS", id);
    addSecondsIssue(seconds, "setupS", id);
  }
  if (request.changeoverS.length !== songs.length) add(`The table needs ${songs.length} rows, one a song; it has ${request.changeoverS.length}.`, "changeoverS");
  request.changeoverS.forEach((row, from) => {
    if (row.length !== songs.length) add(`This row needs ${songs.length} figures, one a song; it has ${row.length}.`, "changeoverS", from);
    row.forEach((seconds, to) => addSecondsIssue(seconds, "changeoverS", from, to));
  });
  for (const [id, position] of Object.entries(request.pinned ?? {})) {
    if (!known.has(id)) add(`There is no song “${id}”.`, "pinned", id);
    if (!Number.isInteger(position) || position < 0 || position >= songs.length) {
      add(`A position is a whole number from 0 to ${Math.max(songs.length - 1, 0)}.`, "pinned", id);
    }
  }
  for (const field of ["together", "apart"] as const) {
    (request[field] ?? []).forEach(([a, b], index) => {
      for (const [side, id] of [a, b].entries()) if (!known.has(id)) add(`There is no song “${id}”.`, field, index, side);
      if (a === b) add(`“${a}” is paired with itself.`, field, index);
    });
  }
  return issues;

  function addSecondsIssue(seconds: number, ...path: (string | number)[]) {
    if (typeof seconds !== "number" || !Number.isFinite(seconds)) add("This must be a number of seconds.", ...path);
    else if (seconds < 0) add("This must be zero or more (seconds).", ...path);
    else if (seconds > MOST_S) add("This must be at most a day (86,400 s).", ...path);
  }
}
