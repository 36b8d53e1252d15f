import { describe, expect, it } from "vitest";
import { countEndMoves, planChangeover, proposeDuty, proposeHomePatch, type Connection } from "@/lib/core/planning";
import { makePlanningSource } from "../../../factories/planning";

const wire = (text: string): Connection[] => text.split(" ").filter(Boolean).map((part) => ({ output: part.split(">")[0]!, input: part.split(">")[1]! }));
const names = (connections: Connection[]) => connections.map(({ output, input }) => `${output}>${input}`);
const movesOf = (songs: Connection[][]) => songs.slice(1).reduce((sum, song, k) => sum + countEndMoves(songs[k]!, song), 0);

it("counts the same ends as the full plan", () => {
  const source = makePlanningSource(51);
  for (let k = 0; k < 400; k += 1) {
    const from = source.patch(source.whole(10), 6, 12);
    const to = k % 2 === 0 ? source.variant(from, 6, 6, 12, 2) : source.patch(source.whole(10), 6, 12);
    expect(countEndMoves(from, to)).toBe(planChangeover({ from, to }).endMoves);
  }
});

describe("the home patch", () => {
  it("leaves a lead in that the middle song does not need: 4 ends saved", () => {
    // a>1 goes away (2) and comes back (2) although nothing in the middle song wants its jacks.
    const home = proposeHomePatch({ songs: [wire("a>1 b>2"), wire("b>2"), wire("a>1 b>2")] });
    expect(home).toMatchObject({ endMovesNow: 4, endMovesThen: 0 });
    expect(names(home.connections)).toEqual(["b>2", "a>1"]);
    expect(home.added.map(names)).toEqual([[], ["a>1"], []]);
  });

  it("does not leave a lead in an input, or an output, that a song gives to another", () => {
    expect(proposeHomePatch({ songs: [wire("a>1"), wire("c>1"), wire("a>1")] }).connections).toEqual([]);
    expect(proposeHomePatch({ songs: [wire("a>1"), wire("a>2"), wire("a>1")] }).connections).toEqual([]);
    expect(names(proposeHomePatch({ songs: [wire("a>1"), wire("a>2"), wire("a>1")], hasMults: true }).connections)).toEqual(["a>1", "a>2"]);
  });

  it("asks the check, and keeps to the leads there are", () => {
    const songs = [wire("a>1 b>2"), wire("b>2"), wire("a>1 b>2")];
    expect(names(proposeHomePatch({ songs, mayStay: (song) => song !== 1 }).connections)).toEqual(["b>2"]);
    expect(proposeHomePatch({ songs, leads: 1 }).endMovesThen).toBe(4);
  });

  it("is never worse than the set as it is, and counts what it says", () => {
    const source = makePlanningSource(52);
    let saved = 0;
    for (let k = 0; k < 60; k += 1) {
      const base = source.patch(8, 8, 8);
      const songs = Array.from({ length: 5 }, () => base.filter(() => source.random() < 0.7));
      const home = proposeHomePatch({ songs, hasMults: true });
      expect(home.endMovesNow).toBe(movesOf(songs));
      expect(home.endMovesThen).toBe(movesOf(songs.map((song, at) => [...song, ...home.added[at]!])));
      expect(home.endMovesThen).toBeLessThanOrEqual(home.endMovesNow);
      if (home.endMovesThen < home.endMovesNow) saved += 1;
    }
    expect(saved).toBeGreaterThan(40);
  });
});

it("the home patch equals the best of all choices on most small sets, and is never far from it", () => {
  const source = makePlanningSource(54);
  let best = 0;
  for (let run = 0; run < 40; run += 1) {
    const base = source.patch(7, 4, 7);
    const songs = Array.from({ length: 4 }, () => base.filter(() => source.random() < 0.6));
    let least = Infinity;
    for (let choice = 0; choice < 2 ** base.length; choice += 1) {
      const left = base.filter((_, k) => (choice >> k) & 1);
      least = Math.min(least, movesOf(songs.map((song) => [...song, ...left.filter((one) => !song.includes(one))])));
    }
    const { endMovesThen } = proposeHomePatch({ songs, hasMults: true });
    expect(endMovesThen).toBeLessThanOrEqual(least + 2);
    if (endMovesThen === least) best += 1;
  }
  expect(best).toBeGreaterThanOrEqual(38);
});

describe("which box does which work", () => {
  const groups = [{ gear: [{ id: "A", outputs: ["A out"], inputs: ["A in"] }, { id: "B", outputs: ["B out"], inputs: ["B in"] }] }];
  const song = (box: string, voice: string) => [{ output: "pad", input: `${box} in` }, { output: `${box} out`, input: voice }];

  it("uses the box that is already plugged: 2 ends saved", () => {
    const duty = proposeDuty({ songs: [song("A", "kick"), song("B", "kick")], groups, isSound: () => true });
    expect(duty).toMatchObject({ endMovesNow: 2, endMovesThen: 0, isComplete: true });
    expect(duty.swaps.filter((swaps) => Object.keys(swaps).length > 0)).toHaveLength(1);
  });

  it("changes nothing the check does not find sound", () => {
    const duty = proposeDuty({ songs: [song("A", "kick"), song("B", "kick")], groups, isSound: () => false });
    expect(duty.endMovesThen).toBe(2);
    expect(duty.swaps).toEqual([{}, {}]);
  });

  it("is the cheapest of all ways through the set", () => {
    const source = makePlanningSource(53);
    const gear = ["A", "B", "C"].map((id) => ({ id, outputs: [`${id} out`], inputs: [`${id} in`] }));
    for (let run = 0; run < 30; run += 1) {
      const songs = Array.from({ length: 3 }, () => {
        const order = source.shuffled(3).map((k) => gear[k]!.id);
        return [0, 1].flatMap((k) => [{ output: `pad ${source.whole(3)}`, input: `${order[k]} in` }, { output: `${order[k]} out`, input: `voice ${k}` }]);
      });
      const duty = proposeDuty({ songs, groups: [{ gear }], isSound: () => true });
      const deals = [[0, 1, 2], [0, 2, 1], [1, 0, 2], [1, 2, 0], [2, 0, 1], [2, 1, 0]];
      const rewire = (connections: Connection[], deal: number[]) => connections.map(({ output, input }) => ({
        output: output.endsWith("out") ? `${"ABC"[deal["ABC".indexOf(output[0]!)]!]} out` : output,
        input: input.endsWith("in") ? `${"ABC"[deal["ABC".indexOf(input[0]!)]!]} in` : input,
      }));
      let least = Infinity;
      for (const a of deals) for (const b of deals) for (const c of deals) least = Math.min(least, movesOf([rewire(songs[0]!, a), rewire(songs[1]!, b), rewire(songs[2]!, c)]));
      expect(duty.isComplete).toBe(true);
      expect(duty.endMovesThen).toBe(least);
      expect(movesOf(duty.songs)).toBe(least);
    }
  });
});
