import { randomBytes } from "node:crypto";
import { secretDigest } from "#app/server/secret-digest.server.ts";

/** How many are made at once. */
export const RECOVERY_CODES = 10;
/** Letters and digits that are not mistaken for each other by hand: base 32 without 0, 1, 8 and 9. */
const LETTERS = "abcdefghijklmnopqrstuvwxyz234567";
const GROUPS = 6;
const IN_GROUP = 4;

/** New recovery codes, as they are shown: 24 letters of 5 random bits each, in groups of four. */
export function newRecoveryCodes(): string[] {
  return Array.from({ length: RECOVERY_CODES }, () => {
    const letters = [...randomBytes(GROUPS * IN_GROUP)].map((byte) => LETTERS.charAt(byte % LETTERS.length)).join("");
    return Array.from({ length: GROUPS }, (_, group) => letters.slice(group * IN_GROUP, (group + 1) * IN_GROUP)).join(
      "-",
    );
  });
}

/** What is kept of a recovery code, however it was typed; null for what cannot be one. */
export function recoveryDigest(typed: string): string | null {
  const letters = typed.toLowerCase().replace(/[\s-]/g, "");
  return letters.length === GROUPS * IN_GROUP ? secretDigest(letters) : null;
}
