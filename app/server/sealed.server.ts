import { createCipheriv, createDecipheriv, randomBytes } from "node:crypto";
import { keyFor } from "./secret-key.server.ts";

const CIPHER = "aes-256-gcm";
/** Bytes of the nonce and of the tag, as NIST SP 800-38D has them. */
const NONCE = 12;
const TAG = 16;
/** Begins what is sealed in this way, so that another way can come beside it. */
const WAY = "1.";

/**
 * Encrypts a secret that the server has to read again.
 * @param of whose it is: sealed for somebody else, it does not open
 */
export function seal(secret: string, of: string): string {
  const nonce = randomBytes(NONCE);
  const cipher = createCipheriv(CIPHER, keyFor("one-time codes"), nonce).setAAD(Buffer.from(of));
  const sealed = Buffer.concat([nonce, cipher.update(secret, "utf8"), cipher.final(), cipher.getAuthTag()]);
  return WAY + sealed.toString("base64url");
}

/** The secret again; null where it was sealed with another key, for somebody else, or has been changed. */
export function unseal(sealed: string, of: string): string | null {
  if (!sealed.startsWith(WAY)) return null;
  const bytes = Buffer.from(sealed.slice(WAY.length), "base64url");
  if (bytes.length < NONCE + TAG) return null;
  const opening = createDecipheriv(CIPHER, keyFor("one-time codes"), bytes.subarray(0, NONCE), { authTagLength: TAG })
    .setAAD(Buffer.from(of))
    .setAuthTag(bytes.subarray(-TAG));
  try {
    return Buffer.concat([opening.update(bytes.subarray(NONCE, -TAG)), opening.final()]).toString("utf8");
  } catch {
    return null;
  }
}
