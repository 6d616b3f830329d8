import { randomUUID } from "node:crypto";
import { once } from "node:events";
import { createServer, type IncomingHttpHeaders, type Server } from "node:http";
import type { AddressInfo } from "node:net";
import { afterAll, beforeAll, beforeEach, describe, expect, test } from "vitest";
import type { WebhookEventName } from "#app/schemas/webhook.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { scopeOfPerson } from "#tests/db/people.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";

process.env["WEBHOOK_NETWORKS"] = "127.0.0.1";
process.env["WEBHOOK_HTTP"] = "1";

const database = useDatabase({ demo: true });
const status = (code: number) => expect.objectContaining({ init: { status: code } }) as unknown;

const hooks = () => import("#app/services/webhooks/webhooks.server.ts");
const log = () => import("#app/services/webhooks/deliveries.server.ts");
const scopes = () => import("#app/server/scope.server.ts");

let owner: ActorScope;
let engineer: ActorScope;
let technician: ActorScope;
let guest: ActorScope;
let server: Server;
let address = "";
let asked: { headers: IncomingHttpHeaders; body: string }[] = [];
let answer: { status: number; headers?: Record<string, string> } = { status: 200 };

beforeAll(async () => {
  await Promise.all([hooks(), log(), import("#app/services/webhooks/send-delivery.server.ts")]);
  owner = await scopeOfPerson(database, "process-owner");
  engineer = await scopeOfPerson(database, "engineer");
  technician = await scopeOfPerson(database, "technician");
  guest = await scopeOfPerson(database, "guest");
  server = createServer((request, response) => {
    let body = "";
    request.on("data", (piece: Buffer) => (body += piece.toString("utf8")));
    request.on("end", () => {
      asked.push({ headers: request.headers, body });
      response.writeHead(answer.status, answer.headers).end("noted");
    });
  }).listen(0, "127.0.0.1");
  await once(server, "listening");
  address = `http://127.0.0.1:${(server.address() as AddressInfo).port}/hook`;
}, 90_000);
afterAll(() => server.close());
beforeEach(async () => {
  asked = [];
  answer = { status: 200 };
  await asOwner(database, "delete from webhook");
  await asOwner(database, "delete from graphile_worker._private_jobs");
});

const programOf = ({ actor }: ActorScope, slug: string) => {
  const held = actor.memberships.find(({ programSlug }) => programSlug === slug);
  return { id: held?.programId ?? "", slug, name: held?.programName ?? "" };
};

const ALL: WebhookEventName[] = ["sheet.released", "incident.reported", "step.stopped"];

async function make(by = owner, slug = "tern", more: { address?: string; events?: WebhookEventName[] } = {}) {
  const { makeWebhook } = await hooks();
  const made = await makeWebhook(by, {
    name: "Line board",
    program: programOf(by, slug).id,
    address: more.address ?? address,
    events: more.events ?? ALL,
  });
  if ("refused" in made) throw new Error(made.refused);
  return made;
}

/** Something that happens in a program, by whoever works there. */
async function stop(slug = "tern", key: string = randomUUID(), by = technician) {
  const { raiseEvent } = await import("#app/services/webhooks/raise-event.server.ts");
  const { inScope } = await scopes();
  await inScope(by, (em) =>
    raiseEvent(em, {
      program: programOf(by, slug),
      event: "step.stopped",
      key,
      about: "Step 14, debond",
      by: by.actor.id,
      data: { stop_id: key, lot_id: randomUUID(), lot: "L-1", flow: "T-2", step: 14, step_title: "debond" },
    }),
  );
  return key;
}

interface Row {
  id: string;
  state: string;
  attempts: number;
  reason: string;
  webhook_id: string;
  tries: { status: number | null; said: string }[];
}
const rows = () => asOwner<Row>(database, "select * from webhook_delivery order by created_at, id");
const first = async () => (await rows())[0] as Row;

/** Does what the worker does with all that is in the queue, whatever its hour. */
async function work() {
  const { sendDelivery } = await import("#app/services/webhooks/send-delivery.server.ts");
  const { postWebhook } = await import("#app/integrations/webhook/configured.server.ts");
  await asOwner(
    database,
    "update webhook_delivery set next_try_at = now() - interval '1 second' where state = 'waiting'",
  );
  const queued = await asOwner<{ payload: unknown }>(
    database,
    "delete from graphile_worker._private_jobs where key like 'webhook %' returning payload",
  );
  for (const { payload } of queued) await sendDelivery(payload, postWebhook);
  return queued.length;
}

