import type { Page } from "@playwright/test";
import { assess } from "./assess.ts";
import { expect, expectNoAxeFindings, signIn, test } from "./support.ts";

const PETREL = "Petrel P-3, on glass 7.2 ppm";
const FULMAR = "Fulmar F-1 A, to 20 µm, slide adhesive";
// Searches and windows are a second or two of work each, several of them in a test.
test.slow();

const DONE = "Every finding has been looked into.";

async function openFlow(page: Page, name: string): Promise<void> {
  await page.goto(`/flows?q=${encodeURIComponent(name)}`);
  await page.getByRole("link", { name, exact: true }).click();
}

/** Assesses a demo flow, which is never changed. */
async function assessed(page: Page, name: string): Promise<string> {
  await openFlow(page, name);
  return assess(page);
}

/** From the assessment to all changes that clear something. */
async function openRemedies(page: Page): Promise<void> {
  const pane = page.getByRole("region", { name: "What clears it" });
  await pane.getByRole("link", { name: /changes that clear|Smallest changes/ }).click();
  await expect(page.getByRole("heading", { level: 1 })).toHaveText("What clears it");
}

const found = (page: Page) => page.locator("article li").allInnerTexts();

/** Buttons and forms differ by who may press them, never by what was found. */
const words = (texts: string[]) => texts.map((text) => text.replace(/\s+/g, " ").replace("Try on a copy", "").trim());

test("a search in the browser is stopped and begun again, and finds what the server finds", async ({
  page,
  browser,
}) => {
  await signIn(page, "engineer");
  const path = await assessed(page, PETREL);
  await openRemedies(page);
  await expect(page.getByText(DONE)).toBeVisible({ timeout: 20_000 });
  const here = words(await found(page));
  expect(here.length).toBeGreaterThan(3);

  // The inputs are kept back, so that the search is surely under way when it is stopped.
  await page.route(`**${path}/trial`, () => undefined);
  await page.getByRole("button", { name: "Start again" }).click();
  await expect(page.getByRole("progressbar", { name: "Findings looked into" })).toBeVisible();
  await page.getByRole("button", { name: "Stop" }).click();
  await expect(page.getByText("Stopped before it began.")).toBeVisible();
  await expect(page.getByRole("button", { name: "Start again" })).toBeFocused();
  await page.unroute(`**${path}/trial`);
  await page.getByRole("button", { name: "Start again" }).click();
  await expect(page.getByText(DONE)).toBeVisible({ timeout: 20_000 });
  expect(words(await found(page))).toEqual(here);

  const context = await browser.newContext({ javaScriptEnabled: false });
  const plain = await context.newPage();
  await signIn(plain, "engineer");
  await plain.goto(`${path}/remedies`);
  expect(words(await found(plain))).toEqual(here);
  await context.close();
});

test("a change leads to its figures before and after, each with its working", async ({ page }) => {
  await signIn(page, "engineer");
  await assessed(page, PETREL);
  await openRemedies(page);
  await page
    .getByRole("link", { name: /^Working of step 10, carrier/ })
    .first()
    .click();
  await expect(page.getByRole("heading", { level: 1 })).toHaveText("Working of a change");
  await expect(page.getByRole("heading", { name: "Before", exact: true })).toBeVisible();
  await expect(page.getByRole("heading", { name: "Curvature of a stack of layers" })).toHaveCount(2);
  await expectNoAxeFindings(page);
  await page.getByRole("link", { name: "Working of step 11, rule 2" }).click();
  await expect(page).toHaveURL(/at=11\.2/);
  await expect(page.getByRole("button", { name: /Try on a copy/ })).toBeVisible();
});

test("20,000 wafers are drawn for every step, beside the first-order band", async ({ page }) => {
  await signIn(page, "engineer");
  await assessed(page, FULMAR);
  const section = page.getByRole("region", { name: "Spread over wafers" });
  await section.getByRole("button", { name: "Draw 20,000 wafers per step" }).click();
  await expect(section.getByText(/^20,000 wafers drawn/)).toBeVisible({ timeout: 20_000 });
  const polish = section.getByRole("row").filter({ hasText: "Polish to 26 µm" });
  await expect(polish).toContainText(/edges up \d+ to \d+\s*µm/);
  await expect(polish).toContainText(/up 200\s*µm: \d+\.\d\s*±\s*0\.\d\s*% as it leaves/);
});

for (const width of [390, 320])
  test(`the text of a process window is readable at ${width} px`, async ({ page }) => {
    await page.setViewportSize({ width, height: 800 });
    await signIn(page, "engineer");
    const path = await assessed(page, PETREL);
    await page.goto(`${path}/window`);
    await page.getByLabel("Along").selectOption("film thickness 6 0");
    await page.getByLabel("Upwards").selectOption("silicon after 12");
    await page.getByRole("button", { name: "Draw" }).click();
    await expect(page.getByText(/All \d+ places that it takes/)).toBeVisible({ timeout: 20_000 });
    const plot = page.getByRole("img", { name: /Verdict over/ });
    const least = await plot.evaluate((svg) => {
      const texts = [...svg.querySelectorAll("text")];
      const scale = svg.getBoundingClientRect().width / (svg as SVGSVGElement).viewBox.baseVal.width;
      return Math.min(...texts.map((text) => Number.parseFloat(getComputedStyle(text).fontSize) * scale));
    });
    expect(least).toBeGreaterThanOrEqual(12);
  });

test("a technician is answered by the server, and is not sent the inputs", async ({ page, browser }) => {
  await signIn(page, "engineer");
  const path = await assessed(page, PETREL);
  const context = await browser.newContext();
  const other = await context.newPage();
  const asked: string[] = [];
  other.on("request", (request) => asked.push(new URL(request.url()).pathname));
  await signIn(other, "technician");
  await other.goto(path);
  await expect(other.getByText("Glass carrier 3.0 ppm").first()).toBeVisible({ timeout: 20_000 });
  await expect(other.getByRole("region", { name: "Spread over wafers" })).toHaveCount(0);
  await openRemedies(other);
  await expect(other.getByRole("heading", { name: "Not cleared by one change" })).toBeVisible();
  await expect(other.getByRole("button", { name: "Start again" })).toHaveCount(0);
  await other.goto(`${path}/window`);
  await other.getByLabel("Along").selectOption("film thickness 6 0");
  await other.getByLabel("Upwards").selectOption("silicon after 12");
  await other.getByRole("button", { name: "Draw" }).click();
  await expect(other.getByRole("img", { name: /Verdict over/ })).toBeVisible({ timeout: 20_000 });
  expect(asked.filter((each) => each.includes("/trial"))).toEqual([]);
  await context.close();
});

test.describe("where the worker does not start", () => {
  test.use({ refusals: true });

  test("the what-if says so, and the search leads to the server", async ({ page }) => {
    await page.route(/(?:flow|what-if)-worker-[^/]*\.js$/, (route) => route.fulfill({ status: 404 }));
    await signIn(page, "engineer");
    await openFlow(page, PETREL);
    await page.locator("summary", { hasText: "What if" }).click();
    await expect(page.getByText(/The engine does not run in this browser/)).toBeVisible();
    await assess(page);
    await expect(page.getByText("could not be worked out in this browser").first()).toBeVisible();
    await page.getByRole("link", { name: "Let the server look" }).click();
    await expect(page).toHaveURL(/remedies\?by=server/);
    await expect(page.getByText("Glass carrier 3.0 ppm").first()).toBeVisible({ timeout: 20_000 });
  });
});
