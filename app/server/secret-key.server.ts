import { hkdfSync } from "node:crypto";
import { environment } from "./environment.server.ts";

/** What a key is for. Each has a key of its own, so that nothing made for one can be passed off as the other. */
type KeyPurpose = "one-time codes" | "half signed in";

const LENGTH = 32;

/** The key for a purpose, derived from that of the environment (RFC 5869, HKDF with SHA-256). */
export function keyFor(purpose: KeyPurpose): Buffer {
  const made = hkdfSync("sha256", environment.SECRET_KEY, "planeward", purpose, LENGTH);
  return Buffer.from(made);
}