describe("what happens", () => {
  test("is written with it, sent once, and signed", async () => {
    const { secret } = await make();
    const key = await stop();
    await stop("tern", key);
    expect(await rows()).toHaveLength(1);
    await work();
    await work();
    expect(asked).toHaveLength(1);
    const [{ headers, body } = { headers: {}, body: "" }] = asked;
    const { id } = await first();
    expect(JSON.parse(body)).toMatchObject({
      event: "step.stopped",
      program: { slug: "tern", name: "Tern" },
      data: { stop_id: key, step: 14 },
    });
    const { hmacOf } = await import("#app/services/webhooks/sign.server.ts");
    const timestamp = headers["planeward-timestamp"];
    expect(headers["planeward-delivery"]).toBe(id);
    expect(headers["planeward-signature"]).toBe(`v1=${hmacOf(secret, `${timestamp as string}.${body}`)}`);
    expect(Math.abs(Date.now() / 1000 - Number(timestamp))).toBeLessThan(60);
    expect(await first()).toMatchObject({ state: "sent", attempts: 1, tries: [{ status: 200, said: "noted" }] });
  });

  test("leaves nothing when its transaction does not end, and is in the queue from its end on", async () => {
    const { id } = await make();
    const { inScope } = await scopes();
    const { raiseEvent } = await import("#app/services/webhooks/raise-event.server.ts");
    const failing = inScope(technician, async (em) => {
      await raiseEvent(em, {
        program: programOf(technician, "tern"),
        event: "step.stopped",
        key: "k",
        about: "Step 1",
        by: technician.actor.id,
        data: { stop_id: "1", lot_id: "1", lot: "L", flow: "F", step: 1, step_title: "grind" },
      });
      throw new Error("killed before its end");
    });
    await expect(failing).rejects.toThrow(/killed/);
    expect(await rows()).toEqual([]);
    // Whoever wrote it may be gone at once: the queue has it.
    await stop();
    const queued = await asOwner<{ queue_name: string }>(
      database,
      "select queue_name from graphile_worker.jobs where key = ?",
      [`webhook ${(await first()).id}`],
    );
    expect(queued).toEqual([{ queue_name: `webhook ${id}` }]);
    expect(await work()).toBe(1);
    expect(asked).toHaveLength(1);
  });

  test("of another program never goes, whatever is written", async () => {
    const tern = await make(owner, "tern");
    const petrel = await make(owner, "petrel");
    await stop("tern");
    expect((await rows()).map(({ webhook_id }) => webhook_id)).toEqual([tern.id]);
    const { writeDelivery } = await import("#app/services/webhooks/write-delivery.server.ts");
    const { inScope } = await scopes();
    const crossing = inScope(owner, (em) =>
      writeDelivery(em, {
        program: programOf(owner, "tern").id,
        webhook: petrel.id,
        event: "step.stopped",
        key: "crossing",
        eventId: randomUUID(),
        about: "",
        body: "{}",
        by: owner.actor.id,
      }),
    );
    await expect(crossing).rejects.toThrow(/own program alone/);
    await expect(asOwner(database, "update webhook_delivery set webhook_id = ?", [petrel.id])).rejects.toThrow(
      /never changes/,
    );
  });

  test("goes to nobody who may not read it, when it happens or when it is sent", async () => {
    await make(guest, "tern");
    await stop();
    expect(await rows()).toEqual([]);
    await make(engineer, "tern");
    await stop();
    expect(await rows()).toHaveLength(1);
    const engineerId = engineer.actor.id;
    await asOwner(database, "update membership set role = 'guest' where person_id = ?", [engineerId]);
    await work();
    expect(asked).toEqual([]);
    expect(await first()).toMatchObject({ state: "parked", reason: expect.stringMatching(/may not see/) as string });
    await asOwner(database, "update membership set role = 'engineer' where person_id = ?", [engineerId]);
  });
});

