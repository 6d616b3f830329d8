import { z } from "zod";
import { PROGRAM_ROLES, SITE_ROLES, type ProgramRole, type SiteRole } from "#app/policies/roles.ts";
import { proofFields } from "./proof.ts";
import { words } from "./written.ts";

/** A choice whose empty value is none. */
const orNone = <Value extends string>(values: readonly Value[]) =>
  z
    .union([z.literal(""), z.enum(values)])
    .optional()
    .transform((value) => (value ? value : null));

/** What somebody is: on the site and in each program; a program without a role is one that they do not belong to. */
const roles = {
  siteRole: orNone(SITE_ROLES),
  memberships: z
    .array(z.object({ program: z.uuid(), role: orNone(PROGRAM_ROLES) }))
    .max(100)
    .default([]),
  ...proofFields,
};

/** An address as it is stored: in small letters. */
export const emailAddress = z
  .string("Type the e-mail address.")
  .trim()
  .toLowerCase()
  .max(200)
  .pipe(z.email("Type a whole e-mail address, such as name@site.example."));

export const inviteSchema = z.object({
  name: words("Type the name, as colleagues know it.", 100),
  email: emailAddress,
  ...roles,
});
export type InviteValues = z.output<typeof inviteSchema>;

export const rolesSchema = z.object({ intent: z.literal("roles"), ...roles });
export type RoleValues = Pick<z.output<typeof rolesSchema>, "siteRole" | "memberships">;

/** How far an account is. */
export const PERSON_STATES = ["active", "invited", "deactivated"] as const;
export type PersonState = (typeof PERSON_STATES)[number];

/** A person as administrators see them. */
export interface PersonRow {
  id: string;
  name: string;
  email: string;
  state: PersonState;
  siteRole: SiteRole | null;
  memberships: { program: string; role: ProgramRole }[];
  /** ISO; null for somebody who has never signed in */
  lastSignInAt: string | null;
}

/** What can be given in each program; role is what the person holds there. */
export interface ProgramRoleChoice {
  id: string;
  name: string;
  role: ProgramRole | null;
}
