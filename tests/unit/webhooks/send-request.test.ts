import type { lookup } from "node:dns";
import { once } from "node:events";
import { createServer, type IncomingMessage, type RequestListener, type Server } from "node:http";
import type { AddressInfo } from "node:net";
import { afterEach, describe, expect, test } from "vitest";
import { isPublicAddress } from "#app/integrations/webhook/public-address.ts";
import { postTo } from "#app/integrations/webhook/send-request.ts";

const servers: Server[] = [];
afterEach(() => {
  for (const server of servers.splice(0)) {
    server.closeAllConnections();
    server.close();
  }
});

/** A receiver on this machine, with what it was asked. */
async function receiver(answer: RequestListener) {
  const asked: IncomingMessage[] = [];
  const server = createServer((request, response) => {
    asked.push(request);
    answer(request, response);
  }).listen(0, "127.0.0.1");
  servers.push(server);
  await once(server, "listening");
  return { asked, port: (server.address() as AddressInfo).port };
}

const onThisMachine = (address: string) => address === "127.0.0.1";
const post = (address: string, more: Partial<Parameters<typeof postTo>[0]> = {}) =>
  postTo({ address, headers: { "X-Test": "1" }, body: '{"µ":1}', mayReach: onThisMachine, ...more });

/** A resolver that gives these addresses for every name. */
const always = (...addresses: string[]) =>
  ((_name: string, _options: object, done: (error: null, found: { address: string; family: number }[]) => void) =>
    done(
      null,
      addresses.map((address) => ({ address, family: address.includes(":") ? 6 : 4 })),
    )) as unknown as typeof lookup;

describe("a delivery", () => {
  test("is posted with its headers, and the beginning of the answer is kept", async () => {
    let body = "";
    const { asked, port } = await receiver((request, response) => {
      request.on("data", (piece: Buffer) => (body += piece.toString("utf8")));
      request.on("end", () => response.writeHead(202).end(`taken\0${"x".repeat(5000)}`));
    });
    const answer = await post(`http://127.0.0.1:${port}/hook?a=1`);
    expect(answer).toMatchObject({ status: 202, failure: null });
    expect(answer.body).toMatch(/^takenx+$/);
    expect(answer.body.length).toBeLessThanOrEqual(500);
    expect(body).toBe('{"µ":1}');
    expect(asked[0]).toMatchObject({
      method: "POST",
      url: "/hook?a=1",
      headers: { "x-test": "1", "content-length": "8" },
    });
  });

  test("does not follow a redirect", async () => {
    const { asked, port } = await receiver((_, response) => response.writeHead(307, { Location: "/elsewhere" }).end());
    expect(await post(`http://127.0.0.1:${port}/`)).toMatchObject({ status: 307 });
    expect(asked).toHaveLength(1);
  });

  test("waits no longer than it may, for the beginning or for the rest", async () => {
    const { port } = await receiver((request, response) => {
      if (request.url === "/slow") response.writeHead(200).write("a");
    });
    for (const path of ["/silent", "/slow"])
      expect((await post(`http://127.0.0.1:${port}${path}`, { timeout: 150 })).failure).toMatch(
        /no whole answer within/,
      );
  });

  test("says why there is no answer, and nothing of what it was told of networks", async () => {
    const { port } = await receiver(() => undefined);
    servers.splice(0).forEach((server) => server.close());
    expect((await post(`http://127.0.0.1:${port}/`)).failure).toBe("the connection was refused");
    expect((await post("http://receiver.invalid/", { mayReach: () => true })).failure).toMatch(/address/);
  });
});

describe("an address that may not be reached", () => {
  test.each(["127.0.0.1", "2130706433", "[::ffff:127.0.0.1]"])("is refused as %s", async (host) => {
    const { asked, port } = await receiver((_, response) => response.end());
    const answer = await post(`http://${host}:${port}/`, { mayReach: isPublicAddress });
    expect(answer.failure).toMatch(/network that webhooks do not go to/);
    expect(asked).toEqual([]);
  });

  test("is refused behind a name, alone or among others", async () => {
    const { asked, port } = await receiver((_, response) => response.end());
    for (const addresses of [["127.0.0.1"], ["1.1.1.1", "127.0.0.1"], ["::ffff:127.0.0.1"], ["fe80::1%lo"]]) {
      const answer = await post(`http://receiver.example:${port}/`, {
        mayReach: isPublicAddress,
        resolve: always(...addresses),
      });
      expect(answer.failure, addresses.join()).toMatch(/network that webhooks do not go to/);
    }
    expect(asked).toEqual([]);
  });

  test("is refused on the connection itself, when a name has led elsewhere the moment before", async () => {
    const { asked, port } = await receiver((_, response) => response.end());
    let looks = 0;
    const answer = await post(`http://receiver.example:${port}/`, {
      resolve: always("127.0.0.1"),
      mayReach: () => looks++ === 0,
    });
    expect(answer.failure).toMatch(/network that webhooks do not go to/);
    expect(asked).toEqual([]);
  });

  test("is not refused behind a name where it may be reached", async () => {
    const { asked, port } = await receiver((_, response) => response.end("ok"));
    const answer = await post(`http://receiver.example:${port}/`, { resolve: always("127.0.0.1") });
    expect(answer).toMatchObject({ status: 200, body: "ok" });
    expect(asked[0]?.headers.host).toBe(`receiver.example:${port}`);
  });
});
