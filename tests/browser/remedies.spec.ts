import type { Page } from "@playwright/test";
import { assess } from "./assess.ts";
import { expect, expectNoAxeFindings, signIn, test } from "./support.ts";

const PETREL = "Petrel P-3, on glass 3.3 ppm";

/** Assesses the demo flow that its carrier bars; the flow itself is never changed. */
async function assessPetrel(page: Page): Promise<string> {
  await page.goto(`/flows?q=${encodeURIComponent(PETREL)}`);
  await page.getByRole("link", { name: PETREL, exact: true }).click();
  return assess(page);
}

test("the smallest change that clears a step is tried on a copy, and both stand side by side", async ({ page }) => {
  await signIn(page, "engineer");
  const path = await assessPetrel(page);
  const pane = page.getByRole("region", { name: "What clears it" });
  await expect(pane.getByText("Glass carrier 3.0 ppm").first()).toBeVisible({ timeout: 20_000 });
  await pane.getByRole("link", { name: /changes that clear|Smallest changes/ }).click();
  await expect(page).toHaveURL(`${path}/remedies`);
  await expect(page.getByRole("heading", { level: 1 })).toHaveText("What clears it");
  await expect(page.getByRole("heading", { name: "Not cleared by one change" })).toBeVisible();
  await expectNoAxeFindings(page);
  await page
    .getByRole("button", { name: /Try on a copy.*Glass carrier 3\.0 ppm/ })
    .first()
    .click();
  await expect(page).toHaveURL(/\/compare\?with=/, { timeout: 20_000 });
  await expect(page.getByText("The verdict goes from do not run to caution")).toBeVisible();
});

test("the finder tries every carrier, searches and filters, and goes out as a file", async ({ page }) => {
  await signIn(page, "engineer");
  const path = await assessPetrel(page);
  await page.getByRole("link", { name: "Carriers and bonds that fit" }).click();
  await expect(page.getByRole("heading", { level: 1 })).toHaveText("Carriers and bonds");
  await expectNoAxeFindings(page);
  await page.getByLabel("Search carriers and bonds").fill("Silicon carrier 775");
  await page.getByLabel("Fits", { exact: true }).selectOption({ label: "Does not fit" });
  await page.getByRole("button", { name: "Show" }).click();
  const table = page.getByRole("table");
  await expect(table.getByText("does not pass").first()).toBeVisible();
  await expect(table.getByText("Glass carrier")).toHaveCount(0);
  const download = page.waitForEvent("download");
  await page.getByRole("link", { name: "Save as CSV" }).click();
  expect((await download).suggestedFilename()).toContain("carriers and bonds.csv");
  await page.goto(`${path}/carriers?sort=-thickness`);
  await expect(table.locator("th[aria-sort=descending]")).toHaveText(/Thickness/);
});

test("the process window is drawn over two inputs, with its verdicts as a table", async ({ page }) => {
  await signIn(page, "engineer");
  const path = await assessPetrel(page);
  await page.goto(`${path}/window`);
  await expect(page.getByRole("heading", { name: "Choose two inputs" })).toBeVisible();
  await page.getByLabel("Along").selectOption("film thickness 6 0");
  await page.getByLabel("Upwards").selectOption("silicon after 12");
  await page.getByLabel("Judged at").selectOption("12");
  await page.getByRole("button", { name: "Draw" }).click();
  await expect(page.getByRole("img", { name: /Verdict over/ })).toBeVisible({ timeout: 20_000 });
  await expect(page.getByRole("table").getByText("Caution").first()).toBeVisible();
  await expectNoAxeFindings(page);
});

test.describe("a target that is none", () => {
  test.use({ refusals: true });

  test("is said at its field, and nothing typed is lost", async ({ page }) => {
    await signIn(page, "engineer");
    const path = await assessPetrel(page);
    await page.goto(`${path}/carriers?warp=12+parsecs&step=16`);
    await expect(page.getByLabel("Target warp at most")).toHaveValue("12 parsecs");
    await expect(page.getByText(/parsecs is not a unit/)).toBeVisible();
    await page.goto(`${path}/carriers?warp=-3+um&step=99`);
    await expect(page.getByText("Choose the step that the target is for.")).toBeVisible();
    await page.goto(`${path}/window?x=film+thickness+6+0&y=silicon+after+12&x-to=-3`);
    await expect(page.getByText(/-3 what/)).toBeVisible();
  });
});

test.describe("without scripts", () => {
  test.use({ javaScriptEnabled: false });

  test("the link leads to the changes, and a change can be tried", async ({ page }) => {
    await signIn(page, "engineer");
    await assessPetrel(page);
    await page.getByRole("link", { name: "Smallest changes that clear it" }).click();
    await page
      .getByRole("button", { name: /Try on a copy.*Glass carrier 3\.0 ppm/ })
      .first()
      .click();
    await expect(page).toHaveURL(/\/compare\?with=/, { timeout: 20_000 });
  });
});

test.describe("roles", () => {
  test.use({ refusals: true });

  test("a technician sees what clears it and cannot try it; a guest sees nothing", async ({ page, browser }) => {
    await signIn(page, "engineer");
    const path = await assessPetrel(page);
    for (const [role, status] of [
      ["technician", 200],
      ["guest", 404],
    ] as const) {
      const context = await browser.newContext();
      const other = await context.newPage();
      await signIn(other, role);
      for (const place of ["remedies", "carriers"])
        expect((await other.goto(`${path}/${place}`))?.status(), `${role} at ${place}`).toBe(status);
      await expect(other.getByRole("button", { name: /Try on a copy/ })).toHaveCount(0);
      const changes = JSON.stringify([{ quantity: "silicon after", step: 12, value: 54e-6 }]);
      const refused = await other.request.post(`${path}/remedies`, {
        form: { changes },
        headers: { Origin: new URL(other.url()).origin },
      });
      expect(refused.status(), role).toBe(status === 200 ? 403 : 404);
      await context.close();
    }
  });
});
