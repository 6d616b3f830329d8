import type { EntityManager } from "@mikro-orm/postgresql";
import { Membership } from "#app/db/entities/membership.ts";
import { Person } from "#app/db/entities/person.ts";
import type { Actor } from "#app/policies/roles.ts";
import { inScope, tellPerson } from "#app/server/scope.server.ts";

/** A person with all that they hold; row-level security is told who asks from then on. */
export async function actorOf(em: EntityManager, { id, name, email, siteRole }: Person): Promise<Actor> {
  await tellPerson(em, id);
  const memberships = await em.find(Membership, { person: id }, { populate: ["program"] });
  const stoodInFor = await em.execute<{ program_id: string; person_id: string; name: string }[]>(
    "select * from people_stood_in_for(?)",
    [id],
  );
  return {
    id,
    name,
    email,
    siteRole: siteRole ?? null,
    memberships: memberships.map(({ program, role }) => ({
      programId: program.id,
      programName: program.name,
      programSlug: program.slug,
      role,
      standsInFor: stoodInFor
        .filter(({ program_id }) => program_id === program.id)
        .map(({ person_id, name: of }) => ({ id: person_id, name: of })),
    })),
  };
}

/** The person whom a job is done for, as they stand now; null for somebody who is no longer active. */
export function actorById(personId: string, requestId: string): Promise<Actor | null> {
  return inScope({ personId: null, atTheDoor: true, requestId }, async (em) => {
    const person = await em.findOne(Person, { id: personId, active: true });
    return person && actorOf(em, person);
  });
}
