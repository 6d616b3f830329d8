import { readFileSync, renameSync, rmSync, writeFileSync } from "node:fs";
import { groupIsAlive, inspect, isAlive, signalProcess, waitUntil } from "./processes.mjs";

/**
 * What one run of a command has going, written down so that somebody else can stop it.
 *
 * @typedef {import("./processes.mjs").Identity & {
 *   group: boolean,
 *   stop: [NodeJS.Signals, number][]
 * }} RunningProcess group: its whole process group is meant; stop: signals, each with the milliseconds it is given
 * @typedef {{ boot: string, processes: RunningProcess[], folders: string[] }} RunRecord
 */

/** The kernel's name for this boot: process numbers and ticks mean nothing after the next. */
function bootId() {
  return readFileSync("/proc/sys/kernel/random/boot_id", "utf8").trim();
}

/** @returns {RunRecord} */
export function emptyRecord() {
  return { boot: bootId(), processes: [], folders: [] };
}

/**
 * @param {string} file
 * @param {RunRecord} record
 */
export function writeRecord(file, record) {
  writeFileSync(`${file}.new`, JSON.stringify(record), { mode: 0o600 });
  renameSync(`${file}.new`, file);
}

/**
 * @param {string} file
 * @returns {RunRecord} empty where nothing (or nothing whole) is written
 */
function readRecord(file) {
  try {
    return JSON.parse(readFileSync(file, "utf8"));
  } catch {
    return emptyRecord();
  }
}

/** @param {RunningProcess} entry */
async function stopProcess(entry) {
  // Members of a group may outlive its first process; their group's number is not given away meanwhile, so a process
  // that now has it but started at another time shows that the group is gone.
  const numberHolder = inspect(entry.pid);
  if (numberHolder ? numberHolder.ticks !== entry.ticks : !entry.group) return;
  const gone = () => (entry.group ? !groupIsAlive(entry.pid) : !isAlive(entry));
  if (gone()) return;
  for (const [signal, patience] of entry.stop) {
    signalProcess(entry.group ? -entry.pid : entry.pid, signal);
    if (await waitUntil(gone, patience)) return;
  }
}

/**
 * Stops everything in a record, the last started first, removes its temporary folders and then the record itself.
 * Harmless when somebody else does the same at the same time.
 *
 * @param {string} file
 */
export async function stopRecorded(file) {
  const record = readRecord(file);
  if (record.boot === bootId()) for (const entry of record.processes.toReversed()) await stopProcess(entry);
  for (const folder of record.folders) rmSync(folder, { recursive: true, force: true });
  rmSync(file, { force: true });
}
