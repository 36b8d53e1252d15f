import { expect, type APIRequestContext, type Page } from "@playwright/test";

export const RIG = "/rigs/marrow-lane";
const DEMO = { performer: "performer", collaborator: "collaborator", "sound-helper": "sound" } as const;

/** Signs in as a person would, through the form. */
export async function signIn(page: Page, role: keyof typeof DEMO): Promise<void> {
  await page.goto("/sign-in");
  await page.getByLabel("E-mail").fill(`${DEMO[role]}@marrowlane.example`);
  await page.getByLabel("Password").fill("two-tea-trolleys");
  await page.getByRole("button", { name: "Sign in", exact: true }).click();
  await expect(page).toHaveURL(/\/rigs$/);
}

/** A new person with an account, signed in through the forms. */
export async function signUp(page: Page, name: string): Promise<void> {
  await page.goto("/sign-up");
  await page.getByLabel("Your name").fill(name);
  await page.getByLabel("E-mail").fill(`${name.toLowerCase().replace(/\W+/g, "-")}-${Date.now()}@newcomer.example`);
  await page.getByLabel("Password").fill("a-shed-full-of-drums");
  await page.getByRole("button", { name: "Sign up" }).click();
  await expect(page).toHaveURL(/\/rigs$/);
}

/** A song of the demo rig made for one test; gives its id. */
export async function newSong(request: APIRequestContext, title: string, copyFrom: string | null = null): Promise<string> {
  const response = await request.post(`/api/v1${RIG}/songs`, { data: { title, tempoBpm: null, notes: "", copyFrom } });
  expect(response.status()).toBe(201);
  return ((await response.json()) as { song: { id: string } }).song.id;
}

/** Drags from the middle of one thing to the middle of another, in steps as a hand would. */
export async function drag(page: Page, from: string, to: string): Promise<void> {
  const [start, end] = await Promise.all([page.locator(from).boundingBox(), page.locator(to).boundingBox()]);
  if (!start || !end) throw new Error(`nothing to drag: ${from} → ${to}`);
  await page.mouse.move(start.x + start.width / 2, start.y + start.height / 2);
  await page.mouse.down();
  await page.mouse.move(start.x + start.width / 2 + 12, start.y + start.height / 2, { steps: 3 });
  await page.mouse.move(end.x + end.width / 2, end.y + end.height / 2, { steps: 12 });
  await page.waitForTimeout(120);
  await page.mouse.up();
}

export async function saved(page: Page): Promise<void> {
  await expect(page.locator("[data-save=saved]")).toContainText("Saved · revision", { timeout: 10_000 });
}
