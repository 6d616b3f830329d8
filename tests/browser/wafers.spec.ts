import type { Page } from "@playwright/test";
import { expect, expectNoAxeFindingsInBothThemes, signIn, test } from "./support.ts";

const MAPS = ["The wafer after the film", "The wafer before the film", "What the film changed"];

/** The demo's wafer that was scanned along four lines. */
async function openWafer(page: Page): Promise<void> {
  await page.goto("/scans?q=M-0412");
  const scan = await page.getByRole("link", { name: /^M-0412, lot T-2611, slot 3, 45°/ }).getAttribute("href");
  const html = await (await page.request.get(scan ?? "")).text();
  await page.goto(/\/wafers\/[0-9a-f-]{36}/.exec(html)?.[0] ?? "");
  await expect(page.getByRole("heading", { level: 1, name: "M-0412" })).toBeVisible({ timeout: 15_000 });
}

test.describe("a wafer scanned along four lines", () => {
  test("shows its shape as maps and figures, its stress and the budget", async ({ page }) => {
    await signIn(page, "technician");
    await openWafer(page);
    const answer = page.getByRole("region", { name: "Answer" });
    await expect(answer).toContainText(/Polymer dielectric A: 3[01]\.\d+.±.0\.\d+.MPa, tension\./);
    // Other tests give the program films that are thicker than the monitor's, which the answer then says in place of the shape.
    await expect(page.getByText(/^Change by the film: bowl/)).toBeVisible();
    for (const of of MAPS)
      await expect(page.getByRole("img", { name: `${of}: heights over the wafer, notch down` })).toBeVisible();
    await expect(
      page.getByText(/^Centre of the median surface over the plane through three points/).first(),
    ).toBeVisible();
    await expect(page.getByText(/the same before and after: cancels/)).toBeVisible();
    await page.getByText(/^\d+ cannot be told$/).click();
    await expect(page.getByText(/^Measured minutes after cure: /)).toBeVisible();
  });

  test("has nothing that axe finds", async ({ page }) => {
    // A long page on a machine that does other things too.
    test.slow();
    await signIn(page, "engineer");
    await openWafer(page);
    await expectNoAxeFindingsInBothThemes(page);
  });

  test("fits a phone and a sheet of paper", async ({ page }) => {
    await signIn(page, "engineer");
    await page.setViewportSize({ width: 390, height: 844 });
    await openWafer(page);
    const overflow = () =>
      page.evaluate(() => document.documentElement.scrollWidth - document.documentElement.clientWidth);
    expect(await overflow()).toBe(0);
    await page.emulateMedia({ media: "print" });
    await expect(page.getByRole("button", { name: "Print" })).toBeHidden();
    await expect(page.getByText("Wafer M-0412, lot T-2611, slot 3, program Tern.")).toBeVisible();
  });

  test("is led to from each of its scans, whose page knows the instrument and the mistakes too", async ({ page }) => {
    await signIn(page, "technician");
    await page.goto("/scans?q=M-0412");
    await page.getByRole("link", { name: "M-0412, lot T-2611, slot 3, 45°" }).click();
    await expect(page.getByRole("heading", { level: 2, name: "Mistakes looked for" })).toBeVisible({ timeout: 10_000 });
    await expect(page.getByText(/The repeatability is that of Stylus 1\./)).toBeVisible();
    await expect(page.getByRole("link", { name: "M-0412, lot T-2611, slot 3", exact: true })).toHaveAttribute(
      "href",
      /^\/wafers\//,
    );
  });
});
