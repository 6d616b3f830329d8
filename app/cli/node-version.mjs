import { readFileSync } from "node:fs";
import { join } from "node:path";
import { root } from "./project.mjs";
import { Sentence } from "./sentence.mjs";

/** @param {string} version "20.20.2" or "21" */
function parts(version) {
  const [major = 0, minor = 0, patch = 0] = version.split(".").map(Number);
  return [major, minor, patch];
}

/**
 * @param {string} left
 * @param {string} right
 * @returns {number} negative, zero or positive, as left is below, equal to or above right
 */
function compare(left, right) {
  const others = parts(right);
  for (const [index, part] of parts(left).entries()) {
    const difference = part - (others[index] ?? 0);
    if (difference !== 0) return difference;
  }
  return 0;
}

/** Refuses a Node that package.json's "engines" does not allow (a list of ">=x.y" and "<x"). */
export function checkNodeVersion() {
  const range = JSON.parse(readFileSync(join(root, "package.json"), "utf8")).engines.node;
  const fits = range.split(" ").every((/** @type {string} */ bound) => {
    const order = compare(process.versions.node, bound.replace(/^[<>=]+/, ""));
    return bound.startsWith(">=") ? order >= 0 : order < 0;
  });
  if (!fits) throw new Sentence(`Planeward needs Node ${range}, and this is ${process.versions.node}.`);
}
