import type { Browser, Page } from "@playwright/test";
import { assess, ownFlow, press } from "./flow-pages.ts";
import { expect, expectNoAxeFindings, signIn, test } from "./support.ts";

/** Sets the incoming silicon of a flow, which every step then rests on. */
async function setIncoming(page: Page, flow: string, thickness: string): Promise<void> {
  await page.goto(`${flow}/edit`);
  await page.getByRole("group", { name: "Silicon as it comes in" }).getByLabel("Value").fill(thickness);
  await page.getByRole("button", { name: /^Save/ }).click();
  await expect(page).toHaveURL(new RegExp(`${flow}$`));
}

/** A flow of the test's own, assessed and then changed; the paths of both. */
async function assessedThenChanged(page: Page): Promise<{ flow: string; assessment: string }> {
  const flow = await ownFlow(page);
  await assess(page);
  const assessment = new URL(page.url()).pathname;
  await setIncoming(page, flow, "600 µm");
  return { flow, assessment };
}

const outOfDate = (page: Page) => page.getByRole("region", { name: /^Out of date/ });

test.describe("an engineer", () => {
  test.beforeEach(({ page }) => signIn(page, "engineer"));

  test("sees what has changed and how far the answer moves, on the page and on paper", async ({ page }) => {
    const { assessment } = await assessedThenChanged(page);
    await page.goto(assessment);
    await expect(outOfDate(page)).toContainText("one input has changed since");
    await expect(outOfDate(page)).toContainText(/The verdict (stays|goes)/);
    await outOfDate(page).getByText("What has changed").click();
    const changes = page.getByRole("table", { name: "Inputs that have changed" });
    await expect(changes).toContainText("Incoming wafer");
    await expect(changes).toContainText(/600.±/);
    await expect(changes).toContainText("Ines Varga");
    await expect(page.getByRole("region", { name: "Title block" })).toContainText(/Revision\s*A/);
    await expectNoAxeFindings(page);

    await page.goto(assessment.replace("assessments", "sheets"));
    await expect(page.getByText(/Inputs have changed since/).first()).toBeVisible();
  });

  test("runs it again and compares the two revisions", async ({ page }) => {
    const { assessment } = await assessedThenChanged(page);
    await page.goto(assessment);
    await outOfDate(page).getByRole("button", { name: "Run again" }).click();
    await expect(page).not.toHaveURL(new RegExp(assessment));
    await expect(outOfDate(page)).toHaveCount(0);
    await expect(page.getByRole("region", { name: "Title block" })).toContainText(/Revision\s*B/);

    await page.getByRole("link", { name: "Compare", exact: true }).click();
    await expect(page.getByRole("heading", { level: 1 })).toHaveText("Revision A and Revision B");
    await expect(page.getByRole("table", { name: "Inputs that differ" })).toContainText(/600.±/);
    await expect(page.getByRole("table", { name: "Steps side by side" }).getByRole("row")).toHaveCount(20);
    await expect(page.getByRole("img", { name: /^Warp along the flow at 25/ }).first()).toBeVisible();
    await expectNoAxeFindings(page);
  });

  test("reads the warp along the flow step by step with the keyboard", async ({ page }) => {
    await ownFlow(page);
    await assess(page);
    const reader = page.getByRole("slider", { name: "Read along step" });
    await expect(reader).toHaveAttribute("aria-valuetext", /^12, Edge trim .*25.°C edges up \d+/);
    await reader.press("ArrowLeft");
    await expect(reader).toHaveAttribute("aria-valuetext", /^11, /);
    await page.getByText("Figures as a table").click();
    await expect(page.getByRole("region", { name: /^Figures: Warp along the flow/ }).getByRole("row")).toHaveCount(20);
  });

  test("asks what a change would do, from the film's page, and prints it for the customer", async ({ page }) => {
    await page.goto("/films");
    await page.getByRole("link", { name: "Polymer dielectric A", exact: true }).click();
    await page.getByRole("link", { name: "What would change?" }).click();
    await page.getByLabel("Property").selectOption({ label: "Stress at 25 °C, tension positive" });
    await page.getByLabel("New value").fill("160 MPa");
    await page.getByRole("button", { name: "What would change?" }).click();
    const answer = page.getByRole("region", { name: "Answer" });
    await expect(answer).toContainText(/It touches .* The verdict changes in/);
    await expect(page.getByText("Do not run").first()).toBeVisible();
    await expectNoAxeFindings(page);
    await answer.getByRole("link", { name: "Page for the customer of Tern" }).click();
    await expect(page.getByRole("heading", { level: 1 })).toContainText("160 MPa");
    await expect(page.getByRole("main")).toContainText("share 118 %");
    await expect(page.getByRole("main")).not.toContainText("500 µm");
    await expectNoAxeFindings(page);
  });

  test.describe("with bad input", () => {
    test.use({ refusals: true });

    test("is told at the field, and nothing typed is lost", async ({ page }) => {
      await page.goto("/assessments/change-request?of=step:cure");
      const value = page.getByLabel(/new value$/);
      for (const [typed, said] of [
        ["12 parsecs", /not a unit of temperature/],
        ["", /Blank is missing, not zero/],
        ["-400 C", /./],
      ] as const) {
        await value.fill(typed);
        await page.getByRole("button", { name: "What would change?" }).click();
        await expect(value).toHaveAttribute("aria-invalid", "true");
        await expect(value).toHaveValue(typed);
        await expect(value).toHaveAccessibleDescription(said);
      }
      await expectNoAxeFindings(page);
      expect((await page.request.get("/assessments/change-request?of=film:nobody")).status()).toBe(400);
      expect((await page.request.get("/assessments/change-request/print?of=step:cure&value=200+C")).status()).toBe(400);
    });

    test("compares with nothing that does not exist", async ({ page }) => {
      await ownFlow(page);
      await assess(page);
      const path = new URL(page.url()).pathname;
      for (const other of ["abc", "00000000-0000-4000-8000-000000000000"])
        expect((await page.request.get(`${path}/compare?with=${other}`)).status()).toBe(404);
      await page.goto(`${path}/compare`);
      await expect(page.getByRole("heading", { name: "Nothing to compare with yet" })).toBeVisible();
      await expectNoAxeFindings(page);
    });
  });
});

