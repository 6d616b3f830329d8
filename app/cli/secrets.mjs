import { randomBytes } from "node:crypto";
import { existsSync, readFileSync, renameSync, writeFileSync } from "node:fs";
import { join } from "node:path";
import { ownFolder } from "./project.mjs";

/**
 * Passwords of the database's roles.
 *
 * @typedef {{ administrator: string, owner: string, app: string }} DatabasePasswords
 */

/** @returns {DatabasePasswords} letters, digits, - and _ only: they stand in URLs and SQL as they are */
export function newPasswords() {
  const password = () => randomBytes(24).toString("base64url");
  return { administrator: password(), owner: password(), app: password() };
}

/**
 * The passwords of this copy's own database: made once, readable by this account alone.
 *
 * @returns {DatabasePasswords}
 */
export function keptPasswords() {
  const file = join(ownFolder, "secrets.json");
  if (existsSync(file)) return JSON.parse(readFileSync(file, "utf8")).database;
  const passwords = newPasswords();
  writeFileSync(`${file}.new`, `${JSON.stringify({ database: passwords }, null, 2)}\n`, { mode: 0o600 });
  renameSync(`${file}.new`, file);
  return passwords;
}
