import { randomBytes, randomUUID } from "node:crypto";
import { Person } from "#app/db/entities/person.ts";
import { Session } from "#app/db/entities/session.ts";
import type { Actor } from "#app/policies/roles.ts";
import { inScope, type SessionOfScope } from "#app/server/scope.server.ts";
import { secretDigest } from "#app/server/secret-digest.server.ts";
import { actorOf } from "./actor.server.ts";
import { codesStateOf } from "./codes/codes-state.server.ts";

const MINUTE = 60_000;
/** A session ends after this long without use, and after this long whatever happens. */
export const IDLE_LIFETIME = 8 * 60 * MINUTE;
export const ABSOLUTE_LIFETIME = 24 * 60 * MINUTE;
/** A token in use is replaced after this long; the old one stays good for requests already on their way. */
const ROTATE_AFTER = 15 * MINUTE;
const OLD_TOKEN_GRACE = MINUTE;
/** A person may have so many at once; where one more begins, the one that was used least lately ends. */
export const MOST_SESSIONS = 50;
/** `lastSeenAt` is written at most this often, so that reading pages does not write. */
const NOTE_USE_AFTER = MINUTE;

const newToken = () => randomBytes(32).toString("base64url");

/** A session just made: the token for the cookie, and when it ends at the latest. */
export interface StartedSession {
  token: string;
  expiresAt: Date;
}

/** Starts a session for somebody who has just proved who they are. */
export async function startSession(personId: string, userAgent: string, requestId: string): Promise<StartedSession> {
  return inScope({ personId, atTheDoor: true, requestId }, async (em) => {
    const now = new Date();
    const token = newToken();
    const expiresAt = new Date(now.getTime() + ABSOLUTE_LIFETIME);
    em.create(Session, {
      id: randomUUID(),
      person: personId,
      tokenHash: secretDigest(token),
      previousTokenHash: null,
      rotatedAt: now,
      createdAt: now,
      lastSeenAt: now,
      expiresAt,
      provenAt: now,
      userAgent: userAgent.slice(0, 200),
    });
    await em.flush();
    const beyond = await em.find(
      Session,
      { person: personId },
      { fields: ["id"], orderBy: { lastSeenAt: "desc", createdAt: "desc", id: "asc" }, offset: MOST_SESSIONS },
    );
    if (beyond.length > 0) await em.nativeDelete(Session, { id: { $in: beyond.map(({ id }) => id) } });
    await em.nativeUpdate(Person, { id: personId }, { lastSignInAt: now });
    return { token, expiresAt };
  });
}

/** Who a token belongs to, and the token to use from now on when it was replaced. Null when it is not good any more. */
export async function resumeSession(
  token: string,
  requestId: string,
): Promise<{ actor: Actor; session: SessionOfScope; renewed: StartedSession | null } | null> {
  return inScope({ personId: null, atTheDoor: true, requestId }, async (em) => {
    const hash = secretDigest(token);
    const session = await em.findOne(
      Session,
      { $or: [{ tokenHash: hash }, { previousTokenHash: hash }] },
      { populate: ["person"] },
    );
    const now = Date.now();
    if (!session || !session.person.active || session.expiresAt.getTime() <= now) return null;
    if (session.lastSeenAt.getTime() + IDLE_LIFETIME <= now) return null;
    const current = session.tokenHash === hash;
    if (!current && session.rotatedAt.getTime() + OLD_TOKEN_GRACE <= now) return null;

    let renewed: StartedSession | null = null;
    if (current && session.rotatedAt.getTime() + ROTATE_AFTER <= now) {
      const next = newToken();
      session.previousTokenHash = hash;
      session.tokenHash = secretDigest(next);
      session.rotatedAt = new Date(now);
      renewed = { token: next, expiresAt: session.expiresAt };
    }
    if (session.lastSeenAt.getTime() + NOTE_USE_AFTER <= now) session.lastSeenAt = new Date(now);
    const actor = await actorOf(em, session.person);
    await em.flush();
    const codes = await codesStateOf(em, actor);
    return { actor, session: { id: session.id, provenAt: session.provenAt.getTime(), codes }, renewed };
  });
}

/** Ends the session of a token; one that is already gone is no error. */
export async function endSession(token: string, requestId: string): Promise<void> {
  await inScope({ personId: null, atTheDoor: true, requestId }, async (em) => {
    const hash = secretDigest(token);
    await em.nativeDelete(Session, { $or: [{ tokenHash: hash }, { previousTokenHash: hash }] });
  });
}
