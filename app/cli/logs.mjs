import { closeSync, existsSync, openSync, readSync, renameSync, statSync } from "node:fs";

const largestLog = 5_000_000;

/**
 * Puts a log that has grown large aside, over the one put aside before.
 *
 * @param {string} file
 */
export function rotateLog(file) {
  if (existsSync(file) && statSync(file).size > largestLog) renameSync(file, `${file}.old`);
}

/**
 * @param {string} file
 * @param {number} [count]
 * @returns {string} its last lines, nothing when there is no such file
 */
export function lastLinesOf(file, count = 20) {
  if (!existsSync(file)) return "";
  const { size } = statSync(file);
  const end = Buffer.alloc(Math.min(size, 64_000));
  const log = openSync(file, "r");
  readSync(log, end, 0, end.length, size - end.length);
  closeSync(log);
  return end.toString("utf8").trimEnd().split("\n").slice(-count).join("\n");
}
