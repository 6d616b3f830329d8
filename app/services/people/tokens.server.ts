import { randomUUID } from "node:crypto";
import type { EntityManager } from "@mikro-orm/postgresql";
import { PersonToken } from "#app/db/entities/person-token.ts";
import { TOKEN_LIFETIME, type TokenPurpose } from "#app/lib/account-mail.ts";
import { secretDigest } from "#app/server/secret-digest.server.ts";
import { mailAccount } from "../mail/mail-account.server.ts";

/**
 * Has a link mailed to a person, in the caller's transaction; an earlier one for the same purpose works no more.
 * @param address where it goes: the person's own, or the one to be confirmed
 * @param by who caused it; null at the door
 */
export async function mailLink(
  em: EntityManager,
  { purpose, person, address, by }: { purpose: TokenPurpose; person: string; address: string; by: string | null },
): Promise<void> {
  const now = new Date();
  await em.nativeUpdate(PersonToken, { person, purpose, endedAt: null }, { endedAt: now });
  const id = randomUUID();
  em.create(PersonToken, {
    id,
    person,
    purpose,
    address,
    secretHashes: [],
    createdAt: now,
    expiresAt: new Date(now.getTime() + TOKEN_LIFETIME[purpose]),
    endedAt: null,
  });
  await mailAccount(em, { kind: purpose, person, key: id, address, by });
}

/** The token that the secret of a link opens, locked until the caller's transaction ends; null when it is not good (any more). */
export async function openToken(em: EntityManager, secret: string, purposes: readonly TokenPurpose[]) {
  const [row] = await em.execute<{ id: string }[]>(
    `select id from person_token where secret_hashes @> array[?]::text[] and ended_at is null and expires_at > ? for update`,
    [secretDigest(secret), new Date()],
  );
  const token = row && (await em.findOne(PersonToken, { id: row.id }, { populate: ["person"] }));
  if (!token || !purposes.includes(token.purpose)) return null;
  // Of somebody who was deactivated since, nothing works; who is invited is not active yet.
  const good = token.purpose === "invitation" ? !!token.person.invitedAt : token.person.active;
  return good ? token : null;
}

/** Puts every link of a person out of use. */
export async function endTokens(em: EntityManager, person: string): Promise<void> {
  await em.nativeUpdate(PersonToken, { person, endedAt: null }, { endedAt: new Date() });
}
