import type { AccountMail } from "#app/lib/account-mail.ts";
import type { AnnouncementKind } from "./announcement.ts";

/**
 * How far a mail is. 'digest' waits for the day's digest, 'in digest' went with it; 'sending' is written before the mail server is
 * talked to; 'parked' needs somebody to look at it; 'dropped' is no longer for its recipient.
 */
export const MAIL_STATES = ["waiting", "sending", "sent", "parked", "digest", "in digest", "dropped"] as const;
export type MailState = (typeof MAIL_STATES)[number];

/** A mail as those see it who look after the outbox: to whom, of what and how far, and nothing of its text. */
export interface OutboxRow {
  id: string;
  kind: AnnouncementKind | AccountMail | "digest";
  /** null for a digest, which is of all the programs of its recipient, and for mail about an account */
  program: string | null;
  to: string;
  email: string;
  state: MailState;
  attempts: number;
  reason: string;
  /** ISO */
  createdAt: string;
  nextTryAt: string;
  sentAt: string | null;
}
