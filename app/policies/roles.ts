/** Roles held in one program. */
export const PROGRAM_ROLES = ["guest", "technician", "engineer", "process owner"] as const;
export type ProgramRole = (typeof PROGRAM_ROLES)[number];

/** Roles held for the whole site, beside any program role. */
export const SITE_ROLES = ["administrator", "shift lead"] as const;
export type SiteRole = (typeof SITE_ROLES)[number];

/** Any role that a person can hold. */
export type Role = ProgramRole | SiteRole;

/** What a person is in a program. */
export interface Membership {
  programId: string;
  programName: string;
  programSlug: string;
  role: ProgramRole;
  /** process owners of the program for whom the person stands in today */
  standsInFor?: StoodInFor[];
}

export interface StoodInFor {
  id: string;
  name: string;
}

/** Who is asking: the person with all that they hold. */
export interface Actor {
  id: string;
  name: string;
  email: string;
  siteRole: SiteRole | null;
  memberships: Membership[];
}
