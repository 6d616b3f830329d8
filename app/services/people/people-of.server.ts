import type { EntityManager } from "@mikro-orm/postgresql";
import type { ProgramRole } from "#app/policies/roles.ts";

/** People of a program by id, for its staff. */
interface ProgramPerson {
  id: string;
  name: string;
  role: ProgramRole;
  /** stands in for a process owner now */
  stands_in: boolean;
}

/** The active people of a program; nobody for who is not of its staff. */
export function peopleOf(em: EntityManager, programId: string): Promise<ProgramPerson[]> {
  return em.execute<ProgramPerson[]>("select * from program_people(?) order by name", [programId]);
}
