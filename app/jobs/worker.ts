import { EventEmitter } from "node:events";
import { Logger, parseCronItems, run, type Runner, type RunnerOptions, type WorkerEvents } from "graphile-worker";
import { QUEUE_SCHEMA } from "#app/db/queue-schema.ts";
import { closeOrm } from "#app/db/orm.server.ts";
import { configuredTransport } from "#app/integrations/mail/configured.server.ts";
import { environment } from "#app/server/environment.server.ts";
import { log } from "#app/server/log.server.ts";
import { announceOutOfDate } from "#app/services/assessments/announce-out-of-date.server.ts";
import { sealAudit } from "#app/services/audit/seal.server.ts";
import { JOB_TASK } from "#app/services/jobs/enqueue.server.ts";
import { freeLostJobs } from "#app/services/jobs/lost-jobs.server.ts";
import { runJob } from "#app/services/jobs/run-job.server.ts";
import { queueLostMail } from "#app/services/mail/lost-mail.server.ts";
import { makeDigests } from "#app/services/mail/make-digests.server.ts";
import { postWebhook } from "#app/integrations/webhook/configured.server.ts";
import { MAIL_TASK } from "#app/services/mail/queue-mail.server.ts";
import { sendMail } from "#app/services/mail/send-mail.server.ts";
import { forgetOldPrints } from "#app/services/sheets/print-retention.server.ts";
import { forgetOldDeliveries, queueLostDeliveries } from "#app/services/webhooks/lost-deliveries.server.ts";
import { DELIVERY_TASK } from "#app/services/webhooks/queue-delivery.server.ts";
import { sendDelivery } from "#app/services/webhooks/send-delivery.server.ts";

/** How often the jobs of workers that were killed are looked for, milliseconds. */
const LOOK_AGAIN = 10_000;
/** A job under way that does not end by itself puts itself back after this long, milliseconds. */
const LONGEST_WAIT = 3_000;
/** A digest whose hour passed while no worker ran is made when one comes back within this long, milliseconds. */
const LATEST_DIGEST = 20 * 60 * 60_000;

const transport = configuredTransport();
const LEVELS = { error: "error", warning: "warn", info: "info", debug: "debug" } as const;

/** Works off some kinds of task, `concurrency` at a time. */
function worker(options: Pick<RunnerOptions, "taskList" | "concurrency" | "parsedCronItems">): Promise<Runner> {
  const events = new EventEmitter() as WorkerEvents;
  // A worker is known to be alive by the session that listens for jobs, which goes when its process goes.
  events.on("pool:listen:success", ({ workerPool, client }) => {
    client.once("drain", () => {
      client
        .query("select set_config('application_name', $1, false)", [workerPool.id])
        .catch((error: unknown) => log.error({ error: String(error) }, "the worker could not say that it is alive"));
    });
  });
  return run({
    connectionString: environment.DATABASE_URL,
    schema: QUEUE_SCHEMA,
    events,
    maxPoolSize: 4,
    gracefulShutdownAbortTimeout: LONGEST_WAIT,
    noHandleSignals: true,
    logger: new Logger(() => (level, message) => log[LEVELS[level]](message)),
    ...options,
  });
}

/**
 * The process that works jobs off, one after the other; as many as are started share them. It connects as the plain role and does each
 * job as the person who asked for it. Mail is sent beside them, so that it does not wait for a file of a million lines.
 */
const jobs = await worker({
  concurrency: 1,
  parsedCronItems: [],
  taskList: {
    [JOB_TASK]: (payload, { job, abortSignal }) =>
      runJob(payload, { isLastAttempt: job.attempts >= job.max_attempts, signal: abortSignal }),
  },
});
const mail = await worker({
  concurrency: 3,
  parsedCronItems: parseCronItems([
    {
      task: "digests",
      match: `0 ${environment.MAIL_DIGEST_HOUR} * * *`,
      options: { backfillPeriod: LATEST_DIGEST },
    },
    { task: "out of date", match: "*/5 * * * *" },
    { task: "old prints", match: "30 3 * * *" },
    { task: "old deliveries", match: "40 3 * * *" },
    { task: "seals", match: "* * * * *" },
  ]),
  taskList: {
    [MAIL_TASK]: (payload) => sendMail(payload, transport),
    digests: () => makeDigests(new Date().toISOString().slice(0, 10)),
    "out of date": () => announceOutOfDate(),
    seals: async () => void (await sealAudit()),
    "old prints": async () => void (await forgetOldPrints()),
    "old deliveries": async () => void (await forgetOldDeliveries()),
  },
});
/** Beside mail, so that receivers that do not answer keep no mail waiting. */
const webhooks = await worker({
  concurrency: 4,
  parsedCronItems: [],
  taskList: { [DELIVERY_TASK]: (payload) => sendDelivery(payload, postWebhook) },
});
const runners = [jobs, mail, webhooks];
if (!transport) log.warn("no mail server is named by SMTP_URL, so mail waits in the outbox");

const look = async () => {
  try {
    await freeLostJobs();
    if (transport) await queueLostMail();
    await queueLostDeliveries();
  } catch (error) {
    log.error({ error: String(error) }, "lost jobs could not be looked for");
  }
};
await look();
const looking = setInterval(() => void look(), LOOK_AGAIN);

for (const signal of ["SIGTERM", "SIGINT"] as const)
  process.once(signal, () => {
    log.info({ signal }, "the worker is stopping");
    // One that is stopping already is on its way.
    for (const runner of runners) runner.stop().catch(() => undefined);
  });

try {
  const ends = runners.map(({ promise }) => promise);
  await Promise.race(ends);
  await Promise.all(ends);
} catch (error) {
  log.error({ error: String(error) }, "the worker has ended by itself");
  process.exitCode = 1;
} finally {
  clearInterval(looking);
  await closeOrm();
}
process.exit();
