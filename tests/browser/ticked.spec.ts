import { readFileSync } from "node:fs";
import type { Page } from "@playwright/test";
import { asOwner } from "./door-ids.ts";
import { TERN } from "./flow-pages.ts";
import { expect, expectNoAxeFindings, signIn, test } from "./support.ts";

const NOWHERE = "00000000-0000-4000-8000-000000000000";

interface Made {
  id: string;
  name: string;
}

/** Word that the rows of one test share and no other row has, so that a search finds them alone. */
const word = () => `ticked${Math.random().toString(36).slice(2, 10)}`;

/** Copies of the demo's stack of Tern, of which nothing else depends. */
function ownStacks(mark: string, ...names: string[]): Promise<Made[]> {
  return asOwner(async (query) => {
    const made: Made[] = [];
    for (const which of names) {
      const name = `${which} ${mark}`;
      const [stack] = await query<{ id: string }>(
        `insert into stack
         select (jsonb_populate_record(s, jsonb_build_object('id', gen_random_uuid(), 'name', ?::text))).*
           from stack s where s.name = 'Tern T-2, one redistribution layer' returning id`,
        [name],
      );
      await query(
        `insert into stack_layer
         select (jsonb_populate_record(l, jsonb_build_object('id', gen_random_uuid(), 'stack_id', ?::uuid))).*
           from stack_layer l join stack s on s.id = l.stack_id where s.name = 'Tern T-2, one redistribution layer'`,
        [stack?.id],
      );
      made.push({ id: stack?.id ?? "", name });
    }
    return made;
  });
}

/** Copies of the demo's flow of Tern, never assessed. */
async function ownFlows(page: Page, mark: string, ...names: string[]): Promise<Made[]> {
  return asOwner(async (query) => {
    const [tern] = await query<{ id: string }>("select id from flow where name = ?", [TERN]);
    const made: Made[] = [];
    for (const which of names) {
      const answer = await page.request.post(`/flows/${tern?.id}`, { form: { intent: "copy" }, maxRedirects: 0 });
      const id = (answer.headers()["location"] ?? "").split("/").at(-1) ?? "";
      await query("update flow set name = ? where id = ?", [`${which} ${mark}`, id]);
      made.push({ id, name: `${which} ${mark}` });
    }
    return made;
  });
}

const tick = (page: Page, name: string) => page.getByRole("checkbox", { name: `Tick ${name}`, exact: true }).check();
const button = (page: Page, name: string | RegExp) => page.getByRole("button", { name, exact: true });
const asked = (page: Page, what: string) => page.getByRole("table", { name: `What is ticked of the ${what}` });
const done = (page: Page) => page.getByRole("table", { name: "What was done" });
const beside = (page: Page) => page.evaluate(() => document.documentElement.scrollWidth - window.innerWidth);

