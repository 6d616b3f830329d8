import { createHash } from "node:crypto";
import { existsSync, readFileSync, readdirSync, statSync } from "node:fs";
import { join } from "node:path";

/**
 * @param {string} folder
 * @param {string} entry a file or folder in it, which may be missing
 * @returns {string[]} the files under the entry, relative to the folder, in one order on every machine
 */
function filesUnder(folder, entry) {
  const path = join(folder, entry);
  if (!existsSync(path)) return [];
  if (!statSync(path).isDirectory()) return [entry];
  return readdirSync(path)
    .sort()
    .flatMap((name) => filesUnder(folder, join(entry, name)));
}

/**
 * A fingerprint of files: it changes when one of them does, or comes, goes or is renamed.
 *
 * @param {string} folder
 * @param {string[]} entries files and folders in it
 * @returns {string}
 */
export function fingerprint(folder, entries) {
  const hash = createHash("sha256");
  for (const file of entries.flatMap((entry) => filesUnder(folder, entry))) {
    const content = readFileSync(join(folder, file));
    hash.update(`${file}\0${content.length}\0`).update(content);
  }
  return hash.digest("hex");
}
