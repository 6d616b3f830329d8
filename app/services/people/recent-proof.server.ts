import { Session } from "#app/db/entities/session.ts";
import { problem } from "#app/server/problem.server.ts";
import { countAttempt, forgiveAttempt } from "#app/server/rate-limit.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { personWithPassword } from "../sign-in.server.ts";

/** A proof of who somebody is counts for this long, ms. */
const PROOF_LASTS = 10 * 60_000;

/** Whether the person has proved within the last ten minutes who they are, by signing in or by their password since. */
export const isProvenLately = ({ session }: ActorScope): boolean =>
  !!session && Date.now() - session.provenAt < PROOF_LASTS;

/**
 * Refuses what a session that was left open must not be enough for. For a form, `proveAgain` comes first, which asks for the password
 * within it.
 */
export function requireRecentProof(scope: ActorScope): void {
  if (!isProvenLately(scope))
    throw problem(403, "Prove once more that it is you: open the page again and type your password in its form.");
}

/**
 * Takes the password that a form brings where the last proof is older than ten minutes, and notes the proof in the session.
 * @returns what stands at the field of the password, or the scope to go on with
 */
export async function proveAgain(
  scope: ActorScope,
  password: string,
): Promise<{ fault: string; scope: null } | { fault: null; scope: ActorScope }> {
  if (isProvenLately(scope)) return { fault: null, scope };
  const { actor, session } = scope;
  if (!session) throw problem(403, "This is done in a browser, by somebody who is signed in.");
  const fault =
    password === ""
      ? "Type your password: you signed in more than ten minutes ago."
      : await ownPasswordFault(scope, password);
  if (fault !== null) return { fault, scope: null };
  const provenAt = new Date();
  await inScope(scope, (em) => em.nativeUpdate(Session, { id: session.id, person: actor.id }, { provenAt }));
  return { fault: null, scope: { ...scope, session: { id: session.id, provenAt: provenAt.getTime() } } };
}

/** Why this is not taken for the person's own password, as a sentence; null where it is. Guesses are counted. */
export async function ownPasswordFault({ actor, requestId }: ActorScope, password: string): Promise<string | null> {
  const counted = [["account from address", `${actor.email} session ${actor.id}`]] as const;
  if (!(await countAttempt(counted)))
    return "Too many attempts have failed. Wait a quarter of an hour, then try again.";
  if ((await personWithPassword(actor.email, password, requestId)) !== actor.id)
    return "This is not your password. Type it once more.";
  await forgiveAttempt(counted);
  return null;
}
