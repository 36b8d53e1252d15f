import { beforeAll, describe, expect, it } from "vitest";
import type { Patch } from "@/lib/schemas/patch";
import { Client, DEMO, DEMO_RIG } from "./client";

interface PatchAnswer {
  patch: Patch;
  revision: number;
  check: { leads: Record<string, { verdict: string }>; worst: string };
}

let performer: Client;
let collaborator: Client;

beforeAll(async () => {
  performer = await new Client().signIn(DEMO.performer);
  collaborator = await new Client().signIn(DEMO.collaborator);
});

async function newSong(copyFrom: string | null = null): Promise<string> {
  const response = await performer.post(`/api/v1/rigs/${DEMO_RIG}/songs`, { title: "Trial", tempoBpm: null, notes: "", copyFrom });
  expect(response.status).toBe(201);
  return ((await response.json()) as { song: { id: string } }).song.id;
}

const at = (songId: string) => `/api/v1/rigs/${DEMO_RIG}/songs/${songId}/patch`;
const lead = (outputId: string, inputId: string, number = 1) => ({ id: `lead-${number}`, number, colour: "red" as const, outputId, inputId });
const patchOf = (...leads: ReturnType<typeof lead>[]): Patch => ({ leads, knobs: [], lanes: [[], [], [], []] });

describe("saving a patch", () => {
  it("raises the revision by one and answers with the check", async () => {
    const songId = await newSong();
    const response = await performer.put(at(songId), { baseRevision: 0, patch: patchOf(lead("pad-kick-out", "cond-kick-pad")) });
    const answer = (await response.json()) as PatchAnswer;
    expect(response.status).toBe(200);
    expect(answer.revision).toBe(1);
    expect(Object.keys(answer.check.leads)).toEqual(["lead-1"]);
  });

  it("from a stale revision is refused with both versions' revision, and changes nothing", async () => {
    const songId = await newSong();
    await performer.put(at(songId), { baseRevision: 0, patch: patchOf(lead("pad-kick-out", "cond-kick-pad")) });
    const stale = await collaborator.put(at(songId), { baseRevision: 0, patch: patchOf(lead("pad-snare-out", "cond-snare-pad")) });
    expect(stale.status).toBe(409);
    const problem = (await stale.json()) as { current: { revision: number; patch: Patch } };
    expect(problem.current.revision).toBe(1);
    expect(problem.current.patch.leads[0]?.outputId).toBe("pad-kick-out");
    const stored = (await (await performer.get(at(songId))).json()) as PatchAnswer;
    expect(stored.patch).toEqual(problem.current.patch);
  });

  it("by twenty people at once lets exactly one through", async () => {
    const songId = await newSong();
    const answers = await Promise.all(
      Array.from({ length: 20 }, (_, i) => (i % 2 ? performer : collaborator).put(at(songId), { baseRevision: 0, patch: patchOf(lead("pad-kick-out", "cond-kick-pad", i + 1)) })),
    );
    const statuses = answers.map((answer) => answer.status);
    expect(statuses.filter((status) => status === 200)).toHaveLength(1);
    expect(statuses.filter((status) => status === 409)).toHaveLength(19);
  });

  it("names leads whose jacks are not of this rig", async () => {
    const songId = await newSong();
    const response = await performer.put(at(songId), { baseRevision: 0, patch: patchOf(lead("pad-kick-out", "not-a-jack")) });
    expect(response.status).toBe(422);
    expect(((await response.json()) as { errors: { field: string }[] }).errors.map((fault) => fault.field)).toEqual(["patch.leads.0.inputId"]);
  });

  it("refuses a lead plugged backwards, and a number used twice", async () => {
    const songId = await newSong();
    const backwards = await performer.put(at(songId), { baseRevision: 0, patch: patchOf(lead("cond-kick-pad", "pad-kick-out")) });
    expect(backwards.status).toBe(422);
    const twice = await performer.put(at(songId), { baseRevision: 0, patch: { ...patchOf(), leads: [lead("pad-kick-out", "cond-kick-pad"), { ...lead("pad-snare-out", "cond-snare-pad"), id: "other" }] } });
    expect(twice.status).toBe(400);
    expect(((await twice.json()) as { errors: { field: string }[] }).errors[0]?.field).toBe("patch.leads.1.number");
  });

  it("of a copied song begins with the other song's leads", async () => {
    const songId = await newSong("wet-chalk");
    const copy = (await (await performer.get(at(songId))).json()) as PatchAnswer;
    const original = (await (await performer.get(at("wet-chalk"))).json()) as PatchAnswer;
    expect(copy.patch.leads.length).toBeGreaterThan(0);
    expect(copy.patch).toEqual(original.patch);
  });
});

describe("checking a draft", () => {
  it("calls the snare trigger into the bare 5 V input hot, and saves nothing", async () => {
    const songId = await newSong();
    const patch = patchOf(lead("pad-snare-out", "cond-snare-pad", 1), lead("cond-snare-trig", "voice-tin-trig", 2));
    const response = await performer.post(`/api/v1/rigs/${DEMO_RIG}/songs/${songId}/check`, { patch });
    const { check } = (await response.json()) as PatchAnswer;
    expect(check.leads["lead-2"]?.verdict).toBe("hot");
    expect(((await (await performer.get(at(songId))).json()) as PatchAnswer).revision).toBe(0);
  });

  it("tells beforehand what every free jack would get", async () => {
    const songId = await newSong();
    const patch = patchOf(lead("pad-snare-out", "cond-snare-pad", 1));
    const response = await performer.post(`/api/v1/rigs/${DEMO_RIG}/songs/${songId}/check`, { patch, from: "cond-snare-trig" });
    const { candidates } = (await response.json()) as { candidates: { jackId: string; verdict: string }[] };
    expect(candidates.find((candidate) => candidate.jackId === "voice-tin-trig")?.verdict).toBe("hot");
    expect(candidates.some((candidate) => candidate.jackId === "cond-snare-pad")).toBe(false);
  });
});

describe("the demo rig", () => {
  it("shows every verdict somewhere in its drafts", async () => {
    const { songs } = (await (await performer.get(`/api/v1/rigs/${DEMO_RIG}/songs`)).json()) as { songs: { id: string; title: string }[] };
    const seeded = songs.filter((song) => /^[a-z-]+$/.test(song.id));
    expect(seeded).toHaveLength(7);
    const seen = new Set<string>();
    for (const song of seeded) {
      const { check } = (await (await performer.get(at(song.id))).json()) as PatchAnswer;
      for (const { verdict } of Object.values(check.leads)) seen.add(verdict);
    }
    expect([...seen].sort()).toEqual(
      ["brief", "clash", "dead", "good", "hot", "long", "overload", "reversed", "stuck", "tight", "unproven", "weak", "wrong-kind"],
    );
  });
});
