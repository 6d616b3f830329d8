import { createHmac, timingSafeEqual } from "node:crypto";
import type { EntityManager } from "@mikro-orm/postgresql";
import { z } from "zod";
import { Credential } from "#app/db/entities/credential.ts";
import { OneTimeCodes } from "#app/db/entities/one-time-codes.ts";
import { Person } from "#app/db/entities/person.ts";
import { inScope, type Scope } from "#app/server/scope.server.ts";
import { keyFor } from "#app/server/secret-key.server.ts";

/** How long the code may take after the password, ms. */
export const HALF_LIFETIME = 5 * 60_000;

const claims = z.object({ person: z.uuid(), until: z.number().int() });
const door = (requestId: string): Scope => ({ personId: null, atTheDoor: true, requestId });

/** The stored password is signed along: once it is another one, what was signed is good for nothing. */
const signature = (payload: string, passwordHash: string) =>
  createHmac("sha256", keyFor("half signed in")).update(`${payload}\n${passwordHash}`).digest();

async function passwordHashOf(em: EntityManager, person: string): Promise<string | null> {
  const codes = await em.findOne(OneTimeCodes, { person, confirmedAt: { $ne: null } });
  return codes && ((await em.findOne(Credential, { person }))?.passwordHash ?? null);
}

/**
 * What somebody holds who has given their password and not their code yet: it opens the page of the code and nothing else.
 * @returns null for who has no codes, whom the password alone signs in
 */
export async function halfSignedIn(person: string, requestId: string): Promise<string | null> {
  const passwordHash = await inScope(door(requestId), (em) => passwordHashOf(em, person));
  if (passwordHash === null) return null;
  const stated = { person, until: Date.now() + HALF_LIFETIME };
  const payload = Buffer.from(JSON.stringify(stated)).toString("base64url");
  return `${payload}.${signature(payload, passwordHash).toString("base64url")}`;
}

/** Who is half signed in by this; null for what was made up, has run out, or came before a change of the password or the codes. */
export async function whoIsHalfSignedIn(
  held: string,
  requestId: string,
): Promise<{ id: string; email: string } | null> {
  const [payload = "", signed = ""] = held.split(".");
  const stated = claims.safeParse(parsed(payload));
  if (!stated.success || stated.data.until <= Date.now()) return null;
  return inScope(door(requestId), async (em) => {
    const person = await em.findOne(Person, { id: stated.data.person, active: true });
    const passwordHash = person && (await passwordHashOf(em, person.id));
    if (!person || !passwordHash) return null;
    const [given, expected] = [Buffer.from(signed, "base64url"), signature(payload, passwordHash)];
    if (given.length !== expected.length || !timingSafeEqual(given, expected)) return null;
    return { id: person.id, email: person.email };
  });
}

function parsed(payload: string): unknown {
  try {
    return JSON.parse(Buffer.from(payload, "base64url").toString("utf8"));
  } catch {
    return null;
  }
}
