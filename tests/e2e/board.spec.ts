import { expect, test } from "@playwright/test";
import { drag, newSong, RIG, saved, signIn, signUp } from "./people";

const tag = (number: number) => new RegExp(`^Lead ${number}, .* to `);

test.describe("the board", () => {
  test.beforeEach(async ({ page }) => signIn(page, "performer"));

  test("plugs by tapping one jack, then the other, and unplugs with Delete; undo brings it back", async ({ page }) => {
    const song = await newSong(page.request, "Tapped");
    await page.goto(`${RIG}/songs/${song}`);
    await page.locator("[data-jack=pad-snare-out]").click();
    await expect(page.getByText("now tap the other end")).toBeVisible();
    // Every free jack says beforehand what it would be.
    await expect(page.locator("[data-jack=cond-snare-pad]")).toContainText("good");
    await page.locator("[data-jack=cond-snare-pad]").click();
    const lead = page.getByRole("button", { name: tag(1) });
    await expect(lead).toContainText("good");
    await saved(page);
    await lead.focus();
    await page.keyboard.press("Delete");
    await expect(lead).toHaveCount(0);
    await page.keyboard.press("Control+z");
    await expect(lead).toBeVisible();
    await saved(page);
  });

  test("a lead dragged off its input is unplugged, and dragged to another input is moved", async ({ page }) => {
    const song = await newSong(page.request, "Dragged", "wet-chalk");
    await page.goto(`${RIG}/songs/${song}`);
    await page.getByLabel("Fold unpatched cards").uncheck();
    await drag(page, '[data-lead-tag="wet-chalk-2"]', "[data-jack=voice-snare-trig]");
    await expect(page.getByRole("button", { name: /^Lead 2, Kick trigger · Trig out to Snare · Trig/ })).toBeVisible();
    await drag(page, '[data-lead-tag="wet-chalk-2"]', "h1");
    await expect(page.getByRole("button", { name: tag(2) })).toHaveCount(0);
    await saved(page);
  });

  test("a card moves within its lane by pointer and by keyboard", async ({ page }) => {
    const song = await newSong(page.request, "Moved");
    await page.goto(`${RIG}/songs/${song}`);
    const order = () => page.getByRole("group", { name: "Pads" }).locator("[data-card]").evaluateAll((cards) => cards.sort((a, b) => a.getBoundingClientRect().top - b.getBoundingClientRect().top).map((card) => card.getAttribute("data-card")));
    expect((await order()).slice(0, 2)).toEqual(["pad-kick", "pad-snare"]);
    await drag(page, "[data-card=pad-kick] > .tape", "[data-card=pad-snare] > .tape");
    await expect.poll(async () => (await order()).slice(0, 2)).toEqual(["pad-snare", "pad-kick"]);
    await saved(page);
    await page.locator("[data-card=pad-snare] > .tape").focus();
    await page.keyboard.press("Space");
    await page.waitForTimeout(200);
    await page.keyboard.press("ArrowDown");
    await page.waitForTimeout(300);
    await page.keyboard.press("Space");
    await expect.poll(async () => (await order()).slice(0, 2)).toEqual(["pad-kick", "pad-snare"]);
  });

  test("a knob is set as a clock position and left alone again", async ({ page }) => {
    const song = await newSong(page.request, "Turned");
    await page.goto(`${RIG}/songs/${song}`);
    await page.getByRole("button", { name: /^Knobs of Low drum/ }).click();
    const dialog = page.getByRole("dialog");
    await dialog.getByRole("button", { name: "Set Pitch" }).click();
    await dialog.getByRole("slider").first().press("ArrowRight");
    await expect(dialog).toContainText("half past 12");
    await dialog.getByRole("button", { name: "Done" }).click();
    await expect(page.getByRole("button", { name: /^Knobs of Low drum: Pitch at half past 12/ })).toBeVisible();
    await saved(page);
  });

  test("cards are unfolded and picked by key, and the focus stays where the work is", async ({ page }) => {
    const song = await newSong(page.request, "By key", "wet-chalk");
    await page.goto(`${RIG}/songs/${song}`);
    const focused = () => page.evaluate(() => document.activeElement?.getAttribute("data-jack") ?? document.activeElement?.getAttribute("data-lead-tag"));
    await expect(page.locator("[data-jack=pad-snare-out]")).toHaveCount(0);
    await page.locator("[data-card=pad-snare] > .tape").press("Enter");
    await expect(page.locator("[data-jack=pad-snare-out]")).toBeVisible();
    // The mark of the focus is not cut off by the tape's torn edge.
    expect(await page.locator("[data-card=pad-snare] > .tape").evaluate((tape) => getComputedStyle(tape).clipPath)).toBe("none");

    const lead = page.locator("[data-lead-tag=wet-chalk-2]");
    await lead.press("Enter");
    await expect(page.getByRole("region", { name: /^Lead 2/ })).toBeVisible();
    await page.keyboard.press("Escape");
    expect(await focused()).toBe("wet-chalk-2");
    await page.keyboard.press("Delete");
    await expect(lead).toHaveCount(0);
    await expect.poll(focused).toBe("voice-low-trig");
  });

  test("a bare pad on a voice is led through a free conditioner by its fix", async ({ page }) => {
    const song = await newSong(page.request, "Led through");
    await page.goto(`${RIG}/songs/${song}`);
    await page.locator("[data-jack=pad-snare-out]").click();
    await page.locator("[data-jack=voice-snare-trig]").click();
    const lead = page.getByRole("button", { name: tag(1) });
    await expect(lead).toContainText("wrong-kind");
    await lead.click();
    await page.getByRole("button", { name: "Use this fix" }).click();
    await expect(lead).toContainText(/good|tight/);
    await expect(page.getByRole("button", { name: /^Lead 2, .* to Snare · Trig/ })).toContainText(/good|tight/);
    await saved(page);
  });

  test("all four lanes fit a tablet held upright, and a phone reaches the knobs", async ({ page }) => {
    await page.setViewportSize({ width: 820, height: 1180 });
    await page.goto(`${RIG}/songs/wet-chalk`);
    await expect(page.locator("[data-card=desk-1]")).toBeInViewport({ ratio: 1 });
    await page.setViewportSize({ width: 390, height: 844 });
    await page.locator("summary", { hasText: "Knobs" }).click();
    await page.getByRole("button", { name: /^Knobs of Low drum/ }).click();
    await expect(page.getByRole("dialog").getByRole("slider")).toHaveCount(2);
  });

  test("the list of runs is one key away", async ({ page }) => {
    await page.goto(`${RIG}/songs/wet-chalk`);
    await page.locator("h1").click();
    await page.keyboard.press("r");
    await expect(page.getByRole("heading", { name: /Kick slab → Kick trigger → Low drum → Ch 1/ })).toBeVisible();
  });

  test("closing the tab mid-edit loses nothing older than a second", async ({ page, context }) => {
    const song = await newSong(page.request, "Closed");
    await page.goto(`${RIG}/songs/${song}`);
    await page.locator("[data-jack=pad-kick-out]").click();
    await page.locator("[data-jack=cond-kick-pad]").click();
    await expect(page.getByRole("button", { name: tag(1) })).toBeVisible();
    await page.close({ runBeforeUnload: true });
    const again = await context.newPage();
    await again.goto(`${RIG}/songs/${song}`);
    await expect(again.getByRole("button", { name: tag(1) })).toBeVisible();
    await saved(again);
  });

  test("what is undone and redone before it was saved leaves nothing behind that a reload would bring back", async ({ page }) => {
    const song = await newSong(page.request, "There and back", "wet-chalk");
    await page.goto(`${RIG}/songs/${song}`);
    const lead = page.getByRole("button", { name: tag(2) });
    await page.locator("[data-lead-tag=wet-chalk-2]").press("Delete");
    await expect(lead).toHaveCount(0);
    await saved(page);
    // Well inside the quiet half second before a save.
    await page.keyboard.press("Control+z");
    await expect(lead).toBeVisible();
    await page.keyboard.press("Control+Shift+z");
    await expect(lead).toHaveCount(0);
    await page.waitForTimeout(1200);
    expect(await page.evaluate((id) => localStorage.getItem(`patch-draft-1:${id}`), song)).toBeNull();
    await page.reload();
    await expect(page.locator("[data-card=voice-low]")).toBeVisible();
    await page.waitForTimeout(1000);
    await expect(lead).toHaveCount(0);
  });

  test("a save that the server does not answer is kept and sent again", async ({ page }) => {
    const song = await newSong(page.request, "Offline");
    await page.goto(`${RIG}/songs/${song}`);
    await page.route("**/patch", (route) => (route.request().method() === "PUT" ? route.abort() : route.continue()));
    await page.locator("[data-jack=pad-kick-out]").click();
    await page.locator("[data-jack=cond-kick-pad]").click();
    await expect(page.getByText("Not saved:")).toBeVisible();
    await page.unroute("**/patch");
    await saved(page);
  });
});

