import { closeSync, openSync } from "node:fs";
import { join } from "node:path";
import { ended } from "./keeper.mjs";
import { rotateLog } from "./logs.mjs";
import { root } from "./project.mjs";

/** A job under way may end or put itself back; what is left is done by the next worker. */
const stop = /** @type {[NodeJS.Signals, number][]} */ ([
  ["SIGTERM", 10_000],
  ["SIGKILL", 5_000],
]);

/** Pause before a worker that has ended is started again, milliseconds: doubled each time that it did not last a minute. */
const shortestPause = 250;
const longestPause = 30_000;
const lasting = 60_000;

/**
 * Runs the worker, the process that does the jobs which take longer than a request, and starts it again whenever it
 * ends before everything is stopped.
 *
 * @param {import("./keeper.mjs").Keeper} keeper
 * @param {{ env: NodeJS.ProcessEnv, logFile?: string }} options logFile: where its log goes, else to the terminal
 */
export function keepWorker(keeper, { env, logFile }) {
  if (logFile) rotateLog(logFile);
  let wait = shortestPause;
  const start = () => {
    const began = Date.now();
    const log = logFile ? openSync(logFile, "a", 0o600) : undefined;
    const worker = keeper.start(process.execPath, ["--import", "tsx", join(root, "app/jobs/worker.ts")], {
      cwd: root,
      env,
      stdio: ["ignore", "ignore", log ?? "inherit"],
      stop,
    });
    if (log !== undefined) closeSync(log);
    void ended(worker).then(() => {
      wait = Date.now() - began > lasting ? shortestPause : Math.min(wait * 2, longestPause);
      setTimeout(() => {
        if (!keeper.stopping) start();
      }, wait).unref();
    });
  };
  start();
}
