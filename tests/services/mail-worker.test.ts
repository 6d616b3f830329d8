import { spawn, type ChildProcess } from "node:child_process";
import { randomUUID } from "node:crypto";
import { once } from "node:events";
import { mkdtemp, readFile, rm } from "node:fs/promises";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { fileURLToPath } from "node:url";
import { afterEach, beforeAll, beforeEach, expect, test } from "vitest";
import { readKept } from "#app/integrations/mail/fake/kept-mail.ts";
import { startMailServer } from "#app/integrations/mail/fake/mail-server.ts";
import type { AnnouncementInput } from "#app/schemas/announcement.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { scopeOfPerson } from "#tests/db/people.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";

const database = useDatabase({ demo: true });
const root = fileURLToPath(new URL("../..", import.meta.url));
const LONG = { timeout: 90_000 };

let folder = "";
let owner: ActorScope;
let engineer: ActorScope;
const started: ChildProcess[] = [];
const servers: { stop: () => Promise<void> }[] = [];

beforeAll(async () => {
  await import("#app/services/mail/announce.server.ts");
  owner = await scopeOfPerson(database, "process-owner");
  engineer = await scopeOfPerson(database, "engineer");
}, 60_000);

beforeEach(async () => {
  folder = await mkdtemp(join(tmpdir(), "planeward-mail-"));
  // What the look for assessments that are out of date writes would be sent as well.
  await asOwner(database, "delete from mail_outbox");
  await asOwner(database, "select graphile_worker.complete_jobs(array(select id from graphile_worker.jobs))");
});

afterEach(async () => {
  for (const worker of started.splice(0)) worker.kill("SIGKILL");
  for (const server of servers.splice(0)) await server.stop();
  await rm(folder, { recursive: true, force: true });
});

interface Pauses {
  beforeKept?: () => Promise<void>;
  afterKept?: () => Promise<void>;
}

async function mailServer(port = 0, pause: Pauses = {}) {
  const server = await startMailServer({ port, folder, pause });
  servers.push(server);
  return server.port;
}

/** The real worker, on this file's database. Where it may look at what arrived, it can tell; a mail server at large tells nobody. */
function startWorker(port: number, mayLook: boolean): ChildProcess {
  const worker = spawn(process.execPath, ["--import", "tsx", "app/jobs/worker.ts"], {
    cwd: root,
    env: {
      ...process.env,
      DATABASE_URL: database.appUrl,
      NODE_ENV: "production",
      LOG_LEVEL: "silent",
      SMTP_URL: `smtp://127.0.0.1:${port}`,
      MAIL_FROM: "Planeward <planeward@kestrel-ridge.example>",
      PUBLIC_ADDRESS: "http://127.0.0.1:3000",
      DEMO_MAIL_FOLDER: mayLook ? folder : undefined,
    },
    stdio: "ignore",
  });
  started.push(worker);
  return worker;
}

const about = { program: "Tern", by: "Mikael Lindqvist", path: "/sheets" };
const HELD: AnnouncementInput = { kind: "lot held", ...about, lot: "T-0412", reason: "" };
const RELEASED: AnnouncementInput = {
  kind: "sheet released",
  ...about,
  sheet: "TERN-S001",
  flow: "T-2",
  revision: "B",
};

async function announce(announcement: AnnouncementInput): Promise<void> {
  const { inScope } = await import("#app/server/scope.server.ts");
  const { announce: write } = await import("#app/services/mail/announce.server.ts");
  const program = owner.actor.memberships.find(({ programSlug }) => programSlug === "tern")?.programId ?? "";
  const key = randomUUID();
  await inScope(owner, (em) => write(em, { program, announcement, key, to: [engineer.actor.id], by: owner.actor.id }));
}

const row = async () => {
  const [found] = await asOwner<{ state: string; attempts: number; reason: string; message_id: string }>(
    database,
    "select state, attempts, reason, message_id from mail_outbox where kind in ('lot held', 'sheet released')",
  );
  return found;
};
const state = async () => (await row())?.state;

