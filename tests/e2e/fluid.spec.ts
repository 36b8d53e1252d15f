import { expect, test } from "@playwright/test";
import { seededRandom } from "../../lib/core/electrics/tolerance/seeded-random";
import { signIn } from "./people";

/* 60 cards and 100 leads: no task over 50 ms while a card, and then a lead, is dragged. */
test("a board of 60 cards and 100 leads stays fluid while dragging", async ({ page }) => {
  test.setTimeout(180_000);
  await signIn(page, "performer");
  const { rig } = (await (await page.request.post("/api/v1/rigs", { data: { name: "Sixty cards" } })).json()) as { rig: { id: string } };
  const at = `/api/v1/rigs/${rig.id}`;
  const output = (id: string, signal: string) => ({ id, direction: "output", name: id, connector: "6.35 mm TS", role: "plain", output: { signal, polarity: "rising", restV: 0, activeV: 5, sourceOhm: 1000, pulseS: 0.002, decayS: null, limitA: 0.02, or: true } });
  const input = (id: string, accepts: string) => ({ id, direction: "input", name: id, connector: "6.35 mm TS", role: "plain", input: { accepts: [accepts], polarity: "rising", onV: accepts === "audio" ? null : "1–2", offV: null, safeLowV: -12, safeHighV: 12, loadOhm: 100000, biasV: null, pulseMinS: null, pulseMaxS: null, decayMinS: null, clamp: null, maxDbu: null, phantom: false } });
  const jacks: Record<"outs" | "ins", string[][]> = { outs: [[], [], [], []], ins: [[], [], [], []] };
  for (let i = 0; i < 60; i += 1) {
    const lane = i % 4;
    const kind = (["pad", "shaper", "voice", "desk-channel"] as const)[lane] as string;
    const details = kind === "pad" ? { kind, sensor: "resistive", restOhm: "47k", hitOhm: "10k", riseS: "1m", holdS: "5m", fallS: "30m", farad: null, peakV: null } : kind === "desk-channel" ? { kind, channel: (i >> 2) + 1 } : { kind };
    const signal = lane === 2 ? "audio" : "trigger";
    const parts = lane === 3 ? [input("in-1", "audio"), input("in-2", "audio")] : lane === 0 ? [output("out-1", signal), output("out-2", signal)] : [input("in-1", "trigger"), input("in-2", "trigger"), output("out-1", signal), output("out-2", signal)];
    const response = await page.request.post(`${at}/gear`, { data: { name: `Card ${i + 1}`, notes: "", supplyId: null, details, jacks: parts, knobs: [], assumed: [] } });
    expect(response.status()).toBe(201);
    const { gear } = (await response.json()) as { gear: { jacks: { id: string; direction: string }[] } };
    for (const jack of gear.jacks) jacks[jack.direction === "output" ? "outs" : "ins"][lane]?.push(jack.id);
  }
  const { song } = (await (await page.request.post(`${at}/songs`, { data: { title: "A hundred leads", tempoBpm: null, notes: "" } })).json()) as { song: { id: string } };
  const random = seededRandom(5);
  const pick = (list: readonly string[]) => list[Math.floor(random() * list.length)] as string;
  const pairs = new Set<string>();
  while (pairs.size < 100) {
    const lane = Math.floor(random() * 3);
    pairs.add(`${pick(jacks.outs[lane] ?? [])}>${pick(jacks.ins[lane + 1] ?? [])}`);
  }
  const leads = [...pairs].map((pair, i) => ({ id: `lead-${i}`, number: i + 1, colour: "black", outputId: pair.split(">")[0], inputId: pair.split(">")[1] }));
  expect((await page.request.put(`${at}/songs/${song.id}/patch`, { data: { baseRevision: 0, patch: { leads, knobs: [], lanes: [[], [], [], []] } } })).status()).toBe(200);

  await page.goto(`/rigs/${rig.id}/songs/${song.id}`);
  await expect(page.locator("[data-card]")).toHaveCount(60);
  await page.getByLabel("Fold unpatched cards").uncheck();
  await page.waitForTimeout(1500);
  await page.evaluate(() => {
    const tasks: number[] = [];
    (window as unknown as { longTasks: number[] }).longTasks = tasks;
    new PerformanceObserver((list) => tasks.push(...list.getEntries().map((entry) => entry.duration))).observe({ entryTypes: ["longtask"] });
  });
  const sweep = async (selector: string, dx: number, dy: number) => {
    const box = await page.locator(selector).first().boundingBox();
    if (!box) throw new Error(`no ${selector}`);
    const [x, y] = [box.x + box.width / 2, box.y + box.height / 2];
    await page.mouse.move(x, y);
    await page.mouse.down();
    for (let i = 1; i <= 60; i += 1) await page.mouse.move(x + (dx * i) / 60, y + (dy * i) / 60);
    await page.waitForTimeout(200);
    await page.keyboard.press("Escape");
    await page.mouse.up();
    await page.waitForTimeout(300);
  };
  // Another program on the machine can take a turn too: of three tries one must be clean.
  const tries: number[][] = [];
  for (let attempt = 0; attempt < 3 && !tries.some((tasks) => tasks.length === 0); attempt += 1) {
    await page.evaluate(() => ((window as unknown as { longTasks: number[] }).longTasks.length = 0));
    await sweep("[data-card] > .tape", 10, 420);
    await sweep("[data-jack]", 420, 300);
    tries.push(await page.evaluate(() => [...(window as unknown as { longTasks: number[] }).longTasks]));
  }
  console.log("tasks over 50 ms while dragging, try by try:", tries);
  expect(tries).toContainEqual([]);
});
