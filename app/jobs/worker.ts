import { EventEmitter } from "node:events";
import { Logger, run, type WorkerEvents } from "graphile-worker";
import { QUEUE_SCHEMA } from "#app/db/queue-schema.ts";
import { closeOrm } from "#app/db/orm.server.ts";
import { environment } from "#app/server/environment.server.ts";
import { log } from "#app/server/log.server.ts";
import { JOB_TASK } from "#app/services/jobs/enqueue.server.ts";
import { freeLostJobs } from "#app/services/jobs/lost-jobs.server.ts";
import { runJob } from "#app/services/jobs/run-job.server.ts";

/** How often the jobs of workers that were killed are looked for, milliseconds. */
const LOOK_AGAIN = 10_000;
/** A job under way that does not end by itself puts itself back after this long, milliseconds. */
const LONGEST_WAIT = 3_000;

/**
 * The process that works jobs off, one after the other; as many as are started share them. It connects as the plain role and does each
 * job as the person who asked for it.
 */
const events = new EventEmitter() as WorkerEvents;
// A worker is known to be alive by the session that listens for jobs, which goes when its process goes.
events.on("pool:listen:success", ({ workerPool, client }) => {
  client.once("drain", () => {
    client
      .query("select set_config('application_name', $1, false)", [workerPool.id])
      .catch((error: unknown) => log.error({ error: String(error) }, "the worker could not say that it is alive"));
  });
});

const LEVELS = { error: "error", warning: "warn", info: "info", debug: "debug" } as const;

const runner = await run({
  connectionString: environment.DATABASE_URL,
  schema: QUEUE_SCHEMA,
  events,
  concurrency: 1,
  maxPoolSize: 4,
  gracefulShutdownAbortTimeout: LONGEST_WAIT,
  noHandleSignals: true,
  parsedCronItems: [],
  logger: new Logger(() => (level, message) => log[LEVELS[level]](message)),
  taskList: {
    [JOB_TASK]: (payload, { job, abortSignal }) =>
      runJob(payload, { isLastAttempt: job.attempts >= job.max_attempts, signal: abortSignal }),
  },
});

const look = () =>
  freeLostJobs().catch((error: unknown) => log.error({ error: String(error) }, "lost jobs could not be looked for"));
await look();
const looking = setInterval(() => void look(), LOOK_AGAIN);

for (const signal of ["SIGTERM", "SIGINT"] as const)
  process.once(signal, () => {
    log.info({ signal }, "the worker is stopping");
    // One that is stopping already is on its way.
    runner.stop().catch(() => undefined);
  });

try {
  await runner.promise;
} catch (error) {
  log.error({ error: String(error) }, "the worker has ended by itself");
  process.exitCode = 1;
} finally {
  clearInterval(looking);
  await closeOrm();
}
process.exit();
