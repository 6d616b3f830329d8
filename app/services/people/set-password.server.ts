import { randomUUID } from "node:crypto";
import { setTimeout as wait } from "node:timers/promises";
import type { EntityManager } from "@mikro-orm/postgresql";
import { hash } from "@node-rs/argon2";
import { Credential } from "#app/db/entities/credential.ts";
import { Person } from "#app/db/entities/person.ts";
import { Session } from "#app/db/entities/session.ts";
import { log } from "#app/server/log.server.ts";
import { countAttempt } from "#app/server/rate-limit.server.ts";
import { inScope, type Scope } from "#app/server/scope.server.ts";
import { mailAccount } from "../mail/mail-account.server.ts";
import { passwordFault } from "./password-fault.server.ts";
import { endTokens, mailLink, openToken } from "./tokens.server.ts";

const door = (requestId: string): Scope => ({ personId: null, atTheDoor: true, requestId });

/** Both answers, of an account that is there and one that is not, take this long: more than the work ever does, ms. */
const ANSWER_AFTER = 400;

/**
 * Mails a link to set a password to whoever has an account with this address; one who is invited gets the invitation again. Nothing tells
 * the caller whether there is such an account, the time that it takes neither. Three an hour and account, more are passed over.
 */
export async function askForPassword(email: string, requestId: string): Promise<void> {
  await Promise.all([wait(ANSWER_AFTER), mailPasswordLink(email, requestId)]);
}

async function mailPasswordLink(email: string, requestId: string): Promise<void> {
  const address = email.trim().toLowerCase();
  try {
    if (!(await countAttempt([["links by mail", address]]))) return;
    await inScope(door(requestId), async (em) => {
      const person = await em.findOne(Person, { email: address });
      if (!person || (!person.active && !person.invitedAt)) return;
      const purpose = person.active ? "password reset" : "invitation";
      await mailLink(em, { purpose, person: person.id, address, by: null });
    });
  } catch (error) {
    // A fault must not tell that there is such an account.
    log.error({ requestId, error: String(error) }, "a link to set a password could not be written");
  }
}

/** Whose password the link of a mail sets, without using it; null for one that is not good any more. */
export async function passwordLink(secret: string, requestId: string) {
  return inScope(door(requestId), async (em) => {
    const token = await openToken(em, secret, ["invitation", "password reset"]);
    return token && { email: token.person.email, isFirst: token.purpose === "invitation" };
  });
}

type PasswordSet = { outcome: "set" } | { outcome: "gone" } | { outcome: "refused"; fault: string };

/**
 * Sets a password by the link of a mail, which works once. Every session of the person ends and every other link of theirs; nobody is
 * signed in by it, so what the door asks for else is asked.
 */
export async function setPasswordByLink(secret: string, password: string, requestId: string): Promise<PasswordSet> {
  return inScope(door(requestId), async (em) => {
    const token = await openToken(em, secret, ["invitation", "password reset"]);
    if (!token) return { outcome: "gone" };
    const { person } = token;
    const fault = await passwordFault(password, person);
    if (fault !== null) return { outcome: "refused", fault };
    await storePassword(em, person.id, password);
    if (person.invitedAt) Object.assign(person, { active: true, invitedAt: null });
    await em.flush();
    await endTokens(em, person.id);
    await em.nativeDelete(Session, { person: person.id });
    if (token.purpose === "password reset")
      await mailAccount(em, { kind: "password changed", person: person.id, key: randomUUID(), by: null });
    return { outcome: "set" };
  });
}

/** Stores a password that has been looked at, in the caller's transaction. */
export async function storePassword(em: EntityManager, person: string, password: string): Promise<void> {
  const passwordHash = await hash(password);
  const known = await em.findOne(Credential, { person });
  if (known) Object.assign(known, { passwordHash, changedAt: new Date() });
  else em.create(Credential, { id: randomUUID(), person, passwordHash, changedAt: new Date() });
  await em.flush();
}
