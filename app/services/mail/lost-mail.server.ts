import { randomUUID } from "node:crypto";
import { inScope } from "#app/server/scope.server.ts";
import { queueMail } from "./queue-mail.server.ts";

/** At most this many are put back at a time; the next look takes more. */
const AT_A_TIME = 500;

/**
 * Puts back into the queue what waits in the outbox and is in no queue: what was written while no mail server was named, and what
 * several workers died over. An attempt that somebody is at is left to its lease.
 */
export async function queueLostMail(): Promise<void> {
  await inScope({ personId: null, atWork: true, requestId: randomUUID() }, async (em) => {
    const lost = await em.execute<{ id: string }[]>(
      `select m.id from mail_outbox m
        where m.state in ('waiting', 'sending') and coalesce(m.lease_until, m.next_try_at) < now() - interval '20 seconds'
          and not exists (select from graphile_worker.jobs queued
                           where queued.key = 'mail ' || m.id
                             and (queued.attempts < queued.max_attempts or queued.locked_at is not null))
        order by m.created_at limit ${AT_A_TIME}`,
    );
    for (const { id } of lost) await queueMail(em, id, new Date());
  });
}
