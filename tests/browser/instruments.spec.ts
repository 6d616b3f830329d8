import type { Page } from "@playwright/test";
import { monitorProfile, profileCsv } from "#app/db/seeders/demo-monitor.ts";
import { expect, expectNoAxeFindings, signIn, test } from "./support.ts";

/** An instrument of this test alone, so that no test counts on another's data. */
async function ownInstrument(page: Page): Promise<{ name: string; path: string }> {
  const name = `Stylus ${Math.random().toString(36).slice(2, 10)}`;
  const { location } = (await page.request.post("/instruments", { form: { name }, maxRedirects: 0 })).headers();
  if (!location) throw new Error("the instrument was not added");
  return { name, path: location };
}

const repeat = (seed: number) => ({
  name: `repeat-${seed}.csv`,
  mimeType: "text/csv",
  buffer: Buffer.from(profileCsv(monitorProfile("before", { seed }))),
});

const answer = (page: Page) => page.getByRole("region", { name: "Answer" });
const readAndKeep = (page: Page) => page.getByRole("button", { name: "Read and keep" }).click();

test.describe("a technician", () => {
  test.use({ refusals: true });
  test.beforeEach(({ page }) => signIn(page, "technician"));

  test("adds an instrument by its name, once", async ({ page }) => {
    const { name } = await ownInstrument(page);
    await page.goto(`/instruments?q=${name}`);
    await expect(page.getByRole("row", { name })).toContainText("not known");
    await page.getByLabel("Name", { exact: true }).fill(name);
    await page.getByRole("button", { name: "Add" }).click();
    await expect(page.getByText("There is already an instrument of that name.")).toBeVisible({ timeout: 10_000 });
  });

  test("studies it with files: two are too few, five say how it repeats", async ({ page }) => {
    const { path } = await ownInstrument(page);
    await page.goto(`${path}/study`);
    await page.getByLabel("Wafer", { exact: true }).fill("M-0388");
    await page.getByLabel("Diameter").fill("200 mm");
    await page.getByLabel("Files of the repeats").setInputFiles([1, 11].map(repeat));
    await readAndKeep(page);
    await expect(page.getByText("2 repeats are too few")).toBeVisible({ timeout: 10_000 });
    await expect(page.getByLabel("Wafer", { exact: true })).toHaveValue("M-0388");
    await page.getByLabel("Files of the repeats").setInputFiles([1, 11, 21, 31, 41].map(repeat));
    await readAndKeep(page);
    await expect(answer(page)).toContainText(/a curvature repeats within ±.0\.0\d+.1\/km/, { timeout: 10_000 });
    await page.getByText("Repeats and working").click();
    await expect(page.getByRole("row", { name: /repeat-31\.csv/ })).toContainText(/0\.[78]\d+/);
  });

  test("sets a study aside with its reason", async ({ page }) => {
    const { path } = await ownInstrument(page);
    const multipart = {
      wafer: "M-1",
      diameter: "200 mm",
      edgeExclusion: "5 mm",
      typedAs: "bow",
      typed: "1 µm\n2 µm\n3 µm",
    };
    await page.request.post(`${path}/study`, { multipart });
    await page.goto(path);
    await page.getByText("Set aside", { exact: true }).first().click();
    await page.getByLabel("Why it does not count").fill("stage was knocked");
    await page.getByRole("button", { name: "Set aside" }).click();
    await expect(page.getByText("stage was knocked")).toBeVisible({ timeout: 10_000 });
    await expect(answer(page)).toContainText("how well it repeats is not known");
  });

  test("reads a wafer of known bow that is new, then the same again", async ({ page }) => {
    const { name, path } = await ownInstrument(page);
    const wafer = `R of ${name}`;
    await page.goto(`${path}/reference`);
    await page.getByLabel("Wafer of known bow").selectOption("");
    await page.getByLabel("Bow as read").fill("-45.3 µm");
    await page.getByLabel("Name", { exact: true }).fill(wafer);
    await page.getByLabel("Diameter").fill("200 mm");
    await page.getByLabel("Known bow", { exact: true }).fill("-45 µm");
    await page.getByLabel("Its uncertainty, k = 2").fill("0.4 µm");
    await page.getByRole("button", { name: "Keep the reading" }).click();
    const section = page.getByRole("region", { name: wafer, exact: true });
    await expect(section).toContainText("Without a repeatability study", { timeout: 10_000 });
    await page.getByRole("link", { name: "New reading" }).click();
    await page.getByLabel("Wafer of known bow").selectOption({ label: `${wafer}: −45.00 ± 0.40 µm, 200 mm` });
    await page.getByLabel("Bow as read").fill("-45.1 µm");
    await page.getByRole("button", { name: "Keep the reading" }).click();
    await expect(section).toContainText("Control limits come with 3 more readings.", { timeout: 10_000 });
  });
});

test("an administrator looks at an instrument and changes nothing", async ({ page }) => {
  await signIn(page, "administrator");
  await page.goto("/instruments?q=Stylus 1");
  await page.getByRole("link", { name: "Stylus 1", exact: true }).click();
  await expect(page.getByRole("heading", { level: 1, name: "Stylus 1" })).toBeVisible();
  await expect(page.getByRole("link", { name: "New study" })).toHaveCount(0);
  await expect(page.getByText("Set aside", { exact: true })).toHaveCount(0);
  await expectNoAxeFindings(page);
});

for (const part of ["", "/study", "/reference"])
  test(`axe finds nothing on ${part || "an instrument"}`, async ({ page }) => {
    await signIn(page, "technician");
    const { path } = await ownInstrument(page);
    await page.goto(`${path}${part}`);
    await expectNoAxeFindings(page);
  });

test.describe("without scripts", () => {
  test.use({ javaScriptEnabled: false, refusals: true });

  test("a study is typed, refused at its line, and kept", async ({ page }) => {
    await signIn(page, "engineer");
    const { path } = await ownInstrument(page);
    await page.goto(`${path}/study`);
    await page.getByLabel("Wafer", { exact: true }).fill("M-1");
    await page.getByLabel("Diameter").fill("200 mm");
    await page.getByLabel("Readings").fill("-4.0 µm\n-4.1\n-3.9 µm");
    await readAndKeep(page);
    await expect(page.getByText(/^Line 2: /)).toBeVisible();
    await page.getByLabel("Readings").fill("-4.0 µm\n-4.1 µm\n-3.9 µm");
    await readAndKeep(page);
    await expect(answer(page)).toContainText("a curvature repeats within");
  });
});
