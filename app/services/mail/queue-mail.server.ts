import type { EntityManager } from "@mikro-orm/postgresql";

/** The queue's name for sending one mail; the payload is the id of its row. */
export const MAIL_TASK = "mail";
/** What the queue itself counts is only a worker that died over it: attempts at the mail server are counted in the row. */
const MOST_DEATHS = 25;

/** Has a mail sent from then on; a worker hears of it when the caller's transaction ends. */
export async function queueMail(em: EntityManager, id: string, at: Date): Promise<void> {
  await em.execute(
    `select graphile_worker.add_job(?, json_build_object('id', ?::text), run_at := ?::timestamptz, max_attempts := ?, job_key := ?)`,
    [MAIL_TASK, id, at, MOST_DEATHS, `mail ${id}`],
  );
}
