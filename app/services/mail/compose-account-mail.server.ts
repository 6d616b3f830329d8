import { randomBytes } from "node:crypto";
import type { MailOutbox } from "#app/db/entities/mail-outbox.ts";
import { PersonToken } from "#app/db/entities/person-token.ts";
import { Person } from "#app/db/entities/person.ts";
import { TOKEN_PURPOSES, type AccountMail } from "#app/lib/account-mail.ts";
import { environment } from "#app/server/environment.server.ts";
import { inScope, type Scope } from "#app/server/scope.server.ts";
import { secretDigest } from "#app/server/secret-digest.server.ts";
import { accountLetter } from "./account-letter.ts";
import type { Letter } from "./letter.ts";

/** A letter about an account and where it goes, or why it is not sent any more. */
export type ComposedAccountMail = { letter: Letter; to: { name: string; address: string } } | { dropped: string };

/**
 * Writes a mail about an account. Its link has a secret that is made here and kept as a SHA-256 beside those of earlier attempts: a
 * mail whose arrival nobody can tell may have arrived, and its link works as well.
 */
export async function composeAccountMail(
  work: Scope,
  { kind, key, person: { id: personId }, address }: MailOutbox & { kind: AccountMail },
): Promise<ComposedAccountMail> {
  const person = await inScope({ personId: null, atTheDoor: true, requestId: work.requestId }, (em) =>
    em.findOne(Person, { id: personId }),
  );
  if (!person) return { dropped: "The account is gone." };
  const to = { name: person.name, address: address ?? person.email };
  const site = environment.PUBLIC_ADDRESS ?? "";
  if (!TOKEN_PURPOSES.some((purpose) => purpose === kind)) {
    if (!person.active) return { dropped: "The recipient's account is not in use any more." };
    return { letter: accountLetter(kind, { site, secret: "", name: person.name }), to };
  }
  const secret = randomBytes(32).toString("base64url");
  const isOpen = await inScope(work, async (em) => {
    const token = await em.findOne(PersonToken, { id: key, endedAt: null, expiresAt: { $gt: new Date() } });
    if (!token) return false;
    await em.execute("update person_token set secret_hashes = secret_hashes || ?::text where id = ?", [
      secretDigest(secret),
      token.id,
    ]);
    return true;
  });
  if (!isOpen) return { dropped: "Its link was used, replaced, or had run out before it could be sent." };
  return { letter: accountLetter(kind, { site, secret, name: person.name }), to };
}
