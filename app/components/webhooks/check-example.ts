/** How a receiver in JavaScript checks a delivery, as the page shows it; a test runs it. */
export const CHECK = `import { createHmac, timingSafeEqual } from "node:crypto";

// body: the bytes as they came, before anything has parsed them
export function isFromPlaneward(headers, body, secret) {
  const timestamp = headers["planeward-timestamp"];
  const age = Math.abs(Date.now() / 1000 - Number(timestamp));
  if (!(age <= 300)) return false;
  const hmac = createHmac("sha256", secret);
  const expected = hmac.update(\`\${timestamp}.\`).update(body).digest();
  const signature = headers["planeward-signature"];
  const [, hex = ""] = /^v1=([0-9a-f]{64})$/.exec(signature) ?? [];
  const sent = Buffer.from(hex, "hex");
  return sent.length === expected.length && timingSafeEqual(sent, expected);
}`;
