import { createHash } from "node:crypto";

/** What stays of a secret that was made at random: its SHA-256, by which it is found again and from which nobody makes it. */
export const secretDigest = (secret: string): string => createHash("sha256").update(secret).digest("hex");
