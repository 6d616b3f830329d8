import { randomUUID } from "node:crypto";
import type { Actor } from "#app/policies/roles.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { asOwner, type TestDatabase } from "./test-database.ts";

/** The scope of a demo person, as the session middleware would make it. */
export async function scopeOfPerson(database: TestDatabase, account: string): Promise<ActorScope> {
  const [person] = await asOwner<{ id: string; name: string; email: string; site_role: Actor["siteRole"] }>(
    database,
    "select id, name, email, site_role from person where email = ?",
    [`${account}@kestrel-ridge.example`],
  );
  if (!person) throw new Error(`no such demo account: ${account}`);
  const memberships = await asOwner<Actor["memberships"][number]>(
    database,
    `select p.id as "programId", p.name as "programName", p.slug as "programSlug", m.role
       from membership m join program p on p.id = m.program_id where m.person_id = ?`,
    [person.id],
  );
  return {
    actor: { id: person.id, name: person.name, email: person.email, siteRole: person.site_role, memberships },
    session: { id: randomUUID(), provenAt: Date.now(), codes: "off" },
    requestId: "test",
  };
}

/** The same person as if they belonged to some of their programs only. The database is not told: it has to be, by `leave`. */
export async function leave(database: TestDatabase, account: string, program: string): Promise<void> {
  await asOwner(
    database,
    `delete from membership using person, program
      where membership.person_id = person.id and membership.program_id = program.id
        and person.email = ? and program.slug = ?`,
    [`${account}@kestrel-ridge.example`, program],
  );
}