describe("a receiver that does not take it", () => {
  test("is asked again after a pause, and given up after the last attempt with its reason", async () => {
    const { MOST_ATTEMPTS } = await import("#app/services/mail/back-off.ts");
    await make();
    await stop();
    answer = { status: 503 };
    await work();
    expect(await first()).toMatchObject({ state: "waiting", attempts: 1, reason: "It answered 503." });
    // Its hour has not come, so whoever is called too early puts it back.
    const { sendDelivery } = await import("#app/services/webhooks/send-delivery.server.ts");
    await sendDelivery({ id: (await first()).id }, () => Promise.reject(new Error("too early")));
    expect(asked).toHaveLength(1);
    for (let attempt = 2; attempt <= MOST_ATTEMPTS; attempt++) await work();
    expect(asked).toHaveLength(MOST_ATTEMPTS);
    expect(await first()).toMatchObject({
      state: "parked",
      reason: "Not taken in 14 attempts. Lastly it answered 503.",
    });
    expect(await work()).toBe(0);
  });

  test("is not followed elsewhere, nor reached in a network that nobody named", async () => {
    await make();
    await stop();
    answer = { status: 302, headers: { Location: "/elsewhere" } };
    await work();
    expect(asked).toHaveLength(1);
    expect((await first()).reason).toBe("It answered 302, a redirect, which is not followed.");
    await asOwner(database, "delete from webhook");
    asked = [];
    await make(owner, "tern", { address: address.replace("127.0.0.1", "127.0.0.2") });
    await stop();
    await work();
    expect((await first()).reason).toMatch(/network that webhooks do not go to/);
    expect(asked).toEqual([]);
  });

  test("gets it once more when its sender died in the middle", async () => {
    await make();
    await stop();
    const { sendDelivery } = await import("#app/services/webhooks/send-delivery.server.ts");
    const { queueLostDeliveries } = await import("#app/services/webhooks/lost-deliveries.server.ts");
    let reached = () => undefined as void;
    const sending = new Promise<void>((resolve) => (reached = resolve));
    const { id } = await first();
    await asOwner(database, "delete from graphile_worker._private_jobs");
    void sendDelivery({ id }, () => {
      reached();
      return new Promise(() => undefined);
    });
    await sending;
    expect(await first()).toMatchObject({ state: "sending", attempts: 1 });
    // Nobody begins another attempt while one may be under way.
    await queueLostDeliveries();
    expect(await work()).toBe(0);
    await asOwner(database, "update webhook_delivery set lease_until = now() - interval '1 minute'");
    await queueLostDeliveries();
    await work();
    expect(asked).toHaveLength(1);
    expect(await first()).toMatchObject({ state: "sent", attempts: 2 });
  });

  test("is left alone after three days of failures, and its maker is told by mail", async () => {
    const { id } = await make(engineer);
    await stop();
    answer = { status: 500 };
    await asOwner(database, "update webhook set failures = 30, failing_since = now() - interval '70 hours'");
    await work();
    expect(await asOwner(database, "select state from webhook")).toEqual([{ state: "on" }]);
    await asOwner(database, "update webhook set failing_since = now() - interval '73 hours'");
    await work();
    expect(await asOwner(database, "select state, failures from webhook")).toEqual([{ state: "off", failures: 32 }]);
    expect(
      await asOwner(database, "select person_id, state from mail_outbox where kind = 'webhook switched off'"),
    ).toEqual([{ person_id: engineer.actor.id, state: "waiting" }]);
    await work();
    expect(await first()).toMatchObject({ state: "parked", reason: "The webhook is switched off." });
    await stop();
    expect(await rows()).toHaveLength(1);
    await (await hooks()).switchWebhook(engineer, id, "on");
    answer = { status: 200 };
    await stop();
    await work();
    expect(await asOwner(database, "select state, failures, failing_since from webhook")).toEqual([
      { state: "on", failures: 0, failing_since: null },
    ]);
  });
});

