import { closeSync, openSync } from "node:fs";
import { setTimeout as pause } from "node:timers/promises";
import { builtServer } from "./build.mjs";
import { hasEnded } from "./keeper.mjs";
import { keepRunning } from "./keep-running.mjs";
import { lastLinesOf, rotateLog } from "./logs.mjs";
import { loopback, requireFreePort } from "./ports.mjs";
import { packageProgram, root } from "./project.mjs";
import { Sentence, Stopped } from "./sentence.mjs";

/** Longest time for the server to begin to answer. */
const startTime = 60_000;

/** Requests under way may end; ten seconds are enough for any. */
const stop = /** @type {[NodeJS.Signals, number][]} */ ([
  ["SIGTERM", 10_000],
  ["SIGKILL", 5_000],
]);

/**
 * @param {number} port
 * @returns {Promise<boolean>} whether the server on the port says that it is well
 */
async function isHealthy(port) {
  try {
    const answer = await fetch(`http://${loopback}:${port}/healthz`, { signal: AbortSignal.timeout(5_000) });
    await answer.arrayBuffer();
    return answer.status === 200;
  } catch {
    return false;
  }
}

/**
 * Waits until a server says that it is well.
 *
 * @param {import("./keeper.mjs").Keeper} keeper
 * @param {import("node:child_process").ChildProcess} server
 * @param {number} port
 * @param {string} [logFile] shown when it does not
 */
async function waitUntilHealthy(keeper, server, port, logFile) {
  const end = Date.now() + startTime;
  while (!hasEnded(server) && Date.now() < end) {
    if (await isHealthy(port)) {
      // An answer counts only while ours lives: on a port lost in a race, somebody else would give it.
      if (!hasEnded(server)) return;
    } else await pause(50);
  }
  if (keeper.stopping) throw new Stopped();
  if (hasEnded(server)) await requireFreePort(port);
  const what = hasEnded(server) ? "The server ended before it served" : "The server does not say that it is well";
  throw new Sentence(logFile ? `${what}; its log is ${logFile}.` : `${what}.`, logFile && lastLinesOf(logFile));
}

/**
 * Serves the production build on the loopback address. Once it was well, it is started again whenever it ends before everything is
 * stopped: what is under way then is asked again, and nobody has to come.
 *
 * @param {import("./keeper.mjs").Keeper} keeper
 * @param {{ port: number, env: NodeJS.ProcessEnv, logFile: string }} options
 */
export async function serveBuild(keeper, { port, env, logFile }) {
  await requireFreePort(port);
  rotateLog(logFile);
  const start = () => {
    const log = openSync(logFile, "a", 0o600);
    const server = keeper.start(process.execPath, [packageProgram("react-router-serve"), builtServer], {
      cwd: root,
      env: { ...env, NODE_ENV: "production", HOST: loopback, PORT: String(port) },
      // The server's own access lines hold whole addresses, with what people searched for: only Planeward's log is kept.
      stdio: ["ignore", "ignore", log],
      stop,
    });
    closeSync(log);
    return server;
  };
  const first = start();
  await waitUntilHealthy(keeper, first, port, logFile);
  keepRunning(keeper, first, start);
}

/**
 * Serves the sources themselves, which reload on edit, and prints what the server prints.
 *
 * @param {import("./keeper.mjs").Keeper} keeper
 * @param {{ port: number, env: NodeJS.ProcessEnv }} options
 * @returns {Promise<import("node:child_process").ChildProcess>} the server, once it is well
 */
export async function serveSources(keeper, { port, env }) {
  await requireFreePort(port);
  const args = ["dev", "--host", loopback, "--port", String(port), "--strictPort"];
  const server = keeper.start(process.execPath, [packageProgram("react-router"), ...args], {
    cwd: root,
    env: { ...env, NODE_ENV: "development", HOST: loopback, PORT: String(port) },
    stop,
  });
  await waitUntilHealthy(keeper, server, port);
  return server;
}
