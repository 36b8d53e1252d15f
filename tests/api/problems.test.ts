import { describe, expect, it } from "vitest";
import { Client, DEMO, DEMO_RIG } from "./client";

interface Problem {
  title: string;
  status: number;
  detail: string;
  errors?: { field: string; pointer: string; detail: string }[];
}

const good = {
  outputs: [{ signal: "trigger", restV: 0, activeV: 8, sourceOhm: 1000 }],
  inputs: [{ id: "a", accepts: ["trigger"], onV: 2, safeV: { min: -0.5, max: 12 }, loadOhm: 100_000 }],
};
const output = good.outputs[0];
const input = good.inputs[0];

async function refused(body: unknown): Promise<Problem> {
  const response = await new Client().post("/api/v1/connection", body);
  expect(response.headers.get("content-type")).toContain("application/problem+json");
  const problem = (await response.json()) as Problem;
  expect(problem.status).toBe(response.status);
  return problem;
}

describe("bad input to the connection calculator", () => {
  it.each([
    ["an upside-down range", { ...good, outputs: [{ ...output, restV: { min: 2, max: 1 } }] }, "outputs.0.restV"],
    ["a tolerance of one", { ...good, outputs: [{ ...output, restV: { nominal: 1, tol: 1 } }] }, "outputs.0.restV"],
    ["a one-sided range", { ...good, outputs: [{ ...output, activeV: { min: 2 } }] }, "outputs.0.activeV"],
    ["a load of nothing", { ...good, inputs: [{ ...input, loadOhm: 0 }] }, "inputs.0.loadOhm"],
    ["a negative time", { ...good, outputs: [{ ...output, pulseS: -1 }] }, "outputs.0.pulseS"],
    ["text that is no value", { ...good, inputs: [{ ...input, loadOhm: "plenty" }] }, "inputs.0.loadOhm"],
    ["a field nobody knows", { ...good, volume: 11 }, "volume"],
    ["no outputs", { ...good, outputs: [] }, "outputs"],
  ])("%s is refused with 400 and named", async (_title, body, field) => {
    const problem = await refused(body);
    expect(problem.status).toBe(400);
    expect(problem.errors?.map((fault) => fault.field)).toContain(field);
  });

  it("a figure that is not there is called missing", async () => {
    const problem = await refused({ ...good, outputs: [{ signal: "trigger", activeV: 8, sourceOhm: 0 }] });
    expect(problem.errors).toContainEqual({ field: "outputs.0.restV", pointer: "#/outputs/0/restV", detail: expect.stringMatching(/missing|Give a number/) });
  });

  it("a number too large for JSON is refused, not passed on as infinity", async () => {
    const response = await new Client().request("POST", "/api/v1/connection", JSON.stringify(good).replace('"activeV":8', '"activeV":1e999'));
    expect(response.status).toBe(400);
  });

  it("a body that is not JSON is refused", async () => {
    expect((await new Client().request("POST", "/api/v1/connection", "{")).status).toBe(400);
    expect((await new Client().request("POST", "/api/v1/connection", "a=1", { "content-type": "text/plain" })).status).toBe(415);
  });

  it("a body over 1 MB is refused before it is read", async () => {
    expect((await new Client().request("POST", "/api/v1/connection", `"${"x".repeat(1_100_000)}"`)).status).toBe(413);
  });

  it("value text is read as people write it", async () => {
    const body = { ...good, inputs: [{ ...input, loadOhm: "100k" }], outputs: [{ ...output, sourceOhm: "4k7" }] };
    const answer = (await (await new Client().post("/api/v1/connection", body)).json()) as { listeners: { highV: { max: number } }[] };
    // Divider rule: 8 V × 100k / 104.7k.
    expect(answer.listeners[0]?.highV.max).toBeCloseTo((8 * 100) / 104.7, 9);
  });
});

describe("writes from another site", () => {
  it("are refused even with a session", async () => {
    const performer = await new Client().signIn(DEMO.performer);
    const response = await performer.request("PATCH", `/api/v1/rigs/${DEMO_RIG}`, { name: "Taken" }, { origin: "https://elsewhere.example" });
    expect(response.status).toBe(403);
    const { rig } = (await (await performer.get(`/api/v1/rigs/${DEMO_RIG}`)).json()) as { rig: { name: string } };
    expect(rig.name).toBe("Marrow Lane");
  });
});

describe("a rig that is not yours", () => {
  it("answers exactly as one that does not exist", async () => {
    const stranger = new Client();
    await stranger.post("/api/v1/accounts", { name: "Other", email: "other@elsewhere.example", password: "another-long-one" });
    await stranger.signIn("other@elsewhere.example", "another-long-one");
    const [theirs, missing] = await Promise.all([stranger.get(`/api/v1/rigs/${DEMO_RIG}`), stranger.get("/api/v1/rigs/no-such-rig")]);
    expect(theirs.status).toBe(404);
    expect(await theirs.text()).toBe(await missing.text());
  });
});
