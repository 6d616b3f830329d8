import type { Page } from "@playwright/test";
import { expect, expectNoAxeFindings, signIn, test } from "./support.ts";

/** Ids of the demo's own flows, which no other test changes. */
async function demoFlows(page: Page): Promise<string[]> {
  const ids: string[] = [];
  for (const name of ["Tern T-2, to 100", "Petrel P-3", "Fulmar F-1"]) {
    await page.goto(`/flows?q=${encodeURIComponent(name)}&sort=name`);
    ids.push((await page.getByRole("checkbox").first().getAttribute("value")) ?? "");
  }
  return ids;
}

test.describe("an engineer", () => {
  test.beforeEach(({ page }) => signIn(page, "engineer"));

  test("ticks flows in the list and sees along the steps which is tightest where", async ({ page }) => {
    await page.goto("/flows");
    const boxes = page.getByRole("checkbox");
    await boxes.nth(0).check();
    await boxes.nth(1).check();
    await page.getByRole("button", { name: "Compare", exact: true }).click();
    await expect(page).toHaveURL(/\/flows\/compare\?of=/);
    await expect(page.getByRole("region", { name: "Compared" }).getByRole("listitem")).toHaveCount(2);
    await expect(page.getByRole("heading", { name: /Warp along the steps/ })).toBeVisible();
    await expectNoAxeFindings(page);
  });

  test("has it on a phone and in the dark without scrolling sideways", async ({ page }) => {
    const ids = await demoFlows(page);
    await page.setViewportSize({ width: 390, height: 844 });
    await page.emulateMedia({ colorScheme: "dark" });
    await page.goto(`/flows/compare?of=${ids.join(",")}`);
    expect(await page.evaluate(() => document.documentElement.scrollWidth <= innerWidth)).toBe(true);
    await expectNoAxeFindings(page);
  });

  for (const paper of ["a4", "letter"])
    for (const along of ["steps", "thickness"])
      test(`prints it along ${along} on one page of ${paper}`, async ({ page }) => {
        const ids = await demoFlows(page);
        await page.goto(`/flows/compare/print?of=${ids.join(",")}&along=${along}&paper=${paper}`);
        await expect(page.getByText("Computed, not released: not for the floor")).toBeVisible();
        const pdf = await page.pdf({ preferCSSPageSize: true, printBackground: true });
        expect(pdf.toString("latin1").match(/\/Type\s*\/Page\b(?!s)/g)).toHaveLength(1);
      });
});

test("a guest compares no flows", async ({ page }) => {
  await signIn(page, "guest");
  expect((await page.request.get("/flows/compare")).status()).toBe(403);
});
