import { expect, expectNoAxeFindings, signIn, test } from "./support.ts";

const SAVE = { name: "Save stack" };

test.describe("others", () => {
  test.use({ refusals: true });

  test("look at a stack without changing it", async ({ page }) => {
    await signIn(page, "technician");
    await page.goto("/stacks");
    await expect(page.getByRole("link", { name: "New stack" })).toHaveCount(0);
    await page.getByRole("link", { name: "Petrel P-3, back-side metal" }).click();
    await expect(page.getByRole("region", { name: "Answer" })).toContainText("it needs a carrier");
    await expect(page.getByRole("region", { name: "Films" })).toContainText("Back-side oxide A");
    await expect(page.getByRole("button", SAVE)).toHaveCount(0);
    await expect(page.getByText("Remove this stack")).toHaveCount(0);
    await page.getByLabel("Shape also at").fill("245 C");
    await page.getByLabel("Shape also at").press("Enter");
    await expect(page.getByRole("region", { name: "Answer" })).toContainText("At 245 °C, free, it");
    await expectNoAxeFindings(page);

    const { pathname } = new URL(page.url());
    expect((await page.request.post(pathname, { form: { intent: "remove" } })).status()).toBe(403);
    expect((await page.request.post(pathname, { form: { name: "x" } })).status()).toBe(400);
    expect((await page.goto("/stacks/new"))?.status()).toBe(403);
    expect((await page.goto(pathname))?.status()).toBe(200);
  });

  test("who are guests learn of no stack", async ({ page, browser }) => {
    await signIn(page, "engineer");
    await page.goto("/stacks");
    const path = await page.getByRole("link", { name: "Tern T-2, one redistribution layer" }).getAttribute("href");
    const context = await browser.newContext();
    const guest = await context.newPage();
    await signIn(guest, "guest");
    expect((await guest.goto("/stacks"))?.status()).toBe(403);
    expect((await guest.goto(path ?? "/"))?.status()).toBe(404);
    expect((await guest.goto("/stacks/new"))?.status()).toBe(403);
    expect((await guest.request.post(path ?? "/", { form: { intent: "remove" } })).status()).toBe(404);
    await context.close();
  });
});