test("two people on one song keep both their leads, and are asked about one knob", async ({ browser }) => {
  const [one, two] = [await (await browser.newContext()).newPage(), await (await browser.newContext()).newPage()];
  await signIn(one, "performer");
  await signIn(two, "collaborator");
  const song = await newSong(one.request, "Shared");
  await Promise.all([one.goto(`${RIG}/songs/${song}`), two.goto(`${RIG}/songs/${song}`)]);
  const plug = async (page: typeof one, from: string, to: string) => {
    await page.locator(`[data-jack=${from}]`).click();
    await page.locator(`[data-jack=${to}]`).click();
  };
  await plug(one, "pad-kick-out", "cond-kick-pad");
  await saved(one);
  await plug(two, "pad-snare-out", "cond-snare-pad");
  await expect(two.getByText("Both their changes and yours are here")).toBeVisible();
  await saved(two);
  await expect(two.getByRole("button", { name: /to Kick trigger · Pad in/ })).toBeVisible();
  await expect(two.getByRole("button", { name: /to Snare trigger · Pad in/ })).toBeVisible();

  await one.reload();
  await Promise.all([one, two].map((page) => page.getByLabel("Fold unpatched cards").uncheck()));
  const turn = async (page: typeof one, key: string) => {
    await page.getByRole("button", { name: /^Knobs of Low drum/ }).click();
    await page.getByRole("dialog").getByRole("button", { name: "Set Pitch" }).click();
    await page.getByRole("dialog").getByRole("slider").first().press(key);
    await page.getByRole("dialog").getByRole("button", { name: "Done" }).click();
  };
  await turn(one, "Home");
  await saved(one);
  await turn(two, "End");
  const asked = two.getByRole("dialog", { name: "Somebody else changed the same thing" });
  await expect(asked).toContainText("Low drum · Pitch");
  // Escape chooses nothing: neither side is thrown away, and the question stays, even for a new visit.
  await two.keyboard.press("Escape");
  await expect(two.getByText("Not saved: somebody else changed the same thing.")).toBeVisible();
  await expect(two.getByRole("button", { name: /^Knobs of Low drum: Pitch at 5 o’clock/ })).toBeVisible();
  await two.reload();
  await expect(asked).toBeVisible();
  await two.keyboard.press("Escape");
  await two.getByRole("button", { name: "Choose whose stays" }).click();
  await asked.getByText("All that each of you changed").click();
  await expect(asked).toContainText("Low drum · Pitch: not set → 5 o’clock.");
  await asked.getByRole("button", { name: "Keep all of mine" }).click();
  await saved(two);
  const stored = (await (await two.request.get(`/api/v1${RIG}/songs/${song}/patch`)).json()) as { patch: { knobs: { position: number }[]; leads: unknown[] } };
  expect(stored.patch.knobs[0]?.position).toBe(1);
  expect(stored.patch.leads).toHaveLength(2);
});

