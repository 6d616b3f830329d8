/**
 * `npm start`: sets up what is missing, serves the application on the loopback address, and on the way out stops
 * everything that it started. `--dev` (`npm run dev`) serves the sources and reloads on edit.
 *
 * Needs nothing but Node until it has installed the packages itself.
 */
import { readdirSync } from "node:fs";
import { join } from "node:path";
import { buildWhenChanged } from "./build.mjs";
import { runCommand } from "./command.mjs";
import { demoAccountLines } from "./demo-accounts.mjs";
import { ensureDependencies } from "./dependencies.mjs";
import { externalDatabase } from "./external-database.mjs";
import { ended, hasEnded } from "./keeper.mjs";
import { startLocalDatabase } from "./local-database.mjs";
import { holdLock } from "./lock.mjs";
import { lastLinesOf } from "./logs.mjs";
import { checkNodeVersion } from "./node-version.mjs";
import { mailSettings } from "./mail-server.mjs";
import { loopback, requireFreePort, wantedPort } from "./ports.mjs";
import { prepareDatabase } from "./prepare.mjs";
import { makeOwnFolder, ownFolder } from "./project.mjs";
import { keptSecretKey } from "./secrets.mjs";
import { stopRecorded } from "./run-record.mjs";
import { Sentence, printFailure } from "./sentence.mjs";
import { serveBuild, serveSources } from "./server.mjs";
import { keepWorker } from "./worker.mjs";

const isDev = process.argv.includes("--dev");
const accountsFile = join(ownFolder, "demo-accounts.json");
const serverLog = join(ownFolder, "server.log");
const workerLog = join(ownFolder, "worker.log");
const databaseLog = join(ownFolder, "postgres.log");

/** What this process is doing, for whoever starts the same copy a second time. */
let doing = "is being started";

/**
 * Stops what an earlier start of this copy left running, when its guard was killed with it. Waits for a guard that is
 * still at work.
 */
async function stopEarlierRun() {
  for (const file of readdirSync(ownFolder)) {
    if (/^run-\d+\.json$/.test(file)) await stopRecorded(join(ownFolder, file));
  }
}

/** What must hold before anything slow is done. */
async function check() {
  checkNodeVersion();
  const port = wantedPort(process.env.PORT);
  const external = externalDatabase();
  const holder = await holdLock("start", () => `${doing} (process ${process.pid})`);
  if (holder)
    throw new Sentence(`Planeward ${holder} from this folder already; to start it anew, stop that one first.`);
  makeOwnFolder();
  await stopEarlierRun();
  await requireFreePort(port);
  return { port, external };
}

/**
 * @param {import("./keeper.mjs").Keeper} keeper
 * @param {{ port: number, external: import("./external-database.mjs").DatabaseAccess | undefined }} options
 * @returns {Promise<number>} exit code
 */
async function run(keeper, { port, external }) {
  await ensureDependencies(keeper);
  const database = external ?? (await startLocalDatabase(keeper, databaseLog));
  // Demo data are for this copy's own database only.
  await prepareDatabase(keeper, database, external ? {} : { accountsFile });
  if (!isDev) await buildWhenChanged(keeper);

  // The server gets the plain role alone.
  const address = `http://${loopback}:${port}`;
  const env = await mailSettings(keeper, {
    env: {
      ...process.env,
      DATABASE_URL: database.appUrl,
      DATABASE_OWNER_URL: undefined,
      SECRET_KEY: process.env.SECRET_KEY || keptSecretKey(),
    },
    address,
    folder: join(ownFolder, "mail"),
    own: !external,
  });
  const sources = isDev ? await serveSources(keeper, { port, env }) : undefined;
  if (!isDev) await serveBuild(keeper, { port, env, logFile: serverLog });
  const mode = isDev ? "development" : "production";
  keepWorker(keeper, { env: { ...env, NODE_ENV: mode }, ...(!isDev && { logFile: workerLog }) });

  doing = `runs at ${address}`;
  const accounts = external ? [] : demoAccountLines(accountsFile);
  console.log(["", `Planeward ${doing}`, "", ...accounts, ...(accounts.length ? [""] : [])].join("\n"));

  // A server of sources ends with what is wrong with them, a database may not be well; everything else is started again.
  const lasting = [sources, database.server].filter((child) => child !== undefined);
  await Promise.race([keeper.whenStopping, ...lasting.map(ended)]);
  if (keeper.stopping) return 0;
  if (sources && hasEnded(sources)) throw new Sentence("The server has ended by itself.");
  throw new Sentence("The database server has ended by itself.", lastLinesOf(databaseLog));
}

try {
  const checked = await check();
  await runCommand(join(ownFolder, `run-${process.pid}.json`), (keeper) => run(keeper, checked));
} catch (error) {
  printFailure(error);
  process.exitCode = 1;
}
