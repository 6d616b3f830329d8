import { randomUUID } from "node:crypto";
import type { EntityManager } from "@mikro-orm/postgresql";
import type { AccountMail } from "#app/lib/account-mail.ts";
import { messageIdFor } from "./message-id.server.ts";
import { queueMail } from "./queue-mail.server.ts";

interface NewAccountMail {
  kind: AccountMail;
  person: string;
  /** id of the token whose link it carries; of a notice any new id */
  key: string;
  /** where it goes, if not to the person's own address */
  address?: string;
  /** who caused it; null at the door */
  by: string | null;
}

/**
 * Writes a mail about an account into the outbox, in the caller's transaction. It holds the id of a token and never a secret: the outbox is
 * read by administrators, kept for good and backed up. The worker makes the secret of the link when it writes the mail.
 */
export async function mailAccount(
  em: EntityManager,
  { kind, person, key, address, by }: NewAccountMail,
): Promise<void> {
  await em.flush();
  const id = randomUUID();
  const now = new Date();
  // Nothing is returned: who writes it may not read the outbox.
  await em.execute(
    `insert into mail_outbox (id, person_id, kind, key, address, state, message_id, attempts, next_try_at, reason, created_at, created_by_id)
       values (?, ?, ?, ?, ?, 'waiting', ?, 0, ?, '', ?, ?)`,
    [id, person, kind, key, address ?? null, messageIdFor(id), now, now, by],
  );
  await queueMail(em, id, now);
}