test("a set list is ordered by dragging, by keys and by buttons", async ({ page }) => {
  await signIn(page, "performer");
  await page.goto(`${RIG}/sets/pump-house`);
  const titles = () => page.locator("[data-set-song]").evaluateAll((rows) => rows.map((row) => row.getAttribute("data-set-song")));
  const [first, second] = await titles();
  await drag(page, `[data-set-song="${first}"] .tape`, `[data-set-song="${second}"] .tape`);
  await expect.poll(async () => (await titles()).slice(0, 2)).toEqual([second, first]);
  await page.getByRole("button", { name: `Move ${first} up` }).click();
  await expect.poll(async () => (await titles()).slice(0, 2)).toEqual([first, second]);
  await expect(page.getByText(/Saved · revision/)).toBeVisible();
  await page.reload();
  expect((await titles()).slice(0, 2)).toEqual([first, second]);
});

test("an empty rig has its first run on the board after three questions", async ({ page }) => {
  await signUp(page, "First Run");
  const { rig } = (await (await page.request.post("/api/v1/rigs", { data: { name: "Three questions" } })).json()) as { rig: { id: string } };
  const { song } = (await (await page.request.post(`/api/v1/rigs/${rig.id}/songs`, { data: { title: "One", tempoBpm: null, notes: "" } })).json()) as { song: { id: string } };
  await page.goto(`/rigs/${rig.id}/songs/${song.id}`);
  for (const [question, cards] of [["1 of 3: What do you hit?", 1], ["2 of 3: What turns it into a pulse?", 2], ["3 of 3: What should sound?", 3]] as const) {
    await expect(page.getByText(question)).toBeVisible();
    await page.locator("main li button").first().click();
    await expect(page.locator("[data-card]")).toHaveCount(cards);
  }
  // The third answer plugs the run.
  await expect(page.locator("[data-lead-tag]")).toHaveCount(2);
  await saved(page);
  // Assumed figures are marked, and one measurement is named.
  for (const lead of await page.locator("[data-lead-tag]").all()) await expect(lead).toContainText("*");
  await expect(page.getByText("Measure next:")).toBeVisible();
});
