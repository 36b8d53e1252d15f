import { expect, test, type Page } from "@playwright/test";
import { RIG, signUp } from "./people";

async function signInHere(page: Page): Promise<void> {
  await page.getByLabel("E-mail").fill("performer@marrowlane.example");
  await page.getByLabel("Password").fill("two-tea-trolleys");
  await page.getByRole("button", { name: "Sign in", exact: true }).click();
}

for (const path of [`${RIG}/songs/wet-chalk`, `${RIG}/gear`, `${RIG}/people`, "/account"]) {
  test(`a visitor at ${path} signs in and comes back to it`, async ({ page }) => {
    await page.goto(path);
    await expect(page).toHaveURL(/\/sign-in\?from=/);
    await expect(page.getByText("Marrow Lane")).toHaveCount(0);
    await signInHere(page);
    await expect(page).toHaveURL(new RegExp(`${path}$`));
  });
}

test("signing in never leads to another site", async ({ page, baseURL }) => {
  await page.goto(`/sign-in?from=${encodeURIComponent("/\t/elsewhere.example/")}`);
  await signInHere(page);
  await expect(page).toHaveURL(`${baseURL}/rigs`);
});

test("the example answers before anything is typed, and shows no verdict on figures it cannot read", async ({ page }) => {
  let asked = 0;
  page.on("request", (request) => { if (request.url().endsWith("/api/v1/connection")) asked += 1; });
  await page.goto("/");
  const fixed = page.getByText("What would mend it");
  await expect(page.getByText("Up to 8.02 V can reach an input that stands 5.5 V at most.")).toBeVisible();
  await expect(fixed).toBeVisible();
  const struck = page.getByLabel("When struck");
  await struck.fill("");
  await struck.pressSequentially("3.3 V", { delay: 30 });
  await expect(page.getByText("3.27 V when struck, 0 V at rest; the input is sure to fire from 2 V.")).toBeVisible();
  await expect(fixed).toHaveCount(0);
  expect(asked, "typing settles before the server is asked").toBeLessThanOrEqual(2);
  await struck.fill("nine");
  await expect(page.getByText("No verdict on these figures.")).toBeVisible();
  await expect(struck).toHaveAttribute("aria-invalid", "true");
  await expect(page.getByText(/is sure to fire from/)).toHaveCount(0);
});

test("a name on tape keeps the whole ring of the focus", async ({ page }) => {
  await page.goto("/");
  await page.keyboard.press("Tab");
  await page.keyboard.press("Tab");
  const name = page.getByRole("link", { name: "Knockwire" });
  await expect(name).toBeFocused();
  const look = await name.evaluate((link) => ({ clip: getComputedStyle(link).clipPath, outline: getComputedStyle(link).outlineWidth }));
  expect(look).toEqual({ clip: "none", outline: "3px" });
});

test("the first steps stay until a lead is plugged, and say which are done", async ({ page }) => {
  await signUp(page, "Step Taker");
  await page.getByLabel("Its name").fill("Shed");
  await page.getByRole("button", { name: "Make this rig" }).click();
  await page.getByRole("link", { name: "Add a pad" }).click();
  await page.getByRole("button", { name: "Add to the rig" }).click();
  await expect(page).not.toHaveURL(/\/new/);
  await page.getByRole("link", { name: "Overview" }).click();
  await expect(page.getByRole("heading", { name: "1. What do you hit? Done" })).toBeVisible();
  await expect(page.locator("[aria-current=step]")).toContainText("2. What turns it into a pulse?");
});
