import { randomUUID } from "node:crypto";
import { inScope } from "#app/server/scope.server.ts";
import { messageIdFor } from "./message-id.server.ts";
import { queueMail } from "./queue-mail.server.ts";

/**
 * Makes the digests of a day: one mail for each person for whom something waits, each in a transaction with what goes into it. A
 * second run on the same day makes none: what has come since waits for the next.
 * @param day such as 2026-12-02
 */
export async function makeDigests(day: string): Promise<void> {
  const work = { personId: null, atWork: true, requestId: randomUUID() };
  const people = await inScope(work, (em) =>
    em.execute<{ person_id: string }[]>("select distinct person_id from mail_outbox where state = 'digest'"),
  );
  for (const { person_id: person } of people)
    await inScope(work, async (em) => {
      const id = randomUUID();
      const made = await em.execute<{ id: string }[]>(
        `insert into mail_outbox (id, person_id, kind, key, state, message_id, attempts, next_try_at, reason, created_at)
           values (?, ?, 'digest', ?, 'waiting', ?, 0, now(), '', now()) on conflict do nothing returning id`,
        [id, person, day, messageIdFor(id)],
      );
      if (made.length === 0) return;
      await em.execute(
        "update mail_outbox set state = 'in digest', digest_id = ? where person_id = ? and state = 'digest'",
        [id, person],
      );
      await queueMail(em, id, new Date());
    });
}
