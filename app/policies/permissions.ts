import type { Actor, Membership, ProgramRole, SiteRole, StoodInFor } from "./roles.ts";

/** Things done inside one program, and who may do them there. Whoever is not listed may not. */
export const PROGRAM_PERMISSIONS = {
  "see released sheets": ["guest", "technician", "engineer", "process owner", "shift lead", "administrator"],
  "see the work": ["technician", "engineer", "process owner", "shift lead"],
  "upload scans": ["technician", "engineer", "process owner", "shift lead"],
  "accept stresses": ["engineer", "process owner"],
  "edit stacks and flows": ["engineer", "process owner"],
  "run assessments": ["engineer", "process owner"],
  "see the outbox": ["process owner", "administrator"],
  "keep webhooks": ["guest", "technician", "engineer", "process owner", "shift lead", "administrator"],
  "look after webhooks": ["process owner", "administrator"],
  "name a delegate": ["process owner"],
  "ask for a review": ["engineer", "process owner"],
  "comment in a review": ["technician", "engineer", "process owner", "shift lead"],
  "record deviations": ["engineer", "process owner"],
  "release, return and withdraw sheets": ["process owner"],
  "assign sheets to lots": ["engineer", "process owner"],
  "work on the floor": ["technician", "engineer", "process owner", "shift lead"],
  "hold lots and clear what the shift can": ["shift lead", "process owner"],
  "clear every hold and stop": ["process owner"],
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
  "manage people": ["administrator"],
  "load and remove the demo": ["process owner"],
  "see the audit trail": ["administrator"],
} as const satisfies Record<string, readonly (ProgramRole | SiteRole)[]>;

export type ProgramPermission = keyof typeof PROGRAM_PERMISSIONS;
export type SitePermission = keyof typeof SITE_PERMISSIONS;

/** What a process owner hands over to whoever stands in for them, and nothing more. */
const HANDED_OVER: readonly ProgramPermission[] = [
  "release, return and withdraw sheets",
  "hold lots and clear what the shift can",
  "clear every hold and stop",
];

const allows = (roles: readonly string[], held: string | null | undefined) =>
  typeof held === "string" && roles.includes(held);

/**
 * Whether the actor may do this in that program. A site role counts only in programs that the person belongs to: a program
 * is a wall for everybody.
 */
export function mayInProgram(actor: Actor, permission: ProgramPermission, programId: string): boolean {
  const membership = actor.memberships.find((held) => held.programId === programId);
  if (!membership) return false;
  if (holdsByRole(actor, permission, membership)) return true;
  return HANDED_OVER.includes(permission) && (membership.standsInFor ?? []).length > 0;
}

function holdsByRole(actor: Actor, permission: ProgramPermission, { role }: Membership): boolean {
  const roles = PROGRAM_PERMISSIONS[permission];
  return allows(roles, role) || allows(roles, actor.siteRole);
}

/**
 * The process owners in whose place the actor does this in that program: nobody for who may do it by their own role. Whatever must not
 * be one's own work must not be theirs either.
 */
export function inPlaceOf(actor: Actor, permission: ProgramPermission, programId: string): StoodInFor[] {
  const membership = actor.memberships.find((held) => held.programId === programId);
  if (!membership || holdsByRole(actor, permission, membership) || !HANDED_OVER.includes(permission)) return [];
  return membership.standsInFor ?? [];
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
