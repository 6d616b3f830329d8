import { randomBytes, randomUUID } from "node:crypto";
import { ApiToken } from "#app/db/entities/api-token.ts";
import { mayOnSite, programsWhere } from "#app/policies/permissions.ts";
import type { NewToken, TokenRow, TokensView } from "#app/schemas/api-token.ts";
import { notFound, problem } from "#app/server/problem.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { secretDigest } from "#app/server/secret-digest.server.ts";
import { proofAsked, requireRecentProof } from "../people/recent-proof.server.ts";
import { requireInProgram, requireInSomeProgram } from "../permission.server.ts";
import { idFrom } from "../uuid.server.ts";

/** By what a token is known for one of ours, where somebody finds it in a file. */
export const TOKEN_PREFIX = "pwd_";
/** Characters of it that stay to be read. */
const BEGINNING = TOKEN_PREFIX.length + 4;
/** Good tokens that one person may have. */
const MOST = 20;
/** How many are listed: those of years ago are found in the audit trail. */
const LISTED = 200;
const DAY = 24 * 3600e3;

const stateOf = ({ revokedAt, expiresAt }: Pick<ApiToken, "revokedAt" | "expiresAt">) =>
  revokedAt ? "revoked" : expiresAt <= new Date() ? "expired" : "good";

/** The person's own tokens; an administrator's page has those of the whole site. No secret is among what comes back. */
export async function tokensView(scope: ActorScope): Promise<TokensView> {
  const ofAll = mayOnSite(scope.actor, "see the audit trail");
  if (!ofAll) requireInSomeProgram(scope, "see released sheets");
  return inScope(scope, async (em) => {
    const found = await em.find(ApiToken, ofAll ? {} : { person: scope.actor.id }, {
      populate: ["person"],
      orderBy: { createdAt: "desc", id: "asc" },
      limit: LISTED,
    });
    // An administrator is told the name of a program that is not theirs to open: whose token it is has to be clear.
    const names = new Map(scope.actor.memberships.map(({ programId, programName }) => [programId, programName]));
    const rows = found.map((token): TokenRow => ({
      id: token.id,
      name: token.name,
      beginning: token.beginning,
      person: token.person.name,
      program: names.get(token.program.id) ?? "another program",
      scopes: token.scopes,
      createdAt: token.createdAt.toISOString(),
      expiresAt: token.expiresAt.toISOString(),
      lastUsedAt: token.lastUsedAt?.toISOString() ?? null,
      state: stateOf(token),
      mine: token.person.id === scope.actor.id,
    }));
    const programs = programsWhere(scope.actor, "see released sheets");
    return {
      rows: rows.toSorted((a, b) => Number(b.state === "good") - Number(a.state === "good")),
      programs: programs.map(({ programId, programName }) => ({ id: programId, name: programName })),
      ofAll,
      proofAsked: proofAsked(scope),
    };
  });
}

/** Makes a token in the actor's own name, who has just proved to be that. The token itself is in what comes back and nowhere else. */
export async function makeToken(
  scope: ActorScope,
  { name, program, scopes, days }: NewToken,
): Promise<{ token: string } | { refused: string }> {
  requireInProgram(scope, "see released sheets", program, "program");
  requireRecentProof(scope);
  return inScope(scope, async (em) => {
    await em.execute("select pg_advisory_xact_lock(hashtextextended(?, 0))", [`tokens of ${scope.actor.id}`]);
    const now = new Date();
    const good = await em.count(ApiToken, { person: scope.actor.id, revokedAt: null, expiresAt: { $gt: now } });
    if (good >= MOST) return { refused: `You have ${MOST} tokens that are good. Revoke one that is not used.` };
    const token = `${TOKEN_PREFIX}${randomBytes(32).toString("base64url")}`;
    em.create(ApiToken, {
      id: randomUUID(),
      person: scope.actor.id,
      program,
      name,
      tokenHash: secretDigest(token),
      beginning: token.slice(0, BEGINNING),
      scopes: [...new Set(scopes)],
      createdAt: now,
      expiresAt: new Date(now.getTime() + days * DAY),
      lastUsedAt: null,
      revokedAt: null,
    });
    await em.flush();
    return { token };
  });
}

/** Revokes a token: one's own, or anybody's for an administrator. It cannot be undone. */
export async function revokeToken(scope: ActorScope, id: string): Promise<void> {
  await inScope(scope, async (em) => {
    const token = await em.findOne(ApiToken, { id: idFrom(id, "token") });
    const mine = token?.person.id === scope.actor.id;
    if (!token || !(mine || mayOnSite(scope.actor, "see the audit trail"))) throw notFound("token");
    if (token.revokedAt) throw problem(409, "It has been revoked already. Open the page again.");
    Object.assign(token, { revokedAt: new Date(), revokedBy: scope.actor.id });
    await em.flush();
  });
}
