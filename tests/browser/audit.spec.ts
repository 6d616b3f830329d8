import { expect, expectNoAxeFindings, signIn, test } from "./support.ts";

test("an administrator finds what changed, follows one object, saves a table and checks the seals", async ({
  page,
}) => {
  await signIn(page, "administrator");
  await page.goto("/settings");
  await page.getByRole("link", { name: "Audit trail" }).click();
  await expect(page.getByRole("heading", { level: 1, name: "Audit trail" })).toBeVisible();
  await expectNoAxeFindings(page);
  await page.getByLabel("Kind", { exact: true }).selectOption("film");
  await page.getByLabel("Done", { exact: true }).selectOption("created");
  await page.getByRole("button", { name: "Show" }).click();
  await expect(page).toHaveURL(/subject=film/);
  await expect(page.getByText(/^\d+ events found$/)).toBeVisible();
  const [file] = await Promise.all([
    page.waitForEvent("download"),
    page.getByRole("link", { name: "Save as CSV" }).click(),
  ]);
  expect(file.suggestedFilename()).toMatch(/\.csv$/);
  await page.getByRole("link", { name: "All events of this film" }).first().click();
  await expect(page).toHaveURL(/\/audit\?q=[0-9a-f-]{36}/);
  await expect(page.getByRole("row", { name: /film created/ })).toHaveCount(1);
  await page.getByRole("searchbox").fill("there is no such thing");
  await page.getByRole("button", { name: "Show" }).click();
  await expect(page.getByText("No event fits")).toBeVisible();

  await page.getByRole("link", { name: "Check the seals" }).click();
  await expect(page.getByText("Every event is as it was sealed, and none is missing.")).toBeVisible({
    timeout: 90_000,
  });
  await expectNoAxeFindings(page);
  await page.setViewportSize({ width: 390, height: 844 });
  for (const path of ["/audit", "/audit/seals"]) {
    await page.goto(path);
    expect(await page.evaluate(() => document.documentElement.scrollWidth - document.documentElement.clientWidth)).toBe(
      0,
    );
  }
});
