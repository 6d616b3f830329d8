import type { Page } from "@playwright/test";
import { asOwner } from "./door-ids.ts";
import { accountOf, expect, scriptsAtWork, test } from "./support.ts";

const MIL = { length: "mil", stress: "ksi", temperature: "°F" };
const DELIVERED = { length: "µm", stress: "MPa", temperature: "°C" };

/**
 * Makes a person of their own for a test and signs in as them: preferences are the person's, and whoever else shares a demo account
 * must go on reading µm.
 */
async function signInAsNobodyElse(page: Page, name: string): Promise<void> {
  const { email, password } = accountOf("process owner");
  const own = `${name}@own-units.example`;
  await asOwner(async (query) => {
    await query(
      `with made as (insert into person (id, email, name, site_role, active, created_at)
                     select gen_random_uuid(), ?, 'Reader of mil', site_role, true, now() from person where email = ? returning id),
            door as (insert into credential (id, person_id, password_hash, changed_at)
                     select gen_random_uuid(), made.id, c.password_hash, now()
                       from made, credential c join person p on p.id = c.person_id where p.email = ?)
       insert into membership (id, person_id, program_id, role, created_at)
       select gen_random_uuid(), made.id, m.program_id, m.role, now()
         from made, membership m join person p on p.id = m.person_id where p.email = ?`,
      [own, email, email, email],
    );
  });
  const answer = await page.request.post("/sign-in", { form: { email: own, password }, maxRedirects: 0 });
  expect(answer.status()).toBe(302);
}

const prefer = async (page: Page, form: Record<string, string>) =>
  expect(
    (await page.request.post("/preferences", { form: { theme: "light", density: "roomy", ...form } })).ok(),
  ).toBeTruthy();

/** The first address of a page's main part that begins so and names a record. */
async function firstLink(page: Page, list: string, path: string): Promise<string> {
  await page.goto(list);
  const links = page.locator(`main a[href^="${path}/"]`);
  const all = await links.evaluateAll((found) => found.map((link) => link.getAttribute("href") ?? ""));
  const record = all.find((href) => /\/[0-9a-f-]{36}$/.test(href));
  if (!record) throw new Error(`no record on ${list}`);
  return record;
}

/**
 * Figures that still stand in what is delivered. What has an ordinary space before its unit, or stands in a link, is a name; what was
 * typed and what a field was understood as stays, and so do the names of mistakes.
 */
async function left(page: Page): Promise<string[]> {
  await expect(page.locator("main h1").first()).toBeVisible();
  return page.locator("main").evaluate((main) => {
    const walker = document.createTreeWalker(main, NodeFilter.SHOW_TEXT);
    const found: string[] = [];
    while (walker.nextNode()) {
      const text = walker.currentNode as Text;
      if (text.parentElement?.closest("script, style, option, textarea, a, .field small")) continue;
      if (/\d\u00A0(?:µm|[MG]Pa|°C)(?![\w/])/.test(text.data) || /^(?:µm|[MG]Pa|°C)\b/.test(text.data))
        found.push(text.data);
    }
    return found;
  });
}

test("the library and the flows follow", async ({ page }) => {
  await signInAsNobodyElse(page, "library");
  await prefer(page, MIL);
  const film = await firstLink(page, "/films", "/films");
  const flow = await firstLink(page, "/flows", "/flows");
  for (const path of [film, flow, "/carriers/limits", "/carriers/silicon"]) {
    await page.goto(path);
    expect(await left(page), path).toEqual([]);
  }
});

test("a stack follows, and goes back to what is delivered", async ({ page }) => {
  await signInAsNobodyElse(page, "stack");
  await prefer(page, MIL);
  const stack = await firstLink(page, "/stacks", "/stacks");
  await page.goto(stack);
  expect(await left(page)).toEqual([]);
  await expect(page.locator("main")).toContainText("mil");
  await prefer(page, DELIVERED);
  await page.goto(stack);
  await expect(page.locator("main")).not.toContainText(/\bmil\b/);
});

test("what is computed and measured follows", async ({ page }) => {
  await signInAsNobodyElse(page, "computed");
  await prefer(page, MIL);
  const [found] = await asOwner((query) =>
    query<{ id: string }>("select id from assessment where lot is null order by created_at limit 1"),
  );
  const assessment = `/assessments/${found?.id}`;
  const scan = await firstLink(page, "/scans", "/scans");
  const lot = await firstLink(page, "/lots", "/lots");
  for (const path of [scan, lot, assessment]) {
    await page.goto(path);
    expect(await left(page), path).toEqual([]);
  }
  await page.goto(assessment);
  await expect(page.getByRole("columnheader", { name: /^Warp, 77 °F/ })).toContainText("mil, k = 2");
  // A sheet is one document for everybody.
  await page.goto(assessment.replace("/assessments/", "/sheets/"));
  await expect(page.locator("body")).toContainText("µm");
  await expect(page.locator("body")).not.toContainText(/\bmil\b|°F/);
});

test("a field keeps what was typed, and says it in both", async ({ page }) => {
  await signInAsNobodyElse(page, "field");
  await prefer(page, MIL);
  await page.goto("/stacks/new");
  const thickness = page.getByLabel("Remaining silicon");
  await scriptsAtWork(thickness);
  await thickness.fill("50 um");
  await expect(page.getByText("50 µm = 1.97 mil")).toBeVisible();
  await expect(thickness).toHaveValue("50 um");
  await thickness.fill("2 mil");
  await expect(page.getByText("2 mil", { exact: true })).toBeVisible();
});

test("a table of films in the German manner comes back unchanged", async ({ page }) => {
  await signInAsNobodyElse(page, "german");
  await prefer(page, { decimalMark: "comma" });
  const csv = await (await page.request.get("/films/films.csv")).text();
  expect(csv.split("\r\n")[0]).toMatch(/^name;/);
  expect(csv).toMatch(/;\d+,\d+;/);
  await page.goto("/films/import");
  await page.getByLabel("File").setInputFiles({ name: "films.csv", mimeType: "text/csv", buffer: Buffer.from(csv) });
  await page.getByRole("button", { name: "See what would change" }).click();
  await expect(page.getByText(/rows say what the library says already/)).toBeVisible();
  await expect(page.getByRole("region", { name: "What would change" })).toBeHidden();
});

test.describe("without scripts", () => {
  test.use({ javaScriptEnabled: false });

  test("the page comes in the reader's units from the first byte", async ({ page }) => {
    await signInAsNobodyElse(page, "no-scripts");
    await page.goto("/preferences");
    await page.getByLabel("mil, a thousandth of an inch").check();
    await page.getByLabel("°F").check();
    await page.getByRole("button", { name: "Save preferences" }).click();
    await expect(page.getByText("Your preferences are saved.")).toBeVisible();
    await page.goto("/carriers/tools");
    expect(await left(page)).toEqual([]);
    await expect(page.getByRole("columnheader", { name: /^Edges up/ })).toContainText("mil");
  });
});
