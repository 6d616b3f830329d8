import { randomBytes, randomUUID } from "node:crypto";
import { readFile } from "node:fs/promises";
import type { EntityManager } from "@mikro-orm/postgresql";
import type { MailOutbox } from "#app/db/entities/mail-outbox.ts";
import type { OutgoingMail } from "#app/integrations/mail/transport.ts";
import { isAccountMail, type AccountMail } from "#app/lib/account-mail.ts";
import { KINDS_OF_MAIL } from "#app/lib/mail/mail-choices.ts";
import { oneLine } from "#app/lib/mail/one-line.ts";
import { mayInProgram } from "#app/policies/permissions.ts";
import type { Actor } from "#app/policies/roles.ts";
import type { Announcement } from "#app/schemas/announcement.ts";
import { environment } from "#app/server/environment.server.ts";
import { inScope, type Scope } from "#app/server/scope.server.ts";
import { actorById } from "../actor.server.ts";
import { composeAccountMail } from "./compose-account-mail.server.ts";
import { letterHtml, MARK_CID } from "./letter-html.ts";
import { letterText } from "./letter-text.ts";
import type { Letter } from "./letter.ts";
import { announcementLetter, digestLetter, unsubscribeAddress } from "./write-letter.ts";

/** A mail to be sent, or why it is no longer for its recipient. */
type Composed = { mail: OutgoingMail } | { dropped: string };

const markFile = new URL("../../../public/icon-72.png", import.meta.url);

/**
 * Writes a mail of the outbox to its recipient as they stand now: who has left the program or the site since gets nothing of it.
 */
export async function composeMail(work: Scope, row: MailOutbox): Promise<Composed> {
  if (isAccountMail(row.kind)) return composeAccount(work, { ...row, kind: row.kind });
  const actor = await actorById(row.person.id, work.requestId);
  if (!actor) return { dropped: "The recipient's account is not in use any more." };
  const { announcements, unsubscribeToken } = await inScope(work, async (em) => ({
    announcements: await announcementsOf(em, row, actor),
    unsubscribeToken: await tokenOf(em, actor.id),
  }));
  const [first] = announcements;
  if (!first) return { dropped: "The recipient may not see what it tells any more." };
  const written = { address: environment.PUBLIC_ADDRESS ?? "", unsubscribeToken };
  const isDigest = row.kind === "digest";
  const letter: Letter = isDigest ? digestLetter(announcements, written) : announcementLetter(first, written);
  const mayStop = isDigest || !KINDS_OF_MAIL[first.kind].essential;
  return {
    mail: {
      messageId: row.messageId,
      to: { name: oneLine(actor.name), address: actor.email },
      subject: letter.subject,
      text: letterText(letter),
      html: letterHtml(letter),
      pictures: [{ cid: MARK_CID, fileName: "planeward.png", content: await readFile(markFile) }],
      unsubscribe: mayStop ? unsubscribeAddress(written, isDigest ? "digest" : first.kind) : null,
      sentAt: new Date(),
    },
  };
}

async function composeAccount(work: Scope, row: MailOutbox & { kind: AccountMail }): Promise<Composed> {
  const composed = await composeAccountMail(work, row);
  if ("dropped" in composed) return composed;
  const { letter, to } = composed;
  return {
    mail: {
      messageId: row.messageId,
      to: { name: oneLine(to.name), address: to.address },
      subject: letter.subject,
      text: letterText(letter),
      html: letterHtml(letter),
      pictures: [{ cid: MARK_CID, fileName: "planeward.png", content: await readFile(markFile) }],
      unsubscribe: null,
      sentAt: new Date(),
    },
  };
}

interface Told {
  program_id: string;
  announcement: Announcement;
}

/** What the mail tells, the oldest first, without what its recipient may not see now. */
async function announcementsOf(em: EntityManager, row: MailOutbox, actor: Actor): Promise<Announcement[]> {
  const told = await em.execute<Told[]>(
    `select program_id, announcement from mail_outbox
      where ${row.kind === "digest" ? "digest_id" : "id"} = ? and announcement is not null order by created_at, id`,
    [row.id],
  );
  return told
    .filter(({ program_id, announcement }) => mayInProgram(actor, KINDS_OF_MAIL[announcement.kind].readers, program_id))
    .map(({ announcement }) => announcement);
}

/** What opens the choices of a person from a mail; made with their first. */
async function tokenOf(em: EntityManager, personId: string): Promise<string> {
  await em.execute(
    `insert into mail_choice (id, person_id, value, unsubscribe_token, at) values (?, ?, '{}', ?, now()) on conflict do nothing`,
    [randomUUID(), personId, randomBytes(32).toString("base64url")],
  );
  const [row] = await em.execute<{ unsubscribe_token: string }[]>(
    "select unsubscribe_token from mail_choice where person_id = ?",
    [personId],
  );
  if (!row) throw new Error("a person has no choices of mail");
  return row.unsubscribe_token;
}
