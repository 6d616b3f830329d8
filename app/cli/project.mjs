import { chmodSync, mkdirSync, statSync } from "node:fs";
import { dirname, join } from "node:path";
import { fileURLToPath } from "node:url";
import { Sentence } from "./sentence.mjs";

/** The project's top folder. */
export const root = dirname(dirname(dirname(fileURLToPath(import.meta.url))));

/** Where `npm start` keeps everything that is this copy's own: database, secrets, logs. Git ignores it. */
export const ownFolder = join(root, ".planeward");

/** Whether this process may install packages and must hand the database server to another account. */
export const isRoot = process.getuid?.() === 0;

/**
 * The path of a program that a package of the project brings; run it with this very Node, `process.execPath`.
 *
 * @param {string} name as in node_modules/.bin
 */
export function packageProgram(name) {
  return join(root, "node_modules", ".bin", name);
}

/**
 * Makes the folder for this copy's own files. Root's may be passed through (not listed) by the account that runs the
 * database; every file in it is closed for itself.
 */
export function makeOwnFolder() {
  mkdirSync(ownFolder, { recursive: true });
  if (!isRoot && statSync(ownFolder).uid !== process.getuid?.())
    throw new Sentence(`${ownFolder} belongs to another account: start Planeward as that one.`);
  chmodSync(ownFolder, isRoot ? 0o711 : 0o700);
}
