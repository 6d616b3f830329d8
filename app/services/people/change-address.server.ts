import { randomUUID } from "node:crypto";
import { setTimeout as wait } from "node:timers/promises";
import { UniqueConstraintViolationException } from "@mikro-orm/core";
import { Person } from "#app/db/entities/person.ts";
import { log } from "#app/server/log.server.ts";
import { problem } from "#app/server/problem.server.ts";
import { countAttempt } from "#app/server/rate-limit.server.ts";
import { inScope, type ActorScope, type Scope } from "#app/server/scope.server.ts";
import { mailAccount } from "../mail/mail-account.server.ts";
import { requireRecentProof } from "./recent-proof.server.ts";
import { endTokens, mailLink, openToken } from "./tokens.server.ts";

const door = (requestId: string): Scope => ({ personId: null, atTheDoor: true, requestId });

/** The answer takes this long, whether the address is free or not: more than the work ever does, ms. */
const ANSWER_AFTER = 400;

/**
 * Mails a link to an address that is to become the person's own. Where it is somebody's already, nothing is mailed, and nothing tells who
 * asked. Three an hour, more are passed over. Administrators change their address, and that of others, in no other way.
 * @throws 403 without a recent proof of who asks
 */
export async function askForAddress(scope: ActorScope, address: string): Promise<void> {
  if (!scope.session) throw problem(403, "This is done in a browser, by somebody who is signed in.");
  requireRecentProof(scope);
  await Promise.all([wait(ANSWER_AFTER), mailAddressLink(scope, address)]);
}

async function mailAddressLink(scope: ActorScope, address: string): Promise<void> {
  const { actor, requestId } = scope;
  try {
    if (!(await countAttempt([["links by mail", `new address of ${actor.id}`]]))) return;
    // Nobody but the door sees whose an address is.
    await inScope({ personId: actor.id, atTheDoor: true, requestId }, async (em) => {
      if (await em.findOne(Person, { email: address })) return;
      await mailLink(em, { purpose: "address change", person: actor.id, address, by: actor.id });
    });
  } catch (error) {
    // A fault must not tell that the address is somebody's.
    log.error({ requestId, error: String(error) }, "a link to confirm an address could not be written");
  }
}

/** Which address the link of a mail confirms, without using it; null for one that is not good any more. */
export function addressLink(secret: string, requestId: string): Promise<{ name: string; address: string } | null> {
  return inScope(door(requestId), async (em) => {
    const token = await openToken(em, secret, ["address change"]);
    return token && { name: token.person.name, address: token.address };
  });
}

/**
 * Makes the address of a link that of its person's account. It works once, every other link of theirs ends, and the address before it is
 * told.
 * @returns false for a link that is not good any more, also where the address has become somebody else's since
 */
export async function confirmAddress(secret: string, requestId: string): Promise<boolean> {
  try {
    return await inScope(door(requestId), async (em) => {
      const token = await openToken(em, secret, ["address change"]);
      if (!token) return false;
      const { person, address } = token;
      const before = person.email;
      person.email = address;
      await em.flush();
      await endTokens(em, person.id);
      await mailAccount(em, {
        kind: "address changed",
        person: person.id,
        key: randomUUID(),
        address: before,
        by: null,
      });
      return true;
    });
  } catch (error) {
    if (error instanceof UniqueConstraintViolationException) return false;
    throw error;
  }
}
