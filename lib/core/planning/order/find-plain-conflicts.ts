import type { Rule } from "./model-order";

/** A set of rules that cannot all hold, and why. */
export interface Conflict {
  rules: Rule[];
  text: string;
}

/** A rule in words, with songs by their ids and positions as the API counts them. */
export function sayRule(rule: Rule, songs: string[]): string {
  const name = (song: number) => `“${songs[song]}”`;
  if (rule.kind === "pin") return `${name(rule.song)} pinned to position ${rule.position}`;
  if (rule.kind === "together") return `${name(rule.b)} right after ${name(rule.a)}`;
  return `${name(rule.a)} and ${name(rule.b)} never next to each other`;
}

/**
 * Contradictions that show without a search: two songs in one place, a song with two followers or two leaders, a ring of followers, a pair
 * both together and apart, pins that do not agree with what follows what or that reach past either end of the set.
 * @param songs ids in the performer's order
 * @returns one entry a contradiction, each with the rules concerned; empty where `modelOrder` may be called
 */
export function findPlainConflicts(songs: string[], rules: Rule[]): Conflict[] {
  const conflicts: Conflict[] = [];
  const add = (text: string, ...concerned: Rule[]) => conflicts.push({ rules: concerned, text });
  const name = (song: number) => `“${songs[song]}”`;
  const pins = rules.filter((rule) => rule.kind === "pin");
  const pairs = rules.filter((rule) => rule.kind === "together");
  const aparts = rules.filter((rule) => rule.kind === "apart");

  const after = new Map<number, (typeof pairs)[number]>();
  const before = new Map<number, (typeof pairs)[number]>();
  for (const pair of pairs) {
    const follower = after.get(pair.a);
    const leader = before.get(pair.b);
    if (follower && follower.b !== pair.b) add(`${name(follower.b)} and ${name(pair.b)} cannot both come right after ${name(pair.a)}.`, follower, pair);
    if (leader && leader.a !== pair.a) add(`${name(pair.b)} cannot come right after both ${name(leader.a)} and ${name(pair.a)}.`, leader, pair);
    after.set(pair.a, follower ?? pair);
    before.set(pair.b, leader ?? pair);
  }
  if (conflicts.length > 0) return conflicts;

  // Where each song stands in its chain.
  const chainOf = new Map<number, { id: number; offset: number }>();
  const chains: number[][] = [];
  for (let song = 0; song < songs.length; song += 1) {
    if (before.has(song)) continue;
    const chain = [song];
    for (let step = after.get(song); step; step = after.get(step.b)) chain.push(step.b);
    chain.forEach((member, offset) => chainOf.set(member, { id: chains.length, offset }));
    chains.push(chain);
  }
  const inRings = pairs.filter((pair) => !chainOf.has(pair.a));
  if (inRings.length > 0) {
    const ring: typeof pairs = [];
    for (let pair = inRings[0]; pair && !ring.includes(pair); pair = after.get(pair.b)) ring.push(pair);
    add(`${ring.map((pair) => sayRule(pair, songs)).join(", ")}: that goes round in a ring, so none can come first.`, ...ring);
    return conflicts;
  }
  for (const apart of aparts) {
    const pair = [after.get(apart.a), after.get(apart.b)].find((one) => one && (one.b === apart.b || one.b === apart.a));
    if (pair) add(`${sayRule(pair, songs)}, yet ${sayRule(apart, songs)}.`, pair, apart);
  }

  // Pins fix whole chains: each must fit the set, agree with the chain's other pins and leave every place to one song.
  const chainPin = new Map<number, { first: number; pin: (typeof pins)[number] }>();
  for (const pin of pins) {
    const { id, offset } = chainOf.get(pin.song)!;
    const chain = chains[id]!;
    const first = pin.position - offset;
    const links = pairs.filter((pair) => chainOf.get(pair.a)!.id === id);
    const told = chainPin.get(id);
    if (told && told.first !== first) {
      add(`${sayRule(told.pin, songs)} does not go with ${sayRule(pin, songs)}: ${links.map((link) => sayRule(link, songs)).join(", ")}.`, told.pin, pin, ...links);
    } else if (first < 0 || first + chain.length > songs.length) {
      add(`${sayRule(pin, songs)} leaves no room for ${links.map((link) => sayRule(link, songs)).join(", ")}.`, pin, ...links);
    } else if (!told) chainPin.set(id, { first, pin });
  }
  const holder = new Map<number, { song: number; rules: Rule[] }>();
  for (const [id, { first, pin }] of chainPin) {
    chains[id]!.forEach((song, offset) => {
      const position = first + offset;
      const other = holder.get(position);
      const concerned: Rule[] = [pin, ...pairs.filter((pair) => chainOf.get(pair.a)!.id === id)];
      if (other) add(`${name(other.song)} and ${name(song)} would both stand at position ${position}: ${[...other.rules, ...concerned].map((rule) => sayRule(rule, songs)).join(", ")}.`, ...other.rules, ...concerned);
      else holder.set(position, { song, rules: concerned });
    });
  }
  for (const [position, { song, rules: concerned }] of holder) {
    const next = holder.get(position + 1);
    const apart = next && aparts.find((one) => (one.a === song && one.b === next.song) || (one.b === song && one.a === next.song));
    if (next && apart && chainOf.get(song)!.id !== chainOf.get(next.song)!.id) {
      const all = [...concerned, ...next.rules];
      add(`${all.map((rule) => sayRule(rule, songs)).join(", ")}, yet ${sayRule(apart, songs)}.`, ...all, apart);
    }
  }
  return conflicts;
}
