import { readFileSync } from "node:fs";

const BASE = process.env["BASE_URL"] ?? "http://127.0.0.1:3000";
const ACCOUNTS = process.env["DEMO_ACCOUNTS_FILE"] ?? ".planeward/demo-accounts.json";

/**
 * Somebody signed in at a copy that runs.
 *
 * @typedef {{ base: string, cookie: string, context: import("@playwright/test").BrowserContext }} SignedIn
 */

/**
 * Signs in as the demo's engineer. `BASE_URL` says where, else the address that `npm start` serves on.
 *
 * @param {import("@playwright/test").Browser} browser
 * @returns {Promise<SignedIn>}
 */
export async function signedIn(browser) {
  /** @type {{ role: string, email: string, password: string }[]} */
  const accounts = JSON.parse(readFileSync(ACCOUNTS, "utf8"));
  const { email, password } = accounts.find(({ role }) => role === "engineer") ?? {};
  const context = await browser.newContext({ baseURL: BASE, viewport: { width: 1440, height: 900 } });
  const answer = await context.request.post("/sign-in", { form: { email, password }, maxRedirects: 0 });
  if (answer.status() !== 302)
    throw new Error(`${BASE} does not let the demo's engineer in (${answer.status()}): npm start first.`);
  const cookies = await context.cookies();
  return { base: BASE, cookie: cookies.map(({ name, value }) => `${name}=${value}`).join("; "), context };
}
