/** Roles held in one program. */
export const PROGRAM_ROLES = ["guest", "technician", "engineer", "process owner"] as const;
export type ProgramRole = (typeof PROGRAM_ROLES)[number];

/** Roles held for the whole site, beside any program role. */
export const SITE_ROLES = ["administrator", "shift lead"] as const;
export type SiteRole = (typeof SITE_ROLES)[number];

/** Who is asking: the person with all that they hold. */
export interface Actor {
  id: string;
  name: string;
  email: string;
  siteRole: SiteRole | null;
  memberships: { programId: string; programName: string; programSlug: string; role: ProgramRole }[];
}
