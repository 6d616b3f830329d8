import {
  chownSync,
  existsSync,
  mkdirSync,
  openSync,
  closeSync,
  readFileSync,
  realpathSync,
  renameSync,
  rmSync,
  writeFileSync,
} from "node:fs";
import { join } from "node:path";
import { hasEnded } from "./keeper.mjs";
import { freePort, loopback } from "./ports.mjs";
import { isAlive, processesIn, signalProcess, waitUntil } from "./processes.mjs";
import { lastLinesOf } from "./logs.mjs";
import { Sentence, Stopped } from "./sentence.mjs";

/**
 * @typedef {object} ClusterPlan
 * @property {import("./postgres-programs.mjs").PostgresPrograms} programs
 * @property {string} dataFolder made when it does not exist
 * @property {import("./postgres-account.mjs").Account} account whom the server runs as
 * @property {string} logFile
 * @property {string} administratorPassword
 * @property {boolean} durable whether what is committed must survive a power cut
 */

export const administrator = "planeward_admin";

/** Fast shutdown first, which ends sessions and writes everything; then an immediate one, from which it recovers. */
const stopSignals = /** @type {[NodeJS.Signals, number][]} */ ([
  ["SIGINT", 20_000],
  ["SIGQUIT", 5_000],
  ["SIGKILL", 5_000],
]);

/** Longest time for a server to begin to answer; replaying its journal after a crash may take a while. */
const startTime = 120_000;

/**
 * The environment for PostgreSQL's programs, without the settings of another server that the caller may have.
 *
 * @param {NodeJS.ProcessEnv} [more]
 */
export function postgresEnvironment(more = {}) {
  const kept = Object.entries(process.env).filter(([name]) => !/^(PG|LC_)/.test(name));
  return { ...Object.fromEntries(kept), LANG: "C.UTF-8", LC_ALL: "C.UTF-8", ...more };
}

/**
 * The version that a cluster's data were made with.
 *
 * @param {string} dataFolder
 * @returns {number | undefined} undefined when there is no cluster
 */
export function clusterMajor(dataFolder) {
  const file = join(dataFolder, "PG_VERSION");
  return existsSync(file) ? Number.parseInt(readFileSync(file, "utf8"), 10) : undefined;
}

/**
 * Makes a cluster; under another name first, so that one cut short is never taken for a whole one.
 *
 * @param {import("./keeper.mjs").Keeper} keeper
 * @param {ClusterPlan} plan
 */
async function createCluster(keeper, plan) {
  console.log("Setting up the database…");
  const unfinished = `${plan.dataFolder}.new`;
  const passwordFile = `${plan.dataFolder}.password`;
  rmSync(unfinished, { recursive: true, force: true });
  rmSync(passwordFile, { force: true });
  mkdirSync(unfinished, { mode: 0o700 });
  writeFileSync(passwordFile, plan.administratorPassword, { mode: 0o600 });
  for (const path of [unfinished, passwordFile]) if (plan.account) chownSync(path, plan.account.uid, plan.account.gid);
  try {
    await keeper.run(
      join(plan.programs.folder, "initdb"),
      [
        `--pgdata=${unfinished}`,
        `--username=${administrator}`,
        `--pwfile=${passwordFile}`,
        "--auth=scram-sha-256",
        "--encoding=UTF8",
        "--locale=C.UTF-8",
        ...(plan.durable ? [] : ["--no-sync"]),
      ],
      {
        cwd: "/",
        env: postgresEnvironment(),
        account: plan.account,
        failure: "The database could not be set up: initdb failed.",
      },
    );
  } finally {
    rmSync(passwordFile, { force: true });
  }
  renameSync(unfinished, plan.dataFolder);
}

/**
 * Stops what an earlier run, killed together with everything that could have cleaned up after it, left running on this
 * cluster, and takes away a lock file that names a process which is none of it.
 *
 * @param {string} dataFolder
 */
async function stopLeftovers(dataFolder) {
  // PostgreSQL's processes all work in the cluster's folder; the server is the one whose parent does not.
  const find = () => processesIn(realpathSync(dataFolder), "postgres");
  const found = find();
  const server = found.find(({ parent }) => !found.some(({ pid }) => pid === parent));
  const gone = () => find().length === 0;
  if (server) {
    for (const [signal, patience] of stopSignals) {
      if (isAlive(server)) signalProcess(server.pid, signal);
      if (await waitUntil(gone, patience)) break;
    }
  }
  if (!gone())
    throw new Sentence(`Processes of an earlier run still use the database in ${dataFolder}, and do not stop.`);
  // PostgreSQL takes its lock file for valid as long as any process has the number in it, be it a later one or a zombie.
  const lockFile = join(dataFolder, "postmaster.pid");
  const named = existsSync(lockFile) ? Number.parseInt(readFileSync(lockFile, "utf8"), 10) : Number.NaN;
  if (existsSync(`/proc/${named}`)) rmSync(lockFile);
}

/**
 * Whether a server says that it takes connections: the eighth line of its lock file.
 *
 * @param {string} dataFolder
 * @param {number | undefined} pid
 */
function isReady(dataFolder, pid) {
  try {
    const lines = readFileSync(join(dataFolder, "postmaster.pid"), "utf8").split("\n");
    return Number(lines[0]) === pid && lines[7]?.trim() === "ready";
  } catch {
    return false;
  }
}

/**
 * Starts a cluster on a free port of the loopback address and waits until it answers. Makes it when there is none.
 *
 * @param {import("./keeper.mjs").Keeper} keeper
 * @param {ClusterPlan} plan
 * @returns {Promise<{ port: number, server: import("node:child_process").ChildProcess }>}
 */
export async function startCluster(keeper, plan) {
  if (existsSync(plan.dataFolder)) await stopLeftovers(plan.dataFolder);
  else await createCluster(keeper, plan);

  const notDurable = ["fsync=off", "synchronous_commit=off", "full_page_writes=off"];
  const settings = [
    `listen_addresses=${loopback}`,
    "unix_socket_directories=",
    "timezone=UTC",
    "log_timezone=UTC",
    ...(plan.durable ? [] : notDurable),
  ];
  // Between finding a free port and using it, somebody else may take it.
  for (let attempt = 1; ; attempt += 1) {
    const port = await freePort();
    const log = openSync(plan.logFile, "a", 0o600);
    const server = keeper.start(
      join(plan.programs.folder, "postgres"),
      ["-D", plan.dataFolder, ...[...settings, `port=${port}`].flatMap((setting) => ["-c", setting])],
      {
        cwd: "/",
        env: postgresEnvironment(),
        account: plan.account,
        stdio: ["ignore", log, log],
        alone: true,
        stop: stopSignals,
      },
    );
    closeSync(log);
    await waitUntil(() => isReady(plan.dataFolder, server.pid) || hasEnded(server), startTime);
    if (keeper.stopping) throw new Stopped();
    if (isReady(plan.dataFolder, server.pid) && !hasEnded(server)) return { port, server };
    const lastLines = lastLinesOf(plan.logFile);
    if (attempt === 3 || !/could not create any TCP\/IP sockets/.test(lastLines))
      throw new Sentence(`The database did not start; its log is ${plan.logFile}.`, lastLines);
  }
}
