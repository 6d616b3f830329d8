import { randomUUID } from "node:crypto";
import { LockMode, type EntityManager } from "@mikro-orm/postgresql";
import { OneTimeCodes } from "#app/db/entities/one-time-codes.ts";
import { log } from "#app/server/log.server.ts";
import { unseal } from "#app/server/sealed-secret.server.ts";
import { mailAccount } from "../mail/mail-account.server.ts";
import { recoveryDigest } from "./recovery-codes.server.ts";
import { purposeOf } from "./sealed-purpose.ts";
import { stepOfCode } from "./time-code.ts";

/** Said of whatever is not taken: which of the reasons it was is nobody's business but the person's. */
export const CODE_REFUSED =
  "This code is not good, or was used already. Wait for the next one in your app and type that, or use a recovery code.";

const TYPED_SPACES = /\s/g;

/**
 * Takes a one-time code or a recovery code of a person, in the caller's transaction; either counts once, also for two who come at once.
 * A recovery code that was used is told to the person by mail.
 * @returns whether it was good
 */
export async function takeCode(em: EntityManager, person: string, typed: string): Promise<boolean> {
  const codes = await em.findOne(
    OneTimeCodes,
    { person, confirmedAt: { $ne: null } },
    { lockMode: LockMode.PESSIMISTIC_WRITE },
  );
  if (!codes) return false;
  const recovery = recoveryDigest(typed);
  if (recovery !== null && codes.recoveryHashes.includes(recovery)) {
    codes.recoveryHashes = codes.recoveryHashes.filter((hash) => hash !== recovery);
    codes.recoveryUsedAt = new Date();
    await mailAccount(em, { kind: "recovery code used", person, key: randomUUID(), by: person });
    return true;
  }
  const secret = unseal(codes.secretSealed, purposeOf(person));
  if (secret === null) {
    log.error(
      { person },
      "the secret of one-time codes does not open: SECRET_KEY is not the one that it was made with",
    );
    return false;
  }
  const step = stepOfCode(secret, typed.replace(TYPED_SPACES, ""), Date.now() / 1000, codes.lastStep ?? null);
  if (step === null) return false;
  codes.lastStep = step;
  await em.flush();
  return true;
}
