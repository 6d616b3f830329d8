import { join } from "node:path";
import { databaseUrl } from "./database.mjs";
import { packageProgram } from "./project.mjs";
import { tallyVitest } from "./tally.mjs";
import { accessTo, templateName } from "./test-database.mjs";

/**
 * What tests that need a database find in their environment; they copy the template, one copy for each worker
 * (`create database … template …`).
 *
 * @param {import("./database.mjs").Database} database
 * @returns {NodeJS.ProcessEnv}
 */
function environment(database) {
  const { ownerUrl, appUrl } = accessTo(database, templateName);
  return {
    // The administrator's connection, which creates and drops databases.
    TEST_DATABASE_ADMIN_URL: databaseUrl(database, "administrator", "postgres"),
    TEST_DATABASE_TEMPLATE: templateName,
    // The owner's and the server's connection to the template; for a copy, its name takes the template's place.
    TEST_DATABASE_OWNER_URL: ownerUrl,
    TEST_DATABASE_APP_URL: appUrl,
  };
}

/**
 * Everything that Vitest runs.
 *
 * @param {import("./checks.mjs").Checks} checks
 * @param {{ folder: string, database: import("./database.mjs").Database | undefined, filters: string[] }} options
 */
export async function runUnitTests(checks, { folder, database, filters }) {
  const report = join(folder, "vitest.json");
  const reporters = ["--reporter=default", "--reporter=json", `--outputFile.json=${report}`];
  await checks.count("vitest", async () => {
    const code = await checks.program(
      [packageProgram("vitest"), "run", "--config=.config/vitest.config.ts", ...reporters, ...filters],
      { env: database && environment(database) },
    );
    return tallyVitest(report, code);
  });
}
