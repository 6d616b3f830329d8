import { z } from "zod";
import type { ProofAsked } from "./proof.ts";
import { words } from "./written.ts";

/** What a token may be made for, with the words for it. A person's roles bind it besides. */
export const API_SCOPES = {
  "estimates:run": "Ask for estimates",
  "films:read": "Read films",
  "stacks:read": "Read stacks",
  "stacks:write": "Make and change stacks",
  "flows:read": "Read flows",
  "assessments:read": "Read assessments",
  "sheets:read": "Read sheets and their status",
  "scans:read": "Read scans and the jobs that read them",
  "scans:write": "Upload scans",
  "lots:read": "Read lots and where they are",
  "lots:write": "Make lots and put them on a sheet",
  "floor:read": "Read what the floor entered",
  "floor:write": "Enter what was seen on the floor",
  "incidents:read": "Read incidents",
  "incidents:write": "Report incidents",
} as const;

export type ApiScope = keyof typeof API_SCOPES;
export const API_SCOPE_NAMES = Object.keys(API_SCOPES) as [ApiScope, ...ApiScope[]];

/** Longest life of a token, in days. */
const LONGEST = 365;
export const TOKEN_LIVES = [7, 30, 90, 365] as const;

/** The form in which a person makes a token. */
export const newTokenSchema = z.object({
  intent: z.literal("make"),
  name: words("Name what will use it.", 80),
  program: z.uuid("Choose a program."),
  scopes: z.array(z.enum(API_SCOPE_NAMES, "Choose from the list.")).min(1, "Choose at least one thing that it may do."),
  days: z.coerce
    .number("Choose how long it is good.")
    .int("Choose how long it is good.")
    .min(1, "Choose how long it is good.")
    .max(LONGEST, "No token is good for longer than a year."),
});
export type NewToken = z.output<typeof newTokenSchema>;

export const revokeTokenSchema = z.object({ intent: z.literal("revoke"), token: z.uuid("Open the page again.") });

/** One token as the page lists it. Times are ISO. */
export interface TokenRow {
  id: string;
  name: string;
  beginning: string;
  person: string;
  program: string;
  scopes: ApiScope[];
  createdAt: string;
  expiresAt: string;
  lastUsedAt: string | null;
  state: "good" | "expired" | "revoked";
  /** of the reader's own */
  mine: boolean;
}

export interface TokensView {
  rows: TokenRow[];
  programs: { id: string; name: string }[];
  /** whether those of everybody are listed */
  ofAll: boolean;
  /** what is asked for before a token is made */
  proofAsked: ProofAsked;
}
