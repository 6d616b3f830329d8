import { randomUUID } from "node:crypto";
import { LockMode, type EntityManager } from "@mikro-orm/postgresql";
import { OneTimeCodes } from "#app/db/entities/one-time-codes.ts";
import { Session } from "#app/db/entities/session.ts";
import { codePath } from "#app/lib/sheet/qr-path.ts";
import type { CodesToConfirm, OwnCodes } from "#app/schemas/own-codes.ts";
import type { Proof, ProofFault } from "#app/schemas/proof.ts";
import { problem } from "#app/server/problem.server.ts";
import { countAttempt, forgiveAttempt } from "#app/server/rate-limit.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { seal, unseal } from "#app/server/sealed-secret.server.ts";
import { mailAccount } from "../mail/mail-account.server.ts";
import { isProvenLately, ownProofFault, requireRecentProof } from "../people/recent-proof.server.ts";
import { purposeOf } from "./sealed-purpose.ts";
import { newRecoveryCodes, recoveryDigest } from "./recovery-codes.server.ts";
import { appAddress, newTimeSecret, stepOfCode } from "./time-code.ts";

/** A secret that no first code has confirmed is shown for this long, ms. */
const WAITS = 30 * 60_000;

const inAppForm = (secret: string) => secret.match(/.{1,4}/g)?.join(" ") ?? secret;

/** The person's own codes, with the secret while it waits for its first code and never after. */
export function ownCodes(scope: ActorScope): Promise<OwnCodes> {
  const { id, email } = scope.actor;
  return inScope(scope, async (em) => {
    const codes = await em.findOne(OneTimeCodes, { person: id });
    if (!codes?.confirmedAt)
      return { since: null, waiting: codes ? waitingOf(codes, id, email) : null, recovery: null };
    return {
      since: codes.confirmedAt.toISOString(),
      waiting: null,
      recovery: {
        left: codes.recoveryHashes.length,
        madeAt: (codes.recoveryMadeAt ?? codes.confirmedAt).toISOString(),
        usedAt: codes.recoveryUsedAt?.toISOString() ?? null,
      },
    };
  });
}

const isWaiting = ({ confirmedAt, createdAt }: Pick<OneTimeCodes, "confirmedAt" | "createdAt">) =>
  !confirmedAt && createdAt.getTime() + WAITS > Date.now();

function waitingOf(codes: OneTimeCodes, person: string, email: string): CodesToConfirm | null {
  const secret = isWaiting(codes) ? unseal(codes.secretSealed, purposeOf(person)) : null;
  if (secret === null) return null;
  const address = appAddress(secret, email);
  return { secret: inAppForm(secret), address, code: codePath(address) };
}

/** Makes a secret for the person's app; it counts once `confirmCodes` has seen a first code. @throws 403 without a recent proof, 409 where codes are on */
export async function beginCodes(scope: ActorScope): Promise<void> {
  requireBrowserProof(scope);
  const person = scope.actor.id;
  await inScope(scope, async (em) => {
    await em.execute("select pg_advisory_xact_lock(hashtextextended(?, 0))", [`one-time codes of ${person}`]);
    const there = await em.findOne(OneTimeCodes, { person });
    if (there?.confirmedAt)
      throw problem(409, "Your one-time codes are on already. Turn them off first to set up another app.");
    if (there) await em.remove(there).flush();
    em.create(OneTimeCodes, {
      id: randomUUID(),
      person,
      secretSealed: seal(newTimeSecret(), purposeOf(person)),
      createdAt: new Date(),
      confirmedAt: null,
      lastStep: null,
      recoveryHashes: [],
      recoveryMadeAt: null,
      recoveryUsedAt: null,
    });
    await em.flush();
  });
}

/** Recovery codes that were just made, which nothing shows again, or what was wrong with the code. */
type Confirmed = { recovery: string[] } | { fault: string };

/**
 * Turns codes on with a first code. Every session but the one that asks ends, and a mail tells.
 * @throws 409 where no secret waits for one
 */
