import { join } from "node:path";
import { startCluster } from "./cluster.mjs";
import { databaseUrl, makeDatabase, makeRoles } from "./database.mjs";
import { ensurePostgres } from "./postgres-programs.mjs";
import { postgresAccount } from "./postgres-account.mjs";
import { prepareDatabase } from "./prepare.mjs";
import { newPasswords } from "./secrets.mjs";

/** A migrated database with reference data and nothing else; every database that tests use is a copy of it. */
export const templateName = "planeward_template";

/**
 * Starts a database server for the tests and fills the template.
 *
 * @param {import("./checks.mjs").Checks} checks
 * @param {string} folder a temporary folder that the server's account may pass through
 * @returns {Promise<import("./database.mjs").Database>}
 */
export async function startTestDatabase({ keeper, env }, folder) {
  const programs = await ensurePostgres(keeper, undefined);
  const passwords = newPasswords();
  const { port } = await startCluster(keeper, {
    programs,
    dataFolder: join(folder, "postgres"),
    account: postgresAccount(),
    logFile: join(folder, "postgres.log"),
    administratorPassword: passwords.administrator,
    durable: false,
  });
  const database = { programs, port, passwords };
  await makeRoles(keeper, database);
  await makeDatabase(keeper, database, templateName);
  await prepareDatabase(keeper, accessTo(database, templateName), { env });
  return database;
}

/**
 * @param {import("./database.mjs").Database} database
 * @param {string} name
 * @returns {import("./external-database.mjs").DatabaseAccess}
 */
export function accessTo(database, name) {
  return { appUrl: databaseUrl(database, "app", name), ownerUrl: databaseUrl(database, "owner", name) };
}
