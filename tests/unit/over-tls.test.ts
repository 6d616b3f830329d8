import { once } from "node:events";
import { createServer } from "node:http";
import type { AddressInfo } from "node:net";
import { afterEach, expect, test, vi } from "vitest";

afterEach(() => {
  vi.unstubAllEnvs();
  vi.resetModules();
  Reflect.deleteProperty(globalThis, "planewardWatchesConnections");
});

function siteAt(address: string | undefined): void {
  vi.resetModules();
  vi.stubEnv("DATABASE_URL", "postgresql://nobody@127.0.0.1:1/none");
  vi.stubEnv("SECRET_KEY", "k".repeat(43));
  vi.stubEnv("PUBLIC_ADDRESS", address);
}

const started = { token: "a-token", expiresAt: new Date("2026-12-04T00:00:00Z") };
const cookies = () => import("#app/server/session-cookie.server.ts");

/** Header lines of an answer of a server whose connections are watched. */
async function headersOfAnswer(): Promise<Headers> {
  const { watchConnections } = await import("#app/server/connection.server.ts");
  watchConnections();
  const server = createServer((_, response) => response.end("ok")).listen(0, "127.0.0.1");
  await once(server, "listening");
  try {
    return (await fetch(`http://127.0.0.1:${(server.address() as AddressInfo).port}/`)).headers;
  } finally {
    server.close();
  }
}

test("on loopback the cookie is a plain one, and nothing is said of TLS", async () => {
  siteAt(undefined);
  const { sessionCookie } = await cookies();
  expect(await sessionCookie(new Request("http://127.0.0.1:3000/"), started)).toMatch(
    /^planeward_session=[^;]+; Path=\/; Expires=.+; HttpOnly; SameSite=Lax$/,
  );
  expect(await sessionCookie(new Request("https://127.0.0.1:3000/"), started)).toMatch(/^__Host-/);
  expect((await headersOfAnswer()).get("Strict-Transport-Security")).toBeNull();
});

// After the other: a connection that is once watched is watched for good.
test("behind a proxy that speaks TLS the cookie is bound to the host and secure, and no answer lets a browser do without", async () => {
  siteAt("https://planeward.site.example");
  const { sessionCookie, tokenOf, clearedSessionCookie } = await cookies();
  const request = new Request("http://127.0.0.1:3000/");
  const header = await sessionCookie(request, started);
  expect(header).toMatch(/^__Host-planeward_session=[^;]+; Path=\/; Expires=.+; HttpOnly; Secure; SameSite=Lax$/);
  expect(header).not.toContain("Domain");
  const [pair = ""] = header.split(";");
  expect(await tokenOf(new Request(request.url, { headers: { Cookie: pair } }))).toBe("a-token");
  // A cookie that anything on plain HTTP could have set opens nothing.
  const plain = pair.replace("__Host-", "");
  expect(await tokenOf(new Request(request.url, { headers: { Cookie: plain } }))).toBeNull();
  expect(await clearedSessionCookie(request)).toMatch(/^__Host-planeward_session=;.*Max-Age=0/);
  const answer = await headersOfAnswer();
  expect(answer.get("Strict-Transport-Security")).toBe("max-age=31536000; includeSubDomains");
  expect(answer.get("X-Content-Type-Options")).toBe("nosniff");
});
