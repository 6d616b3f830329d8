import { readFileSync } from "node:fs";
import type { Page } from "@playwright/test";
import {
  expect,
  expectNoAxeFindings,
  expectNoAxeFindingsInBothThemes,
  scriptsAtWork,
  signIn,
  test,
} from "./support.ts";

const PETREL = "Petrel P-3, back-side metal";
const MAP = "?x=silicon&x-from=40+um&x-to=775+um&y=temperature&y-to=260+C&own=2+mm";

/** The address of the sweep of a stack of the demo. */
async function sweepOf(page: Page, search = "", name = PETREL): Promise<string> {
  await page.goto("/stacks?sort=name");
  const id = (await page.getByRole("checkbox", { name: `Tick ${name}` }).getAttribute("value")) ?? "";
  await page.goto(`/stacks/${id}/sweep${search}`);
  await expect(page.getByRole("heading", { name: "Sweep", exact: true })).toBeVisible();
  return id;
}

const along = (page: Page) => page.getByRole("slider", { name: "Read along Silicon thickness" });
const drawing = (page: Page, name: RegExp) => page.getByRole("img", { name }).first();
const download = async (page: Page, click: () => Promise<void>) => {
  const file = page.waitForEvent("download");
  await click();
  const saved = await file;
  return { name: saved.suggestedFilename(), bytes: readFileSync(await saved.path()) };
};

