import type { Page } from "@playwright/test";
import { assessTern, TERN } from "./assess.ts";
import { expect, expectNoAxeFindings, signIn, signInAtToday, test } from "./support.ts";

/** How many pages a print of what is open has. */
async function printedPages(page: Page): Promise<number> {
  const pdf = await page.pdf({ preferCSSPageSize: true, printBackground: true });
  return pdf.toString("latin1").match(/\/Type\s*\/Page\b(?!s)/g)?.length ?? 0;
}

test.describe("an engineer", () => {
  test.beforeEach(({ page }) => signIn(page, "engineer"));

  test("prints the sheet of an assessment, one page for hands and one for engineers on A4", async ({ page }) => {
    await assessTern(page);
    const number = await page
      .getByRole("region", { name: "Title block" })
      .getByText(/^TERN-A\d+$/)
      .innerText();
    await page.getByRole("link", { name: "Print the sheet" }).first().click();
    await expect(page).toHaveURL(/\/sheets\/[0-9a-f-]+$/);
    await expect(page).toHaveTitle(`Handling-risk sheet ${number} · Planeward`);
    await expect(page.getByText("Draft, not released: not for the floor").first()).toBeVisible();
    await expect(page.getByRole("heading", { level: 1 })).toContainText("tape or ring from step 14");
    const groups = page.getByRole("table", { name: "Steps grouped by what holds the wafer" });
    await expect(groups.getByRole("rowheader")).toHaveCount(3);
    await expect(groups).toContainText("Do not heat above 80 °C on tape");
    await expect(groups).toContainText("Over 400 µm edges up or down");
    await expect(page.getByRole("region", { name: "Page 1 of 2", exact: true })).toBeVisible();
    const steps = page.getByRole("table", { name: "Steps with their figures" });
    await expect(steps.getByRole("rowheader")).toHaveCount(19);
    await expect(page.getByRole("img", { name: /^Warp of the free wafer/ })).toBeVisible();
    expect(await printedPages(page)).toBe(2);
    const pdf = page.waitForEvent("download");
    await page.getByRole("link", { name: "PDF" }).click();
    expect((await pdf).suggestedFilename()).toMatch(new RegExp(`^Handling-risk sheet ${number} [A-Z]+ draft\\.pdf$`));
  });

  test("chooses Letter, and no page runs over", async ({ page }) => {
    await assessTern(page);
    await page.getByRole("link", { name: "Print the sheet" }).first().click();
    await page.getByRole("navigation", { name: "Paper" }).getByRole("link", { name: "Letter" }).click();
    await expect(page).toHaveURL(/\?paper=letter$/);
    await expect(page.getByRole("link", { name: "Letter" })).toHaveAttribute("aria-current", "true");
    const planned = await page.getByRole("region", { name: /^Page \d of \d$/ }).count();
    expect(planned).toBeGreaterThan(0);
    expect(await printedPages(page)).toBe(planned);
    await page.getByRole("link", { name: "Back to the assessment" }).click();
    await expect(page).toHaveURL(/\/assessments\//);
  });

  test("prints without the bar of the screen, black on white in the dark too", async ({ page }) => {
    await page.emulateMedia({ colorScheme: "dark" });
    const path = (await assessTern(page)).replace("assessments", "sheets");
    await page.goto(path);
    const sheet = page.getByRole("region", { name: /^Page 1/ });
    await expect(sheet).toHaveCSS("background-color", "rgb(255, 255, 255)");
    await expect(sheet).toHaveCSS("color", "rgb(0, 0, 0)");
    await expectNoAxeFindings(page);
    await page.emulateMedia({ media: "print" });
    await expect(page.getByRole("link", { name: "Back to the assessment" })).toBeHidden();
    await expect(sheet).toBeVisible();
  });

  test("reads it on a phone without scrolling sideways", async ({ page }) => {
    const path = (await assessTern(page)).replace("assessments", "sheets");
    await page.setViewportSize({ width: 360, height: 740 });
    await page.goto(path);
    await expect(page.getByText("Steps 13 to 15")).toBeVisible();
    expect(await page.evaluate(() => document.documentElement.scrollWidth <= innerWidth)).toBe(true);
    await expectNoAxeFindings(page);
  });

  test("finds what can be printed by search, filter and sort, all in the address", async ({ page }) => {
    await assessTern(page);
    await page.goto("/sheets/drafts");
    await page.getByLabel("Search flows").fill("to 100");
    await page.getByLabel("Program").selectOption("tern");
    await page.getByRole("button", { name: "Show" }).click();
    await expect(page).toHaveURL(/q=to\+100.*program=tern/);
    const row = page.getByRole("row").filter({ has: page.getByRole("link", { name: TERN, exact: true }) });
    await expect(row).toHaveCount(1);
    await expect(row).toContainText(/TERN-A\d+/);
    await page.getByRole("link", { name: "Outcome", exact: true }).click();
    await expect(page).toHaveURL(/sort=outcome/);
    await expectNoAxeFindings(page);
    await row.getByRole("link", { name: `Print the sheet of ${TERN}` }).click();
    await expect(page).toHaveURL(/\/sheets\/[0-9a-f-]+$/);
    await page.goto("/sheets/drafts?q=12+parsecs");
    await expect(page.getByRole("heading", { name: "No draft fits" })).toBeVisible();
  });

  test("opens it without scripts, and is told how to print", async ({ page, browser }) => {
    const path = (await assessTern(page)).replace("assessments", "sheets");
    const context = await browser.newContext({
      javaScriptEnabled: false,
      storageState: await page.context().storageState(),
    });
    const plain = await context.newPage();
    await plain.goto(`${path}?paper=letter`);
    await expect(plain.getByRole("heading", { level: 1 })).toBeVisible();
    expect(await plain.getByRole("banner").innerText()).toContain("Print with the browser’s own command.");
    await context.close();
  });
});

test.describe("others", () => {
  test.use({ refusals: true });

  test("drafts stay out of a guest's reach", async ({ page, browser }) => {
    await signIn(page, "engineer");
    const path = (await assessTern(page)).replace("assessments", "sheets");
    const context = await browser.newContext();
    const guest = await context.newPage();
    await signInAtToday(guest, "guest");
    await guest.getByRole("link", { name: "Sheets", exact: true }).click();
    await expect(guest.getByRole("heading", { name: "Sheets", level: 1 })).toBeVisible();
    await expect(guest.getByRole("link", { name: /TERN-A|Drafts/ })).toHaveCount(0);
    await expect(guest.getByText("TERN-A")).toHaveCount(0);
    await expectNoAxeFindings(guest);
    const answer = await guest.goto(path);
    expect(answer?.status()).toBe(404);
    await expect(guest.getByText("There is no such assessment")).toBeVisible();
    await context.close();
  });

  test("a sheet that is not there says so, and asks nobody who is not signed in", async ({ page }) => {
    await page.goto("/sheets/nonsense");
    await expect(page).toHaveURL(/\/sign-in\?next=/);
    await signIn(page, "technician");
    const answer = await page.goto("/sheets/nonsense");
    expect(answer?.status()).toBe(404);
    await expect(page.getByRole("heading", { level: 1 })).toHaveText("Nothing here");
  });
});
