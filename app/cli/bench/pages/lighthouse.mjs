import { execFile } from "node:child_process";
import { promisify } from "node:util";
import { findChromium } from "../../chromium.mjs";
import { median } from "../timing.mjs";

const run = promisify(execFile);
/** The last that runs on this project's Node. 200 packages for one figure are fetched when it is asked for, not with every install. */
const PACKAGE = "lighthouse@12.8.2";
const RUNS = 3;

/**
 * Lighthouse of a page, desktop preset, the median of three runs.
 *
 * @param {import("./signed-in.mjs").SignedIn} person
 * @param {string} path
 * @returns {Promise<{ performance: number, accessibility: number, practices: number }>} of 100
 */
export async function lighthouse({ base, cookie }, path) {
  const runs = [];
  for (let n = 0; n < RUNS; n += 1) {
    const { stdout } = await run(
      "npx",
      [
        "--yes",
        PACKAGE,
        base + path,
        "--preset=desktop",
        "--quiet",
        "--output=json",
        "--only-categories=performance,accessibility,best-practices",
        "--chrome-flags=--headless=new --no-sandbox",
        ...(path === "/sign-in" ? [] : [`--extra-headers=${JSON.stringify({ Cookie: cookie })}`]),
      ],
      { env: { ...process.env, CHROME_PATH: findChromium() }, maxBuffer: 64e6 },
    );
    runs.push(JSON.parse(stdout).categories);
  }
  const of = (/** @type {string} */ category) => median(runs.map((each) => Math.round(100 * each[category].score)));
  return { performance: of("performance"), accessibility: of("accessibility"), practices: of("best-practices") };
}
