import { ApiToken } from "#app/db/entities/api-token.ts";
import type { Actor } from "#app/policies/roles.ts";
import type { ApiScope } from "#app/schemas/api-token.ts";
import { inScope } from "#app/server/scope.server.ts";
import { secretDigest } from "#app/server/secret-digest.server.ts";
import { actorOf } from "../actor.server.ts";
import { TOKEN_PREFIX } from "./tokens.server.ts";

/** `lastUsedAt` is written at most this often, so that reading does not write. */
const NOTE_USE_AFTER = 60_000;
const SHAPE = new RegExp(`^${TOKEN_PREFIX}[\\w-]{43}$`);

/** What a request's token stands for: the person as they are today, with the token's program alone. */
export interface TokenBearer {
  tokenId: string;
  scopes: ApiScope[];
  programId: string;
  actor: Actor;
}

/**
 * Whom a token speaks for. Null for one that is unknown, over or revoked, whose person is not active or has left its program. A role
 * of the site that opens what lies outside of programs does not come with it.
 */
export function bearerOf(token: string, requestId: string): Promise<TokenBearer | null> {
  if (!SHAPE.test(token)) return Promise.resolve(null);
  return inScope({ personId: null, atTheDoor: true, requestId }, async (em) => {
    const found = await em.findOne(ApiToken, { tokenHash: secretDigest(token) }, { populate: ["person"] });
    const now = new Date();
    if (!found || found.revokedAt || found.expiresAt <= now || !found.person.active) return null;
    const programId = found.program.id;
    const person = await actorOf(em, found.person);
    const memberships = person.memberships.filter((held) => held.programId === programId);
    if (memberships.length === 0) return null;
    if (!found.lastUsedAt || found.lastUsedAt.getTime() + NOTE_USE_AFTER <= now.getTime())
      await em.nativeUpdate(ApiToken, { id: found.id, revokedAt: null }, { lastUsedAt: now });
    const siteRole = person.siteRole === "administrator" ? null : person.siteRole;
    return { tokenId: found.id, scopes: found.scopes, programId, actor: { ...person, siteRole, memberships } };
  });
}
