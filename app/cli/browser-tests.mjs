import { mkdirSync, rmSync } from "node:fs";
import { join } from "node:path";
import { build } from "./build.mjs";
import { asCheck } from "./checks.mjs";
import { chromiumPackage, findChromium } from "./chromium.mjs";
import { makeDatabase } from "./database.mjs";
import { installDebianPackages } from "./debian.mjs";
import { lastLinesOf } from "./logs.mjs";
import { mailSettings } from "./mail-server.mjs";
import { freePort, loopback } from "./ports.mjs";
import { prepareDatabase } from "./prepare.mjs";
import { packageProgram, root } from "./project.mjs";
import { newSecretKey } from "./secrets.mjs";
import { Sentence } from "./sentence.mjs";
import { serveBuild } from "./server.mjs";
import { tallyPlaywright } from "./tally.mjs";
import { accessTo, templateName } from "./test-database.mjs";
import { keepWorker } from "./worker.mjs";

const databaseName = "planeward_browser";

/**
 * Makes the production build and serves it, with demo data, from a copy of the template.
 *
 * @param {import("./checks.mjs").Checks} checks
 * @param {{ folder: string, database: import("./database.mjs").Database, accountsFile: string }} options
 * @returns {Promise<{ port: number, logFile: string, mailFolder: string, ownerUrl: string }>}
 */
async function serveForTests({ keeper, env }, { folder, database, accountsFile }) {
  const access = accessTo(database, databaseName);
  await makeDatabase(keeper, database, databaseName, templateName);
  await prepareDatabase(keeper, access, { accountsFile, env });
  const port = await freePort();
  const logFile = join(folder, "server.log");
  const mailFolder = join(folder, "mail");
  const served = await mailSettings(keeper, {
    env: { ...env, DATABASE_URL: access.appUrl, SECRET_KEY: newSecretKey(), SMTP_URL: undefined },
    address: `http://${loopback}:${port}`,
    folder: mailFolder,
    own: true,
  });
  await serveBuild(keeper, { port, logFile, env: served });
  keepWorker(keeper, { env: { ...served, NODE_ENV: "production" }, logFile: join(folder, "worker.log") });
  return { port, logFile, mailFolder, ownerUrl: access.ownerUrl };
}

/**
 * @param {import("./checks.mjs").Checks} checks
 * @param {{ folder: string, database: import("./database.mjs").Database, filters: string[] }} options
 * @returns {Promise<import("./tally.mjs").Tally>}
 */
async function runPlaywright(checks, { folder, database, filters }) {
  const accountsFile = join(folder, "demo-accounts.json");
  const { port, logFile, ownerUrl, mailFolder } = await serveForTests(checks, { folder, database, accountsFile });
  const report = join(folder, "playwright.json");
  const home = join(folder, "home");
  mkdirSync(home);
  const code = await checks.program(
    [packageProgram("playwright"), "test", "--config=.config/playwright.config.ts", "--reporter=list,json", ...filters],
    {
      env: {
        CHROMIUM: findChromium(),
        BASE_URL: `http://${loopback}:${port}`,
        DEMO_ACCOUNTS_FILE: accountsFile,
        // For what no page can set up, such as a program that nobody belongs to.
        DATABASE_OWNER_URL: ownerUrl,
        // Mail to somebody who cannot sign in yet is read where it lies.
        DEMO_MAIL_FOLDER: mailFolder,
        PLAYWRIGHT_JSON_OUTPUT_FILE: report,
        // The browser writes into its user's home.
        HOME: home,
      },
      // An interrupt lets it close its browsers.
      stop: [
        ["SIGINT", 10_000],
        ["SIGKILL", 5_000],
      ],
    },
  );
  const tally = tallyPlaywright(report, code);
  if (tally.failed) console.log(`\nThe server's last lines:\n${lastLinesOf(logFile, 40)}`);
  return tally;
}

/**
 * The production build, always made anew, and everything that Playwright runs against it.
 *
 * @param {import("./checks.mjs").Checks} checks
 * @param {{ folder: string, database: import("./database.mjs").Database | undefined, filters: string[] }} options
 */
export async function runBrowserTests(checks, { folder, database, filters }) {
  const { keeper, env } = checks;
  const built = await checks.count("build", async () => asCheck((await build(keeper, { env })).code));

  let failed = 0;
  try {
    ({ failed } = await checks.count("playwright", async () => {
      if (!findChromium()) await installDebianPackages(keeper, "Chromium", [chromiumPackage]);
      if (!database || built.failed) throw new Sentence("No browser test was run: there is nothing to run it against.");
      return runPlaywright(checks, { folder, database, filters });
    }));
  } finally {
    // Traces are kept for the failures that they explain.
    if (!failed) rmSync(join(root, "test-results"), { recursive: true, force: true });
  }
}