/** Message-IDs of everything that was handed over whole and kept, in order, repeats included. */
async function deliveries(): Promise<string[]> {
  const text = await readFile(join(folder, "deliveries.jsonl"), "utf8").catch(() => "");
  return text
    .split("\n")
    .filter(Boolean)
    .map((line) => (JSON.parse(line) as { messageId: string }).messageId);
}
const inbox = async () => (await readKept(folder)).map(({ messageId }) => messageId);

/** A moment that a test waits for and that a mail server, once it has come, does not go beyond. */
function held() {
  let reached: () => void = () => undefined;
  const at = new Promise<void>((resolve) => (reached = resolve));
  const wait = () => {
    reached();
    return new Promise<void>(() => undefined);
  };
  return { at, wait };
}

/** Lets the lease of whoever was killed run out at once, instead of after half a minute. */
const endLease = () =>
  asOwner(database, "update mail_outbox set lease_until = now() - interval '1 minute' where state = 'sending'");

async function kill(worker: ChildProcess): Promise<void> {
  worker.kill("SIGKILL");
  await once(worker, "exit");
}

test("mail waits while its server is down and arrives once it is back", LONG, async () => {
  const port = await mailServer();
  await servers.pop()?.stop();
  startWorker(port, true);
  await announce(HELD);
  await expect.poll(async () => (await row())?.reason ?? "", { timeout: 30_000 }).toContain("ECONNREFUSED");
  expect(await row()).toMatchObject({ state: "waiting", attempts: 1 });
  await mailServer(port);
  await expect.poll(state, { timeout: 45_000 }).toBe("sent");
  expect(await deliveries()).toHaveLength(1);
});

test.each([
  { name: "an essential mail", announcement: HELD, mayLook: false },
  { name: "any mail where arrivals can be looked at", announcement: RELEASED, mayLook: true },
])("$name is sent by the next worker when one is killed before the server has it", LONG, async (asked) => {
  const hold = held();
  const port = await mailServer(0, { beforeKept: hold.wait });
  const worker = startWorker(port, asked.mayLook);
  await announce(asked.announcement);
  await hold.at;
  await kill(worker);
  expect(await row()).toMatchObject({ state: "sending", attempts: 1 });
  expect(await deliveries()).toEqual([]);
  // The one that holds what it got is gone as well; another takes its place.
  await servers.pop()?.stop();
  startWorker(await mailServer(), asked.mayLook);
  await endLease();
  await expect.poll(state, { timeout: 45_000 }).toBe("sent");
  expect(await deliveries()).toEqual([(await row())?.message_id]);
});

test("a mail that has arrived is not sent again when its worker is killed before it could note so", LONG, async () => {
  const hold = held();
  const port = await mailServer(0, { afterKept: hold.wait });
  const worker = startWorker(port, true);
  await announce(RELEASED);
  await hold.at;
  await kill(worker);
  expect(await row()).toMatchObject({ state: "sending" });
  await servers.pop()?.stop();
  startWorker(await mailServer(), true);
  await endLease();
  await expect.poll(state, { timeout: 45_000 }).toBe("sent");
  expect(await deliveries()).toHaveLength(1);
  expect(await inbox()).toEqual([(await row())?.message_id]);
});

test("where nobody can tell, an essential mail is delivered twice and read once", LONG, async () => {
  const hold = held();
  const port = await mailServer(0, { afterKept: hold.wait });
  const worker = startWorker(port, false);
  await announce(HELD);
  await hold.at;
  await kill(worker);
  await servers.pop()?.stop();
  startWorker(await mailServer(), false);
  await endLease();
  await expect.poll(state, { timeout: 45_000 }).toBe("sent");
  const id = (await row())?.message_id;
  expect(await deliveries()).toEqual([id, id]);
  expect(await inbox()).toEqual([id]);
});

test("where nobody can tell, any other mail is parked with its reason and not sent twice", LONG, async () => {
  const hold = held();
  const port = await mailServer(0, { afterKept: hold.wait });
  const worker = startWorker(port, false);
  await announce(RELEASED);
  await hold.at;
  await kill(worker);
  await servers.pop()?.stop();
  startWorker(await mailServer(), false);
  await endLease();
  await expect.poll(state, { timeout: 45_000 }).toBe("parked");
  expect((await row())?.reason).toMatch(/^It may have arrived/);
  expect(await deliveries()).toHaveLength(1);
});
