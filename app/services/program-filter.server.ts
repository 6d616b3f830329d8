import { programsWhere, type ProgramPermission } from "#app/policies/permissions.ts";
import type { Actor } from "#app/policies/roles.ts";

/** The programs that a list covers: all in which the person may, or the one that the address names by its slug. */
export function programFilter(actor: Actor, permission: ProgramPermission, slug: string | undefined) {
  const programs = programsWhere(actor, permission);
  const chosen = slug ? programs.filter(({ programSlug }) => programSlug === slug) : programs;
  return { $in: chosen.map(({ programId }) => programId) };
}