test.describe("an engineer", () => {
  test.beforeEach(({ page }) => signIn(page, "engineer"));

  test("duplicates two stacks and removes the copies, each row with what came of it", async ({ page }) => {
    const mark = word();
    const [one, other] = await ownStacks(mark, "First", "Second");
    if (!one || !other) throw new Error("no stacks");
    await page.goto(`/stacks?q=${mark}&sort=name`);
    await tick(page, one.name);
    await tick(page, other.name);
    await expect(page.getByText("2 stacks ticked.")).toBeVisible();
    await button(page, "Duplicate").click();
    await expect(asked(page, "stacks").getByRole("row")).toHaveCount(3);
    await expect(asked(page, "stacks")).toContainText("A copy is added to its program.");
    await button(page, "Duplicate 2 stacks").click();
    await expect(page.getByText("Copied: 2 stacks.")).toBeVisible();
    await expect(done(page).getByRole("row", { name: `${one.name}, 2` })).toContainText(`Done. Copy of ${one.name}.`);
    await done(page)
      .getByRole("link", { name: `${other.name}, 2` })
      .click();
    await expect(page.getByRole("region", { name: "Films" })).toContainText("Plated copper A");

    await page.goto(`/stacks?q=${mark}&sort=name`);
    await tick(page, `${one.name}, 2`);
    await tick(page, `${other.name}, 2`);
    await button(page, "Remove").click();
    await expect(page.getByText("There is no way back.")).toBeVisible();
    await expectNoAxeFindings(page);
    // Nothing has gone yet: there is a way out.
    await page.getByRole("link", { name: "Leave them as they are" }).click();
    await page.goto(`/stacks?q=${mark}&sort=name`);
    await tick(page, `${one.name}, 2`);
    await tick(page, `${other.name}, 2`);
    await button(page, "Remove").click();
    // Somebody saves one of them in the meantime.
    await expect(asked(page, "stacks").getByRole("row")).toHaveCount(3);
    await asOwner((query) => query("update stack set version = version + 1 where name = ?", [`${other.name}, 2`]));
    await button(page, "Remove 2 stacks for good").click();
    await expect(page.getByText("Removed: 1 stack.")).toBeVisible();
    const left = done(page).getByRole("row", { name: `${other.name}, 2` });
    await expect(left).toContainText("Left as it is.");
    await expect(left).toContainText("after you had ticked it. Look at it, then tick it again.");
    await expectNoAxeFindings(page);
    await page.goto(`/stacks?q=${mark}&sort=name`);
    await expect(page.getByRole("checkbox", { name: /^Tick / })).toHaveCount(3);
  });

  test("assesses two flows again: at work it says of how many, is pressed once, and answers row by row", async ({
    page,
  }) => {
    const mark = word();
    const [one, other, third] = await ownFlows(page, mark, "First", "Second", "Third");
    if (!one || !other || !third) throw new Error("no flows");
    await page.request.post(`/flows/${third.id}`, { form: { intent: "assess" } });
    await page.goto(`/flows?q=${mark}&sort=name`);
    await button(page, "Tick all on this page").click();
    await expect(page.getByText("3 flows ticked.")).toBeVisible();
    await button(page, "Assess again").click();
    await expect(asked(page, "flows").getByRole("row", { name: one.name })).toContainText("Not assessed yet.");
    await expect(asked(page, "flows").getByRole("row", { name: third.name })).toContainText(
      "Revision A is up to date: nothing that it rests on has changed.",
    );
    await expectNoAxeFindings(page);

    let sent = 0;
    let letGo = () => {};
    const held = new Promise<void>((resolve) => (letGo = resolve));
    await page.route(/\/flows\/assess/, async (route) => {
      if (route.request().method() === "POST") {
        sent += 1;
        await held;
      }
      await route.continue();
    });
    await button(page, "Assess 2 flows").dblclick();
    await expect(button(page, "Assessing 2 flows")).toBeDisabled();
    await expect(page.getByRole("status").filter({ hasText: "Assessing 2 flows. One after the other" })).toBeVisible();
    await expect(page.getByRole("link", { name: "Leave them as they are" })).toHaveCount(0);
    await expectNoAxeFindings(page);
    letGo();
    await expect(page.getByText("Assessed: 2 flows.")).toBeVisible();
    expect(sent).toBe(1);
    for (const { name } of [one, other])
      await expect(done(page).getByRole("row", { name })).toContainText(/Done\. Revision A: [a-z ]+\./);
    await expect(done(page).getByRole("row", { name: third.name })).toContainText("Left as it is. Revision A is up to");
    await done(page).getByRole("link", { name: one.name }).click();
    await expect(page).toHaveURL(/\/assessments\/[0-9a-f-]{36}$/);
    await expect(page.getByText(one.name).first()).toBeVisible();
  });

  test("marks favourites and sees them, the marks of others untouched", async ({ page, browser }) => {
    const mark = word();
    const [one, other] = await ownFlows(page, mark, "First", "Second");
    if (!one || !other) throw new Error("no flows");
    await page.goto(`/flows?q=${mark}&sort=name`);
    await tick(page, one.name);
    await button(page, "Mark as favourites").click();
    await expect(page).toHaveURL(/\/flows\?favourites=mine$/);
    await expect(page.getByRole("link", { name: one.name })).toBeVisible();
    await expect(page.getByRole("link", { name: other.name })).toHaveCount(0);
    const context = await browser.newContext();
    const owner = await context.newPage();
    await signIn(owner, "process owner");
    await owner.goto("/flows?favourites=mine");
    await expect(owner.getByRole("link", { name: one.name })).toHaveCount(0);
    await context.close();
  });

  test("downloads the films that are ticked, on two pages of a search too, and no other", async ({ page }) => {
    await page.goto("/films?q=copper&sort=name");
    const names = await page.getByRole("checkbox", { name: /^Tick / }).count();
    expect(names).toBeGreaterThan(1);
    await tick(page, "Plated copper A");
    await page.getByRole("searchbox", { name: "Search films" }).fill("polymer dielectric a");
    await button(page, "Show").click();
    await expect(page.getByRole("link", { name: "Plated copper A", exact: true })).toHaveCount(0);
    await tick(page, "Polymer dielectric A");
    await expect(page.getByText("2 films ticked.")).toBeVisible();
    const file = page.waitForEvent("download");
    await button(page, "Download ticked as CSV").click();
    const saved = await file;
    expect(saved.suggestedFilename()).toMatch(/\.csv$/);
    const rows = readFileSync(await saved.path(), "utf8")
      .trim()
      .split("\r\n");
    expect(rows).toHaveLength(3);
    expect(rows[1]).toContain("Plated copper A");
    expect(rows[2]).toContain("Polymer dielectric A");
  });

  test("does all of it on a phone, in the dark", async ({ page }) => {
    await page.setViewportSize({ width: 390, height: 844 });
    await page.emulateMedia({ colorScheme: "dark" });
    const mark = word();
    const stacks = await ownStacks(mark, "First", "Second");
    const flows = await ownFlows(page, mark, "First");
    await page.goto(`/stacks?q=${mark}&sort=name`);
    for (const { name } of stacks) await tick(page, name);
    expect(await beside(page)).toBe(0);
    await expectNoAxeFindings(page);
    await button(page, "Remove").click();
    await expect(asked(page, "stacks")).toContainText("Tern");
    expect(await beside(page)).toBe(0);
    await expectNoAxeFindings(page);
    await button(page, "Remove 2 stacks for good").click();
    await expect(page.getByText("Removed: 2 stacks.")).toBeVisible();
    expect(await beside(page)).toBe(0);
    await expectNoAxeFindings(page);
    await page.goto(`/flows?q=${mark}`);
    await tick(page, flows[0]?.name ?? "");
    await button(page, "Assess again").click();
    await button(page, "Assess 1 flow").click();
    await expect(page.getByText("Assessed: 1 flow.")).toBeVisible();
    expect(await beside(page)).toBe(0);
    await expectNoAxeFindings(page);
  });

  test.describe("whose address or form holds too little", () => {
    test.use({ refusals: true });

    test("is told so", async ({ page }) => {
      for (const path of ["/stacks/duplicate", "/stacks/remove", "/flows/assess"]) {
        await page.goto(path);
        await expect(page.getByRole("heading", { name: /^No (stack|flow) is ticked$/ })).toBeVisible();
        await page.goto(`${path}?of=${NOWHERE}`);
        await expect(page.getByRole("heading", { name: /^No (stack|flow) is ticked$/ })).toBeVisible();
      }
      expect((await page.request.get("/films/films.csv?only=ticked")).status()).toBe(400);
      expect((await page.request.get(`/films/films.csv?only=ticked&of=${NOWHERE}`)).status()).toBe(400);
    });
  });
});

