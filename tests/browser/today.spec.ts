import { expect, expectNoAxeFindings, expectNoAxeFindingsInBothThemes, signInAtToday, test } from "./support.ts";

for (const role of ["engineer", "process owner", "shift lead", "technician"] as const)
  test(`a ${role} sees what waits, the newest scans and the programs`, async ({ page }) => {
    await signInAtToday(page, role);
    await expect(page.getByRole("heading", { level: 1, name: "Today" })).toBeVisible();
    await expect(page.getByText(/\d{4}-\d\d-\d\d, \d\d:\d\d UTC/)).toBeVisible();
    const programs = page.getByRole("table", { name: "Your programs" });
    for (const name of ["Tern", "Petrel", "Fulmar"]) await expect(programs).toContainText(name);
    await expect(page.getByRole("heading", { name: "Latest scans" })).toBeVisible();
    await page.getByRole("main").getByRole("link", { name: "Upload scans" }).click();
    await expect(page).toHaveURL(/\/scans\/new$/);
  });

test("counts lead to the lists of that program", async ({ page }) => {
  await signInAtToday(page, "engineer");
  await page.getByRole("link", { name: /^\d+ stacks of Petrel$/ }).click();
  await expect(page).toHaveURL(/\/stacks\?program=petrel$/);
});

test("a guest sees their program and nothing of the others", async ({ page }) => {
  await signInAtToday(page, "guest");
  await expect(page.getByText(/sheets? (is|are) in force for your programs\./)).toBeVisible();
  const main = page.getByRole("main");
  await expect(main).toContainText("Tern");
  for (const name of ["Petrel", "Fulmar", "Flows", "Stacks"]) await expect(main).not.toContainText(name);
  await expectNoAxeFindings(page);
});

test("axe finds nothing on Today", async ({ page }) => {
  await signInAtToday(page, "engineer");
  await expectNoAxeFindingsInBothThemes(page);
});

test("nothing is wider than a small phone", async ({ page }) => {
  await page.setViewportSize({ width: 320, height: 640 });
  await signInAtToday(page, "engineer");
  expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBeLessThanOrEqual(320);
});