describe("by hand", () => {
  test("what ended is sent once more with the same body, and a test is tried once", async () => {
    const { id } = await make();
    await stop();
    const { sendAgain, sendTest } = await log();
    const delivery = (await first()).id;
    await expect(sendAgain(owner, id, delivery)).rejects.toEqual(status(409));
    await work();
    const again = await sendAgain(owner, id, delivery);
    await work();
    expect(asked[1]?.body).toBe(asked[0]?.body);
    expect(asked[1]?.headers["planeward-delivery"]).toBe(again);
    answer = { status: 404 };
    const tried = await sendTest(owner, id);
    await work();
    const { deliveryView } = await log();
    expect(await deliveryView(owner, id, tried)).toMatchObject({
      event: "test",
      state: "parked",
      reason: "It answered 404.",
      byHand: owner.actor.name,
      tries: [{ status: 404, said: "noted" }],
    });
    const trail = await asOwner<{ action: string; subject: string; field: string | null }>(
      database,
      "select action, subject, field from audit_event where subject like '%webhook%' and request_id = 'test' and at > now() - interval '1 minute'",
    );
    expect(trail.filter(({ subject }) => subject === "delivery of a webhook")).toHaveLength(2);
  });

  test("a secret is shown once, kept sealed, renewed, and in no trail", async () => {
    const { id, secret } = await make();
    const renewed = await (await hooks()).renewSecret(owner, id);
    expect(renewed).not.toBe(secret);
    await (await log()).sendTest(owner, id);
    await work();
    const { hmacOf } = await import("#app/services/webhooks/sign.server.ts");
    const [{ headers, body } = { headers: {} as IncomingHttpHeaders, body: "" }] = asked;
    const signed = `${headers["planeward-timestamp"] as string}.${body}`;
    expect(headers["planeward-signature"]).toBe(`v1=${hmacOf(renewed, signed)}`);
    const kept = await asOwner<{ all: string }>(
      database,
      "select to_jsonb(w)::text as all from webhook w union all select to_jsonb(d)::text from webhook_delivery d union all select to_jsonb(a)::text from audit_event a",
    );
    const sealed = await asOwner<{ sealed_secret: string }>(database, "select sealed_secret from webhook");
    for (const hidden of [secret, renewed]) expect(kept.some(({ all }) => all.includes(hidden))).toBe(false);
    const trail = await asOwner<{ all: string }>(database, "select to_jsonb(a)::text as all from audit_event a");
    expect(trail.some(({ all }) => all.includes(sealed[0]?.sealed_secret ?? "?"))).toBe(false);
    await asOwner(database, "update webhook set sealed_secret = 's1.AAAA.AAAA.AAAA'");
    await (await log()).sendTest(owner, id);
    await work();
    expect((await rows()).at(-1)).toMatchObject({
      state: "parked",
      reason: expect.stringMatching(/Renew the secret/) as string,
    });
  });

  test("somebody's webhook is their own and of who looks after the program, and nobody else's", async () => {
    const { id } = await make(technician);
    await stop();
    const { id: delivery } = await first();
    const { webhookPage, webhooksView, switchWebhook, renewSecret, deleteWebhook } = await hooks();
    const { listDeliveries, deliveryView, sendAgain, sendTest } = await log();
    const params = { query: "", sort: "written", descending: true, page: 1, filters: {} };
    for (const other of [engineer, guest]) {
      expect((await webhooksView(other)).rows).toEqual([]);
      for (const deed of [
        () => webhookPage(other, id),
        () => listDeliveries(other, id, params),
        () => deliveryView(other, id, delivery),
        () => sendAgain(other, id, delivery),
        () => sendTest(other, id),
        () => switchWebhook(other, id, "off"),
        () => renewSecret(other, id),
        () => deleteWebhook(other, id),
      ])
        await expect(deed()).rejects.toEqual(status(404));
      // The wall below says the same to a query that forgets to ask.
      const { inScope } = await scopes();
      for (const table of ["webhook", "webhook_delivery"])
        expect(await inScope(other, (em) => em.execute(`select 1 from ${table}`))).toEqual([]);
    }
    const old = { ...technician, session: { codes: "off" as const, id: randomUUID(), provenAt: 0 } };
    await expect(make(old)).rejects.toEqual(status(403));
    await expect(renewSecret(old, id)).rejects.toEqual(status(403));
    expect((await webhooksView(owner)).rows).toMatchObject([{ id, madeBy: technician.actor.name, makerLeft: false }]);
    await asOwner(database, "update person set active = false where id = ?", [technician.actor.id]);
    expect((await webhookPage(owner, id)).webhook.makerLeft).toBe(true);
    await asOwner(database, "update person set active = true where id = ?", [technician.actor.id]);
    expect((await listDeliveries(owner, id, { ...params, query: "%" })).total).toBe(0);
    expect((await listDeliveries(owner, id, { ...params, query: "debond" })).total).toBe(1);
    expect((await listDeliveries(owner, id, { ...params, filters: { state: "sent" } })).total).toBe(0);
    await deleteWebhook(owner, id);
    expect(await rows()).toEqual([]);
    await expect(webhookPage(technician, id)).rejects.toEqual(status(404));
  });
});

test("the log goes back thirty days, and what is on its way stays", async () => {
  await make();
  for (const [state, days] of [
    ["sent", 31],
    ["parked", 31],
    ["waiting", 31],
    ["sent", 29],
  ] as const) {
    const key = await stop();
    await asOwner(database, "alter table webhook_delivery disable trigger keep_webhook_delivery");
    await asOwner(
      database,
      "update webhook_delivery set state = ?, created_at = now() - make_interval(days => ?) where key = ?",
      [state, days, key],
    );
    await asOwner(database, "alter table webhook_delivery enable trigger keep_webhook_delivery");
  }
  const { forgetOldDeliveries } = await import("#app/services/webhooks/lost-deliveries.server.ts");
  expect(await forgetOldDeliveries()).toBe(2);
  expect((await rows()).map(({ state }) => state).toSorted()).toEqual(["sent", "waiting"]);
});
