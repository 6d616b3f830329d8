import { once } from "node:events";
import { createServer } from "node:http";
import type { AddressInfo } from "node:net";
import { afterEach, expect, test, vi } from "vitest";
import { clientAddress, trustedProxies } from "#app/server/client-address.server.ts";

const trusting = (setting: string | undefined) => trustedProxies.parse(setting);

test.each([
  { setting: undefined, peer: "203.0.113.5", forwarded: "1.2.3.4", from: "203.0.113.5", why: "nobody is trusted" },
  {
    setting: "1",
    peer: "127.0.0.1",
    forwarded: "9.9.9.9, 198.51.100.7",
    from: "198.51.100.7",
    why: "one proxy, from the right",
  },
  {
    setting: "2",
    peer: "127.0.0.1",
    forwarded: "9.9.9.9, 198.51.100.7, 10.0.0.2",
    from: "198.51.100.7",
    why: "two in a row",
  },
  { setting: "2", peer: "127.0.0.1", forwarded: "198.51.100.7", from: "198.51.100.7", why: "fewer than were said" },
  { setting: "1", peer: "127.0.0.1", forwarded: undefined, from: "127.0.0.1", why: "nothing is forwarded" },
  {
    setting: "1",
    peer: "127.0.0.1",
    forwarded: "1.2.3.4, me",
    from: "127.0.0.1",
    why: "what is no address is no address",
  },
  {
    setting: "10.0.0.0/8, ::1",
    peer: "::ffff:10.0.0.5",
    forwarded: "1.2.3.4, 198.51.100.7, 10.9.9.9",
    from: "198.51.100.7",
    why: "as far as proxies are known",
  },
  {
    setting: "10.0.0.0/8",
    peer: "203.0.113.5",
    forwarded: "1.2.3.4",
    from: "203.0.113.5",
    why: "a stranger who says so",
  },
  {
    setting: "10.0.0.0/8",
    peer: "10.0.0.5",
    forwarded: "10.0.0.7",
    from: "10.0.0.7",
    why: "somebody of the network itself",
  },
  { setting: "1", peer: "127.0.0.1", forwarded: "[2001:db8::7]:4711", from: "2001:db8::7", why: "IPv6 with a port" },
  { setting: "1", peer: "127.0.0.1", forwarded: "198.51.100.7:4711", from: "198.51.100.7", why: "IPv4 with a port" },
  {
    setting: "1",
    peer: "127.0.0.1",
    forwarded: "::ffff:198.51.100.7",
    from: "198.51.100.7",
    why: "one address has one name",
  },
])("a request is from $from where $why", ({ setting, peer, forwarded, from }) => {
  expect(clientAddress(peer, forwarded, trusting(setting))).toBe(from);
});

test("a setting that is neither a number of proxies nor networks is refused with what to write", () => {
  expect(trustedProxies.safeParse("all of them").error?.issues[0]?.message).toMatch(
    /how many proxies stand in front, or where/,
  );
});

afterEach(() => {
  vi.unstubAllEnvs();
  vi.resetModules();
  Reflect.deleteProperty(globalThis, "planewardWatchesConnections");
});

test("the header that loaders read holds the client behind a trusted proxy, whatever was sent under its name", async () => {
  vi.resetModules();
  vi.stubEnv("DATABASE_URL", "postgresql://nobody@127.0.0.1:1/none");
  vi.stubEnv("SECRET_KEY", "k".repeat(43));
  vi.stubEnv("TRUSTED_PROXIES", "127.0.0.1");
  const { PEER_HEADER, watchConnections } = await import("#app/server/connection.server.ts");
  watchConnections();
  const server = createServer((request, response) => response.end(request.headers[PEER_HEADER])).listen(0, "127.0.0.1");
  await once(server, "listening");
  const ask = async (headers: Record<string, string>) =>
    (await fetch(`http://127.0.0.1:${(server.address() as AddressInfo).port}/`, { headers })).text();
  try {
    expect(await ask({ "X-Forwarded-For": "1.2.3.4, 198.51.100.7" })).toBe("198.51.100.7");
    expect(await ask({ [PEER_HEADER]: "1.2.3.4" })).toBe("127.0.0.1");
  } finally {
    server.close();
  }
});
