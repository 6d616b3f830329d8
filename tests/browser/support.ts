import { readFileSync } from "node:fs";
import AxeBuilder from "@axe-core/playwright";
import { test as base, expect, type Locator, type Page } from "@playwright/test";

export { expect };

export interface Account {
  role: string;
  email: string;
  password: string;
}

/** The demo accounts of the database that the browser tests run against. */
export function accounts(): Account[] {
  const file = process.env["DEMO_ACCOUNTS_FILE"];
  if (!file) throw new Error("DEMO_ACCOUNTS_FILE is not set: run the browser tests through npm test.");
  return JSON.parse(readFileSync(file, "utf8")) as Account[];
}

export type Role = "engineer" | "technician" | "shift lead" | "process owner" | "administrator" | "guest";

/** The first demo account of a role. */
export function accountOf(role: Role): Account {
  const account = accounts().find((candidate) => candidate.role === role);
  if (!account) throw new Error(`There is no demo account for ${role}.`);
  return account;
}

/** Signs in as the form does, without drawing a page: that is what the tests of the form are for. */
export async function signIn(page: Page, role: Role): Promise<void> {
  const { email, password } = accountOf(role);
  const answer = await page.request.post("/sign-in", { form: { email, password }, maxRedirects: 0 });
  expect(answer.status()).toBe(302);
}

/** The same, and opens Today. */
export async function signInAtToday(page: Page, role: Role): Promise<void> {
  await signIn(page, role);
  await page.goto("/");
}

/**
 * Waits until the page's scripts answer for an element. A button pressed before sends its form, as it does without scripts, which
 * takes a loaded machine long.
 */
export async function scriptsAtWork(element: Locator): Promise<void> {
  await expect
    .poll(() => element.evaluate((node) => Object.keys(node).some((key) => key.startsWith("__reactProps"))))
    .toBe(true);
}

/** The rules that a change of theme alone can break. */
const OF_COLOURS = ["color-contrast", "link-in-text-block"];

async function expectNothingFound(axe: AxeBuilder): Promise<void> {
  // No page has frames; the way for them opens a second page each time.
  const { violations } = await axe.setLegacyMode().analyze();
  const found = violations.map(({ id, nodes }) => `${id}: ${nodes.map(({ target }) => target.join(" ")).join(", ")}`);
  expect(found).toEqual([]);
}

/** axe's findings on the page as it stands, none of which are expected. */
export async function expectNoAxeFindings(page: Page): Promise<void> {
  await expectNothingFound(new AxeBuilder({ page }).withTags(["wcag2a", "wcag2aa", "wcag21aa", "wcag22aa"]));
}

/** The same, and once more in the dark for what depends on colours. Ends in the light. */
export async function expectNoAxeFindingsInBothThemes(page: Page): Promise<void> {
  await expectNoAxeFindings(page);
  await page.emulateMedia({ colorScheme: "dark" });
  await expectNothingFound(new AxeBuilder({ page }).withRules(OF_COLOURS));
  await page.emulateMedia({ colorScheme: "light" });
}

/** Has `goto` and `reload` wait until the scripts of the page answer, unless they are told what to wait for. */
function waitForScripts(page: Page): void {
  const answering = async () => {
    const isOurs = await page.evaluate(() => document.querySelector('link[rel="modulepreload"]') !== null);
    if (isOurs) await page.locator('html[data-scripts="at work"]').waitFor({ state: "attached" });
  };
  const [goto, reload] = [page.goto.bind(page), page.reload.bind(page)];
  page.goto = async (url, options) => {
    const answer = await goto(url, options);
    if (options?.waitUntil === undefined) await answering();
    return answer;
  };
  page.reload = async (options) => {
    const answer = await reload(options);
    if (options?.waitUntil === undefined) await answering();
    return answer;
  };
}

/** The browser's own remark about an answer that is a refusal on purpose, or that cannot come. */
const REFUSED =
  /^Failed to load resource: (the server responded with a status of (4\d\d)|net::ERR_INTERNET_DISCONNECTED)/;

/** Playwright's own remark about what its settings switch off. */
const BLOCKED = "Service Worker registration blocked by Playwright";

/**
 * Playwright's test with an eye on the page: a script that fails or complains fails the test. `refusals: true` lets the browser
 * remark on answers of 400 to 499, for tests that ask for them.
 */
export const test = base.extend<{ refusals: boolean; watched: void }>({
  page: async ({ page, javaScriptEnabled }, use) => {
    if (javaScriptEnabled) waitForScripts(page);
    await use(page);
  },
  refusals: [false, { option: true }],
  watched: [
    async ({ page, refusals }, use) => {
      const complaints: string[] = [];
      page.on("pageerror", (error) => complaints.push(error.message));
      page.on("console", (message) => {
        if (message.type() !== "error" && message.type() !== "warning") return;
        if (refusals && REFUSED.test(message.text())) return;
        if (message.text() === BLOCKED) return;
        complaints.push(message.text());
      });
      await use();
      expect(complaints).toEqual([]);
    },
    { auto: true },
  ],
});
