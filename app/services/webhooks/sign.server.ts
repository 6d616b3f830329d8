import { createHmac } from "node:crypto";

/** Name of the way of signing, before the signature, so that another one can be told from it one day. */
const WAY = "v1";

/** HMAC-SHA-256 (RFC 2104) as hexadecimal digits. */
export const hmacOf = (secret: string, text: string): string => createHmac("sha256", secret).update(text).digest("hex");

/**
 * What a receiver checks: an HMAC under the webhook's secret over the time of sending, a point and the body.
 * @param timestamp seconds since 1970
 */
const signatureOf = (secret: string, timestamp: number, body: string): string =>
  `${WAY}=${hmacOf(secret, `${timestamp}.${body}`)}`;

/** Headers of a delivery. @param id of the delivery @param sentAt ms since 1970 */
export function deliveryHeaders(id: string, body: string, secret: string, sentAt: number): Record<string, string> {
  const timestamp = Math.floor(sentAt / 1000);
  return {
    "Content-Type": "application/json; charset=utf-8",
    "User-Agent": "Planeward",
    "Planeward-Delivery": id,
    "Planeward-Timestamp": String(timestamp),
    "Planeward-Signature": signatureOf(secret, timestamp, body),
  };
}

/** A signature to try a receiver with, of a secret that is no webhook's. */
export function exampleSignature() {
  const example = { secret: "pwh_an-example-and-no-secret", timestamp: 1764748812, body: '{"id":"1","event":"test"}' };
  return { ...example, signature: signatureOf(example.secret, example.timestamp, example.body) };
}
