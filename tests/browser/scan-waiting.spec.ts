import type { Page } from "@playwright/test";
import { scanFile, trueScan } from "#tests/fixtures/scan-files.ts";
import { expect, expectNoAxeFindings, signIn, test } from "./support.ts";

const ownName = (letter: string) => `${letter}-${Math.random().toString(10).slice(2, 9)}`;

/** Brings one file in as the import screen would, without thicknesses, and gives its page in the queue. */
async function bring(page: Page, wafer: string, side: "before" | "after", times: number): Promise<string> {
  if (!page.url().endsWith("/scans/new")) await page.goto("/scans/new");
  const tern = page.getByLabel("Program", { exact: true }).locator("option", { hasText: "Tern" });
  const buffer = Buffer.from(scanFile(trueScan({ times }), {}).bytes);
  const answer = await page.request.post("/scans/import/file", {
    multipart: {
      program: (await tern.getAttribute("value")) ?? "",
      wafer,
      side,
      lines: "[[0,0]]",
      profile: "{}",
      orientation: "100",
      diameter: "200 mm",
      edgeExclusion: "5 mm",
      file: { name: `${wafer}_${side}.csv`, mimeType: "text/csv", buffer },
    },
  });
  const { placed } = (await answer.json()) as { placed: { waferScan: string }[] };
  return `/scans/waiting/${placed[0]?.waferScan}`;
}

test.use({ refusals: true });

test("a file waits, is put together with another by hand, and the scan can be undone", async ({ page }) => {
  test.slow();
  await signIn(page, "technician");
  const [wafer, wrong] = [ownName("W"), ownName("V")];
  const times = 1 + Math.random() / 10;
  const before = await bring(page, wafer, "before", times);
  await bring(page, wrong, "after", 1.8 * times);
  await page.goto(`/scans/waiting?q=${wafer}`);
  await expect(page.getByRole("row")).toHaveCount(2);
  await expectNoAxeFindings(page);
  await page.getByRole("link", { name: `${wafer}, 0°` }).click();
  await expect(page).toHaveURL(before);
  await expectNoAxeFindings(page);
  const partner = page.getByLabel("File after the film");
  await partner.selectOption({ label: await labelOf(page, wrong) });
  // Nobody has said the thicknesses yet: the form says so and keeps the partner.
  await page.getByRole("button", { name: "Make the scan" }).click();
  await expect(page.getByRole("alert")).toContainText("fields need a look");
  await expect(page.getByLabel("File after the film").locator("option:checked")).toContainText(wrong);
  await page.getByLabel("Film thickness").fill("5 um");
  await page.getByLabel("Silicon thickness").fill("725 um");
  await page.getByRole("button", { name: "Make the scan" }).click();
  await expect(page).toHaveURL(/\/scans\/[0-9a-f-]{36}$/);
  const scan = page.url();

  await page.getByText("Undo the import of this scan").click();
  await page.getByRole("button", { name: "Take apart" }).click();
  await expect(page).toHaveURL(/\/scans\/waiting$/);
  await expect(page.getByRole("link", { name: `${wafer}, 0°` })).toHaveCount(2);
  expect((await page.request.get(scan)).status()).toBe(404);
});

const labelOf = async (page: Page, wafer: string) =>
  (await page.getByLabel("File after the film").locator("option", { hasText: wafer }).textContent()) ?? "";

test("a file is moved to another wafer, and out of the queue, without scripts", async ({ page, browser }) => {
  test.slow();
  await signIn(page, "shift lead");
  const [wafer, other] = [ownName("W"), ownName("W")];
  const path = await bring(page, wafer, "before", 1 + Math.random() / 10);
  const context = await browser.newContext({ javaScriptEnabled: false });
  const still = await context.newPage();
  await signIn(still, "shift lead");
  await still.goto(path);
  await still.getByLabel("Azimuth from the notch").fill("400");
  await still.getByRole("button", { name: "Move the file" }).click();
  await expect(still.getByText("Type an angle of 0 to 360°.")).toBeVisible();
  await still.getByLabel("Azimuth from the notch").fill("45");
  await still.getByLabel("Wafer", { exact: true }).fill(other);
  await still.getByRole("button", { name: "Move the file" }).click();
  await expect(still.getByRole("heading", { level: 1, name: `${other}, 45°` })).toBeVisible();
  await still.getByText("Take it out of the queue").click();
  await still.getByRole("button", { name: "Undo the import" }).click();
  await expect(still).toHaveURL(/\/scans\/waiting$/);
  expect((await still.goto(path))?.status()).toBe(404);
  await context.close();
});

test("an import profile is renamed and removed", async ({ page }) => {
  test.slow();
  await signIn(page, "engineer");
  const [name, next] = [ownName("Stylus"), ownName("Stylus")];
  const kept = await page.request.post("/scans/import", { form: { name, profile: '{"decimalMark":"comma"}' } });
  expect(kept.ok()).toBe(true);
  await page.goto(`/import-profiles?q=${name}`);
  await expectNoAxeFindings(page);
  await expect(page.getByText("Decimal comma.")).toBeVisible();
  await page.getByText("Rename", { exact: true }).first().click();
  await page.getByLabel("Name of the instrument").fill(next);
  await page.getByRole("button", { name: `Rename ${name}` }).click();
  await expect(page.getByRole("heading", { level: 2, name: next })).toBeVisible();
  await page.goto(`/import-profiles?q=${next}`);
  await page.getByText("Remove", { exact: true }).click();
  await page.getByRole("button", { name: `Remove ${next}` }).click();
  await expect(page).toHaveURL(/\/import-profiles$/);
  await page.goto(`/import-profiles?q=${next}`);
  await expect(page.getByText("No instrument fits")).toBeVisible();
});
