import type { Actor, ProgramRole, SiteRole } from "./roles.ts";

/** Things done inside one program, and who may do them there. Whoever is not listed may not. */
export const PROGRAM_PERMISSIONS = {
  "see released sheets": ["guest", "technician", "engineer", "process owner", "shift lead", "administrator"],
  "see the work": ["technician", "engineer", "process owner", "shift lead"],
  "upload scans": ["technician", "engineer", "process owner", "shift lead"],
  "accept stresses": ["engineer", "process owner"],
  "edit stacks and flows": ["engineer", "process owner"],
  "run assessments": ["engineer", "process owner"],
  "see the outbox": ["process owner", "administrator"],
  "ask for a review": ["engineer", "process owner"],
  "comment in a review": ["technician", "engineer", "process owner", "shift lead"],
  "record deviations": ["engineer", "process owner"],
  "release, return and withdraw sheets": ["process owner"],
  "report incidents": ["technician", "engineer", "process owner", "shift lead"],
  "follow up incidents": ["engineer", "process owner"],
} as const satisfies Record<string, readonly (ProgramRole | SiteRole)[]>;

/** Things done to what the whole site shares. A program role counts when it is held in any program. */
export const SITE_PERMISSIONS = {
  "see the library": ["technician", "engineer", "process owner", "shift lead", "administrator"],
  "edit films": ["engineer", "process owner"],
  "edit the step library": ["engineer", "process owner"],
  "keep import profiles": ["technician", "engineer", "process owner", "shift lead"],
  "check instruments": ["technician", "engineer", "process owner", "shift lead"],
  "edit carriers, bonds and limits": ["process owner", "administrator"],
  "edit site settings": ["administrator"],
  "load and remove the demo": ["process owner"],
  "see the audit trail": ["administrator"],
} as const satisfies Record<string, readonly (ProgramRole | SiteRole)[]>;

export type ProgramPermission = keyof typeof PROGRAM_PERMISSIONS;
export type SitePermission = keyof typeof SITE_PERMISSIONS;

const allows = (roles: readonly string[], held: string | null | undefined) =>
  typeof held === "string" && roles.includes(held);

/**
 * Whether the actor may do this in that program. A site role counts only in programs that the person belongs to: a program
 * is a wall for everybody.
 */
export function mayInProgram(actor: Actor, permission: ProgramPermission, programId: string): boolean {
  const membership = actor.memberships.find((held) => held.programId === programId);
  if (!membership) return false;
  const roles = PROGRAM_PERMISSIONS[permission];
  return allows(roles, membership.role) || allows(roles, actor.siteRole);
}

/** Whether the actor may do this to what the site shares. */
export function mayOnSite(actor: Actor, permission: SitePermission): boolean {
  const roles = SITE_PERMISSIONS[permission];
  return allows(roles, actor.siteRole) || actor.memberships.some(({ role }) => allows(roles, role));
}

/** The programs in which the actor may do this, in the order of their names. */
export function programsWhere(actor: Actor, permission: ProgramPermission): Actor["memberships"] {
  return actor.memberships
    .filter(({ programId }) => mayInProgram(actor, permission, programId))
    .toSorted((a, b) => a.programName.localeCompare(b.programName));
}