test.describe("an engineer", () => {
  test.beforeEach(({ page }) => signIn(page, "engineer"));

  test("comes from the stack and sees where its warp meets the limit", async ({ page }) => {
    await page.goto("/stacks?sort=name");
    await page.getByRole("link", { name: PETREL }).first().click();
    await page.getByRole("link", { name: "Sweep", exact: true }).click();
    await expect(page).toHaveURL(/\/stacks\/[0-9a-f-]{36}\/sweep$/);
    await expect(page.getByText(/^The warp reaches .* of silicon\. Below that it is more\.$/).first()).toBeVisible();
  });

  test("asks for a map", async ({ page }) => {
    await sweepOf(page);
    await page.getByLabel("Upwards", { exact: true }).selectOption({ label: "Temperature, 25 °C" });
    await page.getByLabel("or a limit of your own").fill("2 mm");
    await page.getByRole("button", { name: "Draw" }).click();
    await expect(page).toHaveURL(/y=temperature.*own=2\+mm/);
    await expect(drawing(page, /^Warp over silicon thickness and temperature, free wafer$/)).toBeVisible();
    await expect(page.getByText(/^With temperature 25.°C, the warp reaches 2.mm at .* of silicon\./)).toBeVisible();
    await expect(page.getByRole("table", { name: /^Warp by Temperature/ }).getByRole("row")).toHaveCount(7);
  });

  test("reads a map by arrow keys and by pointer, in words", async ({ page }) => {
    await sweepOf(page, MAP);
    const slider = along(page);
    await slider.focus();
    const spoken = async () => (await slider.getAttribute("aria-valuetext")) ?? "";
    const first = await spoken();
    expect(first).toMatch(/^Silicon thickness [\d.]+.µm; Temperature [\d.]+.°C: [\d.]+.[µm]m/);
    await page.keyboard.press("ArrowUp");
    await expect(slider).not.toHaveAttribute("aria-valuetext", first);
    const above = await spoken();
    expect(above.split(";")[0]).toBe(first.split(";")[0]);
    await page.keyboard.press("ArrowRight");
    await expect(slider).not.toHaveAttribute("aria-valuetext", above);
    await page.keyboard.press("ArrowLeft");
    await page.keyboard.press("ArrowDown");
    await expect(slider).toHaveAttribute("aria-valuetext", first);
    await drawing(page, /^Warp over/).scrollIntoViewIfNeeded();
    const box = await drawing(page, /^Warp over/).boundingBox();
    if (!box) throw new Error("no map");
    await page.mouse.move(box.x + box.width * 0.8, box.y + box.height * 0.3);
    await expect(slider).not.toHaveAttribute("aria-valuetext", first);
  });

  test.describe("with something wrong in what was asked", () => {
    test.use({ refusals: true });

    test("is told what is wrong where it stands, and keeps what was typed", async ({ page }) => {
      await sweepOf(page, "?x-from=700+um&x-to=50+um&own=3+kg");
      await expect(page.getByRole("alert")).toContainText("Nothing is drawn");
      await expect(page.getByText("The range is empty: type a value above where it begins.")).toBeVisible();
      await expect(page.getByText("kg is a unit of mass")).toBeVisible();
      await expect(page.getByLabel("from", { exact: true }).first()).toHaveValue("700 um");
      await expectNoAxeFindings(page);
    });
  });

  test("takes it away as CSV, drawing and picture, and prints it on one page", async ({ page }) => {
    const id = await sweepOf(page, MAP);
    const csv = await download(page, () => page.getByRole("link", { name: "CSV", exact: true }).click());
    expect(csv.name).toBe(`${PETREL}, sweep.csv`);
    expect(csv.bytes.toString().split("\r\n")).toHaveLength(41 * 41 + 2);
    const svg = await download(page, () => page.getByRole("link", { name: "SVG", exact: true }).click());
    expect(svg.bytes.toString()).toContain(`${PETREL} (Petrel)`);
    const png = await download(page, () => page.getByRole("button", { name: "PNG" }).click());
    expect(png.bytes.subarray(1, 4).toString()).toBe("PNG");
    await page.getByRole("link", { name: "Print" }).click();
    await expect(page).toHaveURL(new RegExp(`/stacks/${id}/sweep/print`));
    await expect(page.getByText("not released: not for the floor")).toBeVisible();
    const pdf = await page.pdf({ preferCSSPageSize: true, printBackground: true });
    expect(pdf.toString("latin1").match(/\/Type\s*\/Page\b(?!s)/g)).toHaveLength(1);
    await expectNoAxeFindings(page);
    await page.getByRole("link", { name: "Back to the sweep" }).click();
    await expect(along(page)).toBeVisible();
  });

  test("finds it by its name and chooses a stack", async ({ page }) => {
    await page.goto("/stacks/sweep");
    await page.getByLabel("Stack", { exact: true }).selectOption({ label: `${PETREL}, Petrel` });
    await page.getByRole("button", { name: "Sweep it" }).click();
    await expect(page).toHaveURL(/\/stacks\/[0-9a-f-]{36}\/sweep$/);
    await page.goto("/search?q=sweep+contours");
    await expect(page.getByRole("link", { name: /Sweep a stack/ })).toBeVisible();
  });

  test("has it on the narrowest phone without scrolling sideways", async ({ page }) => {
    await page.setViewportSize({ width: 320, height: 800 });
    await sweepOf(page, MAP);
    await expect(along(page)).toBeVisible();
    expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBeLessThanOrEqual(320);
  });

  for (const [what, search] of [
    ["curve", "?answer=bow"],
    ["map", MAP],
  ] as const)
    test(`meets nothing that axe finds on a ${what}`, async ({ page }) => {
      await sweepOf(page, search);
      await scriptsAtWork(page.getByRole("slider").first());
      await expectNoAxeFindingsInBothThemes(page);
    });
});

test.describe("without scripts", () => {
  test.use({ javaScriptEnabled: false });

  test("a technician chooses inputs and has drawing, sentences and table", async ({ page }) => {
    await signIn(page, "technician");
    await sweepOf(page);
    await expect(drawing(page, /^Warp against silicon thickness, free wafer/)).toBeVisible();
    await page.getByLabel("Upwards", { exact: true }).selectOption("temperature");
    await page.getByLabel("Answer", { exact: true }).selectOption("load");
    await page.getByRole("button", { name: "Draw" }).click();
    await expect(drawing(page, /^Share of the curling load over/)).toBeVisible();
    await expect(page.getByRole("table", { name: /^Share of the curling load by Temperature/ })).toContainText("%");
    await expect(page.getByRole("slider")).toHaveCount(0);
  });
});
