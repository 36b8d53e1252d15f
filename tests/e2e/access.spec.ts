import AxeBuilder from "@axe-core/playwright";
import { expect, test } from "@playwright/test";
import { RIG, signIn } from "./people";

const OPEN = ["/", "/sign-in", "/sign-up"];
const SIGNED_IN = ["/rigs", "/account", RIG, `${RIG}/gear`, `${RIG}/gear?assumed=yes`, `${RIG}/gear/new?kind=pad`, `${RIG}/gear/new?kind=conditioner`, `${RIG}/gear/new?kind=voice`, `${RIG}/gear/cond-tom`, `${RIG}/gear/cond-tom?edit=1`, `${RIG}/songs`, `${RIG}/songs/wet-chalk`, `${RIG}/songs/back-stairs`, `${RIG}/songs/slow-kettle/sheet`, `${RIG}/sets/pump-house`, `${RIG}/people`, "/no/such/page"];

for (const scheme of ["light", "dark"] as const) {
  for (const width of [390, 1440]) {
    test(`axe finds nothing, and no page scrolls sideways, at ${width} px in the ${scheme} theme`, async ({ browser }) => {
      test.setTimeout(240_000);
      const context = await browser.newContext({ colorScheme: scheme, viewport: { width, height: 900 } });
      const page = await context.newPage();
      const look = async (path: string) => {
        await page.goto(path);
        await page.waitForLoadState("load");
        await page.locator("h1").first().waitFor();
        const result = await new AxeBuilder({ page }).exclude("object, iframe").analyze();
        expect(result.violations.map((violation) => `${path}: ${violation.id} ${violation.nodes[0]?.target.join(" ")} ${violation.nodes[0]?.failureSummary ?? ""}`)).toEqual([]);
        expect(await page.evaluate(() => document.documentElement.scrollWidth - document.documentElement.clientWidth), path).toBeLessThanOrEqual(0);
      };
      for (const path of OPEN) await look(path);
      await signIn(page, "performer");
      for (const path of SIGNED_IN) await look(path);
      await page.goto(`${RIG}/songs/ladder-month`);
      const lead = width < 760 ? page.getByRole("button", { name: /Snare trigger · Trig out → Tin plate/ }) : page.getByRole("button", { name: /^Lead 2, .* to Tin plate/ });
      await lead.click();
      await expect(page.getByRole("region", { name: /^Lead 2/ })).toBeVisible();
      const result = await new AxeBuilder({ page }).analyze();
      expect(result.violations.map((violation) => `lead panel: ${violation.id} ${violation.nodes[0]?.target.join(" ")}`)).toEqual([]);
      await context.close();
    });
  }
}
