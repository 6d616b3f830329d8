import type { EntityManager } from "@mikro-orm/postgresql";

/** The queue's name for sending one delivery; the payload is the id of its row. */
export const DELIVERY_TASK = "webhook";
/** What the queue itself counts is only a worker that died over it: attempts are counted in the row. */
const MOST_DEATHS = 25;

/** Has a delivery sent from then on. Those of one webhook go one at a time, so that a slow receiver keeps nobody else waiting. */
export async function queueDelivery(em: EntityManager, id: string, webhookId: string, at: Date): Promise<void> {
  await em.execute(
    `select graphile_worker.add_job(?, json_build_object('id', ?::text), queue_name := ?, run_at := ?::timestamptz,
                                    max_attempts := ?, job_key := ?)`,
    [DELIVERY_TASK, id, `webhook ${webhookId}`, at, MOST_DEATHS, `webhook ${id}`],
  );
}
