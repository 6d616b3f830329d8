import { randomUUID } from "node:crypto";
import { inScope } from "#app/server/scope.server.ts";

/**
 * Gives back to the queue what workers held that are no longer there, and parks with its reason what has used up its attempts that
 * way. A worker that lives has a session under its name.
 */
export async function freeLostJobs(): Promise<void> {
  await inScope({ personId: null, atWork: true, requestId: randomUUID() }, async (em) => {
    // One that has just begun may not have given its session a name yet.
    await em.execute(
      `select graphile_worker.force_unlock_workers(array(
         select distinct locked_by from graphile_worker.jobs
          where locked_at < now() - interval '5 seconds'
            and locked_by not in (select application_name from pg_stat_activity where datname = current_database())))`,
    );
    await em.execute(
      `update job set state = 'failed', ended_at = now(), sentence = ?
        where state in ('waiting', 'running')
          and not exists (select from graphile_worker.jobs queued
                           where queued.key = job.id::text
                             and (queued.attempts < queued.max_attempts or queued.locked_at is not null))`,
      ["The process that did this ended in the middle of it several times."],
    );
  });
}
