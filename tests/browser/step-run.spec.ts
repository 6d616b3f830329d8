import { ownFlow, press, steps, assess } from "./flow-pages.ts";
import { expect, expectNoAxeFindings, signIn, test } from "./support.ts";

const PROFILE = "0 25; 30 150; 60 150; 90 230; 120 25";

/** Opens a step of the flow's page by the first words of its name. */
async function openStep(page: Parameters<typeof ownFlow>[0], name: RegExp) {
  await steps(page).getByRole("link", { name }).first().click();
  await expect(page.getByLabel("What is done")).toBeVisible();
}

test("a profile gives peak and time, and stands with machine and recipe in table and assessment", async ({ page }) => {
  // Several pages and a check of all of one.
  test.slow();
  await signIn(page, "engineer");
  const flow = await ownFlow(page);
  await openStep(page, /cure polymer/i);
  await page.getByText("Temperature profile", { exact: true }).click();
  await page.getByLabel("Minutes and °C, point by point").fill(PROFILE);
  await expect(page.getByRole("img", { name: /Temperature profile: 25 °C, in 30 min to 150 °C/ })).toBeVisible();
  await expect(page.getByLabel("Peak temperature")).toBeHidden();
  await expect(page.getByText("From the profile: within 5 K of the peak")).toBeVisible();
  await page.getByLabel("Which of them").fill("oven 3");
  await page.getByLabel("Recipe").fill("PI-5 slow");
  await page.getByLabel("Side up").selectOption("Back side");
  await expectNoAxeFindings(page);
  await page.getByRole("button", { name: "Save step", exact: true }).last().click();
  await expect(page).toHaveURL(/\?step=/);
  const row = steps(page)
    .getByRole("row", { name: /cure polymer/i })
    .first();
  await expect(row).toContainText("oven 3, recipe PI-5 slow");
  await expect(row).toContainText("2.61 min");
  await expect(row).toContainText("back side up");

  await page.getByLabel("Search steps").fill("oven PI-5");
  await press(page, "Show");
  await expect(page.getByRole("status").filter({ hasText: "1 of" })).toBeVisible();
  await expect(steps(page).getByRole("row", { name: /cure polymer/i })).toHaveCount(1);

  await page.goto(flow);
  const number = await steps(page)
    .getByRole("row", { name: /cure polymer/i })
    .first()
    .getByRole("cell")
    .first()
    .innerText();
  await assess(page);
  await page.goto(`${page.url().split("?")[0]}?step=${number.trim()}`);
  await expect(page.getByRole("img", { name: /Temperature profile/ })).toBeVisible();
  await expect(page.getByText("oven 3, recipe PI-5 slow").first()).toBeVisible();
});

test.describe("what cannot be read", () => {
  test.use({ refusals: true });

  test("is said at its point, and nothing typed is lost", async ({ page }) => {
    await signIn(page, "engineer");
    await ownFlow(page);
    await openStep(page, /cure polymer/i);
    await page.getByText("Temperature profile", { exact: true }).click();
    const field = page.getByLabel("Minutes and °C, point by point");
    for (const [typed, said] of [
      ["0 25; 30,150", /Point 2: .* one number with decimals or two/],
      ["0 25; 30 12 parsecs", /Point 2/],
      ["0 25; 60 150; 30 25", /Point 3 is at 30.min, not after point 2/],
    ] as const) {
      await field.fill(typed);
      await expect(page.getByText(said)).toBeVisible();
      const refused = page.waitForResponse((answer) => answer.request().method() === "POST");
      await page.getByRole("button", { name: "Save step", exact: true }).last().click();
      expect((await refused).status()).toBe(400);
      await expect(page.getByText(said)).toBeVisible();
      await expect(field).toHaveValue(typed);
    }
  });

  test("is said without scripts too", async ({ browser }) => {
    const context = await browser.newContext({ javaScriptEnabled: false });
    const page = await context.newPage();
    await signIn(page, "engineer");
    await ownFlow(page);
    await openStep(page, /cure polymer/i);
    await page.getByText("Temperature profile", { exact: true }).click();
    const field = page.getByLabel("Minutes and °C, point by point");
    await field.fill("0 25; 30");
    await page.getByRole("button", { name: "Save step", exact: true }).last().click();
    await expect(page.getByText(/Point 2: .* has one number only/)).toBeVisible();
    await expect(field).toHaveValue("0 25; 30");
    await field.fill(PROFILE.replaceAll("; ", "\n"));
    await page.getByRole("button", { name: "Save step", exact: true }).last().click();
    await expect(page).toHaveURL(/\?step=/);
    await expect(
      steps(page)
        .getByRole("row", { name: /cure polymer/i })
        .first(),
    ).toContainText("2.61 min");
    await context.close();
  });
});

test("a technician reads how a step is run", async ({ page }) => {
  await signIn(page, "engineer");
  const flow = await ownFlow(page);
  await openStep(page, /cure polymer/i);
  await page.getByLabel("Recipe").fill("PI-5 slow");
  await page.getByRole("button", { name: "Save step", exact: true }).last().click();
  await expect(page).toHaveURL(/\?step=/);
  await page.context().clearCookies();
  await signIn(page, "technician");
  await page.goto(flow);
  await steps(page)
    .getByRole("link", { name: /cure polymer/i })
    .first()
    .click();
  await expect(page.getByRole("definition").filter({ hasText: "PI-5 slow" })).toBeVisible();
  await expect(page.getByLabel("Recipe")).toHaveCount(0);
});
