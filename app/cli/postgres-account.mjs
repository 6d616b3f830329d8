import { execFileSync, spawnSync } from "node:child_process";
import { isRoot } from "./project.mjs";
import { Sentence } from "./sentence.mjs";

/**
 * @typedef {{ uid: number, gid: number } | undefined} Account undefined for the account of this process
 */

/**
 * The account that the database server runs as. PostgreSQL refuses root; anybody else runs it themselves.
 *
 * @returns {Account}
 */
export function postgresAccount() {
  if (!isRoot) return undefined;
  try {
    const [uid, gid] = ["-u", "-g"].map((option) =>
      Number(execFileSync("id", [option, "postgres"], { encoding: "utf8", stdio: ["ignore", "pipe", "ignore"] })),
    );
    if (uid && gid) return { uid, gid };
  } catch {
    // No such account: told below.
  }
  throw new Sentence(
    "PostgreSQL does not run as root, and this machine has no account 'postgres' to run it as: add one.",
  );
}

/**
 * @param {string} folder
 * @param {Account} account
 * @returns {boolean} whether the account can get into the folder
 */
export function canReach(folder, account) {
  return (
    spawnSync("/bin/sh", ["-c", 'cd -- "$1"', "sh", folder], { cwd: "/", stdio: "ignore", ...account }).status === 0
  );
}
