import { ended } from "./keeper.mjs";

/** Pause before a program that has ended is started again, milliseconds: doubled each time that it did not last a minute. */
const shortestPause = 250;
const longestPause = 30_000;
const lasting = 60_000;

/**
 * Starts a program again whenever it ends before everything is stopped.
 *
 * @param {import("./keeper.mjs").Keeper} keeper
 * @param {import("node:child_process").ChildProcess} first what runs already
 * @param {() => import("node:child_process").ChildProcess} start
 */
export function keepRunning(keeper, first, start) {
  let wait = shortestPause;
  /** @param {import("node:child_process").ChildProcess} child */
  const watch = (child) => {
    const began = Date.now();
    void ended(child).then(() => {
      wait = Date.now() - began > lasting ? shortestPause : Math.min(wait * 2, longestPause);
      setTimeout(() => {
        if (!keeper.stopping) watch(start());
      }, wait).unref();
    });
  };
  watch(first);
}
