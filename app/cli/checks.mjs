import { root } from "./project.mjs";
import { Stopped, printFailure } from "./sentence.mjs";

/** @typedef {import("./tally.mjs").Tally} Tally */

const oneFailed = { passed: 0, failed: 1 };

/**
 * What a program that is one check by itself counts.
 *
 * @param {number | null} exitCode
 * @returns {Tally}
 */
export function asCheck(exitCode) {
  return exitCode === 0 ? { passed: 1, failed: 0 } : oneFailed;
}

/** Runs checks one after the other, prints what they print, and adds up how they end. */
export class Checks {
  /** @type {{ name: string, tally: Tally }[]} */
  #done = [];

  /**
   * @param {import("./keeper.mjs").Keeper} keeper
   * @param {NodeJS.ProcessEnv} env for every program
   */
  constructor(keeper, env) {
    this.keeper = keeper;
    this.env = env;
  }

  /**
   * Does a check; one that throws has failed, and the next ones go on.
   *
   * @param {string} name
   * @param {() => Promise<Tally>} work
   * @returns {Promise<Tally>}
   */
  async count(name, work) {
    console.log(`\n── ${name}`);
    const tally = await this.need(name, work);
    if (tally) this.#done.push({ name, tally });
    return tally ?? oneFailed;
  }

  /**
   * Does what checks need. It counts, as one failed check, only when it throws.
   *
   * @template T
   * @param {string} name
   * @param {() => Promise<T>} work
   * @returns {Promise<T | undefined>} undefined when it has failed
   */
  async need(name, work) {
    try {
      return await work();
    } catch (error) {
      if (error instanceof Stopped) throw error;
      printFailure(error);
      this.#done.push({ name, tally: oneFailed });
      return undefined;
    }
  }

  /**
   * Runs one of Node's programs as a check.
   *
   * @param {string} name
   * @param {string[]} args the program's file and its arguments
   */
  run(name, args) {
    return this.count(name, async () => asCheck(await this.program(args)));
  }

  /**
   * Runs one of Node's programs, which prints as it goes.
   *
   * @param {string[]} args the program's file and its arguments
   * @param {import("./keeper.mjs").ProgramOptions} [options]
   * @returns {Promise<number | null>} its exit code
   */
  async program(args, options = {}) {
    const env = { ...this.env, ...options.env };
    const { code } = await this.keeper.outcome(process.execPath, args, { cwd: root, ...options, env });
    return code;
  }

  /** Prints each check's result and, alone on the last line, the sum. */
  print() {
    const width = Math.max(...this.#done.map(({ name }) => name.length));
    const line = (/** @type {Tally} */ { passed, failed }) => `${passed} passed, ${failed} failed`;
    const { passed, failed } = this.sum();
    console.log("");
    for (const { name, tally } of this.#done) console.log(`${name.padEnd(width)}  ${line(tally)}`);
    console.log(`\n${line({ passed, failed })}`);
  }

  /** @returns {Tally} */
  sum() {
    const add = (/** @type {"passed" | "failed"} */ outcome) =>
      this.#done.reduce((sum, { tally }) => sum + tally[outcome], 0);
    return { passed: add("passed"), failed: add("failed") };
  }
}