test.describe("roles", () => {
  test.use({ refusals: true });

  /** An assessment that is out of date, made by somebody who may. */
  async function madeByAnEngineer(browser: Browser, baseURL: string | undefined): Promise<string> {
    const page = await browser.newPage({ baseURL });
    await signIn(page, "engineer");
    const { assessment } = await assessedThenChanged(page);
    await page.close();
    return assessment;
  }

  test("a technician reads it all and runs nothing", async ({ page, browser, baseURL }) => {
    const assessment = await madeByAnEngineer(browser, baseURL);
    await signIn(page, "technician");
    await page.goto(assessment);
    await expect(outOfDate(page)).toContainText("has changed since");
    await expect(page.getByRole("button", { name: "Run again" })).toHaveCount(0);
    await page.goto(`${assessment}/compare`);
    await expect(page.getByRole("heading", { level: 1 })).toBeVisible();
  });

  test("a guest learns of nothing", async ({ page, browser, baseURL }) => {
    const assessment = await madeByAnEngineer(browser, baseURL);
    await signIn(page, "guest");
    for (const [path, status] of [
      [assessment, 404],
      [`${assessment}/compare`, 404],
      ["/assessments/change-request", 403],
      ["/assessments/change-request/print?of=step:cure&value=200+C&program=tern", 403],
    ] as const)
      expect((await page.request.get(path)).status()).toBe(status);
  });
});

test.describe("without scripts", () => {
  test.use({ javaScriptEnabled: false });

  test("the answer to a change and its chart are there as well", async ({ page }) => {
    await signIn(page, "engineer");
    await page.goto("/assessments/change-request");
    await page.getByLabel("What changes").selectOption({ label: "Cure" });
    await page.getByRole("button", { name: "Go on" }).click();
    await page.getByLabel(/new value$/).fill("200 °C");
    await page.getByRole("button", { name: "What would change?" }).click();
    await expect(page.getByRole("region", { name: "Answer" })).toContainText("It touches");
    await ownFlow(page);
    await press(page, "Assess");
    await expect(page.getByRole("img", { name: "Warp along the flow, as it lies on each tool" }).first()).toBeVisible();
  });
});
