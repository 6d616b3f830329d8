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
 * The secrets of this copy: each made once, readable by this account alone.
 *
 * @returns {{ database: DatabasePasswords, sealing: string }}
 */
function kept() {
  const file = join(ownFolder, "secrets.json");
  const known = existsSync(file) ? JSON.parse(readFileSync(file, "utf8")) : {};
  const secrets = { database: newPasswords(), sealing: newSealingSecret(), ...known };
  // One that was added since is made for a copy that has been there before.
  if (Object.keys(secrets).some((name) => !(name in known))) {
    writeFileSync(`${file}.new`, `${JSON.stringify(secrets, null, 2)}\n`, { mode: 0o600 });
    renameSync(`${file}.new`, file);
  }
  return secrets;
}

/** The passwords of this copy's own database. */
export const keptPasswords = () => kept().database;

/** Under what this copy seals the secrets that it has to read again. */
export const keptSealingSecret = () => kept().sealing;

/** @returns {string} 32 bytes made at random */
export const newSealingSecret = () => randomBytes(32).toString("base64url");
