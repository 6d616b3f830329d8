import type { MailTransport, OutgoingMail } from "#app/integrations/mail/transport.ts";
import { asOwner, type TestDatabase } from "#tests/db/test-database.ts";

/** Sends what waits in the outbox, as the worker does, and gives what went out. */
export async function sendWaitingMail(database: TestDatabase): Promise<OutgoingMail[]> {
  const { sendMail } = await import("#app/services/mail/send-mail.server.ts");
  const sent: OutgoingMail[] = [];
  const transport: MailTransport = {
    send: (mail) => {
      sent.push(mail);
      return Promise.resolve({ outcome: "accepted" });
    },
    has: () => Promise.resolve(false),
  };
  const waiting = await asOwner<{ id: string }>(
    database,
    "select id from mail_outbox where state = 'waiting' order by created_at, id",
  );
  for (const { id } of waiting) await sendMail({ id }, transport);
  return sent;
}

/** The secret of the link in a mail. */
export function secretIn(mail: OutgoingMail | undefined): string {
  const [, secret = ""] = /\/(?:set-password|confirm-address)\/([\w-]+)/.exec(mail?.text ?? "") ?? [];
  return secret;
}
