import type { Page } from "@playwright/test";
import { assess, press, steps } from "./flow-pages.ts";
import { expect, expectNoAxeFindings, signIn, test } from "./support.ts";

const TEMPLATE = "Two-carrier transfer to 50 µm, lines on both sides, 300 mm";

/** A flow of this name from the template; stays on its page. */
async function fromTemplate(page: Page, name: string): Promise<string> {
  await page.goto("/flows/library/flows");
  await page.getByRole("link", { name: TEMPLATE }).click();
  await page.getByRole("link", { name: /flow from/i }).click();
  await page.getByLabel("Program").selectOption({ label: "Petrel" });
  await page.getByLabel("Name", { exact: true }).fill(name);
  await press(page, "Save with the steps below");
  await expect(page.getByRole("heading", { level: 1 })).toContainText(name);
  return new URL(page.url()).pathname;
}

const debond = (page: Page) => page.getByRole("link", { name: "Laser debond through glass: device side", exact: true });
const face = (page: Page) => page.getByLabel("Face that is let go");

test("a transfer from the template says at each step which carriers hold the wafer and what is let go", async ({
  page,
}) => {
  await signIn(page, "engineer");
  await fromTemplate(page, "Transfer, as it comes");
  const row = (title: RegExp) => steps(page).getByRole("row").filter({ hasText: title });
  await expect(row(/^12 ?Bond to Silicon carrier|Bond to Silicon carrier/)).toContainText("on the back side");
  await expect(row(/Laser debond through glass: device side/)).toContainText("lets go Borosilicate glass, 300 mm");
  await assess(page);
  const bonds = page.getByRole("heading", { name: "The bonds" }).locator("..");
  await expect(bonds).toContainText("device side");
  await expect(bonds).toContainText("back side");
  await expect(page.getByText("The shape of three is not computed")).toHaveCount(0);
  await expectNoAxeFindings(page);
  await page.getByRole("link", { name: /Print the sheet/ }).click();
  await expect(page.getByText("Both carriers").first()).toBeVisible();
  await expect(page.getByText(/back side bonded/)).toBeVisible();
});

test("a debond that names the wrong face, or none, is stopped by the order rule", async ({ page }) => {
  await signIn(page, "engineer");
  const path = await fromTemplate(page, "Transfer, faces mixed up");
  await debond(page).click();
  await expect(face(page)).toHaveValue("front");
  await face(page).selectOption({ label: "The one that is bonded" });
  await press(page, "Save");
  await expect(page).toHaveURL(new RegExp(`${path}$`));
  await assess(page);
  await page.goto(`${new URL(page.url()).pathname}?step=13`);
  await expect(page.getByText(/which of them this debond lets go is not said/).first()).toBeVisible();
  await page.goto(path);
  await page.getByRole("link", { name: "Mechanical peel debond, on frame: back side", exact: true }).click();
  await face(page).selectOption({ label: "Device side" });
  await press(page, "Save");
  await expect(page).toHaveURL(new RegExp(`${path}$`));
  await assess(page);
  await page.goto(`${new URL(page.url()).pathname}?step=21`);
  await expect(page.getByText(/nothing to debond on the device side/).first()).toBeVisible();
});

test.describe("without scripts", () => {
  test.use({ javaScriptEnabled: false });

  test("the face of a debond is there to be said, and is kept", async ({ page }) => {
    await signIn(page, "engineer");
    const path = await fromTemplate(page, "Transfer, without scripts");
    await debond(page).click();
    await face(page).selectOption({ label: "Back side" });
    await press(page, "Save");
    await expect(page).toHaveURL(new RegExp(`${path}$`));
    await debond(page).click();
    await expect(face(page)).toHaveValue("back");
  });
});

test("somebody who only reads sees the faces and changes none", async ({ page }) => {
  await signIn(page, "technician");
  await page.goto("/flows/library/flows");
  await page.getByRole("link", { name: TEMPLATE }).click();
  await expect(page.getByText("lets go Silicon carrier, 300 mm")).toBeVisible();
  await expect(face(page)).toHaveCount(0);
});
