import { asOwner } from "./door-ids.ts";
import { assess, ownFlow, press } from "./flow-pages.ts";
import { expect, expectNoAxeFindings, signIn, test } from "./support.ts";

test("an engineer asks, the process owner releases, the technician takes the paper out and its code says so", async ({
  page,
  browser,
}) => {
  await signIn(page, "engineer");
  await ownFlow(page);
  await assess(page);
  await page.getByRole("link", { name: "Review", exact: true }).click();
  await expect(page).toHaveURL(/\/review$/);
  const review = new URL(page.url()).pathname;
  await expectNoAxeFindings(page);
  await page.getByLabel("What the reviewer should know").fill("For next week");
  await press(page, "Ask for a review");
  await expect(page.getByText("asked for a review at")).toBeVisible();
  await page.getByLabel("About").selectOption({ index: 3 });
  await page.getByRole("textbox", { name: "Comment" }).fill("Cure checked on a monitor");
  await press(page, "Say it");
  await expect(page.getByText("Cure checked on a monitor")).toBeVisible();

  await signIn(page, "process owner");
  await page.goto(review);
  await expectNoAxeFindings(page);
  await page.getByRole("checkbox").check();
  await press(page, "Release the sheet");
  await page.getByRole("link", { name: "Open the sheet" }).click();
  await expect(page).toHaveURL(/\/sheets\/revisions\//);
  await expect(page.getByText("Current: this is the revision in force.")).toBeVisible();
  await expectNoAxeFindings(page);
  const sheet = new URL(page.url()).pathname;

  await signIn(page, "technician");
  await page.setViewportSize({ width: 390, height: 844 });
  await page.goto(sheet);
  expect(await page.evaluate(() => document.documentElement.scrollWidth <= innerWidth)).toBe(true);
  await page.getByLabel("Where it will hang").fill("Trimmer 1");
  const [paper] = await Promise.all([page.waitForEvent("download"), press(page, "Take out the PDF")]);
  expect(paper.suggestedFilename()).toMatch(/^Handling-risk sheet TERN-H\d+ A\.pdf$/);
  await page.reload();
  await expect(page.getByRole("table", { name: "Papers taken out" })).toContainText("Trimmer 1");

  await page.getByRole("link", { name: "The sheet as it was released" }).click();
  await expect(page.getByText("Effective from").first()).toBeVisible();
  const [row] = await asOwner((query) =>
    query<{ token: string }>("select token from sheet_revision where id = ?", [sheet.split("/").at(-1)]),
  );
  const visitor = await (await browser.newContext()).newPage();
  await visitor.goto(`/s/${row?.token}`);
  await expect(visitor.getByRole("heading", { level: 1 })).toHaveText("Current");
  await expectNoAxeFindings(visitor);
});
