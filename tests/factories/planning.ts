import type { Connection, KnobPosition } from "@/lib/core/planning";
import { planChangeover } from "@/lib/core/planning";
import type { OrderRequest } from "@/lib/core/planning";
import { seededRandom } from "@/lib/core/planning/order/seeded-random";

/** Random patches and sets for tests and benches; the same seed gives the same. */
export function makePlanningSource(seed: number) {
  const random = seededRandom(seed);
  const whole = (below: number) => Math.floor(random() * below);
  const shuffled = (count: number) => {
    const all = Array.from({ length: count }, (_, index) => index);
    for (let i = count - 1; i > 0; i -= 1) {
      const j = whole(i + 1);
      [all[i], all[j]] = [all[j]!, all[i]!];
    }
    return all;
  };

  /** Leads into distinct inputs; outputs may be shared, as by a mult. */
  const patch = (leads: number, outputs: number, inputs: number): Connection[] =>
    shuffled(inputs).slice(0, leads).map((input) => ({ output: `out ${whole(outputs)}`, input: `in ${input}` }));

  /** A patch like another: some ends elsewhere, a few leads fewer. */
  const variant = (base: Connection[], changes: number, outputs: number, inputs: number, fewer: number): Connection[] => {
    const next = base.map((one) => ({ ...one }));
    const used = new Set(next.map((one) => one.input));
    for (let k = 0; k < changes && next.length > 0; k += 1) {
      const one = next[whole(next.length)]!;
      const input = `in ${whole(inputs)}`;
      if (random() < 0.5) one.output = `out ${whole(outputs)}`;
      else if (!used.has(input)) {
        used.delete(one.input);
        used.add(input);
        one.input = input;
      }
    }
    return next.slice(0, next.length - whole(fewer + 1));
  };

  const knobs = (count: number): Record<string, KnobPosition> =>
    Object.fromEntries(Array.from({ length: count }, (_, index) => [`knob ${index}`, `${7 + whole(11)} o'clock`]));

  /** Songs of a few families of patches, as a rig has them: from song to song much stays. */
  const setOfSongs = (songs: number, leads: number, families: number) => {
    const bases = Array.from({ length: families }, () => patch(leads, leads, leads + 12));
    return Array.from({ length: songs }, () => ({
      connections: variant(bases[whole(families)]!, whole(Math.ceil(leads * 0.6)), leads, leads + 12, 4),
      knobs: knobs(12),
    }));
  };

  /** The order request of such a set: changeovers as planned, openers patched from nothing. */
  const orderOfSet = (songs: number, leads: number, families: number): OrderRequest => {
    const set = setOfSongs(songs, leads, families);
    const ids = set.map((_, index) => `song ${index}`);
    return {
      songs: ids,
      setupS: Object.fromEntries(set.map((song, index) => [ids[index]!, planChangeover({ from: [], to: song.connections, knobsTo: song.knobs }).seconds])),
      changeoverS: set.map((a) => set.map((b) =>
        planChangeover({ from: a.connections, to: b.connections, knobsFrom: a.knobs, knobsTo: b.knobs }).seconds)),
    };
  };

  /** A table of times: `near` symmetric (places on a stage plus a little), or any numbers at all. */
  const orderOfTimes = (songs: number, kind: "near" | "any"): OrderRequest => {
    const ids = Array.from({ length: songs }, (_, index) => `song ${index}`);
    const places = ids.map(() => [random() * 100, random() * 100] as const);
    return {
      songs: ids,
      setupS: Object.fromEntries(ids.map((id) => [id, 20 + whole(80)])),
      changeoverS: places.map((a, i) => places.map((b, j) =>
        i === j ? 0 : kind === "any" ? whole(100) : Math.round(Math.hypot(a[0] - b[0], a[1] - b[1]) + random() * 3))),
    };
  };
  return { random, whole, shuffled, patch, variant, knobs, setOfSongs, orderOfSet, orderOfTimes };
}
