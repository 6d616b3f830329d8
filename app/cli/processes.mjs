import { readFileSync, readdirSync, readlinkSync } from "node:fs";
import { setTimeout as pause } from "node:timers/promises";

/**
 * A process that can be told from a later one with the same number.
 *
 * @typedef {{ pid: number, ticks: number }} Identity ticks: its start in clock ticks after boot
 */

/**
 * One process as the kernel sees it, or undefined when there is none. A zombie counts as gone: it does nothing any
 * more, and where the first process of a container does not reap, it stays.
 *
 * @param {number} pid
 */
export function inspect(pid) {
  try {
    const text = readFileSync(`/proc/${pid}/stat`, "utf8");
    // The name stands in parentheses and may hold blanks and parentheses of its own.
    const nameEnd = text.lastIndexOf(")");
    const name = text.slice(text.indexOf("(") + 1, nameEnd);
    const fields = text.slice(nameEnd + 2).split(" ");
    if (fields[0] === "Z" || fields[0] === "X") return undefined;
    return { pid, name, parent: Number(fields[1]), group: Number(fields[2]), ticks: Number(fields[19]) };
  } catch {
    return undefined;
  }
}

/**
 * @param {Identity} identity
 * @returns {boolean} whether that very process still runs
 */
export function isAlive({ pid, ticks }) {
  return inspect(pid)?.ticks === ticks;
}

/** Numbers of all processes. */
function allPids() {
  return readdirSync("/proc")
    .filter((entry) => /^\d+$/.test(entry))
    .map(Number);
}

/**
 * @param {number} group
 * @returns {boolean} whether any process of that process group still runs
 */
export function groupIsAlive(group) {
  return allPids().some((pid) => inspect(pid)?.group === group);
}

/**
 * Processes of one program whose working folder is the given one, as far as this account may see them.
 *
 * @param {string} folder
 * @param {string} name the program's, as the kernel has it
 */
export function processesIn(folder, name) {
  return allPids().flatMap((pid) => {
    try {
      if (readlinkSync(`/proc/${pid}/cwd`) !== folder) return [];
    } catch {
      return [];
    }
    const found = inspect(pid);
    return found?.name === name ? [found] : [];
  });
}

/**
 * Sends a signal; a process that has just gone is no error.
 *
 * @param {number} target a process, or a process group when negative
 * @param {NodeJS.Signals} signal
 */
export function signalProcess(target, signal) {
  try {
    process.kill(target, signal);
  } catch (error) {
    if (!(error instanceof Error && "code" in error && error.code === "ESRCH")) throw error;
  }
}

/**
 * Waits until something holds.
 *
 * @param {() => boolean} holds
 * @param {number} milliseconds the longest to wait
 * @returns {Promise<boolean>} whether it came to hold
 */
export async function waitUntil(holds, milliseconds) {
  const end = Date.now() + milliseconds;
  while (!holds()) {
    if (Date.now() > end) return false;
    await pause(50);
  }
  return true;
}
