import { spawn } from "node:child_process";
import { once } from "node:events";
import { fileURLToPath } from "node:url";
import { inspect } from "./processes.mjs";
import { emptyRecord, stopRecorded, writeRecord } from "./run-record.mjs";
import { Sentence, Stopped } from "./sentence.mjs";

const guardProgram = fileURLToPath(new URL("./guard.mjs", import.meta.url));

/** Lines kept of a quiet program's output, to be shown when it fails. */
const linesShown = 20;

/**
 * @typedef {object} ProgramOptions
 * @property {string} [cwd]
 * @property {NodeJS.ProcessEnv} [env]
 * @property {import("./postgres-account.mjs").Account} [account] whom it runs as, when not as this process
 * @property {import("node:child_process").StdioOptions} [stdio]
 * @property {boolean} [alone] stop only the process itself, not its whole group: it stops its children
 * @property {[NodeJS.Signals, number][]} [stop] signals to stop it with, each with the milliseconds it is given
 */

/**
 * @param {import("node:child_process").ChildProcess} child
 * @returns {boolean} whether it has ended, or never began
 */
export function hasEnded(child) {
  return child.pid === undefined || child.exitCode !== null || child.signalCode !== null;
}

/**
 * @param {import("node:child_process").ChildProcess} child
 * @returns {Promise<void>} fulfilled when it has ended, be it long ago
 */
export async function ended(child) {
  if (!hasEnded(child)) await once(child, "exit");
}

/**
 * Starts programs and stops every one of them, whatever ends this process: a record of what runs is kept in a file,
 * and a guard process stops what the record holds as soon as this process closes the pipe to it or dies.
 * Programs run in process groups of their own, so a Ctrl-C in the terminal reaches this process alone, which then
 * stops them in the right order.
 */
export class Keeper {
  #record = emptyRecord();
  #stopping = false;
  /** @type {() => void} */
  #tellStopping = () => undefined;
  /** Fulfilled when stopping begins. */
  whenStopping = /** @type {Promise<void>} */ (new Promise((resolve) => (this.#tellStopping = resolve)));
  /** @type {Promise<void> | undefined} */
  #stopped;
  /** @type {import("node:child_process").ChildProcess} */
  #guard;

  /** @param {string} recordFile where this run's record is kept; no other run may use it */
  constructor(recordFile) {
    this.recordFile = recordFile;
    writeRecord(recordFile, this.#record);
    this.#guard = this.#startGuard();
  }

  #startGuard() {
    const guard = spawn(process.execPath, [guardProgram, this.recordFile], {
      cwd: "/",
      detached: true,
      stdio: ["pipe", "ignore", "inherit"],
    });
    guard.stdin?.on("error", () => undefined);
    guard.once("exit", () => {
      if (!this.#stopping) this.#guard = this.#startGuard();
    });
    return guard;
  }

  /**
   * Starts a program that is to run until the end.
   *
   * @param {string} program
   * @param {string[]} args
   * @param {ProgramOptions} [options]
   */
  start(program, args, options = {}) {
    if (this.#stopping) throw new Stopped();
    const child = spawn(program, args, {
      cwd: options.cwd,
      env: options.env,
      stdio: options.stdio ?? ["ignore", "inherit", "inherit"],
      detached: true,
      ...options.account,
    });
    // One that could not be started has no number; whoever waits for it sees that it has ended.
    child.on("error", () => undefined);
    const found = child.pid === undefined ? undefined : inspect(child.pid);
    if (found) {
      const entry = {
        pid: found.pid,
        ticks: found.ticks,
        group: !options.alone,
        stop: options.stop ?? [
          ["SIGTERM", 10_000],
          ["SIGKILL", 5_000],
        ],
      };
      this.#record.processes.push(entry);
      writeRecord(this.recordFile, this.#record);
      child.once("exit", () => {
        // While stopping, the record is the guard's: it waits for the rest of the group.
        if (this.#stopping) return;
        this.#record.processes = this.#record.processes.filter((other) => other !== entry);
        writeRecord(this.recordFile, this.#record);
      });
    }
    return child;
  }

  /**
   * Runs a program to its end. Its output is shown only when it fails, unless `stdio` says otherwise.
   *
   * @param {string} program
   * @param {string[]} args
   * @param {ProgramOptions & { failure?: string, input?: string }} [options] failure: the sentence to fail with;
   *   input: what it reads on standard input
   * @throws {Sentence} when it does not end with exit code 0
   */
  async run(program, args, options = {}) {
    const { code, lastLines } = await this.outcome(program, args, {
      stdio: [options.input === undefined ? "ignore" : "pipe", "pipe", "pipe"],
      ...options,
    });
    if (code !== 0) throw new Sentence(options.failure ?? `${program} failed.`, lastLines);
  }

  /**
   * Runs a program to its end and tells how it ended.
   *
   * @param {string} program
   * @param {string[]} args
   * @param {ProgramOptions & { input?: string }} [options]
   * @returns {Promise<{ code: number | null, lastLines: string }>} code: null when a signal ended it or it could not start
   */
  async outcome(program, args, options = {}) {
    const child = this.start(program, args, options);
    /** @type {string[]} */
    let lines = [];
    for (const stream of [child.stdout, child.stderr]) {
      stream?.setEncoding("utf8").on("data", (/** @type {string} */ text) => {
        lines = (lines.join("\n") + text).split("\n").slice(-linesShown);
      });
    }
    child.stdin?.on("error", () => undefined).end(options.input);
    const code = await new Promise((resolve) => {
      child.once("error", (error) => {
        lines.push(error.message);
        resolve(null);
      });
      child.once("close", resolve);
    });
    if (this.#stopping) throw new Stopped();
    return { code, lastLines: lines.join("\n").trim() };
  }

  /**
   * Has a temporary folder removed at the end.
   *
   * @param {string} folder
   */
  removeAtEnd(folder) {
    this.#record.folders.push(folder);
    writeRecord(this.recordFile, this.#record);
  }

  /** Whether stopping has begun. */
  get stopping() {
    return this.#stopping;
  }

  /** Stops everything that was started, and returns when all of it is gone. */
  stop() {
    this.#stopped ??= this.#stopAll();
    return this.#stopped;
  }

  async #stopAll() {
    this.#stopping = true;
    this.#tellStopping();
    const guardGone = new Promise((resolve) => this.#guard.once("exit", resolve));
    this.#guard.stdin?.end();
    await guardGone;
    // Nothing is left to do here unless somebody killed the guard at its work.
    await stopRecorded(this.recordFile);
  }
}
