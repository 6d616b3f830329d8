import { existsSync, readFileSync, rmSync, statSync, writeFileSync } from "node:fs";
import { join } from "node:path";
import { packageProgram, root } from "./project.mjs";
import { Sentence } from "./sentence.mjs";
import { fingerprint } from "./stamp.mjs";

/** What the production build is made from. */
const sources = ["app", "public", "package-lock.json", "vite.config.ts", "react-router.config.ts", "tsconfig.json"];

/** The built server, which react-router-serve loads. */
export const builtServer = join(root, "build", "server", "index.js");

const stampFile = join(root, "build", "sources.txt");

/**
 * What a build is known by: its sources, and when the result was written, lest another build be taken for it.
 *
 * @param {string} sourcesFingerprint
 */
function stamp(sourcesFingerprint) {
  return `${sourcesFingerprint} ${statSync(builtServer).mtimeMs}\n`;
}

/**
 * Makes the production build, whatever is there.
 *
 * @param {import("./keeper.mjs").Keeper} keeper
 * @param {import("./keeper.mjs").ProgramOptions} [options]
 * @returns {Promise<{ code: number | null, lastLines: string }>} how the bundler ended
 */
export async function build(keeper, options = {}) {
  const made = fingerprint(root, sources);
  rmSync(stampFile, { force: true });
  const outcome = await keeper.outcome(process.execPath, [packageProgram("react-router"), "build"], {
    cwd: root,
    ...options,
    env: { ...(options.env ?? process.env), NODE_ENV: "production" },
  });
  if (outcome.code === 0) writeFileSync(stampFile, stamp(made));
  return outcome;
}

/**
 * Makes the production build when its sources have changed since.
 *
 * @param {import("./keeper.mjs").Keeper} keeper
 */
export async function buildWhenChanged(keeper) {
  const isBuilt = existsSync(builtServer) && existsSync(stampFile);
  if (isBuilt && readFileSync(stampFile, "utf8") === stamp(fingerprint(root, sources))) return;
  console.log("Building…");
  const { code, lastLines } = await build(keeper, { stdio: ["ignore", "pipe", "pipe"] });
  if (code !== 0) throw new Sentence("The application could not be built.", lastLines);
}
