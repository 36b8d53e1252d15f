import { expect, test } from "@playwright/test";
import { drag, saved, signIn, signUp } from "./people";
import { readPdf } from "./read-pdf";

test("a newcomer makes gear from figures, patches it by drag and by keyboard, mends a hot lead and prints the sheet", async ({ page }) => {
  test.setTimeout(180_000);
  await signUp(page, "Newcomer");
  await page.getByLabel("Its name").fill("Shed rig");
  await page.getByRole("button", { name: "Make this rig" }).click();
  await expect(page.getByRole("heading", { name: "Shed rig" })).toBeVisible();
  const rig = new URL(page.url()).pathname;

  const make = async (kind: string, name: string, figures: Record<string, string>) => {
    await page.goto(`${rig}/gear/new?kind=${kind}`);
    await page.getByLabel("Name, as it stands on its tape").fill(name);
    for (const [label, value] of Object.entries(figures)) {
      const box = page.getByRole("textbox", { name: label, exact: false }).first();
      await box.fill(value);
    }
    await page.getByRole("button", { name: "Add to the rig" }).click();
    await expect(page).toHaveURL(/\/gear(\/[^/]+)?(\?.*)?$/);
    await expect(page).not.toHaveURL(/\/new/);
  };
  await make("supply", "Nine volts", {});
  await make("pad", "Bucket pad", { "at rest": "45k–50k", "when hit": "9k–11k" });
  await make("conditioner", "Hot box", { "Output resistor": "1k", "Resistor across the output": "" });
  await make("voice", "Bare chip", { "Fires at": "0.8–2", "Lets go at": "0.8–2", "Lowest safe level": "-0.5", "Highest safe level": "5.5" });

  await page.goto(`${rig}/songs`);
  await page.getByRole("button", { name: "Add a song" }).click();
  await page.getByLabel("Title").fill("First Light");
  await page.getByRole("button", { name: "Add this song" }).click();
  await expect(page.getByRole("heading", { name: "First Light" })).toBeVisible();

  const jack = (card: string, name: RegExp) => page.locator(`[data-card]:has-text("${card}") [data-jack]`).filter({ hasText: name });
  const id = async (card: string, name: RegExp) => `[data-jack="${await jack(card, name).getAttribute("data-jack")}"]`;

  // By drag: the pad onto the conditioner.
  await drag(page, await id("Bucket pad", /./), await id("Hot box", /Pad in/));
  await expect(page.getByRole("button", { name: /^Lead 1, Bucket pad .* to Hot box/ })).toBeVisible();

  // By keyboard: the conditioner's output, Enter, the list of free jacks with the verdict each would get, Enter.
  await page.locator(await id("Hot box", /Trigger out/)).focus();
  await page.keyboard.press("Enter");
  const option = page.getByRole("option", { name: /Bare chip/ });
  await expect(option.first()).toContainText("hot");
  await page.keyboard.type("Bare chip");
  await page.keyboard.press("Enter");
  const tag = page.getByRole("button", { name: /^Lead 2, Hot box .* to Bare chip/ });
  await expect(tag).toContainText("hot");
  await expect(tag).toContainText("V");
  await saved(page);

  // The verdict opens into its numbers; the fix has been checked; using it makes the lead good.
  await tag.click();
  const panel = page.getByRole("region", { name: /^Lead 2/ });
  await expect(panel).toContainText(/Up to \d+(\.\d+)? V can reach an input that stands 5\.5 V/);
  await panel.getByRole("button", { name: "Use this fix" }).first().click();
  await expect(tag).toContainText("good");
  await saved(page);
  const volts = (await tag.locator(".font-semibold").textContent())?.match(/[\d.]+–[\d.]+/)?.[0];
  expect(volts).toBeDefined();

  // Undo takes the fix away again, redo brings it back.
  await panel.getByRole("button", { name: "Close" }).click();
  await page.keyboard.press("Control+z");
  await expect(tag).toContainText("hot");
  await page.keyboard.press("Control+Shift+z");
  await expect(tag).toContainText("good");
  await saved(page);

  // What was saved is what a new visit shows.
  await page.reload();
  await expect(tag).toContainText("good");

  // The sheet: the lead, its volts and the song are in the PDF's text.
  const song = new URL(page.url()).pathname;
  const response = await page.request.get(`/api/v1${song}/sheet.pdf`);
  expect(response.headers()["content-type"]).toBe("application/pdf");
  const text = (await readPdf(await response.body())).join(" ");
  for (const words of ["First Light", "Shed rig", "Bucket pad", "Hot box", "Bare chip", "good"]) expect(text).toContain(words);
  expect(text.replace(/\s/g, "")).toContain(volts?.replace(/\s/g, ""));
});

test("a sound helper sees and prints, and cannot edit", async ({ page }) => {
  await signIn(page, "sound-helper");
  await page.goto("/rigs/marrow-lane/songs/wet-chalk");
  await expect(page.getByText("You can look and print")).toBeVisible();
  await expect(page.getByRole("button", { name: "Undo" })).toHaveCount(0);
  await expect(page.locator("[data-jack]").first()).toBeDisabled();
  const before = await (await page.request.get("/api/v1/rigs/marrow-lane/songs/wet-chalk/patch")).json();
  await drag(page, "[data-jack=pad-kick-out]", "[data-jack=cond-tom-pad]");
  expect(await (await page.request.get("/api/v1/rigs/marrow-lane/songs/wet-chalk/patch")).json()).toEqual(before);
  await page.getByRole("link", { name: "Patch sheet" }).click();
  await expect(page).toHaveURL(/\/sheet$/);
  const response = await page.request.get("/api/v1/rigs/marrow-lane/songs/wet-chalk/sheet.pdf");
  expect(response.status()).toBe(200);
  const text = (await readPdf(await response.body())).join(" ");
  for (const words of ["Wet Chalk", "Kick slab", "Kick trigger", "Low drum", "2.92–5.61"]) expect(text).toContain(words);
});
