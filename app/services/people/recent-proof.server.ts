import { Session } from "#app/db/entities/session.ts";
import type { Proof, ProofAsked, ProofFault } from "#app/schemas/proof.ts";
import { problem } from "#app/server/problem.server.ts";
import { countAttempt, forgiveAttempt } from "#app/server/rate-limit.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { CODE_REFUSED, takeCode } from "../codes/take-code.server.ts";
import { personWithPassword } from "../sign-in.server.ts";

/** A proof of who somebody is counts for this long, ms. */
const PROOF_LASTS = 10 * 60_000;

/** Whether the person has proved within the last ten minutes who they are, by signing in or by their password since. */
export const isProvenLately = ({ session }: ActorScope): boolean =>
  !!session && Date.now() - session.provenAt < PROOF_LASTS;

/** What a form has to ask for, so that `proveAgain` lets it pass. */
export function proofAsked(scope: ActorScope): ProofAsked {
  if (isProvenLately(scope)) return null;
  return scope.session?.codes === "on" ? "password and code" : "password";
}

/**
 * Refuses what a session that was left open must not be enough for, and one whose person has yet to set up one-time codes. For a form,
 * `proveAgain` comes first, which asks for the password within it.
 */
export function requireRecentProof(scope: ActorScope): void {
  if (scope.session?.codes === "missing")
    throw problem(403, "Your role signs in with one-time codes. Set them up, then do this again.");
  if (!isProvenLately(scope))
    throw problem(403, "Prove once more that it is you: open the page again and type your password in its form.");
}

/**
 * Takes what a form brings where the last proof is older than ten minutes, and notes the proof in the session.
 * @returns what stands at which field, or the scope to go on with
 */
export async function proveAgain(
  scope: ActorScope,
  given: Proof,
): Promise<{ fault: ProofFault; scope: null } | { fault: null; scope: ActorScope }> {
  if (isProvenLately(scope)) return { fault: null, scope };
  const { actor, session } = scope;
  if (!session) throw problem(403, "This is done in a browser, by somebody who is signed in.");
  const fault: ProofFault | null =
    given.proof === ""
      ? { field: "proof", sentence: "Type your password: you signed in more than ten minutes ago." }
      : await ownProofFault(scope, given);
  if (fault !== null) return { fault, scope: null };
  const provenAt = new Date();
  // The next request is given another token: whatever was known of the old one is worth nothing after the proof.
  const renewed = { provenAt, rotatedAt: new Date(0) };
  await inScope(scope, (em) => em.nativeUpdate(Session, { id: session.id, person: actor.id }, renewed));
  return { fault: null, scope: { ...scope, session: { ...session, provenAt: provenAt.getTime() } } };
}

/** Why this does not prove that it is the person, their one-time code included where they have codes; null where it does. */
export async function ownProofFault(scope: ActorScope, { proof, proofCode }: Proof): Promise<ProofFault | null> {
  const wrong = await ownPasswordFault(scope, proof);
  if (wrong !== null) return { field: "proof", sentence: wrong };
  if (scope.session?.codes !== "on") return null;
  const refused = await ownCodeFault(scope, proofCode);
  return refused === null ? null : { field: "proofCode", sentence: refused };
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

async function ownCodeFault(scope: ActorScope, code: string): Promise<string | null> {
  if (code.trim() === "") return "Type the code that your app shows.";
  const counted = [["codes", scope.actor.id]] as const;
  if (!(await countAttempt(counted))) return "Too many attempts have failed. Wait an hour, then try again.";
  if (!(await inScope(scope, (em) => takeCode(em, scope.actor.id, code)))) return CODE_REFUSED;
  await forgiveAttempt(counted);
  return null;
}
