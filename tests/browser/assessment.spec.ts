import { assess, assessTern, openTern } from "./assess.ts";
import { expect, expectNoAxeFindings, expectNoAxeFindingsInBothThemes, signIn, test } from "./support.ts";

test.describe("an engineer", () => {
  test.beforeEach(({ page }) => signIn(page, "engineer"));

  test("reads the answer, looks at a step, follows a figure to its working and comes back", async ({ page }) => {
    const path = await assessTern(page);
    const answer = page.getByRole("region", { name: "Answer" });
    await expect(answer.getByRole("heading", { level: 1 })).toContainText("tape or ring from step 14");
    await expect(answer).toContainText("Thinnest silicon");

    await page.getByRole("link", { name: "Grind to 110 µm", exact: true }).click();
    await expect(page).toHaveURL(/\?step=14$/);
    const row = page.locator("#step-14");
    await expect(row).toHaveAttribute("aria-current", "true");
    await expect(page.getByRole("row").filter({ hasText: "If let go" })).toContainText("it rolls up, radius about 0.");
    await expect(page.getByText("Held flat by grinding tape: it has no bow of its own here.")).toBeVisible();

    const strip = page.getByRole("region", { name: "Steps on one axis" });
    await strip.getByRole("link", { name: /^Step 8,/ }).press("Enter");
    await expect(page).toHaveURL(/\?step=8$/);
    await expect(strip.getByRole("link", { name: /^Step 8,/ })).toHaveAttribute("aria-current", "step");
    const details = page.getByRole("row").filter({ hasText: "Lies as" }).last();
    const shown = await details.getByText(/^Edges up .* at 25/).innerText();

    await details.getByRole("link", { name: "Working of lies as" }).click();
    await expect(page).toHaveURL(new RegExp(`${path}/working\\?step=8&shape=loaded$`));
    await expect(page.getByRole("heading", { level: 1 })).toHaveText("Shape at 25 °C, after the step");
    const figure = (await page.locator("main .text-answer").innerText()).replaceAll("\u00A0", " ");
    expect(shown.replaceAll("\u00A0", " ")).toContain(figure);
    await expect(page.getByRole("table").first()).toContainText("wafer radius");
    await page.getByRole("link", { name: "Back to step 8" }).click();
    await expect(page.locator("#step-8")).toHaveAttribute("aria-current", "true");
  });

  test("opens what is clear, and sees from the tightest figure where it comes from", async ({ page }) => {
    await assessTern(page);
    await page
      .getByText(/^\d clear findings?$/)
      .first()
      .click();
    await expect(page.getByText("No support needed", { exact: false }).first()).toBeVisible();
    await page
      .getByRole("region", { name: "Answer" })
      .getByRole("link", { name: /^Working/ })
      .click();
    await expect(page.getByRole("heading", { level: 1 })).toContainText("Warp");
  });

  test("runs it again: another assessment, with a number of its own", async ({ page }) => {
    const first = await assessTern(page);
    const number = page.getByRole("region", { name: "Title block" }).getByText(/^TERN-A\d+$/);
    const before = await number.innerText();
    await page.getByRole("button", { name: "Run again" }).click();
    await expect(page).not.toHaveURL(new RegExp(first));
    await expect(number).not.toHaveText(before);
    await page.goto(first);
    await expect(number).toHaveText(before);
  });

  test("is told that the flow has changed since, and runs it again as it is now", async ({ page }) => {
    // Somebody else may make a copy in the same moment and be given the name.
    await expect(async () => {
      await openTern(page);
      await page.getByRole("button", { name: "Copy", exact: true }).click();
      await expect(page.getByRole("heading", { level: 1 })).toContainText(", copy", { timeout: 3000 });
    }).toPass();
    const flow = new URL(page.url()).pathname;
    const path = await assess(page);
    await expect(page.getByText("Out of date")).toHaveCount(0);
    await page.goto(flow);
    await page.getByRole("button", { name: /^Copy step 2,/ }).click();
    await expect(page.getByRole("button", { name: /^Copy step 20,/ })).toBeVisible();
    await page.goto(path);
    await expect(page.getByRole("region", { name: /^Out of date/ })).toContainText("Out of date");
    await page
      .getByRole("region", { name: /^Out of date/ })
      .getByRole("button", { name: "Run again" })
      .click();
    await expect(page.getByText("Out of date")).toHaveCount(0);
    await expect(page.locator("#step-20")).toBeVisible();
  });

  test("reads it on a phone: steps as a list, actions at the foot, nothing wider than the screen", async ({ page }) => {
    const path = await assessTern(page);
    await page.setViewportSize({ width: 360, height: 740 });
    await page.goto(path);
    await expect(page.getByRole("region", { name: "Steps on one axis" })).toBeHidden();
    const list = page.getByRole("region", { name: "Steps as a list" });
    await list.getByRole("link", { name: "Grind to 110 µm", exact: true }).click();
    await expect(list.getByText(/it rolls up, radius about/)).toBeVisible();
    await expect(page.getByRole("link", { name: "Print the sheet" }).last()).toBeInViewport();
    expect(await page.evaluate(() => document.documentElement.scrollWidth <= innerWidth)).toBe(true);
    await expectNoAxeFindings(page);
  });

  test("gives axe nothing to find", async ({ page }) => {
    await assessTern(page);
    await page.evaluate(() => document.querySelectorAll("details").forEach((details) => (details.open = true)));
    await expectNoAxeFindingsInBothThemes(page);
    await page
      .getByRole("region", { name: "Answer" })
      .getByRole("link", { name: /^Working/ })
      .click();
    await expect(page.getByRole("heading", { level: 1 })).toContainText("Warp");
    await expectNoAxeFindingsInBothThemes(page);
  });

  test("does all of it without scripts", async ({ page, browser }) => {
    const path = await assessTern(page);
    const context = await browser.newContext({
      javaScriptEnabled: false,
      storageState: await page.context().storageState(),
    });
    const plain = await context.newPage();
    await plain.goto(path);
    await plain.getByRole("link", { name: "Dice, two-step blade", exact: true }).click();
    await expect(plain).toHaveURL(/\?step=18#step-18$/);
    await expect(plain.locator("#step-18")).toHaveAttribute("aria-current", "true");
    await plain.getByRole("button", { name: "Run again" }).click();
    await expect(plain).toHaveURL(/\/assessments\/[0-9a-f-]+$/);
    await expect(plain).not.toHaveURL(new RegExp(path));
    await context.close();
  });
});

test.describe("an address", () => {
  test.use({ refusals: true });

  test("that names no step opens the one to look at first", async ({ page }) => {
    await signIn(page, "engineer");
    const path = await assessTern(page);
    const first = await page.locator("tr[aria-current]").getAttribute("id");
    for (const step of ["0", "-3", "99", "12%20parsecs", ""]) {
      await page.goto(`${path}?step=${step}`);
      await expect(page.locator("tr[aria-current]")).toHaveAttribute("id", first ?? "");
    }
  });

  test("that names nothing says so, and never breaks", async ({ page }) => {
    await signIn(page, "engineer");
    const path = await assessTern(page);
    for (const wrong of [
      `${path}/working`,
      `${path}/working?finding=abc&figure=0`,
      `${path}/working?finding=99999&figure=0`,
      `${path}/working?step=14&shape=loaded`,
      "/assessments/nonsense",
      "/assessments/00000000-0000-4000-8000-000000000000",
    ]) {
      const answer = await page.goto(wrong);
      expect(answer?.status(), wrong).toBe(404);
      await expect(page.getByRole("heading", { level: 1 })).toHaveText("Nothing here");
    }
  });

  test("refuses what is no request to run again", async ({ page, baseURL }) => {
    await signIn(page, "engineer");
    const path = await assessTern(page);
    const headers = { Origin: baseURL ?? "" };
    const post = async (options: object) =>
      (await page.request.post(path, { headers, maxRedirects: 0, ...options })).status();
    expect(await post({ form: { intent: "release" } })).toBe(400);
    expect(await post({ form: {} })).toBe(400);
    expect(await post({ data: { intent: "run" } })).toBe(400);
  });
});

test.describe("other roles", () => {
  test.use({ refusals: true });

  test("a technician and a shift lead read and print, and may not run", async ({ page, browser, baseURL }) => {
    await signIn(page, "engineer");
    const path = await assessTern(page);
    for (const role of ["technician", "shift lead"] as const) {
      const context = await browser.newContext();
      const other = await context.newPage();
      await signIn(other, role);
      await other.goto(path);
      await expect(other.getByRole("link", { name: "Print the sheet" }).first()).toBeVisible();
      await expect(other.getByRole("button", { name: "Run again" })).toHaveCount(0);
      await expect(other.getByRole("link", { name: "Change the flow" })).toHaveCount(0);
      const ran = await other.request.post(path, {
        form: { intent: "run" },
        headers: { Origin: baseURL ?? "" },
        maxRedirects: 0,
      });
      expect(ran.status()).toBe(403);
      await context.close();
    }
  });

  test("a guest of the program, and somebody of no program, find nothing there", async ({ page, browser, baseURL }) => {
    await signIn(page, "engineer");
    const path = await assessTern(page);
    for (const role of ["guest", "administrator"] as const) {
      const context = await browser.newContext();
      const other = await context.newPage();
      await signIn(other, role);
      for (const closed of [path, `${path}/working?step=12&shape=loaded`, path.replace("assessments", "sheets")])
        expect((await other.request.get(closed)).status(), `${role} ${closed}`).toBe(404);
      const ran = await other.request.post(path, {
        form: { intent: "run" },
        headers: { Origin: baseURL ?? "" },
        maxRedirects: 0,
      });
      expect(ran.status()).toBe(404);
      await context.close();
    }
  });
});
