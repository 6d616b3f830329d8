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

const TERN = "Tern T-2, one redistribution layer";
const PETREL = "Petrel P-3, back-side metal";
const FULMAR = "Fulmar F-1, pillars and vias";
const NOWHERE = "00000000-0000-4000-8000-000000000000";

/** Ids of the demo's stacks, from the boxes of the list. */
async function idsOf(page: Page, ...names: string[]): Promise<string[]> {
  await page.goto("/stacks?sort=name");
  return Promise.all(
    names.map(async (name) => (await page.getByRole("checkbox", { name: `Tick ${name}` }).getAttribute("value")) ?? ""),
  );
}

async function compare(page: Page, names: string[], more = "") {
  const ids = await idsOf(page, ...names);
  await page.goto(`/stacks/compare?of=${ids.join(",")}${more}`);
  await expect(page.getByRole("heading", { name: "What differs" })).toBeVisible();
  return ids;
}

const readOut = (page: Page) => page.getByRole("slider", { name: "Read along silicon thickness" });
const table = (page: Page) => page.getByRole("table", { name: "Figures and inputs of the stacks, side by side" });
const column = (page: Page, n: number) => table(page).getByRole("columnheader").nth(n);
const download = async (page: Page, click: () => Promise<void>) => {
  const file = page.waitForEvent("download");
  await click();
  const saved = await file;
  return { name: saved.suggestedFilename(), bytes: readFileSync(await saved.path()) };
};

/** How many pages a print of what is open has. */
async function printedPages(page: Page): Promise<number> {
  const pdf = await page.pdf({ preferCSSPageSize: true, printBackground: true });
  return pdf.toString("latin1").match(/\/Type\s*\/Page\b(?!s)/g)?.length ?? 0;
}