export async function confirmCodes(scope: ActorScope, typed: string): Promise<Confirmed> {
  requireBrowserProof(scope);
  const person = scope.actor.id;
  const counted = [["codes", person]] as const;
  if (!(await countAttempt(counted))) return { fault: "Too many attempts have failed. Wait an hour, then try again." };
  const confirmed = await inScope(scope, async (em): Promise<Confirmed> => {
    const codes = await em.findOne(OneTimeCodes, { person }, { lockMode: LockMode.PESSIMISTIC_WRITE });
    const secret = codes && isWaiting(codes) ? unseal(codes.secretSealed, purposeOf(person)) : null;
    if (!codes || secret === null)
      throw problem(409, "The code that was shown does not wait any more. Open the page again and begin anew.");
    const step = stepOfCode(secret, typed.replace(/\s/g, ""), Date.now() / 1000, null);
    if (step === null)
      return {
        fault:
          "This is not the code that your app shows now. Type the newest one, and look whether the clock of the device is right.",
      };
    Object.assign(codes, { confirmedAt: new Date(), lastStep: step });
    const recovery = newRecovery(codes);
    await em.flush();
    await endOtherSessions(em, scope);
    await mailAccount(em, { kind: "codes on", person, key: randomUUID(), by: person });
    return { recovery };
  });
  if ("recovery" in confirmed) await forgiveAttempt(counted);
  return confirmed;
}

/** Makes the recovery codes anew; those before work no more, and a mail tells. @throws 403 without a recent proof, 409 where codes are off */
export async function renewRecoveryCodes(scope: ActorScope): Promise<string[]> {
  requireRecentProof(scope);
  const person = scope.actor.id;
  return inScope(scope, async (em) => {
    const codes = await confirmedCodes(em, person);
    const recovery = newRecovery(codes);
    await em.flush();
    await mailAccount(em, { kind: "recovery codes made", person, key: randomUUID(), by: person });
    return recovery;
  });
}

/**
 * Turns codes off for who gives password and code once more. Every session but the one that asks ends, and a mail tells.
 * @returns what is wrong at which field; null when it is done
 */
export async function turnCodesOff(scope: ActorScope, proof: Proof): Promise<ProofFault | null> {
  if (!scope.session) throw problem(403, "This is done in a browser, by somebody who is signed in.");
  const person = scope.actor.id;
  const fault = await ownProofFault(scope, proof);
  if (fault !== null) return fault;
  await inScope(scope, async (em) => {
    em.remove(await confirmedCodes(em, person));
    await em.flush();
    await endOtherSessions(em, scope);
    await mailAccount(em, { kind: "codes off", person, key: randomUUID(), by: person });
  });
  return null;
}

/** As `requireRecentProof`, for what somebody does whose role asks for codes that they do not have yet. */
function requireBrowserProof(scope: ActorScope): void {
  if (!isProvenLately(scope))
    throw problem(403, "Prove once more that it is you: open the page again and type your password in its form.");
}

async function confirmedCodes(em: EntityManager, person: string) {
  const codes = await em.findOne(
    OneTimeCodes,
    { person, confirmedAt: { $ne: null } },
    { lockMode: LockMode.PESSIMISTIC_WRITE },
  );
  if (!codes) throw problem(409, "Your one-time codes are off. Open the page again.");
  return codes;
}

function newRecovery(codes: OneTimeCodes): string[] {
  const recovery = newRecoveryCodes();
  Object.assign(codes, {
    recoveryHashes: recovery.flatMap((code) => recoveryDigest(code) ?? []),
    recoveryMadeAt: new Date(),
    recoveryUsedAt: null,
  });
  return recovery;
}

async function endOtherSessions(em: EntityManager, { actor, session }: ActorScope): Promise<void> {
  await em.nativeDelete(Session, { person: actor.id, id: { $ne: session?.id ?? null } });
}
