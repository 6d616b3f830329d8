import type { Page } from "@playwright/test";
import { assessTern } from "./assess.ts";
import { expect, expectNoAxeFindings, signIn, signInAtToday, test } from "./support.ts";

test.slow();

const places = (page: Page) => page.getByRole("navigation", { name: "Places" });
const current = (page: Page) => places(page).locator("[aria-current=page]");

for (const width of [390, 320])
  test(`a phone of ${width} px has the bar on one line and the current place in sight`, async ({ page }) => {
    await page.setViewportSize({ width, height: 700 });
    await signInAtToday(page, "process owner");
    const [home, person, out] = [
      page.getByRole("link", { name: "Planeward, Today" }),
      page.getByText("Mikael Lindqvist"),
      page.getByRole("button", { name: "Sign out" }),
    ];
    const boxes = await Promise.all([home, person, out].map((part) => part.boundingBox()));
    const middles = boxes.map((box) => (box ? box.y + box.height / 2 : Number.NaN));
    expect(Math.max(...middles) - Math.min(...middles)).toBeLessThan(8);
    expect(Math.max(...boxes.map((box) => (box ? box.x + box.width : Infinity)))).toBeLessThanOrEqual(width);
    await expect(page.locator("header")).toContainText("Mikael Lindqvist, process owner");
    await expect(current(page)).toHaveText("Today");
    // By its address and, further on, by a press within the page.
    await page.goto("/method");
    await expect(current(page)).toHaveText("Method");
    await expect(current(page)).toBeInViewport({ ratio: 0.9 });
    await places(page).getByRole("link", { name: "Films" }).click();
    await expect(current(page)).toHaveText("Films");
    await expect(current(page)).toBeInViewport({ ratio: 0.9 });
    await expectNoAxeFindings(page);
    expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBeLessThanOrEqual(width);
  });

test("an assessment lies in the flows", async ({ page }) => {
  await signIn(page, "engineer");
  await assessTern(page);
  await expect(current(page)).toHaveText("Flows");
});

test("a page past the last one of a list leads to the last one", async ({ page }) => {
  await signIn(page, "engineer");
  for (const list of ["films", "stacks", "flows", "carriers/carriers", "carriers/tools", "scans", "sheets"]) {
    const answer = await page.request.get(`/${list}?page=4000&sort=name`, { maxRedirects: 0 });
    expect(answer.status()).toBe(302);
    expect(answer.headers()["location"]).toMatch(new RegExp(`^/${list}\\?(?:page=\\d{1,2}&)?sort=name$`));
  }
});
