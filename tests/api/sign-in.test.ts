import { describe, expect, it } from "vitest";
import { Client } from "./client";

/** Wrong passwords that are allowed in a row; see lib/auth/auth-options.ts. */
const TRIES = 30;

async function signsIn(email: string, password: string): Promise<boolean> {
  const client = new Client();
  const { csrfToken } = (await (await client.get("/api/auth/csrf")).json()) as { csrfToken: string };
  const form = new URLSearchParams({ csrfToken, email, password, json: "true" });
  await client.request("POST", "/api/auth/callback/credentials", form.toString(), { "content-type": "application/x-www-form-urlencoded" });
  return (await client.get("/api/v1/rigs")).status === 200;
}

describe("signing in", () => {
  const account = { name: "Guessed", email: "guessed@elsewhere.example", password: "a-password-worth-guessing" };

  it("takes the right password and refuses the wrong one and the unknown address", async () => {
    expect((await new Client().post("/api/v1/accounts", account)).status).toBe(201);
    expect(await signsIn(account.email, account.password)).toBe(true);
    expect(await signsIn(account.email, "not-the-password")).toBe(false);
    expect(await signsIn("nobody@elsewhere.example", account.password)).toBe(false);
  });

  it("stops listening after many wrong passwords in a row", async () => {
    for (let i = 0; i < TRIES; i += 1) await signsIn(account.email, `guess number ${i}`);
    expect(await signsIn(account.email, account.password)).toBe(false);
  });

  it("keeps the session out of scripts' reach and other sites' requests", async () => {
    const client = await new Client().signIn("sound@marrowlane.example");
    const response = await client.get("/api/auth/session");
    const cookie = response.headers.getSetCookie().find((item) => item.includes("session-token")) ?? "";
    expect(cookie).toMatch(/HttpOnly/i);
    expect(cookie).toMatch(/SameSite=Lax/i);
  });

  it("refuses a second account for one address", async () => {
    const response = await new Client().post("/api/v1/accounts", account);
    expect(response.status).toBe(409);
    expect(((await response.json()) as { errors: { field: string }[] }).errors[0]?.field).toBe("email");
  });
});
