/* The demo's own page. What all browser tests share is looked at here and never taken out: that is tests/services/demo-removal.test.ts. */
import { expect, expectNoAxeFindings, signIn, signInAtToday, test, type Role } from "./support.ts";

test("a process owner comes from Today to what exactly goes and what stays", async ({ page }) => {
  await signInAtToday(page, "process owner");
  await page.getByRole("main").getByRole("link", { name: "Remove the demo" }).click();
  await expect(page).toHaveURL(/\/demo$/);
  const part = (name: string) => page.getByRole("region", { name });
  await expect(part("Goes")).toContainText("Fulmar, Petrel and Tern");
  await expect(part("Goes")).toContainText("3programs");
  await expect(part("Stays")).toContainText("whoever can sign in now still can");
  await expect(part("Remove the demo")).toContainText("Mikael Lindqvist (process owner)");
  await expectNoAxeFindings(page);
});

test("what somebody has put into it is named with them", async ({ page, browser }) => {
  const engineer = await browser.newPage();
  await signIn(engineer, "engineer");
  await engineer.goto("/stacks?program=tern");
  await engineer.getByRole("link", { name: "Tern T-2, one redistribution layer" }).first().click();
  await engineer.getByRole("link", { name: "Copy", exact: true }).click();
  await expect(engineer).toHaveURL(/\/stacks\/new\?from=/);
  await expect(engineer.getByRole("heading", { level: 1, name: "New stack" })).toBeVisible();
  const name = `Goes with the demo ${Date.now().toString(36)}`;
  await engineer.locator('[name="name"]').fill(name);
  await engineer.getByRole("button", { name: "Save stack" }).click();
  await expect(engineer.getByRole("heading", { level: 1, name })).toBeVisible();
  await engineer.close();
  await signIn(page, "process owner");
  await page.goto("/demo");
  const added = page.getByRole("region", { name: "Added since" });
  await expect(added.getByRole("listitem").filter({ hasText: name })).toContainText("Ines Varga");
});

test.describe("without the word", () => {
  test.use({ javaScriptEnabled: false, refusals: true });

  test("nothing goes, and without scripts it says so", async ({ page }) => {
    await signIn(page, "process owner");
    await page.goto("/demo");
    await page.getByLabel("Name of the new program").fill("Heron");
    await page.getByLabel("Type the word remove").fill("yes");
    await page.getByRole("button", { name: "Remove the demo" }).click();
    await expect(page.getByRole("alert")).toContainText("Nothing was removed");
    await expect(page.getByLabel("Name of the new program")).toHaveValue("Heron");
    await page.goto("/");
    await expect(page.getByRole("table", { name: "Your programs" })).toContainText("Tern");
  });
});

test.describe("anybody else", () => {
  test.use({ refusals: true });

  for (const role of ["engineer", "technician", "administrator", "guest"] satisfies Role[])
    test(`as ${role} finds no way to it`, async ({ page }) => {
      await signInAtToday(page, role);
      await expect(page.getByRole("link", { name: "Remove the demo" })).toHaveCount(0);
      const answer = await page.request.post("/demo", { form: { intent: "remove", confirm: "remove" } });
      expect(answer.status()).toBe(403);
    });
});

for (const [what, options] of [
  ["a phone", { viewport: { width: 320, height: 640 } }],
  ["the dark", { colorScheme: "dark" }],
] as const)
  test.describe(`on ${what}`, () => {
    test.use(options);

    test("nothing is too wide, and axe finds nothing", async ({ page }) => {
      await signIn(page, "process owner");
      await page.goto("/demo");
      await expect(page.getByRole("region", { name: "Goes" })).toBeVisible();
      expect(await page.evaluate(() => document.documentElement.scrollWidth - innerWidth)).toBeLessThanOrEqual(0);
      await expectNoAxeFindings(page);
    });
  });
