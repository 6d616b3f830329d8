import { randomUUID } from "node:crypto";
import { Session } from "#app/db/entities/session.ts";
import type { OwnSession } from "#app/schemas/own-account.ts";
import { problem } from "#app/server/problem.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { mailAccount } from "../mail/mail-account.server.ts";
import { ABSOLUTE_LIFETIME, IDLE_LIFETIME } from "../sessions.server.ts";
import { idFrom } from "../uuid.server.ts";
import { passwordFault } from "./password-fault.server.ts";
import { ownPasswordFault, requireRecentProof } from "./recent-proof.server.ts";
import { storePassword } from "./set-password.server.ts";
import { endTokens } from "./tokens.server.ts";

const HOUR = 3600e3;
/** Hours after which a session ends: without use, and whatever happens. */
export const SESSION_HOURS = { idle: IDLE_LIFETIME / HOUR, absolute: ABSOLUTE_LIFETIME / HOUR };

/** The person's own sessions that still run, the one that asks first, then by when they were last used. */
export function ownSessions({ actor, session, ...rest }: ActorScope): Promise<OwnSession[]> {
  return inScope({ actor, ...rest }, async (em) => {
    const now = Date.now();
    const found = await em.find(
      Session,
      { person: actor.id, expiresAt: { $gt: new Date(now) }, lastSeenAt: { $gt: new Date(now - IDLE_LIFETIME) } },
      { orderBy: { lastSeenAt: "desc", id: "asc" } },
    );
    return found
      .map(({ id, userAgent, createdAt, lastSeenAt }) => ({
        id,
        userAgent,
        createdAt: createdAt.toISOString(),
        lastSeenAt: lastSeenAt.toISOString(),
        isThis: id === session?.id,
      }))
      .toSorted((a, b) => Number(b.isThis) - Number(a.isThis));
  });
}

/**
 * Ends one of the person's own sessions; another's looks as if it had ended, and one that has is no error.
 * @throws 403 without a recent proof: whoever finds a session open must not shut its owner out
 */
export async function endOwnSession(scope: ActorScope, id: string | undefined): Promise<void> {
  requireRecentProof(scope);
  await inScope(scope, (em) => em.nativeDelete(Session, { id: idFrom(id, "session"), person: scope.actor.id }));
}

/** What was wrong with a change of the password, by field; null when it is done. */
type Faults = { current: string } | { password: string } | null;

/**
 * Changes the person's own password. Every session but the one that asks ends, so do links that are on their way, and a mail tells.
 * @throws 403 for who asks without a session, such as by a token
 */
export async function changePassword(
  scope: ActorScope,
  { current, password }: { current: string; password: string },
): Promise<Faults> {
  const { actor, session, requestId } = scope;
  if (!session) throw problem(403, "This is done in a browser, by somebody who is signed in.");
  const unproven = await ownPasswordFault(scope, current);
  if (unproven !== null) return { current: unproven };
  const fault = await passwordFault(password, actor);
  if (fault !== null) return { password: fault };
  await inScope({ personId: actor.id, atTheDoor: true, requestId }, async (em) => {
    await storePassword(em, actor.id, password);
    await endTokens(em, actor.id);
    await em.nativeDelete(Session, { person: actor.id, id: { $ne: session.id } });
    await mailAccount(em, { kind: "password changed", person: actor.id, key: randomUUID(), by: actor.id });
  });
  return null;
}
