import { randomUUID } from "node:crypto";
import type { EntityManager } from "@mikro-orm/postgresql";
import type { DeliveredEvent } from "#app/schemas/webhook.ts";
import { queueDelivery } from "./queue-delivery.server.ts";

interface NewDelivery {
  program: string;
  webhook: string;
  event: DeliveredEvent;
  key: string;
  eventId: string;
  about: string;
  body: string;
  by: string | null;
}

/** Writes what an event tells one webhook, and has it sent once the caller's transaction has ended. The same is told once. */
export async function writeDelivery(em: EntityManager, delivery: NewDelivery): Promise<void> {
  const { program, webhook, event, key, eventId, about, body, by } = delivery;
  const id = randomUUID();
  const now = new Date();
  // No conflict is named, and nothing returned: whoever does something may not read what others are told of it.
  await em.execute(
    `insert into webhook_delivery (id, program_id, webhook_id, event, key, event_id, about, body, state, attempts, tries, next_try_at,
                                   reason, created_at, created_by_id, by_hand)
       values (?, ?, ?, ?, ?, ?, ?, ?, 'waiting', 0, '[]', ?, '', ?, ?, false) on conflict do nothing`,
    [id, program, webhook, event, key, eventId, about, body, now, now, by],
  );
  await queueDelivery(em, id, webhook, now);
}
