import { generateSecret, generateURI, verifySync } from "otplib";

/** Length of a time step, s (RFC 6238, 4.1). */
const STEP = 30;
const CODE = /^\d{6}$/;

/** A new secret for somebody's app: 160 random bits in base 32, as RFC 4226, 4 recommends. */
export const newTimeSecret = (): string => generateSecret();

/** What the app reads from the square code. */
export const appAddress = (secret: string, email: string): string =>
  generateURI({ issuer: "Planeward", label: email, secret });

/**
 * The time step that a code belongs to, where it is good now: that of the clock, or one beside it for clocks that drift.
 * @param at s since 1970
 * @param after time step of the newest code that was taken: neither it nor one before it counts again
 * @returns null where it is not good
 */
export function stepOfCode(secret: string, code: string, at: number, after: number | null): number | null {
  if (!CODE.test(code)) return null;
  const found = verifySync({ secret, token: code, epoch: at, epochTolerance: STEP });
  if (!found.valid || !("timeStep" in found)) return null;
  return after === null || found.timeStep > after ? found.timeStep : null;
}
