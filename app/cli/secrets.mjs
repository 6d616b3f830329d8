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

/** @returns {string} 32 random bytes, from which the server derives the keys that it encrypts and signs with */
export const newSecretKey = () => randomBytes(32).toString("base64url");

/**
 * A secret of this copy: made once, readable by this account alone.
 *
 * @template Secret
 * @param {string} name
 * @param {() => Secret} make
 * @returns {Secret}
 */
function kept(name, make) {
  const file = join(ownFolder, "secrets.json");
  const known = existsSync(file) ? JSON.parse(readFileSync(file, "utf8")) : {};
  if (known[name] !== undefined) return known[name];
  const made = make();
  writeFileSync(`${file}.new`, `${JSON.stringify({ ...known, [name]: made }, null, 2)}\n`, { mode: 0o600 });
  renameSync(`${file}.new`, file);
  return made;
}

/** @returns {DatabasePasswords} of this copy's own database */
export const keptPasswords = () => kept("database", newPasswords);

/** @returns {string} this copy's key, where the environment names none */
export const keptSecretKey = () => kept("key", newSecretKey);
