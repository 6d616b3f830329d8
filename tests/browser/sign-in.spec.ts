import { accountOf, expect, expectNoAxeFindingsInBothThemes, signInAtToday, test } from "./support.ts";

test("the door leads back to the page that was asked for", async ({ page }) => {
  const { email, password } = accountOf("engineer");
  await page.goto("/films?q=copper");
  await expect(page).toHaveURL(/\/sign-in\?next=/);
  await page.getByLabel("E-mail").fill(email);
  await page.getByLabel("Password").fill(password);
  await page.getByRole("button", { name: "Sign in" }).click();
  await expect(page).toHaveURL(/\/films\?q=copper$/);
  await expect(page.getByRole("heading", { name: "Films", level: 1 })).toBeVisible();
});

test("the door never leads to another site", async ({ page, baseURL }) => {
  const { email, password } = accountOf("engineer");
  await page.goto("/sign-in?next=//elsewhere.example/");
  await page.getByLabel("E-mail").fill(email);
  await page.getByLabel("Password").fill(password);
  await page.getByRole("button", { name: "Sign in" }).click();
  await expect(page).toHaveURL(`${baseURL}/`);
});

test.describe("a wrong password", () => {
  test.use({ refusals: true });

  test("is told in words that do not say which of the two was wrong; the address stays", async ({ page }) => {
    const { email } = accountOf("engineer");
    await page.goto("/sign-in");
    await page.getByLabel("E-mail").fill(email);
    await page.getByLabel("Password").fill("not it");
    await page.getByRole("button", { name: "Sign in" }).click();
    await expect(page.getByRole("alert")).toContainText("E-mail address and password do not belong together");
    await expect(page.getByLabel("E-mail")).toHaveValue(email);
    await page.getByLabel("E-mail").fill("nobody@kestrel-ridge.example");
    await page.getByLabel("Password").fill("not it");
    await page.getByRole("button", { name: "Sign in" }).click();
    await expect(page.getByRole("alert")).toContainText("E-mail address and password do not belong together");
  });
});

test("signing out shuts every page again", async ({ page }) => {
  await signInAtToday(page, "engineer");
  await page.getByRole("button", { name: "Sign out" }).click();
  await expect(page).toHaveURL(/\/sign-in$/);
  await page.goto("/films");
  await expect(page).toHaveURL(/\/sign-in\?next=/);
});

test.describe("without JavaScript", () => {
  test.use({ javaScriptEnabled: false });

  test("one signs in, sees the films and signs out", async ({ page }) => {
    await signInAtToday(page, "technician");
    await page.getByRole("link", { name: "Films" }).click();
    await expect(page.getByRole("table")).toBeVisible();
    await page.getByRole("button", { name: "Sign out" }).click();
    await expect(page).toHaveURL(/\/sign-in$/);
  });
});

test("axe finds nothing at the door", async ({ page }) => {
  await page.goto("/sign-in");
  await expectNoAxeFindingsInBothThemes(page);
});
