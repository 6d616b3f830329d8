import type { Page } from "@playwright/test";
import { assess } from "./assess.ts";
import { press, steps } from "./flow-pages.ts";
import { expect, expectNoAxeFindings, signIn, test } from "./support.ts";

const TEMPLATE = "Two-carrier transfer to 50 µm, lines on both sides, 300 mm";
const FIRST_DEBOND = "Laser debond through glass: device side";
const LAST_DEBOND = "Mechanical peel debond, on frame: back side";

/** A flow of this name from the template; stays on its page. */
async function fromTemplate(page: Page, name: string): Promise<string> {
  await signIn(page, "engineer");
  await page.goto("/flows/library/flows");
  await page.getByRole("link", { name: TEMPLATE }).click();
  await page.getByRole("link", { name: "New flow from it", exact: true }).click();
  await page.getByLabel("Program").selectOption({ label: "Petrel" });
  await page.getByLabel("Name", { exact: true }).fill(name);
  await press(page, "Save with the steps below");
  await expect(page.getByRole("heading", { level: 1 })).toContainText(name);
  return new URL(page.url()).pathname;
}

const face = (page: Page) => page.getByLabel("Face that is let go");
const open = (page: Page, title: string) => page.getByRole("link", { name: title, exact: true }).click();
const row = (page: Page, title: string) => steps(page).getByRole("row").filter({ hasText: title });

/** Says another face at a debond, and is back on the flow's page. */
async function sayFace(page: Page, title: string, label: string): Promise<void> {
  await open(page, title);
  await face(page).selectOption({ label });
  await press(page, "Save step");
  await expect(page).toHaveURL(/\?step=/);
}

// Each walks and assesses 25 steps of its own, which takes a while on a busy machine.
test.describe.configure({ timeout: 90_000 });

test("a transfer says which carriers hold the wafer, by which face, and what is let go", async ({ page }) => {
  await fromTemplate(page, "Transfer, as it comes");
  await expect(row(page, "Bond to Silicon carrier")).toContainText("on the back side");
  await expect(row(page, FIRST_DEBOND)).toContainText("lets go Aluminosilicate glass, low expansion, 300 mm");
  await assess(page);
  const bonds = page.getByRole("heading", { name: "The bonds" }).locator("..");
  await expect(bonds).toContainText("device side");
  await expect(bonds).toContainText("back side");
  await page.getByRole("link", { name: /Print the sheet/ }).click();
  await expect(page.getByText("Both carriers").first()).toBeVisible();
  await expect(page.getByText(/back side bonded/)).toBeVisible();
});

test("a debond between two carriers that does not say which it lets go cannot be judged", async ({ page }) => {
  await fromTemplate(page, "Transfer, a face unsaid");
  await open(page, FIRST_DEBOND);
  await expect(face(page)).toHaveValue("front");
  await expectNoAxeFindings(page);
  await page.goBack();
  await sayFace(page, FIRST_DEBOND, "The one that is bonded");
  await page.goto(`${await assess(page)}?step=13`);
  await expect(page.getByText(/which of them this debond lets go is not said/).first()).toBeVisible();
});

test("a debond of a face with nothing bonded is stopped by the order rule", async ({ page }) => {
  await fromTemplate(page, "Transfer, a wrong face");
  await sayFace(page, LAST_DEBOND, "Device side");
  await page.goto(`${await assess(page)}?step=21`);
  await expect(page.getByText(/nothing to debond on the device side/).first()).toBeVisible();
  await expect(page.getByText(/rule 12/).first()).toBeVisible();
});

test.describe("without scripts", () => {
  test.use({ javaScriptEnabled: false });

  test("the face of a debond is there to be said, and is kept", async ({ page }) => {
    await fromTemplate(page, "Transfer, without scripts");
    await sayFace(page, FIRST_DEBOND, "Back side");
    await open(page, FIRST_DEBOND);
    await expect(face(page)).toHaveValue("back");
  });
});

test("somebody who only reads sees the faces and changes none", async ({ page }) => {
  await signIn(page, "technician");
  await page.goto("/flows/library/flows");
  await page.getByRole("link", { name: TEMPLATE }).click();
  const template = page.getByRole("table", { name: "Steps of the template" });
  const row21 = template.getByRole("row").filter({ hasText: LAST_DEBOND });
  await expect(row21).toContainText("lets go Silicon carrier, 300 mm");
  await expect(face(page)).toHaveCount(0);
});