test.describe("others", () => {
  test.use({ refusals: true });

  test("have no button for what they may not do, and are refused when they ask for it all the same", async ({
    page,
    browser,
  }) => {
    const mark = word();
    const [stack] = await ownStacks(mark, "Only");
    const context = await browser.newContext();
    const engineer = await context.newPage();
    await signIn(engineer, "engineer");
    const [flow] = await ownFlows(engineer, mark, "Only");
    await context.close();

    await signIn(page, "technician");
    await page.goto(`/stacks?q=${mark}`);
    await tick(page, `Only ${mark}`);
    await expect(button(page, "Compare")).toBeVisible();
    for (const name of ["Duplicate", "Remove"]) await expect(button(page, name)).toHaveCount(0);
    await page.goto(`/flows?q=${mark}`);
    await tick(page, `Only ${mark}`);
    await expect(button(page, "Assess again")).toHaveCount(0);
    await button(page, "Mark as favourites").click();
    await expect(page.getByRole("link", { name: `Only ${mark}` })).toBeVisible();
    const csv = await page.request.get(`/films/films.csv?only=ticked&of=${NOWHERE}`);
    expect(csv.status()).toBe(400);

    const asks = async () => {
      const answers: number[] = [];
      for (const path of ["/stacks/duplicate", "/stacks/remove"])
        answers.push((await page.request.post(path, { form: { of: `${stack?.id} 1` } })).status());
      answers.push((await page.request.post("/flows/assess", { form: { of: `${flow?.id} 1` } })).status());
      answers.push((await page.request.get(`/stacks/remove?of=${stack?.id}`)).status());
      return answers;
    };
    expect(await asks()).toEqual([403, 403, 403, 403]);
    await page.request.post("/sign-out");
    await signIn(page, "guest");
    expect(await asks()).toEqual([403, 403, 403, 403]);
    expect((await page.request.get("/films/films.csv?only=ticked")).status()).toBe(403);
    const [left] = await asOwner((query) =>
      query<{ stacks: number; assessments: number }>(
        `select (select count(*)::int from stack where name like ?) as stacks,
                (select count(*)::int from assessment where flow_id = ?) as assessments`,
        [`%${mark}%`, flow?.id],
      ),
    );
    expect(left).toEqual({ stacks: 1, assessments: 0 });
  });
});

