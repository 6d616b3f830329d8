import { root } from "./project.mjs";

/**
 * Migrates a database, fills in reference data and, where asked and the database is empty, demo data.
 *
 * @param {import("./keeper.mjs").Keeper} keeper
 * @param {import("./external-database.mjs").DatabaseAccess} access
 * @param {{ accountsFile?: string | undefined, env?: NodeJS.ProcessEnv }} [options] accountsFile: where the demo accounts
 *   are written; no demo data without it
 */
export async function prepareDatabase(keeper, { appUrl, ownerUrl }, { accountsFile, env = process.env } = {}) {
  await keeper.run(process.execPath, ["--import", "tsx", "app/db/prepare.ts"], {
    cwd: root,
    env: {
      ...env,
      DATABASE_URL: appUrl,
      DATABASE_OWNER_URL: ownerUrl,
      APP_ROLE: decodeURIComponent(new URL(appUrl).username),
      DEMO: accountsFile ? "1" : "0",
      ...(accountsFile && { DEMO_ACCOUNTS_FILE: accountsFile }),
    },
    failure: "The database could not be prepared.",
  });
}
