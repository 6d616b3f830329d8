import { mailedLink } from "./mailed-link.ts";
import { accountOf, expect, expectNoAxeFindings, signIn, test } from "./support.ts";

const PHONE = { width: 390, height: 844 };

test.describe("people", () => {
  test.use({ refusals: true });

  test("somebody is invited, sets a password by the link in the mail, works, and is shut out", async ({
    page,
    browser,
  }) => {
    test.slow();
    const address = `n.vale-${Date.now().toString(36)}@kestrel-ridge.example`;
    await signIn(page, "administrator");
    await page.goto("/people");
    await expect(page.getByRole("heading", { level: 1, name: "People" })).toBeVisible();
    await expectNoAxeFindings(page);
    await page.getByRole("link", { name: "Invite somebody" }).click();
    await expect(page.getByRole("heading", { level: 1, name: "Invite somebody" })).toBeVisible();
    await expectNoAxeFindings(page);
    await page.getByLabel("Name").fill("Nora Vale");
    await page.getByLabel("E-mail").fill(accountOf("engineer").email);
    await page.getByLabel("In Tern").selectOption({ label: "Technician" });
    await page.getByRole("button", { name: "Invite" }).click();
    await expect(page.getByText("There is an account with this address already.")).toBeVisible();
    await page.getByLabel("E-mail").fill(address);
    await page.getByRole("button", { name: "Invite" }).click();
    await expect(page.getByText("The invitation is on its way.")).toBeVisible();
    const account = page.url().replace(/\?.*/, "");
    await expectNoAxeFindings(page);

    const theirs = await (await browser.newContext({ viewport: PHONE })).newPage();
    const link = await mailedLink(address, "set-password");
    await theirs.goto(link);
    await theirs.goto(link);
    await expect(theirs.getByRole("heading", { level: 1 })).toHaveText("Welcome: set your password");
    await expectNoAxeFindings(theirs);
    await theirs.getByLabel("New password", { exact: true }).fill("password1234");
    await theirs.getByRole("button", { name: "Set the password" }).click();
    await expect(theirs.getByLabel("New password", { exact: true })).toHaveAttribute("aria-invalid", "true");
    await theirs.getByLabel("New password", { exact: true }).fill("glass under the copper");
    await theirs.getByRole("button", { name: "Set the password" }).click();
    await expect(theirs).toHaveURL(/\/sign-in/);
    await theirs.getByLabel("E-mail").fill(address);
    await theirs.getByLabel("Password", { exact: true }).fill("glass under the copper");
    await theirs.getByRole("button", { name: "Sign in" }).click();
    await expect(theirs.getByRole("heading", { level: 1, name: "Today" })).toBeVisible();
    expect((await theirs.goto("/stacks"))?.status()).toBe(200);
    await theirs.goto("/account");
    await expectNoAxeFindings(theirs);
    await theirs.getByLabel("Password now", { exact: true }).fill("not this one at all");
    await theirs.getByLabel("New password", { exact: true }).fill("copper over the glass");
    await theirs.getByRole("button", { name: "Change the password" }).click();
    await expect(theirs.getByText("This is not your password.")).toBeVisible();
    await theirs.getByLabel("Password now", { exact: true }).fill("glass under the copper");
    await theirs.getByLabel("New password", { exact: true }).fill("copper over the glass");
    await theirs.getByRole("button", { name: "Change the password" }).click();
    await expect(theirs.getByText("Your password is changed")).toBeVisible();
    // The link works once, and what one role may not stays shut.
    expect((await theirs.goto(link))?.status()).toBe(404);
    expect((await theirs.goto("/people"))?.status()).toBe(403);

    await page.goto(account);
    await page.getByRole("button", { name: "Deactivate" }).click();
    await expect(page.getByText("every session of it has ended")).toBeVisible();
    await theirs.goto("/stacks");
    await expect(theirs).toHaveURL(/\/sign-in/);
    await page.goto(`/people?q=${address}`);
    await expect(page.getByRole("link", { name: "Nora Vale" })).toBeVisible();
    await page.setViewportSize(PHONE);
    for (const path of ["/people", "/people/new", account, "/account"]) {
      await page.goto(path);
      const over = () => document.documentElement.scrollWidth - document.documentElement.clientWidth;
      expect(await page.evaluate(over)).toBe(0);
    }
  });

  test("whoever asks for a link is told the same, whether there is an account or not", async ({ page }) => {
    for (const address of ["nobody@kestrel-ridge.example", "nobody-else@kestrel-ridge.example"]) {
      await page.goto("/sign-in");
      await page.getByRole("link", { name: /forgotten/i }).click();
      await expect(page).toHaveURL(/\/forgotten/);
      await expectNoAxeFindings(page);
      await page.getByLabel("E-mail").fill(address);
      await page.getByRole("button", { name: /link/i }).click();
      await expect(page.getByRole("status")).toBeVisible();
    }
  });
});