test.describe("without scripts", () => {
  test.use({ javaScriptEnabled: false });

  test("an engineer duplicates, removes, assesses and marks by the same forms", async ({ page }) => {
    const mark = word();
    await signIn(page, "engineer");
    await ownStacks(mark, "Bare");
    const [flow] = await ownFlows(page, mark, "Bare");
    await page.goto(`/stacks?q=${mark}`);
    await tick(page, `Bare ${mark}`);
    await button(page, "Duplicate").click();
    await button(page, "Duplicate 1 stack").click();
    await expect(page.getByText("Copied: 1 stack.")).toBeVisible();
    await page.goto(`/stacks?q=${mark}`);
    await tick(page, `Bare ${mark}`);
    await tick(page, `Bare ${mark}, 2`);
    await button(page, "Remove").click();
    await button(page, "Remove 2 stacks for good").click();
    await expect(page.getByText("Removed: 2 stacks.")).toBeVisible();
    await page.goto(`/flows?q=${mark}`);
    await tick(page, flow?.name ?? "");
    await button(page, "Assess again").click();
    await button(page, "Assess 1 flow").click();
    await expect(page.getByText("Assessed: 1 flow.")).toBeVisible();
    await expect(done(page)).toContainText("Done. Revision A");
    await page.goto(`/flows?q=${mark}`);
    await tick(page, flow?.name ?? "");
    await button(page, "Mark as favourites").click();
    await expect(page).toHaveURL(/favourites=mine/);
    await expect(page.getByRole("link", { name: flow?.name ?? "" })).toBeVisible();
  });
});
