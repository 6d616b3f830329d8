import type { Page } from "@playwright/test";
import { assess } from "./assess.ts";
import { ownFlow, press, steps } from "./flow-pages.ts";
import { expect, expectNoAxeFindings, signIn, test } from "./support.ts";

// Each assesses a flow of its own twice over, which takes a while on a busy machine.
test.describe.configure({ timeout: 120_000 });

const slots = (page: Page) => page.getByLabel("Slots", { exact: true });
/** The step that some slots leave out here. */
const grind = (page: Page) => steps(page).getByRole("row").filter({ hasText: "Grind" }).first();

async function openGrind(page: Page): Promise<void> {
  await grind(page).getByRole("link").first().click();
  await expect(slots(page)).toBeVisible();
}

test.describe("slots of a step", () => {
  test.use({ refusals: true });

  test("are typed, part the flow, and each leg is answered by its own verdict", async ({ page }) => {
    await signIn(page, "engineer");
    await ownFlow(page);
    await openGrind(page);
    await slots(page).fill("12-1");
    await press(page, "Save step");
    await expect(page.getByText("12-1 runs backwards: type 1-12.")).toBeVisible();
    await expect(slots(page)).toHaveValue("12-1");
    await slots(page).fill("1-12");
    await press(page, "Save step");
    await expect(page).toHaveURL(/\?step=/);
    await expect(grind(page)).toContainText("slots 1 to 12");
    await expect(page.getByText("slots 1 to 12; slots 13 to 25")).toBeVisible();
    await openGrind(page);
    await expect(slots(page)).toHaveValue("1-12");
    await page.goBack();

    const path = await assess(page);
    await expect(page.getByText(/slots 13 to 25/i).first()).toBeVisible();
    await page.goto(`${path}?leg=1`);
    await expect(page.getByText(/slots 1 to 12/i).first()).toBeVisible();
    await expectNoAxeFindings(page);
  });
});

test.describe("without scripts", () => {
  test.use({ javaScriptEnabled: false });

  test("slots are there to be said, and are kept", async ({ page }) => {
    await signIn(page, "engineer");
    await ownFlow(page);
    await openGrind(page);
    await slots(page).fill("2, 4-6");
    await press(page, "Save step");
    await expect(grind(page)).toContainText("slots 2 and 4 to 6");
  });
});
