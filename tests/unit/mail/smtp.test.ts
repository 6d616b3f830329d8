import { mkdtemp, readFile, rm } from "node:fs/promises";
import { createServer } from "node:net";
import { once } from "node:events";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterAll, beforeAll, expect, test } from "vitest";
import { readKept } from "#app/integrations/mail/fake/kept-mail.ts";
import { startMailServer } from "#app/integrations/mail/fake/mail-server.ts";
import { smtpTransport } from "#app/integrations/mail/smtp.server.ts";
import type { OutgoingMail } from "#app/integrations/mail/transport.ts";
import { backOff, MOST_ATTEMPTS } from "#app/services/mail/back-off.ts";

const FROM = { name: "Planeward", address: "planeward@site.example" };
const mail = (changes: Partial<OutgoingMail> = {}): OutgoingMail => ({
  messageId: "<1@site.example>",
  to: { name: "Lea Winter", address: "lea@site.example" },
  subject: "Tern: lot held at 20 µm",
  text: "Planeward\n\n20 µm\n",
  html: `<p>20 µm</p><img src="cid:mark@planeward">`,
  pictures: [{ cid: "mark@planeward", fileName: "planeward.png", content: Buffer.from("picture") }],
  unsubscribe: "https://site.example/unsubscribe/token?kind=sheet%20released",
  sentAt: new Date("2026-12-02T10:00:00Z"),
  ...changes,
});

let folder: string;
let server: Awaited<ReturnType<typeof startMailServer>>;

beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), "planeward-mail-"));
  server = await startMailServer({ port: 0, folder });
});
afterAll(async () => {
  await server.stop();
  await rm(folder, { recursive: true });
});

const toServer = () => smtpTransport({ url: `smtp://127.0.0.1:${server.port}`, from: FROM });

/** A server of a mail's beginning: it answers each line by the first words that fit. */
async function scripted(answers: [RegExp, string | null][]) {
  const listener = createServer((socket) => {
    socket.on("error", () => undefined);
    socket.write("220 scripted\r\n");
    socket.on("data", (data) => {
      const found = answers.find(([words]) => words.test(String(data)));
      if (found?.[1] === null) socket.destroy();
      else socket.write(`${found?.[1] ?? "250 fine"}\r\n`);
    });
  });
  listener.listen(0, "127.0.0.1");
  await once(listener, "listening");
  const address = listener.address();
  const port = typeof address === "object" && address ? address.port : 0;
  return { transport: smtpTransport({ url: `smtp://127.0.0.1:${port}`, from: FROM }), stop: () => listener.close() };
}

test("a mail arrives whole, as text and HTML, with its own picture and the headers to stop it", async () => {
  expect(await toServer().send(mail())).toEqual({ outcome: "accepted" });
  const [kept] = await readKept(folder);
  expect(kept).toMatchObject({
    messageId: "<1@site.example>",
    to: ["lea@site.example"],
    from: "planeward@site.example",
    subject: "Tern: lot held at 20 µm",
    // The last line of a mail ends, as every line does.
    html: `<p>20 µm</p><img src="data:image/png;base64,${Buffer.from("picture").toString("base64")}">\n`,
  });
  expect(kept?.text.trim()).toBe("Planeward\n\n20 µm");
  expect(kept?.headers).toMatchObject({
    "auto-submitted": "auto-generated",
    "list-unsubscribe": "<https://site.example/unsubscribe/token?kind=sheet%20released>",
    "list-unsubscribe-post": "List-Unsubscribe=One-Click",
  });
});

test("a mail that comes again is kept once, and both deliveries are noted", async () => {
  await toServer().send(mail({ messageId: "<2@site.example>" }));
  await toServer().send(mail({ messageId: "<2@site.example>" }));
  expect((await readKept(folder)).filter(({ messageId }) => messageId === "<2@site.example>")).toHaveLength(1);
  const noted = (await readFile(join(folder, "deliveries.jsonl"), "utf8"))
    .split("\n")
    .filter((line) => line.includes("<2@"));
  expect(noted.map((line) => (JSON.parse(line) as { repeated: boolean }).repeated)).toEqual([false, true]);
});

test("no name and no subject makes a header of its own", async () => {
  const messageId = "<3@site.example>";
  const to = { name: "Lea\r\nBcc: everybody@site.example", address: "lea@site.example" };
  await toServer().send(mail({ messageId, to, subject: "held\r\nX-Evil: yes\r\n\r\nnew body" }));
  const kept = (await readKept(folder)).find((each) => each.messageId === messageId);
  expect(Object.keys(kept?.headers ?? {})).not.toContain("bcc");
  expect(Object.keys(kept?.headers ?? {})).not.toContain("x-evil");
  expect(kept?.to).toEqual(["lea@site.example"]);
  expect(kept?.text.trim()).toBe("Planeward\n\n20 µm");
});

test("a server that is not there, or not now, is asked again later", async () => {
  const nobody = smtpTransport({ url: "smtp://127.0.0.1:9", from: FROM });
  expect(await nobody.send(mail())).toMatchObject({ outcome: "not now" });
  const busy = await scripted([[/^RCPT/, "451 try later"]]);
  expect(await busy.transport.send(mail())).toMatchObject({ outcome: "not now", reason: expect.stringMatching(/451/) });
  busy.stop();
});

test("a recipient that the server does not know is refused for good", async () => {
  const strict = await scripted([[/^RCPT/, "550 nobody of that name"]]);
  expect(await strict.transport.send(mail())).toMatchObject({
    outcome: "refused",
    reason: expect.stringMatching(/550/),
  });
  strict.stop();
});

test("nobody knows how it went when the connection ends after the text has begun; before it, everybody does", async () => {
  const after = await scripted([
    [/^DATA/, "354 go on"],
    [/Message-ID/, null],
  ]);
  expect(await after.transport.send(mail())).toMatchObject({ outcome: "unsure" });
  after.stop();
  const before = await scripted([[/^DATA/, null]]);
  expect(await before.transport.send(mail())).toMatchObject({ outcome: "not now" });
  before.stop();
});

test("attempts lie further and further apart, a quarter more or less, and end after some hours", () => {
  expect([1, 2, 3].map((attempt) => backOff(attempt, 0.5))).toEqual([5_000, 10_000, 20_000]);
  expect([backOff(1, 0), backOff(1, 1)]).toEqual([3_750, 6_250]);
  expect(backOff(30, 0.5)).toBe(7_200_000);
  const hours =
    Array.from({ length: MOST_ATTEMPTS - 1 }, (_, n) => backOff(n + 1, 0.5)).reduce((a, b) => a + b) / 3.6e6;
  expect(hours).toBeGreaterThan(5);
  expect(hours).toBeLessThan(9);
});
