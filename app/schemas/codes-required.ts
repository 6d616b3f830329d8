import { z } from "zod";
import { PROGRAM_ROLES, SITE_ROLES } from "#app/policies/roles.ts";

/** Every role, in the order in which forms list them. */
export const ROLES = [...PROGRAM_ROLES, ...SITE_ROLES] as const;

/** The form that says which roles sign in with a one-time code. */
export const codesRequiredSchema = z.object({ roles: z.array(z.enum(ROLES)).max(ROLES.length).default([]) });
