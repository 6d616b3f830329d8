import {
  chmodSync,
  lstatSync,
  mkdirSync,
  mkdtempSync,
  readlinkSync,
  realpathSync,
  statSync,
  symlinkSync,
} from "node:fs";
import { join } from "node:path";
import { clusterMajor, startCluster } from "./cluster.mjs";
import { databaseUrl, makeDatabase, makeRoles } from "./database.mjs";
import { rotateLog } from "./logs.mjs";
import { canReach, postgresAccount } from "./postgres-account.mjs";
import { ensurePostgres } from "./postgres-programs.mjs";
import { isRoot, ownFolder } from "./project.mjs";
import { keptPasswords } from "./secrets.mjs";

/** @typedef {import("./postgres-account.mjs").Account} Account */

/** Where this copy's cluster lies, or a link to where it does. */
const clusterFolder = join(ownFolder, "postgres");

/**
 * Data that exist stay where they are, and run as the account that they belong to.
 *
 * @returns {{ dataFolder: string, major: number, account: Account } | undefined}
 */
function existingCluster() {
  const major = clusterMajor(clusterFolder);
  if (major === undefined) return undefined;
  const { uid, gid } = statSync(clusterFolder);
  return { dataFolder: realpathSync(clusterFolder), major, account: isRoot ? { uid, gid } : undefined };
}

/**
 * A place for a new cluster. When root's project is in a folder that the server's account can't get into, such as
 * root's home, the place is below /var/lib, and a link stands where the cluster would.
 *
 * @returns {{ dataFolder: string, account: Account }}
 */
function placeForCluster() {
  const account = postgresAccount();
  if (canReach(ownFolder, account)) return { dataFolder: clusterFolder, account };
  if (!lstatSync(clusterFolder, { throwIfNoEntry: false })?.isSymbolicLink()) {
    const reachable = "/var/lib/planeward";
    mkdirSync(reachable, { recursive: true });
    const parent = mkdtempSync(join(reachable, "cluster-"));
    for (const folder of [reachable, parent]) chmodSync(folder, 0o711);
    symlinkSync(join(parent, "postgres"), clusterFolder);
  }
  return { dataFolder: readlinkSync(clusterFolder), account };
}

/**
 * Starts this copy's own database server, with its roles and its database, which are made on first use.
 *
 * @param {import("./keeper.mjs").Keeper} keeper
 * @param {string} logFile
 * @returns {Promise<import("./external-database.mjs").DatabaseAccess>}
 */
export async function startLocalDatabase(keeper, logFile) {
  const existing = existingCluster();
  const programs = await ensurePostgres(keeper, existing?.major);
  const { dataFolder, account } = existing ?? placeForCluster();
  const passwords = keptPasswords();
  rotateLog(logFile);
  const { port, server } = await startCluster(keeper, {
    programs,
    dataFolder,
    account,
    logFile,
    administratorPassword: passwords.administrator,
    durable: true,
  });
  const database = { programs, port, passwords };
  await makeRoles(keeper, database);
  await makeDatabase(keeper, database, "planeward");
  return {
    appUrl: databaseUrl(database, "app", "planeward"),
    ownerUrl: databaseUrl(database, "owner", "planeward"),
    server,
  };
}
