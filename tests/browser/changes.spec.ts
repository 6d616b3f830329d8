import { expect, expectNoAxeFindings, scriptsAtWork, signIn, test } from "./support.ts";

const TITLE = "Somebody has saved this stack since you opened it.";

test("who has a stack open is told that somebody saved it, also where the server can't tell by itself", async ({
  page,
  browser,
}) => {
  await signIn(page, "engineer");
  await page.goto("/stacks?sort=name");
  await page.getByRole("link", { name: "Tern T-2, one redistribution layer", exact: true }).click();
  await page.getByRole("link", { name: "Copy", exact: true }).click();
  // The page of the stack itself has the same fields.
  await expect(page).toHaveURL(/\/stacks\/new\?from=/);
  await expect(page.getByRole("heading", { level: 1, name: "New stack" })).toBeVisible();
  const name = `Told ${Date.now().toString(36)}`;
  await page.getByLabel("Name", { exact: true }).fill(name);
  await page.getByRole("button", { name: "Save stack" }).click();
  await expect(page.getByRole("heading", { level: 1, name })).toBeVisible();
  const path = new URL(page.url()).pathname;

  const asking = await page.context().newPage();
  await asking.route(/\/changes\?(?!.*once)/, (route) => route.fulfill({ status: 204 }));
  const stands = [page, asking].map((each) => each.waitForResponse(/\/changes\?.*once/));
  await page.goto(path);
  await asking.goto(path);
  await Promise.all(stands);

  const other = await (await browser.newContext()).newPage();
  await signIn(other, "process owner");
  await other.goto(path);
  await scriptsAtWork(other.getByLabel("Remaining silicon"));
  await other.getByLabel("Remaining silicon").fill("321 um");
  await other.getByRole("button", { name: "Save stack" }).click();
  await expect(other.getByText(/Last changed .*Mikael Lindqvist/)).toBeVisible();
  // Nobody is told of what they did themselves.
  await expect(page.getByText(TITLE)).toBeVisible({ timeout: 30_000 });
  await expect(asking.getByText(TITLE)).toBeVisible({ timeout: 30_000 });
  await expect(other.getByText(TITLE)).toBeHidden();
  await expectNoAxeFindings(page);
  await page.getByRole("link", { name: "Show it as it is now" }).click();
  await expect(page.getByLabel("Remaining silicon")).toHaveValue("321 um");
  await expect(page.getByText(TITLE)).toBeHidden();
});
