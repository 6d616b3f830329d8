import { expect, test } from "vitest";
import { CHECK } from "#app/components/webhooks/check-example.ts";
import { deliveryHeaders, exampleSignature, hmacOf } from "#app/services/webhooks/sign.server.ts";

test.each([
  // RFC 4231 (2005), test cases 1 and 2, HMAC-SHA-256.
  ["\u000b".repeat(20), "Hi There", "b0344c61d8db38535ca8afceaf0bf12b881dc200c9833da726e9376c2e32cff7"],
  ["Jefe", "what do ya want for nothing?", "5bdcc146bf60754e6a042426089575c75a003f089d2739839dec58b964ec3843"],
])("the HMAC is the published one", (key, text, expected) => {
  expect(hmacOf(key, text)).toBe(expected);
});

type Check = (headers: Record<string, string>, body: Buffer, secret: string) => boolean;
/** The check that the page shows, as it stands there. */
const shownCheck = async () =>
  ((await import(/* @vite-ignore */ `data:text/javascript,${encodeURIComponent(CHECK)}`)) as { isFromPlaneward: Check })
    .isFromPlaneward;

const asReceived = (headers: Record<string, string>) =>
  Object.fromEntries(Object.entries(headers).map(([name, value]) => [name.toLowerCase(), value]));

test("the check that the page shows takes what is ours, and nothing changed, late or signed by somebody else", async () => {
  const isFromPlaneward = await shownCheck();
  const body = '{"id":"1","program":{"name":"Tërn µ"}}';
  const sentAt = (ago: number) => asReceived(deliveryHeaders("1", body, "a secret", Date.now() - ago * 1000));
  const checked = (headers: Record<string, string>, text = body, secret = "a secret") =>
    isFromPlaneward(headers, Buffer.from(text), secret);
  expect(checked(sentAt(0))).toBe(true);
  expect(checked(sentAt(290))).toBe(true);
  expect(checked(sentAt(310))).toBe(false);
  expect(checked(sentAt(-310))).toBe(false);
  expect(checked(sentAt(0), body.replace("1", "2"))).toBe(false);
  expect(checked(sentAt(0), body, "another")).toBe(false);
  const { "planeward-timestamp": timestamp = "", ...rest } = sentAt(0);
  expect(checked({ ...rest, "planeward-timestamp": String(Number(timestamp) + 1) })).toBe(false);
  expect(checked({})).toBe(false);
});

test("the example of the page is signed as deliveries are", () => {
  const { secret, timestamp, body, signature } = exampleSignature();
  expect(deliveryHeaders("1", body, secret, timestamp * 1000)["Planeward-Signature"]).toBe(signature);
  expect(signature).toBe(`v1=${hmacOf(secret, `${timestamp}.${body}`)}`);
});
