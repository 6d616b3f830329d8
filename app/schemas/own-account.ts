import { z } from "zod";

const LONGEST = 200;

/** A change of one's own password; whether the new one is taken says the service. */
export const passwordChangeSchema = z.object({
  current: z.string("Type the password that you sign in with.").max(LONGEST, "This is not your password."),
  password: z.string("Type a new password.").max(LONGEST, `Keep it under ${LONGEST} characters.`),
});

/** A session of one's own that still runs. */
export interface OwnSession {
  id: string;
  /** what its browser says of itself */
  userAgent: string;
  createdAt: string;
  lastSeenAt: string;
  /** the one that asks */
  isThis: boolean;
}
