import { createCipheriv, createDecipheriv, randomBytes } from "node:crypto";
import { keyFor } from "./secret-key.server.ts";

/** AES-256 in Galois/counter mode (NIST SP 800-38D), with a nonce of 96 bits made at random for each text. */
const CIPHER = "aes-256-gcm";
const NONCE = 12;
/** Of the whole form, so that another one can be told from it. */
const FORM = "s1";

/**
 * A secret as it may be stored where it has to be read again.
 * @param purpose what it is for and of which record, so that nobody can put it into another's row
 */
export function seal(text: string, purpose: string): string {
  const nonce = randomBytes(NONCE);
  const cipher = createCipheriv(CIPHER, keyFor(purpose), nonce);
  const sealed = Buffer.concat([cipher.update(text, "utf8"), cipher.final()]);
  return [FORM, nonce, cipher.getAuthTag(), sealed]
    .map((part) => (typeof part === "string" ? part : part.toString("base64url")))
    .join(".");
}

/** The secret again; null for a text that was sealed for another purpose, under another key of the environment, or was changed since. */
export function unseal(sealed: string, purpose: string): string | null {
  const [form, nonce, tag, text] = sealed.split(".");
  if (form !== FORM || nonce === undefined || tag === undefined || text === undefined) return null;
  try {
    const decipher = createDecipheriv(CIPHER, keyFor(purpose), Buffer.from(nonce, "base64url"), { authTagLength: 16 });
    decipher.setAuthTag(Buffer.from(tag, "base64url"));
    return Buffer.concat([decipher.update(Buffer.from(text, "base64url")), decipher.final()]).toString("utf8");
  } catch {
    return null;
  }
}
