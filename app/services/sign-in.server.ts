import { randomUUID } from "node:crypto";
import { hash, verify } from "@node-rs/argon2";
import { AuditEvent } from "#app/db/entities/audit-event.ts";
import { Credential } from "#app/db/entities/credential.ts";
import { OneTimeCodes } from "#app/db/entities/one-time-codes.ts";
import { Person } from "#app/db/entities/person.ts";
import { inScope } from "#app/server/scope.server.ts";

/** Verified when there is no such account, so that both answers take the same time. */
const nobodysHash = hash(randomUUID());

/** The id of the person whose password this is, or null. An unknown account takes as long as a wrong password. */
export async function personWithPassword(email: string, password: string, requestId: string): Promise<string | null> {
  const found = await inScope({ personId: null, atTheDoor: true, requestId }, async (em) => {
    const person = await em.findOne(Person, { email: email.trim().toLowerCase(), active: true });
    if (!person) return null;
    const credential = await em.findOne(Credential, { person: person.id });
    if (!credential) return null;
    const hasCodes = (await em.count(OneTimeCodes, { person: person.id, confirmedAt: { $ne: null } })) > 0;
    return { personId: person.id, passwordHash: credential.passwordHash, hasCodes };
  });
  const matches = await verify(found?.passwordHash ?? (await nobodysHash), password);
  const personId = found && matches ? found.personId : null;
  // Who has one-time codes is signed in by the code alone.
  if (!personId || !found?.hasCodes) await noteAttempt(found?.personId ?? null, personId !== null, requestId);
  return personId;
}

/** Notes in the trail that somebody was signed in, or was refused. */
export async function noteAttempt(personId: string | null, succeeded: boolean, requestId: string): Promise<void> {
  await inScope({ personId, atTheDoor: true, requestId }, async (em) => {
    em.create(AuditEvent, {
      id: randomUUID(),
      at: new Date(),
      actorId: succeeded ? personId : null,
      programId: null,
      action: succeeded ? "signed in" : "refused",
      subject: "session",
      subjectId: personId,
      field: null,
      from: null,
      to: null,
      requestId,
    });
    await em.flush();
  });
}
