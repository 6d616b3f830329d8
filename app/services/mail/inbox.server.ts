import { readKept, type KeptMail } from "#app/integrations/mail/fake/kept-mail.ts";
import { environment } from "#app/server/environment.server.ts";
import { notFound, problem } from "#app/server/problem.server.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import type { InboxRow } from "#app/schemas/inbox.ts";

/** Whether this copy has a mail server of its own, whose mail can be read here. */
export const hasInbox = (): boolean => environment.DEMO_MAIL_FOLDER !== undefined;

/**
 * What the demo's own mail server took for the person who asks, the newest first; nobody reads another's mail.
 * @throws 404 where mail goes to a real server
 */
export async function listInbox(scope: ActorScope): Promise<InboxRow[]> {
  const mails = await ownMail(scope);
  return mails.map(({ id, subject, arrivedAt }) => ({ id, subject, arrivedAt }));
}

/** @throws 404 for a mail that is not there, or is to somebody else */
export async function getMail(scope: ActorScope, id: string): Promise<KeptMail> {
  const mail = (await ownMail(scope)).find((each) => each.id === id);
  if (!mail) throw notFound("mail");
  return mail;
}

async function ownMail({ actor }: ActorScope): Promise<KeptMail[]> {
  const { DEMO_MAIL_FOLDER } = environment;
  if (DEMO_MAIL_FOLDER === undefined)
    throw problem(404, "There is no inbox here: mail goes to the site’s own mail server.");
  const mails = await readKept(DEMO_MAIL_FOLDER);
  return mails.filter(({ to }) => to.some((address) => address.toLowerCase() === actor.email.toLowerCase()));
}
