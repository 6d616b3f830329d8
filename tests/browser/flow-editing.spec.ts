import type { Page } from "@playwright/test";
import { ownFlow, press, steps } from "./flow-pages.ts";
import { expect, expectNoAxeFindings, expectNoAxeFindingsInBothThemes, signIn, test } from "./support.ts";

const titles = (page: Page) => steps(page).locator("tbody th[scope=row] > a").allTextContents();
const firstThree = (page: Page) => titles(page).then((all) => all.slice(0, 3));
const status = (page: Page) => page.getByRole("status").first();

test.describe("an engineer", () => {
  test.beforeEach(({ page }) => signIn(page, "engineer"));

  test("moves a step by pointer and by keys, and takes it back", async ({ page }) => {
    await ownFlow(page);
    const [first = "", second = "", third = ""] = await titles(page);
    const rows = steps(page).locator("tbody tr[id]");
    await rows.nth(0).evaluate((row) => row.scrollIntoView({ block: "center" }));
    const handle = await rows.nth(2).getByTitle("Drag to move").boundingBox();
    const target = await rows.nth(0).boundingBox();
    if (!handle || !target) throw new Error("The table has no rows to drag.");
    await page.mouse.move(handle.x + handle.width / 2, handle.y + handle.height / 2);
    await page.mouse.down();
    await page.mouse.move(handle.x, target.y + 4, { steps: 5 });
    await page.mouse.up();
    await expect.poll(() => firstThree(page)).toEqual([third, first, second]);
    await expect(status(page)).toContainText(`Moved step 3, ${third}, to 1.`);

    await page.getByRole("link", { name: third, exact: true }).focus();
    await page.keyboard.press("Alt+ArrowDown");
    await expect.poll(() => firstThree(page)).toEqual([first, third, second]);
    await page.keyboard.press("Control+z");
    await expect.poll(() => firstThree(page)).toEqual([third, first, second]);
    await press(page, "Undo");
    await expect.poll(() => firstThree(page)).toEqual([first, second, third]);
    await page.keyboard.press("Control+Shift+z");
    await expect.poll(() => firstThree(page)).toEqual([third, first, second]);
    await expect(status(page)).toContainText("Did again: moved step 3");
  });

  test("lets a drag go with Escape, and nothing has changed", async ({ page }) => {
    await ownFlow(page);
    const before = await titles(page);
    const handle = await steps(page).locator("tbody tr[id]").nth(3).getByTitle("Drag to move").boundingBox();
    if (!handle) throw new Error("The table has no rows to drag.");
    await page.mouse.move(handle.x + 4, handle.y + 4);
    await page.mouse.down();
    await page.mouse.move(handle.x, handle.y - 120, { steps: 4 });
    await page.keyboard.press("Escape");
    await page.mouse.up();
    expect(await titles(page)).toEqual(before);
    await expect(page.getByRole("button", { name: "Undo" })).toHaveAttribute("aria-disabled", "true");
  });

  test("is offered what was half typed when the page went away", async ({ page }) => {
    const path = await ownFlow(page);
    await page.goto(`${path}/steps/new`);
    await page.getByLabel("What is done").fill("Half typed");
    await page.getByLabel("Peak temperature").fill("12 parsecs");
    await expect
      .poll(() => page.evaluate(() => Object.values(sessionStorage).some((text) => String(text).includes("parsecs"))))
      .toBe(true);
    page.on("dialog", (dialog) => void dialog.accept());
    await page.goto(path);
    await page.goto(`${path}/steps/new`);
    await press(page, "Fill it in again");
    await expect(page.getByLabel("What is done")).toHaveValue("Half typed");
    await expect(page.getByLabel("Peak temperature")).toHaveValue("12 parsecs");
    await page.getByRole("link", { name: "Leave without saving" }).click();
    await expect(page).toHaveURL(new RegExp(`${path}$`));
    await page.goto(`${path}/steps/new`);
    await expect(page.getByLabel("What is done")).toHaveValue("");
    await expect(page.getByRole("button", { name: "Fill it in again" })).toBeHidden();
  });

  test("tries a thickness, sees what becomes of the answer, and takes it or puts it back", async ({ page }) => {
    const path = await ownFlow(page);
    await page.getByText("What if").click();
    const value = page.getByLabel("Value", { exact: true });
    await expect(value).toHaveValue("100 µm");
    await value.fill("12 parsecs");
    await expect(page.getByText("parsecs is not a unit of length")).toBeVisible();
    await value.fill("40 um");
    await expect(page.getByRole("list", { name: "Changes tried" })).toContainText("step 15, silicon after it: 40 µm");
    await expect(page.getByRole("heading", { name: "With the changes", exact: true })).toBeVisible();
    await press(page, "Put back");
    await expect(value).toHaveValue("100 µm");
    await expect(page.getByRole("list", { name: "Changes tried" })).toBeHidden();
    // Nothing has been saved by looking.
    await expect(page.getByRole("button", { name: "Undo" })).toHaveAttribute("aria-disabled", "true");

    await value.fill("90 um");
    await press(page, "Apply to the flow");
    await expect(page).toHaveURL(new RegExp(`${path}\\?done=what-if`));
    await expect(steps(page).getByRole("row").filter({ hasText: "Dry polish" })).toContainText("90 ± 3");
    await press(page, "Undo");
    await expect(steps(page).getByRole("row").filter({ hasText: "Dry polish" })).toContainText("100 ± 3");
  });

  test("starts a flow from a template, and a step from the library", async ({ page }) => {
    await page.goto("/flows/new");
    await page.getByRole("link", { name: "Tape flow to 100 µm, 200 mm" }).click();
    await expect(page.getByRole("table", { name: "Steps it starts with" })).toContainText("Grind to 110 µm");
    const name = `From a template, ${crypto.randomUUID().slice(0, 8)}`;
    await page.getByLabel("Name").fill(name);
    await page.getByLabel("Program").selectOption({ label: "Tern" });
    await press(page, "Save with the steps below");
    await expect(page.getByRole("heading", { level: 1 })).toHaveText(name);
    await expect(steps(page).locator("tbody tr[id]")).toHaveCount(19);

    await page.getByRole("link", { name: "Add a step at the end" }).click();
    await page.getByLabel("Search by name or kind").fill("dice");
    await press(page, "Show");
    await page.getByRole("link", { name: "Dice, two-step blade" }).click();
    await expect(page.getByLabel("What is done")).toHaveValue("Dice, two-step blade");
    await press(page, "Save step");
    await expect(steps(page).locator("tbody tr[id]")).toHaveCount(20);
  });

  test("keeps a flow in the place of a template, asked once more before", async ({ page }) => {
    const path = await ownFlow(page);
    await page.getByRole("link", { name: "Keep as template" }).click();
    await expect(page.getByText("Everybody on the staff of the site will see this template")).toBeVisible();
    await expectNoAxeFindings(page);
    await press(page, "Keep");
    await expect(page).toHaveURL(/\/flows\/library\/flows\//);
    const template = new URL(page.url()).pathname;
    // The address changes before the page does.
    await expect(page.getByRole("link", { name: "make a flow from it" })).toBeVisible();
    const name = await page.getByRole("heading", { level: 1 }).innerText();
    await page.goto(`${path}/keep`);
    const kept = page.getByLabel("Keep it as");
    await kept.selectOption(template.split("/").at(-1) ?? "");
    await expect(kept.locator("option:checked")).toContainText(
      /^In place of ‘Tern T-2, to 100\s*\S*\s*µm on tape, copy/,
    );
    await press(page, "Keep");
    await expect(page.getByRole("alert")).toContainText(`Replace the steps of ‘${name}’`);
    await press(page, "Replace its steps");
    await expect(page).toHaveURL(new RegExp(`${template}$`));
    await page.getByText("Remove this template").click();
    await press(page, "Remove it");
    await expect(page).toHaveURL(/\/flows\/library\/flows$/);
  });

  test("takes a tape of the library, what the step states of it counting before", async ({ page }) => {
    await ownFlow(page);
    await page.getByRole("link", { name: /^Mount on film frame in line/ }).click();
    const tape = page.getByLabel("Tape of the library");
    await expect(tape.locator("option:checked")).toHaveText("Dicing tape A");
    await tape.selectOption({ label: "Dicing tape for heat and vacuum" });
    await expect(page.getByText("Dicing tape for heat and vacuum brings its own values.")).toBeVisible();
    await page.getByRole("group", { name: "Highest temperature of the tape" }).getByLabel("Value").fill("50 °C");
    await press(page, "Save step");
    await press(page, "Assess");
    await expect(page.getByText(/Dicing tape for heat and vacuum takes 50\s°C/).first()).toBeVisible();
  });

  test("keeps a step in the library, with what the handling rules ask, and takes it out again", async ({ page }) => {
    await ownFlow(page);
    await page.getByRole("link", { name: /^Laminate bump-embedding/ }).click();
    await expect(page.getByRole("group", { name: "Tape", exact: true })).toBeVisible();
    const title = `Laminate tape, ${crypto.randomUUID().slice(0, 8)}`;
    await page.getByLabel("What is done").fill(title);
    await page.getByText("Contact, clocks and bumps").click();
    await page.getByLabel("Face that is touched").selectOption("Back side");
    await page.getByLabel("Touched with").selectOption("Full area");
    await press(page, "Save step");
    await page.getByRole("link", { name: title, exact: true }).click();
    await press(page, "Keep in the step library");
    await expect(page).toHaveURL(/\/flows\/library\/steps\//);
    await expect(page.getByLabel("Touched with")).toHaveValue("full area");
    await expectNoAxeFindings(page);
    await page.getByText("Remove from the library").click();
    await press(page, "Remove it");
    await page.getByLabel("Search steps").fill(title);
    await press(page, "Show");
    await expect(page.getByRole("heading", { name: "No step fits" })).toBeVisible();
  });

  test.describe("with bad input", () => {
    test.use({ refusals: true });

    test("is told at the fields of a step what has nothing to belong to", async ({ page }) => {
      const path = await ownFlow(page);
      await page.goto(`${path}/steps/new`);
      await page.getByLabel("What is done").fill("Etch");
      await page.getByLabel("Kind of step").selectOption("clean");
      await page.getByLabel("solvent", { exact: true }).check();
      await page.getByLabel("Time in solvent").fill("-5 min");
      await page.getByText("Contact, clocks and bumps").click();
      await page.getByLabel("Touched with").selectOption("Pad");
      await press(page, "Save step");
      await expect(page.getByText("−5 min is outside 0 to 30 days.")).toBeVisible();
      await expect(page.getByText("Say which face is touched.")).toBeVisible();
      await expect(page.getByText(/Tick .* too/)).toBeHidden();
      await expect(page.getByLabel("Time in solvent")).toHaveValue("-5 min");
    });
  });
});

test("a technician reads the library and is offered nothing to change in it", async ({ page }) => {
  await signIn(page, "technician");
  await page.goto("/flows/library/steps");
  await expect(page.getByRole("link", { name: "Add a step" })).toBeHidden();
  await page.getByRole("link", { name: "Edge trim 0.7 mm wide, 150 µm deep from device side" }).click();
  await expect(page.getByText("Edge trimmer")).toBeVisible();
  await expect(page.getByRole("button", { name: "Save step" })).toBeHidden();
  await expect(page.getByText("Remove from the library")).toBeHidden();
  expect((await page.request.get("/flows/library/steps/new")).status()).toBe(403);
});

test("axe finds nothing where flows are tried and kept", async ({ page }) => {
  test.slow();
  await signIn(page, "engineer");
  await ownFlow(page);
  await page.getByText("What if").click();
  await page.getByLabel("Value", { exact: true }).fill("40 um");
  await expect(page.getByRole("heading", { name: "With the changes", exact: true })).toBeVisible();
  await expectNoAxeFindingsInBothThemes(page);
  for (const place of ["/flows/library/flows", "/flows/library/steps", "/flows/library/steps/new", "/flows/new"]) {
    await page.goto(place);
    await expectNoAxeFindingsInBothThemes(page);
  }
  await page.goto("/flows/library/flows");
  await page.getByRole("link", { name: "Tape flow to 100 µm, 200 mm" }).click();
  await expect(page.getByRole("table", { name: "Steps of the template" })).toBeVisible();
  await expectNoAxeFindingsInBothThemes(page);
});
