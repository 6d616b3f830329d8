import { hkdfSync } from "node:crypto";
import { environment } from "./environment.server.ts";

const LENGTH = 32;

/**
 * The key for a purpose, derived from that of the environment (RFC 5869, HKDF with SHA-256). Each purpose has a key of its own, so that
 * nothing made for one can be passed off as another's.
 */
export function keyFor(purpose: string): Buffer {
  return Buffer.from(hkdfSync("sha256", environment.SECRET_KEY, "planeward", purpose, LENGTH));
}
