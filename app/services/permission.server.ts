import {
  mayInProgram,
  mayOnSite,
  programsWhere,
  type ProgramPermission,
  type SitePermission,
} from "#app/policies/permissions.ts";
import { notFound, problem } from "#app/server/problem.server.ts";
import type { ActorScope } from "#app/server/scope.server.ts";

/** Refuses what the site's roles do not allow. */
export function requireOnSite({ actor }: ActorScope, permission: SitePermission): void {
  if (!mayOnSite(actor, permission))
    throw problem(403, `Your role may not ${permission}. Ask a process owner or administrator.`);
}

/** Refuses somebody who may not do this in any program. */
export function requireInSomeProgram({ actor }: ActorScope, permission: ProgramPermission): void {
  if (programsWhere(actor, permission).length === 0)
    throw problem(403, `Your role may not ${permission} of any program. Ask its process owner.`);
}

/** Refuses what a program's roles do not allow; a program that is not the person's own looks as if it were not there. */
export function requireInProgram(
  { actor }: ActorScope,
  permission: ProgramPermission,
  programId: string,
  what: string,
): void {
  if (mayInProgram(actor, permission, programId)) return;
  const member = mayInProgram(actor, "see the work", programId);
  throw member
    ? problem(403, `Your role may not ${permission} in this program. Ask its process owner.`)
    : notFound(what);
}
