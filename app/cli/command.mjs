import { constants } from "node:os";
import { Keeper } from "./keeper.mjs";
import { watchNpm } from "./npm-parent.mjs";
import { Stopped, printFailure } from "./sentence.mjs";

/**
 * Does a command's work and ends this process. Ctrl-C, SIGTERM, the closing of the terminal and the death of npm cut
 * the work short; whatever ends it, everything that it started through the keeper is stopped first.
 *
 * @param {string} recordFile where the keeper's record is kept
 * @param {(keeper: Keeper) => Promise<number>} work returns the exit code
 */
export async function runCommand(recordFile, work) {
  // A closed terminal or pipe is no reason to leave anything running.
  for (const stream of [process.stdout, process.stderr]) stream.on("error", () => undefined);
  const keeper = new Keeper(recordFile);
  /** Exit code when the work was cut short. */
  let interrupted = 1;
  for (const signal of /** @type {const} */ (["SIGINT", "SIGTERM", "SIGHUP"])) {
    process.on(signal, () => {
      if (!keeper.stopping) console.log("Stopping…");
      interrupted = 128 + constants.signals[signal];
      void keeper.stop();
    });
  }
  watchNpm(() => void keeper.stop());

  let code;
  try {
    code = await work(keeper);
  } catch (error) {
    printFailure(error);
    code = error instanceof Stopped ? interrupted : 1;
  }
  await keeper.stop();
  process.exit(code);
}