test.describe("an engineer", () => {
  test.beforeEach(({ page }) => signIn(page, "engineer"));

  test("ticks stacks in the list and sees them side by side", async ({ page }) => {
    await page.goto("/stacks?sort=name");
    const box = (name: string) => page.getByRole("checkbox", { name: `Tick ${name}` });
    await scriptsAtWork(box(TERN));
    await box(TERN).check();
    await expect(page.getByText("1 stack ticked. Compare: tick one more.")).toBeVisible();
    await box(PETREL).check();
    await page.getByRole("button", { name: "Compare", exact: true }).click();
    await expect(page).toHaveURL(/\/stacks\/compare\?of=/);
    await expect(page.getByRole("region", { name: "Compared" }).getByRole("listitem")).toHaveCount(2);
    await expect(page.getByText(/^A and B /)).toBeVisible();
    await expect(table(page).getByRole("row", { name: /^Curls differs/ })).toContainText("below");
    await expect(page.getByText(/Stress of Plated copper A\s±\s10\sMPa moves it by\s±/).first()).toBeVisible();
  });

  test("finds another to add, moves and removes them, all in the address", async ({ page }) => {
    const [tern, petrel] = await compare(page, [TERN, PETREL]);
    const search = page.getByRole("searchbox", { name: "Name or program contains" });
    await page.getByText("Add a stack").click();
    await scriptsAtWork(search);
    await search.fill("pillars fulmar");
    await expect(page.getByText(/^1 of \d/)).toBeVisible();
    await page.getByRole("link", { name: `Add ${FULMAR}` }).click();
    await expect(column(page, 3)).toHaveText(`C ${FULMAR}`);
    await page.getByRole("link", { name: `Up ${FULMAR}` }).click();
    await expect(column(page, 2)).toHaveText(`B ${FULMAR}`);
    await page.getByRole("link", { name: `Remove ${FULMAR}` }).click();
    await expect(page).toHaveURL(new RegExp(`of=${tern},${petrel}$`));
    await page.getByRole("link", { name: `Remove ${TERN}` }).click();
    await expect(page.getByRole("heading", { name: "One stack has nothing to be compared with" })).toBeVisible();
    await page.goto(`/stacks/${tern}`);
    await page.getByRole("link", { name: "Compare", exact: true }).click();
    await expect(page).toHaveURL(`/stacks/compare?of=${tern}`);
    await page.getByRole("link", { name: `Add ${PETREL}` }).click();
    await expect(column(page, 2)).toHaveText(`B ${PETREL}`);
  });

  test("reads all curves at one thickness by keyboard", async ({ page }) => {
    await compare(page, [TERN, PETREL, FULMAR]);
    const slider = readOut(page);
    await slider.focus();
    const before = (await slider.getAttribute("aria-valuetext")) ?? "";
    expect(before).toMatch(/µm; A Tern.* [\d.]+.[µm]m; B Petrel.* [\d.]+.[µm]m; C Fulmar/);
    await page.keyboard.press("ArrowRight");
    await expect(slider).not.toHaveAttribute("aria-valuetext", before);
    await page.keyboard.press("Home");
    await expect(slider).toHaveAttribute("aria-valuetext", /^20.µm/);
  });

  test("asks for another temperature, range and scale, and for what differs alone", async ({ page }) => {
    await compare(page, [TERN, PETREL]);
    const all = await table(page).getByRole("row").count();
    await page.getByLabel("Temperature").fill("245 C");
    await page.getByLabel("Silicon from").fill("100 um");
    await page.getByLabel("Axes").selectOption("Linear");
    await page.getByLabel("Warp limits of").selectOption({ label: "Coat and develop track" });
    await page.getByRole("button", { name: "Show" }).click();
    await expect(page).toHaveURL(/at=245\+C.*from=100\+um.*scale=linear|scale=linear/);
    const chart = page.getByRole("img", { name: /^Warp against silicon thickness, free wafers, 245/ }).first();
    await expect(chart).toContainText("edges up 400 µm: Coat and develop track");
    await page.getByRole("link", { name: /^Only what differs/ }).click();
    await expect(page).toHaveURL(/only=differences/);
    await expect.poll(() => table(page).getByRole("row").count()).toBeLessThan(all);
    await page.getByLabel("Temperature").fill("12 parsecs");
    await page.getByRole("button", { name: "Show" }).click();
    await expect(page.getByText("parsecs is not a unit of temperature")).toBeVisible();
    await expect(page.getByRole("heading", { name: /free wafers, 25/ })).toBeVisible();
  });

  test("takes it away as CSV, drawing and picture", async ({ page }) => {
    await compare(page, [TERN, PETREL]);
    const csv = await download(page, () => page.getByRole("link", { name: "CSV", exact: true }).click());
    expect(csv.name).toBe(`${TERN}, ${PETREL}.csv`);
    expect(csv.bytes.toString()).toMatch(/^part,stack,film,quantity,silicon_thickness_um,value,unit\r\n/);
    const svg = await download(page, () => page.getByRole("link", { name: "SVG", exact: true }).click());
    expect(svg.bytes.toString()).toContain(`A  ${TERN} (Tern)`);
    const png = await download(page, () => page.getByRole("button", { name: "PNG" }).click());
    expect(png.bytes.subarray(1, 4).toString()).toBe("PNG");
    expect(png.bytes.length).toBeGreaterThan(20_000);
  });

  test("prints it on one page of A4 and of Letter", async ({ page }) => {
    const ids = await compare(page, [TERN, PETREL, FULMAR]);
    await page.getByRole("link", { name: "Print" }).click();
    await expect(page).toHaveURL(`/stacks/compare/print?of=${ids.join(",")}`);
    await expect(page.getByText("not released: not for the floor")).toBeVisible();
    expect(await printedPages(page)).toBe(1);
    await page.getByRole("link", { name: "Letter" }).click();
    await expect(page).toHaveURL(/paper=letter$/);
    expect(await printedPages(page)).toBe(1);
    await expectNoAxeFindings(page);
    await page.getByRole("link", { name: "Back to the comparison" }).click();
    await expect(page.getByRole("heading", { name: "What differs" })).toBeVisible();
  });

  test("of what is not there is told so, never which, and the rest is compared", async ({ page }) => {
    await compare(page, [TERN, PETREL], `,${NOWHERE}`);
    await expect(page.getByText("No such stack")).toBeVisible();
    await expect(page.getByText(NOWHERE)).toHaveCount(0);
    await expect(table(page).getByRole("columnheader")).toHaveCount(3);
    await page.goto("/stacks/compare");
    await expect(page.getByRole("heading", { name: "Nothing to compare yet" })).toBeVisible();
  });

  test("reads it on a phone, the heads of the rows staying in sight", async ({ page }) => {
    await page.setViewportSize({ width: 390, height: 844 });
    await compare(page, [TERN, PETREL, FULMAR]);
    expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBeLessThanOrEqual(390);
    const head = table(page).getByRole("rowheader", { name: /^Curls/ });
    const before = await head.boundingBox();
    await page
      .getByRole("region", { name: "Differences, row by row" })
      .evaluate((node) => node.scrollTo({ left: 200 }));
    expect((await head.boundingBox())?.x).toBeCloseTo(before?.x ?? NaN, 0);
  });

  test("meets nothing that axe finds", async ({ page }) => {
    await compare(page, [TERN, PETREL]);
    await expect(readOut(page)).toBeVisible();
    await expectNoAxeFindingsInBothThemes(page);
  });

  test("meets nothing that axe finds while nothing is chosen", async ({ page }) => {
    await page.goto("/stacks/compare");
    await expect(page.getByRole("searchbox")).toBeVisible();
    await expectNoAxeFindings(page);
  });
});

test.describe("without scripts", () => {
  test.use({ javaScriptEnabled: false });

  test("a technician ticks, compares, adds and removes, and sees chart and table", async ({ page }) => {
    await signIn(page, "technician");
    await page.goto("/stacks?sort=name");
    await page.getByRole("checkbox", { name: `Tick ${TERN}` }).check();
    await page.getByRole("checkbox", { name: `Tick ${PETREL}` }).check();
    await page.getByRole("button", { name: "Compare", exact: true }).click();
    await expect(page).toHaveURL(/\/stacks\/compare\?of=/);
    await expect(page.getByRole("img", { name: /^Warp against silicon thickness, free wafers/ }).first()).toBeVisible();
    await expect(table(page).getByRole("row", { name: /^Diameter differs/ })).toContainText("300 mm");
    await expect(page.getByRole("button", { name: "PNG" })).toHaveCount(0);
    await page.getByText("Add a stack").click();
    await page.getByRole("searchbox").fill("fulmar");
    await page.getByRole("button", { name: "Find" }).click();
    await page.getByRole("link", { name: `Add ${FULMAR}` }).click();
    await expect(table(page).getByRole("columnheader")).toHaveCount(4);
    await page.getByLabel("Axes").selectOption("Linear");
    await page.getByRole("button", { name: "Show" }).click();
    await expect(page).toHaveURL(/scale=linear/);
    await page.getByRole("link", { name: `Remove ${FULMAR}` }).click();
    await expect(table(page).getByRole("columnheader")).toHaveCount(3);
  });
});
