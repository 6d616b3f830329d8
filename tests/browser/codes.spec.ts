import { hash } from "@node-rs/argon2";
import { generateSync } from "otplib";
import type { Page } from "@playwright/test";
import { asOwner } from "./door-ids.ts";
import { mailedLink } from "./mailed-link.ts";
import { expect, expectNoAxeFindings, test } from "./support.ts";

const PASSWORD = "resin under the glass";

/** A technician of Tern of this test's own: turning codes on ends every other session of its account. */
async function newPerson(email: string): Promise<void> {
  const passwordHash = await hash(PASSWORD);
  await asOwner(async (query) => {
    const [person] = await query<{ id: string }>(
      `insert into person (id, email, name, active, created_at) values (gen_random_uuid(), ?, 'Odile Marsh', true, now()) returning id`,
      [email],
    );
    const id = person?.id ?? "";
    await query(
      `insert into credential (id, person_id, password_hash, changed_at) values (gen_random_uuid(), ?, ?, now()) returning id`,
      [id, passwordHash],
    );
    await query(
      `insert into membership (id, person_id, program_id, role, created_at)
         select gen_random_uuid(), ?, id, 'technician', now() from program where slug = 'tern' returning id`,
      [id],
    );
  });
}

/** The code that an app with the secret shows so many steps of 30 s from now. */
const codeIn = (secret: string, steps = 0) => generateSync({ secret, epoch: Date.now() / 1000 + steps * 30 });

async function signInByForm(page: Page, email: string): Promise<void> {
  await page.getByLabel("E-mail").fill(email);
  await page.getByLabel("Password", { exact: true }).fill(PASSWORD);
  await page.getByRole("button", { name: "Sign in" }).click();
}

test.describe("one-time codes", () => {
  test.use({ refusals: true });

  test("codes are set up, asked for after the password, replaced by a recovery code, and turned off; the address changes", async ({
    page,
  }) => {
    test.slow();
    const mark = Date.now().toString(36);
    const email = `o.marsh-${mark}@kestrel-ridge.example`;
    const fresh = `odile-${mark}@kestrel-ridge.example`;
    await newPerson(email);
    await page.goto("/sign-in?next=%2Faccount");
    await signInByForm(page, email);
    await page.getByRole("link", { name: "Set up one-time codes" }).click();
    await page.getByRole("button", { name: "Set up codes" }).click();
    await expect(page.getByLabel("First code")).toBeVisible();
    await expectNoAxeFindings(page);
    const secret = (await page.locator("code").innerText()).replaceAll(/\s/g, "");
    await page.getByLabel("First code").fill("12345");
    await page.getByRole("button", { name: "Turn codes on" }).click();
    await expect(page.getByLabel("First code")).toHaveAttribute("aria-invalid", "true");
    await page.getByLabel("First code").fill(codeIn(secret));
    await page.getByRole("button", { name: "Turn codes on" }).click();
    await expect(page.getByText("One-time codes are on")).toBeVisible();
    await expectNoAxeFindings(page);
    const recovery = await page.locator("li code").allInnerTexts();
    expect(recovery).toHaveLength(10);
    await page.setViewportSize({ width: 320, height: 640 });
    const over = () => document.documentElement.scrollWidth - document.documentElement.clientWidth;
    expect(await page.evaluate(over)).toBe(0);
    await page.goto("/account/codes");
    await expect(page.getByText("10 are left")).toBeVisible();
    await expect(page.locator("li code")).toHaveCount(0);

    // Half signed in is nobody, whatever is asked for.
    await page.context().clearCookies();
    await page.goto("/sign-in?next=%2Faccount");
    await signInByForm(page, email);
    await expect(page).toHaveURL(/\/sign-in\/code\?next=/);
    await expectNoAxeFindings(page);
    expect(await page.evaluate(over)).toBe(0);
    const films = await page.request.get("/films", { maxRedirects: 0 });
    expect([films.status(), films.headers()["location"]]).toEqual([302, "/sign-in?next=%2Ffilms"]);
    await page.getByLabel("Code").fill("000 000");
    await page.getByRole("button", { name: "Sign in" }).click();
    await expect(page.getByText("This code is not good")).toBeVisible();
    await page.getByLabel("Code").fill(codeIn(secret, 1));
    await page.getByRole("button", { name: "Sign in" }).click();
    await expect(page.getByRole("heading", { level: 1, name: "Account" })).toBeVisible();

    await page.getByLabel("New e-mail address").fill(fresh);
    await page.getByRole("button", { name: "Send the link" }).click();
    await expect(page.getByText("a mail with a link is on its way")).toBeVisible();
    const link = await mailedLink(fresh, "confirm-address");
    await page.goto(link);
    await expect(page.getByRole("heading", { level: 1 })).toHaveText("Confirm your new address");
    await expectNoAxeFindings(page);
    await page.getByRole("button", { name: "Confirm the address" }).click();
    await expect(page.getByText("Your address is changed")).toBeVisible();
    await expectNoAxeFindings(page);
    expect((await page.goto(link))?.status()).toBe(404);

    await page.context().clearCookies();
    await page.goto("/sign-in?next=%2Faccount%2Fcodes");
    await signInByForm(page, fresh);
    await page.getByLabel("Code").fill(recovery[0] ?? "");
    await page.getByRole("button", { name: "Sign in" }).click();
    await expect(page.getByText("9 are left")).toBeVisible();
    await page.getByLabel("Your password, to turn off", { exact: true }).fill(PASSWORD);
    await page.getByLabel("Your one-time code").fill(recovery[1] ?? "");
    await page.getByRole("button", { name: "Turn codes off" }).click();
    await expect(page.getByText("Your one-time codes are off")).toBeVisible();
  });
});
