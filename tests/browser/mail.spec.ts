import { randomUUID } from "node:crypto";
import type { Page } from "@playwright/test";
import type { Announcement } from "#app/schemas/announcement.ts";
import { ANNOUNCEMENTS } from "#tests/fixtures/announcements.ts";
import { asOwner } from "./door-ids.ts";
import { accountOf, expect, expectNoAxeFindings, signIn, test, type Role } from "./support.ts";

/** Puts a mail of Tern's into the outbox, as what it tells would, and has the worker send it where it waits; its id. */
async function tell(kind: Announcement["kind"], to: Role, state: "waiting" | "parked" = "waiting"): Promise<string> {
  const announcement = ANNOUNCEMENTS.find((each) => each.kind === kind);
  const id = randomUUID();
  await asOwner(async (query) => {
    await query(
      `insert into mail_outbox (id, program_id, person_id, kind, key, announcement, state, message_id, attempts, next_try_at, reason, created_at)
         select ?, program.id, person.id, ?, ?, ?::jsonb, ?, ?, 0, now(), ?, now() from program, person
          where program.slug = 'tern' and person.email = ?`,
      [
        id,
        kind,
        id,
        JSON.stringify(announcement),
        state,
        `<${id}@kestrel-ridge.example>`,
        state === "parked" ? "The mail server refused it: 550 mailbox full" : "",
        accountOf(to).email,
      ],
    );
    if (state === "waiting")
      await query("select graphile_worker.add_job('mail', json_build_object('id', ?::text))", [id]);
  });
  return id;
}

async function openMail(page: Page, subject: string): Promise<void> {
  await expect
    .poll(
      async () => {
        await page.goto("/mail");
        return page.getByRole("link", { name: subject }).count();
      },
      { timeout: 20_000 },
    )
    .toBeGreaterThan(0);
  await page.getByRole("link", { name: subject }).first().click();
  await expect(page.getByRole("heading", { level: 1 })).toHaveText(subject);
}

test("a mail arrives with its recipient alone, as HTML that can do nothing and as text", async ({ page, browser }) => {
  await tell("lot held", "technician");
  await signIn(page, "technician");
  await openMail(page, "Tern: lot T-0412 is held");
  await expect(page.locator("pre")).toContainText("shards of thin");
  const frame = page.locator("iframe");
  await expect(frame).toHaveAttribute("sandbox", "allow-popups allow-popups-to-escape-sandbox");
  await expect(frame).toHaveAttribute("title", "Tern: lot T-0412 is held, as HTML");
  const path = new URL(page.url()).pathname;
  const answer = await page.request.get(`${path}/html`);
  expect(answer.headers()["content-security-policy"]).toMatch(/^default-src 'none'.*sandbox/);
  // No script reaches into the frame, that of the check neither: the page is looked at without it, and what is in it by itself.
  await frame.evaluate((node) => node.remove());
  await expectNoAxeFindings(page);
  const context = await browser.newContext();
  const reader = await context.newPage();
  await reader.emulateMedia({ colorScheme: "dark" });
  await reader.setContent(await answer.text());
  await expect(reader.getByRole("heading", { name: "Tern: lot T-0412 is held" })).toBeVisible();
  expect(await reader.locator("img").evaluate((image: HTMLImageElement) => image.naturalWidth)).toBe(72);
  await expectNoAxeFindings(reader);
  await reader.emulateMedia({ colorScheme: "light" });
  await expectNoAxeFindings(reader);

  const other = await context.newPage();
  await signIn(other, "engineer");
  expect((await other.request.get(path)).status()).toBe(404);
  expect((await other.request.get(`${path}/html`)).status()).toBe(404);
  await context.close();
});

test("what is mailed is chosen without scripts, and what is essential is only told", async ({ browser }) => {
  const context = await browser.newContext({ javaScriptEnabled: false });
  const page = await context.newPage();
  await signIn(page, "shift lead");
  await page.goto("/preferences");
  await page.getByRole("link", { name: "E-mail" }).click();
  const released = page.getByRole("group", { name: "A sheet is released" });
  await expect(released.getByLabel("At once")).toBeChecked();
  await released.getByLabel("In the daily digest").check();
  await page.getByRole("button", { name: "Save choices" }).click();
  await expect(page.getByText("Your choices are saved.")).toBeVisible();
  await expect(released.getByLabel("In the daily digest")).toBeChecked();
  await expect(page.getByRole("group", { name: "A lot is held" })).toHaveCount(0);
  await expect(page.getByText("A lot is held")).toBeVisible();
  await context.close();
});

test("the link of a mail stops its kind without signing in, and only once its button is pressed", async ({
  page,
  browser,
}) => {
  await tell("sheet withdrawn", "guest");
  await signIn(page, "guest");
  await openMail(page, "Tern: sheet TERN-S001 B withdrawn");
  const [link = ""] = /http\S+\/unsubscribe\/\S+/.exec((await page.locator("pre").textContent()) ?? "") ?? [];
  const choice = async () => {
    await page.goto("/preferences/mail");
    return page.getByRole("group", { name: "A sheet is withdrawn" });
  };

  const context = await browser.newContext();
  const stranger = await context.newPage();
  await stranger.goto(link);
  await expect(stranger.getByRole("heading", { name: "Stop this mail?" })).toBeVisible();
  await expectNoAxeFindings(stranger);
  await expect((await choice()).getByLabel("At once")).toBeChecked();
  await stranger.getByRole("button", { name: "Stop it" }).click();
  await expect(stranger.getByRole("heading", { name: "It is stopped" })).toBeVisible();
  await expect((await choice()).getByLabel("Not at all")).toBeChecked();

  // As readers of mail do it by themselves: one post, nothing followed.
  const superseded = link.replace(/kind=.*/, "kind=sheet%20superseded");
  const answer = await context.request.post(superseded, {
    form: { "List-Unsubscribe": "One-Click" },
    maxRedirects: 0,
  });
  expect(answer.status()).toBe(200);
  await page.goto("/preferences/mail");
  await expect(page.getByRole("group", { name: "A sheet is superseded" }).getByLabel("Not at all")).toBeChecked();
  await expectNoAxeFindings(page);
  await context.close();
});

test("parked mail stands in the outbox with its reason and is sent when it is tried again", async ({ page }) => {
  const id = await tell("incident", "technician", "parked");
  await signIn(page, "process owner");
  await page.goto("/mail/outbox?state=parked");
  const row = page.getByRole("row").filter({ hasText: "An incident is reported" }).first();
  await expect(row).toContainText("The mail server refused it: 550 mailbox full");
  await expectNoAxeFindings(page);
  await row.getByRole("button", { name: /Try again/ }).click();
  await expect(page.getByText("No mail fits")).toBeVisible();
  const state = () =>
    asOwner(
      async (query) => (await query<{ state: string }>("select state from mail_outbox where id = ?", [id]))[0]?.state,
    );
  await expect.poll(state, { timeout: 20_000 }).toBe("sent");
  await page.goto("/mail/outbox?q=incident&state=sent");
  await expect(page.getByRole("row").filter({ hasText: "An incident is reported" }).first()).toBeVisible();
});

test.describe("at 320 px", () => {
  test.use({ viewport: { width: 320, height: 640 } });

  test("nothing of the pages of mail lies beside the screen", async ({ page }) => {
    await signIn(page, "process owner");
    for (const path of ["/mail", "/mail/outbox", "/preferences/mail"]) {
      await page.goto(path);
      const beside = await page.evaluate(() => document.documentElement.scrollWidth - window.innerWidth);
      expect(beside, path).toBe(0);
    }
  });
});
