import { environment } from "#app/server/environment.server.ts";
import { isKept } from "./fake/kept-mail.ts";
import { smtpTransport } from "./smtp.server.ts";
import type { MailTransport } from "./transport.ts";

/** The mail server that the environment names, or null where it names none: then nothing is sent, and all of it waits. */
export function configuredTransport(): MailTransport | null {
  const { SMTP_URL, MAIL_FROM, DEMO_MAIL_FOLDER } = environment;
  if (SMTP_URL === undefined || MAIL_FROM === undefined) return null;
  const settings = { url: SMTP_URL, from: MAIL_FROM };
  return DEMO_MAIL_FOLDER === undefined
    ? smtpTransport(settings)
    : smtpTransport(settings, (messageId) => isKept(DEMO_MAIL_FOLDER, messageId));
}
