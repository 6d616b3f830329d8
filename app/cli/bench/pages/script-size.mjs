import { gzipSync } from "node:zlib";

/** How long nothing more must come for a page to be complete, ms. */
const QUIET = 700;

/**
 * How much script a page loads, gzip at its hardest: by itself, and once its first field or button is reached by the keyboard, which
 * brings what it keeps for whoever works on it.
 *
 * @param {import("./signed-in.mjs").SignedIn} person
 * @param {string} path
 * @returns {Promise<{ before: number, after: number }>} bytes
 */
export async function scriptSize({ context }, path) {
  const page = await context.newPage();
  /** @type {Map<string, number>} */
  const sizes = new Map();
  /** @type {Promise<void>[]} */
  const reading = [];
  page.on("response", (response) => {
    if (response.request().resourceType() !== "script" || sizes.has(response.url())) return;
    sizes.set(response.url(), 0);
    reading.push(response.body().then((body) => void sizes.set(response.url(), gzipSync(body, { level: 9 }).length)));
  });
  const sum = async () => {
    await page.waitForLoadState("networkidle");
    await page.waitForTimeout(QUIET);
    await Promise.all(reading);
    return [...sizes.values()].reduce((total, size) => total + size, 0);
  };
  await page.goto(path);
  const before = await sum();
  const field = page.locator("main").locator("input, select, textarea").first();
  if (await field.count()) await field.focus();
  const after = await sum();
  await page.close();
  return { before, after };
}
