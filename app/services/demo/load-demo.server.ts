import { randomUUID } from "node:crypto";
import { UniqueConstraintViolationException } from "@mikro-orm/core";
import type { EntityManager } from "@mikro-orm/postgresql";
import { Membership } from "#app/db/entities/membership.ts";
import type { Program } from "#app/db/entities/program.ts";
import { loadDemo } from "#app/db/seeders/load-demo.ts";
import { PROGRAM_ROLES, type ProgramRole } from "#app/policies/roles.ts";
import { problem } from "#app/server/problem.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { requireOnSite } from "../permission.server.ts";
import { demoIsHere } from "./demo-view.server.ts";

/** One after the other: who loads and who removes the demo wait for each other. */
export const waitForTheDemo = (em: EntityManager) =>
  em.execute("select pg_advisory_xact_lock(hashtext('the demo comes and goes'))");

/**
 * Loads the demo, whole or not at all. Everybody of the site who is more than a guest joins its programs with the role that they hold
 * elsewhere; its own people are names without a sign-in.
 * @throws 403 for a role that may not, 409 when it is there already or a name that it needs is taken
 */
export async function loadTheDemo(scope: ActorScope): Promise<void> {
  requireOnSite(scope, "load and remove the demo");
  try {
    await inScope({ ...scope, atTheDemo: true }, async (em) => {
      await waitForTheDemo(em);
      if (await demoIsHere(em)) throw problem(409, "The demo is there already. Nothing was loaded a second time.");
      await loadDemo(em, { signIn: false, also: (programs) => joinAll(em, programs) });
    });
  } catch (error) {
    if (!(error instanceof UniqueConstraintViolationException)) throw error;
    throw problem(
      409,
      "The demo was not loaded: the site has a program with one of the names Tern, Petrel and Fulmar already.",
    );
  }
}

interface Colleague {
  person_id: string;
  role: ProgramRole;
}

async function joinAll(em: EntityManager, programs: readonly Program[]): Promise<void> {
  const strongest = [...PROGRAM_ROLES].toReversed();
  const own = programs.map(({ id }) => id);
  const colleagues = await em.execute<Colleague[]>(
    `select m.person_id, (array_agg(m.role order by array_position(?::text[], m.role)))[1] as role
       from membership m join person p on p.id = m.person_id
      where p.active and m.program_id not in (?)
      group by m.person_id
     having bool_or(m.role <> 'guest')
        and not bool_or(exists (select 1 from membership d where d.person_id = m.person_id and d.program_id in (?)))`,
    [`{${strongest.map((role) => `"${role}"`).join(",")}}`, own, own],
  );
  for (const { person_id: person, role } of colleagues)
    for (const program of programs)
      em.create(Membership, { id: randomUUID(), person, program, role, createdAt: new Date() });
  await em.flush();
}
