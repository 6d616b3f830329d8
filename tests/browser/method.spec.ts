import { expect, expectNoAxeFindingsInBothThemes, signIn, signInAtToday, test } from "./support.ts";

test("the method page leads to equations, rules, cautions and words by their anchors", async ({ page }) => {
  await signInAtToday(page, "engineer");
  await page.getByRole("link", { name: "Method", exact: true }).click();
  const nav = page.getByRole("navigation", { name: "On this page" });
  for (const name of ["Handling rules", "Equations", "What is left out", "Cautions", "Glossary", "Sources"]) {
    await nav.getByRole("link", { name, exact: true }).click();
    await expect(page.getByRole("heading", { level: 2, name, exact: true })).toBeInViewport();
  }
  await page.goto("/method#equation-stoney-curvature");
  await expect(page.getByRole("heading", { name: "Curvature from a thin film's stress" })).toBeInViewport();
  await page.goto("/method#rule-2");
  await expect(page.getByRole("heading", { name: /^2\. Warp/ })).toBeInViewport();
  await page.getByRole("link", { name: "Cautions" }).last().click();
  await expect(page).toHaveURL(/\/method#cautions$/);
  await expect(page.getByRole("list", { name: "Cautions" })).toContainText("razor-sharp shards");
});

test("axe finds nothing on the method page", async ({ page }) => {
  // The longest page of all.
  test.slow();
  await signIn(page, "engineer");
  await page.goto("/method");
  await expectNoAxeFindingsInBothThemes(page);
});

test("the staff sees the site's limits, a guest the rules alone", async ({ page, browser }) => {
  await signIn(page, "technician");
  await page.goto("/method");
  await expect(page.getByRole("table", { name: "Limits of rule 1", exact: true })).toContainText("common practice");
  const guest = await browser.newPage();
  await signIn(guest, "guest");
  await guest.goto("/method");
  await expect(guest.getByRole("heading", { name: /^1\. / })).toBeVisible();
  await expect(guest.getByText("Value here")).toHaveCount(0);
  await guest.close();
});

test("nothing is wider than a small phone", async ({ page }) => {
  await page.setViewportSize({ width: 320, height: 640 });
  await signIn(page, "guest");
  await page.goto("/method");
  expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBeLessThanOrEqual(320);
});
