/**
 * `npm test`: types, lint, unit and database tests, the production build and browser tests against it, all counted on
 * the last line. `npm test -- static`, `unit` or `browser` does a part; what follows goes to the part's runner, for
 * example `npm test -- unit tests/engine`.
 *
 * Everything happens in a temporary folder, with a database server of its own, and none of it is left behind.
 */
import { chmodSync, mkdirSync, mkdtempSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { runBrowserTests } from "./browser-tests.mjs";
import { Checks } from "./checks.mjs";
import { runCommand } from "./command.mjs";
import { ensureDependencies } from "./dependencies.mjs";
import { holdLock } from "./lock.mjs";
import { checkNodeVersion } from "./node-version.mjs";
import { isRoot } from "./project.mjs";
import { Sentence, printFailure } from "./sentence.mjs";
import { runStaticChecks } from "./static-checks.mjs";
import { startTestDatabase } from "./test-database.mjs";
import { runUnitTests } from "./unit-tests.mjs";

const parts = ["static", "unit", "browser"];

/** What must hold before anything is done. */
async function check() {
  checkNodeVersion();
  const [part, ...filters] = process.argv.slice(2);
  if (part !== undefined && !parts.includes(part))
    throw new Sentence(`There is no part "${part}" of the tests; the parts are ${parts.join(", ")}.`);
  const holder = await holdLock("test", () => `process ${process.pid}`);
  if (holder) throw new Sentence(`The tests already run from this folder (${holder}); wait for them, or stop them.`);
  return { filters, wanted: part === undefined ? parts : [part] };
}

/**
 * A temporary folder that the account which runs the database server may pass through. Root's own may be closed to it.
 *
 * @returns {string}
 */
function makeTemporaryFolder() {
  const folder = mkdtempSync(join(isRoot ? "/tmp" : tmpdir(), "planeward-test-"));
  chmodSync(folder, isRoot ? 0o711 : 0o700);
  return folder;
}

/**
 * The environment for tests: no settings for another database, server or mode, and temporary files where they go away.
 *
 * @param {string} temporaryFiles
 * @returns {NodeJS.ProcessEnv}
 */
function testEnvironment(temporaryFiles) {
  mkdirSync(temporaryFiles);
  const others = [
    "DATABASE_URL",
    "DATABASE_OWNER_URL",
    "DEMO_ACCOUNTS_FILE",
    "HOST",
    "NODE_ENV",
    "PORT",
    "SECRET_KEY",
    "TRUSTED_PROXIES",
    "WEBHOOK_HTTP",
    "WEBHOOK_NETWORKS",
  ];
  const kept = Object.entries(process.env).filter(([name]) => !others.includes(name));
  return { ...Object.fromEntries(kept), TMPDIR: temporaryFiles };
}

/**
 * @param {Checks} checks
 * @param {{ folder: string, filters: string[], wanted: string[] }} options
 */
async function runParts(checks, { folder, filters, wanted }) {
  if (wanted.includes("static")) await runStaticChecks(checks);
  if (!wanted.includes("unit") && !wanted.includes("browser")) return;
  const database = await checks.need("database", () => startTestDatabase(checks, folder));
  if (wanted.includes("unit")) await runUnitTests(checks, { folder, database, filters });
  if (wanted.includes("browser")) await runBrowserTests(checks, { folder, database, filters });
}

try {
  const options = await check();
  const folder = makeTemporaryFolder();
  await runCommand(join(folder, "run.json"), async (keeper) => {
    keeper.removeAtEnd(folder);
    const checks = new Checks(keeper, testEnvironment(join(folder, "tmp")));
    const isInstalled = await checks.need("packages", () => ensureDependencies(keeper).then(() => true));
    if (isInstalled) await runParts(checks, { ...options, folder });
    checks.print();
    return checks.sum().failed ? 1 : 0;
  });
} catch (error) {
  printFailure(error);
  process.exitCode = 1;
}
