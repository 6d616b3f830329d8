import { closeSync, openSync } from "node:fs";
import { join } from "node:path";
import { keepRunning } from "./keep-running.mjs";
import { rotateLog } from "./logs.mjs";
import { root } from "./project.mjs";

/** A job under way may end or put itself back; what is left is done by the next worker. */
const stop = /** @type {[NodeJS.Signals, number][]} */ ([
  ["SIGTERM", 10_000],
  ["SIGKILL", 5_000],
]);

/**
 * Runs the worker, the process that does the jobs which take longer than a request, and starts it again whenever it
 * ends before everything is stopped.
 *
 * @param {import("./keeper.mjs").Keeper} keeper
 * @param {{ env: NodeJS.ProcessEnv, logFile?: string }} options logFile: where its log goes, else to the terminal
 */
export function keepWorker(keeper, { env, logFile }) {
  if (logFile) rotateLog(logFile);
  const start = () => {
    const log = logFile ? openSync(logFile, "a", 0o600) : undefined;
    const worker = keeper.start(process.execPath, ["--import", "tsx", join(root, "app/jobs/worker.ts")], {
      cwd: root,
      env,
      stdio: ["ignore", "ignore", log ?? "inherit"],
      stop,
    });
    if (log !== undefined) closeSync(log);
    return worker;
  };
  keepRunning(keeper, start(), start);
}
