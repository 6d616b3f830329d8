import type { Page } from "@playwright/test";
import { assess, LIST, ownFlow, press, stackId, steps, TERN } from "./flow-pages.ts";
import { expect, expectNoAxeFindingsInBothThemes, signIn, signInAtToday, test } from "./support.ts";

test.describe("roles", () => {
  test.use({ refusals: true });

  /** Posts as a form of ours would, from the page's own session. */
  const post = (page: Page, path: string, form: Record<string, string>, origin: string) =>
    page.request.post(path, { form, headers: { Origin: origin }, maxRedirects: 0 });

  test("a technician reads flows and steps and may change nothing", async ({ page, baseURL }) => {
    await signIn(page, "technician");
    await page.goto(LIST);
    await expect(page.getByRole("link", { name: "New flow" })).toHaveCount(0);
    await page.getByRole("link", { name: TERN, exact: true }).click();
    await expect(steps(page)).toContainText("Grind to 110");
    const path = new URL(page.url()).pathname;
    for (const name of ["Assess", "Copy", "Name and wafer", "Add a step at the end"])
      await expect(page.getByText(name, { exact: true })).toHaveCount(0);
    await expect(page.getByRole("button", { name: /^Move/ })).toHaveCount(0);
    await page.getByRole("link", { name: "Grind to 110 µm" }).click();
    await expect(page.getByRole("table", { name: "Figures of the step" })).toContainText("110");
    await expect(page.getByRole("button", { name: /Save/ })).toHaveCount(0);

    const step = new URL(page.url()).pathname;
    const origin = baseURL ?? "";
    expect((await post(page, path, { intent: "assess" }, origin)).status()).toBe(403);
    expect((await post(page, path, { intent: "copy" }, origin)).status()).toBe(403);
    expect((await post(page, path, { intent: "remove" }, origin)).status()).toBe(403);
    expect((await post(page, path, { change: `remove ${step.split("/").at(-1)}` }, origin)).status()).toBe(403);
    const values = { title: "x", kind: "measure", peakTemperature: "25 °C", planned: "bare" };
    expect((await post(page, step, values, origin)).status()).toBe(403);
    expect((await post(page, `${path}/steps/new`, values, origin)).status()).toBe(403);
    for (const place of [`${path}/edit`, `${path}/steps/new`, "/flows/new"])
      expect((await page.request.get(place)).status()).toBe(403);
  });

  test("a guest sees no flow, not even that there is one", async ({ page, browser, baseURL }) => {
    const engineer = await browser.newPage({ baseURL });
    await signIn(engineer, "engineer");
    await engineer.goto(LIST);
    const path = await engineer.getByRole("link", { name: TERN, exact: true }).getAttribute("href");
    await engineer.close();
    await signInAtToday(page, "guest");
    await expect(page.getByRole("link", { name: "Flows" })).toHaveCount(0);
    expect((await page.request.get("/flows")).status()).toBe(403);
    expect((await page.request.get(path ?? "")).status()).toBe(404);
    expect((await post(page, path ?? "", { intent: "assess" }, baseURL ?? "")).status()).toBe(404);
    await page.goto(path ?? "");
    await expect(page.getByRole("main")).toContainText("There is no such flow");
  });

  test("an id that names nothing is nothing, whatever is in it", async ({ page, baseURL }) => {
    await signIn(page, "engineer");
    const nowhere = "/flows/00000000-0000-4000-8000-000000000000";
    for (const path of [nowhere, "/flows/1", "/flows/'%20or%201=1", `${nowhere}/edit`, `${nowhere}/steps/new`])
      expect((await page.request.get(path)).status()).toBe(404);
    const path = await ownFlow(page);
    expect((await page.request.get(`${path}/steps/1`)).status()).toBe(404);
    expect((await post(page, path, { intent: "fly" }, baseURL ?? "")).status()).toBe(400);
    expect((await post(page, path, { change: "up 1" }, baseURL ?? "")).status()).toBe(404);
    expect((await page.request.get(`${path}/steps/new?at=-7`)).status()).toBe(200);
  });
});

test.describe("axe", () => {
  test.use({ refusals: true });

  test("finds nothing on any page of the flows", async ({ page }) => {
    test.slow();
    await signIn(page, "engineer");
    const stack = await stackId(page, "Petrel P-3, back-side metal");
    const path = await ownFlow(page);
    await expectNoAxeFindingsInBothThemes(page);
    await page.getByRole("button", { name: /^Remove step 2,/ }).click();
    await expectNoAxeFindingsInBothThemes(page);
    await assess(page);
    for (const place of [
      path,
      "/flows",
      "/flows?q=parsecs",
      "/flows/new",
      `/flows/new?stack=${stack}`,
      `${path}/edit`,
    ]) {
      await page.goto(place);
      await expectNoAxeFindingsInBothThemes(page);
    }
    await page.getByRole("link", { name: "Flows", exact: true }).first().click();
    await page.goto(path);
    await page.getByRole("link", { name: "Plate redistribution copper, 5 µm, 35 %", exact: true }).click();
    await expectNoAxeFindingsInBothThemes(page);
    await page.getByLabel("Kind of step").selectOption("bond");
    await page.getByLabel("Peak temperature").fill("hot");
    await press(page, "Save step");
    await expect(page.getByRole("alert")).toBeVisible();
    await expectNoAxeFindingsInBothThemes(page);
    await page.setViewportSize({ width: 390, height: 844 });
    await page.goto(path);
    await page.getByLabel("Change step 2", { exact: true }).click();
    await expectNoAxeFindingsInBothThemes(page);
  });
});
