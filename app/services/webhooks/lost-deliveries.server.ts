import { randomUUID } from "node:crypto";
import { WebhookDelivery } from "#app/db/entities/webhook-delivery.ts";
import { log } from "#app/server/log.server.ts";
import { inScope, type Scope } from "#app/server/scope.server.ts";
import { queueDelivery } from "./queue-delivery.server.ts";

/** At most this many are put back at a time; the next look takes more. */
const AT_A_TIME = 500;
/** How long the log of deliveries is kept, milliseconds. */
const KEPT_FOR = 30 * 24 * 3600e3;

const atWork = (): Scope => ({ personId: null, atWork: true, requestId: randomUUID() });

/** Puts back into the queue what waits and is in no queue, such as what several workers died over. */
export async function queueLostDeliveries(): Promise<void> {
  await inScope(atWork(), async (em) => {
    const lost = await em.execute<{ id: string; webhook_id: string }[]>(
      `select d.id, d.webhook_id from webhook_delivery d
        where d.state in ('waiting', 'sending') and coalesce(d.lease_until, d.next_try_at) < now() - interval '20 seconds'
          and not exists (select from graphile_worker.jobs queued
                           where queued.key = 'webhook ' || d.id
                             and (queued.attempts < queued.max_attempts or queued.locked_at is not null))
        order by d.created_at limit ${AT_A_TIME}`,
    );
    for (const { id, webhook_id } of lost) await queueDelivery(em, id, webhook_id, new Date());
  });
}

/** Takes out what was sent or given up longer ago than the log goes back. */
export async function forgetOldDeliveries(): Promise<number> {
  const gone = await inScope(atWork(), (em) =>
    em.nativeDelete(WebhookDelivery, {
      state: { $in: ["sent", "parked"] },
      createdAt: { $lt: new Date(Date.now() - KEPT_FOR) },
    }),
  );
  if (gone > 0) log.info({ gone }, "deliveries of webhooks beyond their retention were taken out");
  return gone;
}
