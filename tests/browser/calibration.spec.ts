import type { Page } from "@playwright/test";
import { expect, expectNoAxeFindings, signIn, test, type Role } from "./support.ts";

const MATERIAL = "Laser-release adhesive B";
const FLOW = "Petrel: Petrel P-3, on glass 3.3 ppm";

/** Opens the calibration of the demo's laser-release adhesive, from its own page. */
async function openCalibration(page: Page, role: Role): Promise<void> {
  await signIn(page, role);
  await page.goto(`/carriers/bonding-materials?${new URLSearchParams({ q: MATERIAL }).toString()}`);
  await page.getByRole("link", { name: MATERIAL, exact: true }).click();
  await page.getByRole("link", { name: "Calibrate on measured pairs" }).click();
  await expect(page.getByRole("heading", { level: 1, name: "Calibrate on measured pairs" })).toBeVisible();
  await page.getByLabel("Flow that the pairs have been through").selectOption({ label: FLOW });
  await page.getByRole("button", { name: "Show" }).click();
  await expect(page).toHaveURL(/calibrate\?flow=/);
}

const row = (page: Page, number: number) => page.getByRole("group", { name: `Bow, row ${number}` });

async function fillRow(page: Page, number: number, step: string, bow: string, uncertainty: string): Promise<void> {
  await row(page, number).getByLabel("After step").selectOption(step);
  await row(page, number).getByLabel("Measured bow").fill(bow);
  await row(page, number).getByLabel("Standard uncertainty").fill(uncertainty);
}

/** Bows near those that the demo flow is computed to have, so that they can be fitted. */
const BOWS: [step: string, bow: string][] = [
  ["10", "-410 um"],
  ["12", "-140 um"],
  ["14", "-196 um"],
];

async function fillBows(page: Page): Promise<void> {
  for (const [index, [step, bow]] of BOWS.entries()) await fillRow(page, index + 1, step, bow, "4 um");
}

const calibrate = (page: Page) => page.getByRole("button", { name: "Calibrate", exact: true }).click();

test("an engineer fits modulus and expansion to measured bows, and nothing is stored", async ({ page }) => {
  await openCalibration(page, "engineer");
  await fillBows(page);
  await page.getByRole("button", { name: "Another bow" }).click();
  await fillRow(page, 4, "15", "-5 um", "4 um");
  await calibrate(page);
  await expect(page.getByRole("status")).toContainText(
    /Locked-in modulus .*\sMPa and carrier expansion .*\sppm\/K fit/,
  );
  const residuals = page.getByRole("table", { name: "Measured and computed bows, µm" });
  await expect(residuals.getByRole("row")).toHaveCount(5);
  await expect(residuals).toContainText("−410.0");
  await page.getByText("Working", { exact: true }).click();
  await expect(page.getByText("locked-in modulus of the bonding material").first()).toBeVisible();
  await expect(row(page, 4).getByLabel("Measured bow")).toHaveValue("-5 um");
  await expect(page.getByText("A process owner puts fitted values into the library.")).toBeVisible();
  await expect(page.getByRole("button", { name: "Use these values" })).toHaveCount(0);
  await expectNoAxeFindings(page);
  await page.getByRole("link", { name: MATERIAL }).click();
  await expect(page.getByRole("heading", { level: 1, name: MATERIAL })).toBeVisible();
  await expect(page.getByRole("table", { name: "Properties" })).toContainText(/150\s±\s45\sMPa/);
});

test("bows that leave a value open are refused with the one that would help", async ({ page }) => {
  await openCalibration(page, "engineer");
  await fillRow(page, 1, "10", "-410 um", "4 um");
  await calibrate(page);
  await expect(page.getByRole("status")).toContainText("1 measured bow cannot give 2 values.");
  await expect(page.getByRole("status")).toContainText(/A bow of the pair after step \d+, .*, would help most\./);
});

test("a process owner is offered to use the values", async ({ page }) => {
  await openCalibration(page, "process owner");
  await fillBows(page);
  await calibrate(page);
  await expect(page.getByRole("button", { name: "Use these values" })).toBeVisible();
});

test.describe("what cannot be taken", () => {
  test.use({ refusals: true });

  test("is said at its field, and everything typed stays", async ({ page }) => {
    await openCalibration(page, "engineer");
    await calibrate(page);
    await expect(row(page, 1)).toContainText("Type at least one measured bow");
    await fillRow(page, 1, "10", "12 parsecs", "4 um");
    await fillRow(page, 2, "12", "-140 um", "-4 um");
    await row(page, 3).getByLabel("Measured bow").fill("-200 um");
    await calibrate(page);
    await expect(row(page, 1)).toContainText("parsecs is not a unit of length");
    await expect(row(page, 2)).toContainText("outside 10 nm to 20 mm");
    await expect(row(page, 3)).toContainText("Choose the step after which it was measured.");
    await expect(row(page, 1).getByLabel("Measured bow")).toHaveValue("12 parsecs");
    await expectNoAxeFindings(page);
  });

  test("is the post of somebody who may only look, or to use values without the right to", async ({ page }) => {
    await openCalibration(page, "technician");
    await expect(page.getByRole("table", { name: "Computed bows of the pair" })).toBeVisible();
    await expect(page.getByRole("button", { name: "Calibrate", exact: true })).toHaveCount(0);
    await expectNoAxeFindings(page);
    const address = new URL(page.url());
    const form = {
      flow: address.searchParams.get("flow") ?? "",
      fit: "modulus",
      "rows[0].step": "10",
      "rows[0].bow": "-410 um",
      "rows[0].uncertainty": "4 um",
    };
    const origin = address.origin;
    const answer = await page.request.post(address.pathname, { form, headers: { origin } });
    expect(answer.status()).toBe(403);
    const use = await page.request.post(address.pathname, { form: { ...form, intent: "use" }, headers: { origin } });
    expect(use.status()).toBe(403);
  });
});

test.describe("without scripts", () => {
  test.use({ javaScriptEnabled: false });

  test("three blank rows are there, and the result comes with the page", async ({ page }) => {
    await openCalibration(page, "engineer");
    await fillBows(page);
    await calibrate(page);
    await expect(page.getByRole("status")).toContainText("fit the 3 measured bows best");
    await expect(row(page, 2).getByLabel("Measured bow")).toHaveValue("-140 um");
  });
});
