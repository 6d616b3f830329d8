import { expect, expectNoAxeFindings, signIn, test } from "./support.ts";

test.use({ refusals: true });

const day = (days: number) => new Date(Date.now() + days * 24 * 3600e3).toISOString().slice(0, 10);

test("a process owner names who stands in, with days, and ends it early", async ({ page }) => {
  await signIn(page, "process owner");
  await page.goto("/delegates");
  await page.getByRole("button", { name: "Name the delegate" }).click();
  await expect(page.getByText("Choose who stands in.")).toBeVisible();
  const who = page.getByLabel("Who", { exact: true });
  const petrel = who.locator("optgroup[label=Petrel] option").filter({ hasText: "engineer" }).first();
  await who.selectOption((await petrel.getAttribute("value")) ?? "");
  await page.getByLabel("First day").fill(day(40));
  await page.getByLabel("Last day").fill(day(38));
  await page.getByLabel("Why").fill("On leave");
  await page.getByRole("button", { name: "Name the delegate" }).click();
  await expect(page.getByText("The last day is before the first.")).toBeVisible();
  await expect(page.getByLabel("Why")).toHaveValue("On leave");
  await page.getByLabel("Last day").fill(day(44));
  await page.getByRole("button", { name: "Name the delegate" }).click();
  await expect(page.getByText("It is written down who stands in for you.")).toBeVisible();
  const row = page.getByRole("listitem").filter({ hasText: `${day(40)} to ${day(44)}` });
  await expect(row).toContainText("to come");
  await expectNoAxeFindings(page);
  await page.setViewportSize({ width: 320, height: 640 });
  expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBeLessThanOrEqual(320);
  await row.getByRole("button", { name: /^End it/ }).click();
  await expect(page.getByText("The delegation is ended.")).toBeVisible();
  await expect(row).toContainText("ended early");
});

test("a technician reads who stands in and names nobody", async ({ page }) => {
  await page.emulateMedia({ colorScheme: "dark" });
  await signIn(page, "technician");
  await page.goto("/delegates");
  await expect(page.getByRole("heading", { level: 1, name: "Delegates" })).toBeVisible();
  await expect(page.getByRole("button", { name: "Name the delegate" })).toHaveCount(0);
  await expectNoAxeFindings(page);
});
