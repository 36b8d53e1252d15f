import { existsSync, readdirSync, readFileSync } from "node:fs";
import { join } from "node:path";
import { beforeAll, describe, expect, it } from "vitest";
import { OPERATIONS, type Operation } from "@/lib/http/describe-api";
import { holds } from "@/lib/rights/can";
import { ROLES, type Role } from "@/lib/schemas/rig";
import { demoPads } from "@/seeders/demo/gear";
import { Client, DEMO, DEMO_RIG } from "./client";

/*
 * Every operation × visitor, stranger with an account, and the three roles.
 * A role that may is shown by getting past the rights: bodies are empty ({}),
 * so 400 stands for "allowed, but say what". Where rights depend on the body
 * (gear of any kind but desk channels) a whole body is sent.
 */
const pad = demoPads[0]?.gear;
const BODIES: Record<string, unknown> = {
  "post /api/v1/rigs/{rigId}/gear": pad,
  "put /api/v1/rigs/{rigId}/gear/{gearId}": { baseRevision: 0, gear: pad },
  "post /api/v1/rigs/{rigId}/gear/{gearId}/retire": { retired: false },
};
const ALLOWED_ANSWERS: Record<string, number> = { "put /api/v1/rigs/{rigId}/gear/{gearId}": 409 };

const people: Partial<Record<Role | "visitor" | "stranger", Client>> = {};

beforeAll(async () => {
  people.visitor = new Client();
  const stranger = new Client();
  await stranger.post("/api/v1/accounts", { name: "Stranger", email: "stranger@elsewhere.example", password: "no-tea-trolley-here" });
  people.stranger = await stranger.signIn("stranger@elsewhere.example", "no-tea-trolley-here");
  for (const role of ROLES) people[role] = await new Client().signIn(DEMO[role]);
});

function address(operation: Operation, songId: string): string {
  return operation.path.replace("{rigId}", DEMO_RIG).replace("{gearId}", "pad-kick").replace("{songId}", songId).replace("{setId}", "pump-house");
}

async function ask(who: keyof typeof people, operation: Operation): Promise<number> {
  const client = people[who];
  if (!client) throw new Error(`no ${who}`);
  const key = `${operation.method} ${operation.path}`;
  const body = key in BODIES ? BODIES[key] : operation.body ? {} : undefined;
  const songId = operation.method === "delete" ? await throwawaySong() : "wet-chalk";
  return (await client.request(operation.method.toUpperCase(), address(operation, songId), body)).status;
}

async function throwawaySong(): Promise<string> {
  const response = await people.performer?.post(`/api/v1/rigs/${DEMO_RIG}/songs`, { title: "To be deleted", tempoBpm: null, notes: "" });
  return ((await response?.json()) as { song: { id: string } }).song.id;
}

function allowedAnswer(operation: Operation): number {
  const key = `${operation.method} ${operation.path}`;
  return ALLOWED_ANSWERS[key] ?? (operation.body && !(key in BODIES) ? 400 : operation.ok);
}

describe.each(OPERATIONS.map((operation) => [`${operation.method.toUpperCase()} ${operation.path}`, operation] as const))("%s", (_title, operation) => {
  const { right } = operation;
  it(right === "open" ? "is open to a visitor" : "asks a visitor to sign in", async () => {
    expect(await ask("visitor", operation)).toBe(right === "open" ? allowedAnswer(operation) : 401);
  });
  it(right === "open" || right === "account" ? "is open to anyone with an account" : "does not exist for a stranger", async () => {
    expect(await ask("stranger", operation)).toBe(right === "open" || right === "account" ? allowedAnswer(operation) : 404);
  });
  it.each(ROLES)("answers a %s by the rights table", async (role) => {
    const may = right === "open" || right === "account" || holds(role, right);
    expect(await ask(role, operation)).toBe(may ? allowedAnswer(operation) : 403);
  });
});

describe("the sound helper at the desk", () => {
  it("may add a desk channel", async () => {
    const gear = { ...pad, name: "Ch 9 spare", details: { kind: "desk-channel", channel: 9 }, jacks: [], assumed: [] };
    expect((await people["sound-helper"]?.post(`/api/v1/rigs/${DEMO_RIG}/gear`, gear))?.status).toBe(201);
  });
  it("cannot turn that right into one over a pad", async () => {
    const gear = { ...pad, details: { kind: "desk-channel", channel: 9 }, jacks: [], assumed: [] };
    expect((await people["sound-helper"]?.put(`/api/v1/rigs/${DEMO_RIG}/gear/pad-kick`, { baseRevision: 1, gear }))?.status).toBe(422);
  });
});

describe("the table of operations", () => {
  it("holds every route handler of the tree, and no other", () => {
    const handlers = [...routeFiles("app/api/v1")].flatMap((file) => {
      const path = `/${file.replace(/^app\//, "").replace(/\/route\.ts$/, "")}`.replaceAll("[", "{").replaceAll("]", "}");
      return [...readFileSync(file, "utf8").matchAll(/export (?:const|async function|function) (GET|POST|PUT|PATCH|DELETE)\b/g)].map((match) => `${match[1]?.toLowerCase()} ${path}`);
    });
    expect(handlers.sort()).toEqual(OPERATIONS.map((operation) => `${operation.method} ${operation.path}`).sort());
  });
});

function* routeFiles(folder: string): Generator<string> {
  if (!existsSync(folder)) return;
  for (const entry of readdirSync(folder, { withFileTypes: true })) {
    const path = join(folder, entry.name);
    if (entry.isDirectory()) yield* routeFiles(path);
    else if (entry.name === "route.ts") yield path;
  }
}
