/**
 * How far a mail is. 'digest' waits for the day's digest, 'in digest' went with it; 'sending' is written before the mail server is
 * talked to; 'parked' needs somebody to look at it; 'dropped' is no longer for its recipient.
 */
export const MAIL_STATES = ["waiting", "sending", "sent", "parked", "digest", "in digest", "dropped"] as const;
export type MailState = (typeof MAIL_STATES)[number];
