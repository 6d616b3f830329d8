import { randomUUID } from "node:crypto";
import { beforeAll, beforeEach, describe, expect, test } from "vitest";
import type { Delivery, MailTransport, OutgoingMail } from "#app/integrations/mail/transport.ts";
import type { AnnouncementInput } from "#app/schemas/announcement.ts";
import type { MailState } from "#app/schemas/outbox.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { leave, scopeOfPerson } from "#tests/db/people.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";

const database = useDatabase({ demo: true });

const scopes = () => import("#app/server/scope.server.ts");
const announcing = () => import("#app/services/mail/announce.server.ts");
const sending = () => import("#app/services/mail/send-mail.server.ts");
const digests = () => import("#app/services/mail/make-digests.server.ts");
const choosing = () => import("#app/services/mail/my-choices.server.ts");
const outbox = () => import("#app/services/mail/outbox.server.ts");
const lost = () => import("#app/services/mail/lost-mail.server.ts");

const PEOPLE = ["engineer", "technician", "process-owner", "second-process-owner", "administrator", "guest"] as const;
const people = {} as Record<(typeof PEOPLE)[number], ActorScope>;
let tern = "";

beforeAll(async () => {
  process.env["PUBLIC_ADDRESS"] = "https://planeward.site.example/";
  process.env["MAIL_FROM"] = "Planeward <planeward@site.example>";
  await leave(database, "technician", "petrel");
  for (const person of PEOPLE) people[person] = await scopeOfPerson(database, person);
  tern = programOf("tern");
  await Promise.all([announcing(), sending(), digests(), choosing(), outbox(), lost()]);
}, 60_000);

beforeEach(async () => {
  await asOwner(database, "update mail_outbox set digest_id = null");
  await asOwner(database, "delete from mail_outbox");
  await asOwner(database, "delete from mail_choice");
  await asOwner(database, "select graphile_worker.complete_jobs(array(select id from graphile_worker.jobs))");
});

const programOf = (slug: string) =>
  people["process-owner"].actor.memberships.find(({ programSlug }) => programSlug === slug)?.programId ?? "";
const idOf = (person: (typeof PEOPLE)[number]) => people[person].actor.id;

const about = { program: "Tern", by: "Mikael Lindqvist", path: "/sheets" };
const HELD: AnnouncementInput = { kind: "lot held", ...about, lot: "T-0412", reason: "Came in at twice the bow." };
const RELEASED: AnnouncementInput = {
  kind: "sheet released",
  ...about,
  sheet: "TERN-S001",
  flow: "Tern T-2",
  revision: "B",
  changes: ["Copper, plated: thickness"],
};

interface Asked {
  announcement?: AnnouncementInput;
  to?: readonly (typeof PEOPLE)[number][];
  by?: (typeof PEOPLE)[number];
  program?: string;
  key?: string;
}

/** Announces something within a transaction of the person who did it. */
async function announce({ announcement = HELD, to = ["engineer"], by = "process-owner", program, key }: Asked = {}) {
  const { inScope } = await scopes();
  const { announce: write } = await announcing();
  await inScope(people[by], (em) =>
    write(em, { program: program ?? tern, announcement, key: key ?? randomUUID(), to: to.map(idOf), by: idOf(by) }),
  );
}

interface Row {
  id: string;
  email: string;
  kind: string;
  state: MailState;
  attempts: number;
  reason: string;
  message_id: string;
  next_try_at: Date;
  announcement: Record<string, unknown>;
}

const rows = () =>
  asOwner<Row>(
    database,
    "select m.*, split_part(p.email, '@', 1) as email from mail_outbox m join person p on p.id = m.person_id order by m.created_at, p.email",
  );
const told = async () => (await rows()).map(({ email }) => email);
const queued = async () =>
  (await asOwner<{ key: string }>(database, "select key from graphile_worker.jobs order by key")).map(({ key }) => key);

/** A mail server that answers as it is told and keeps what it gets. */
function server(answers: Delivery[], arrived: boolean | null = null) {
  const got: OutgoingMail[] = [];
  const transport: MailTransport = {
    send: (mail) => {
      got.push(mail);
      return Promise.resolve(answers.shift() ?? { outcome: "accepted" });
    },
    has: () => Promise.resolve(arrived),
  };
  return { transport, got };
}
const send = async (id: string, transport: MailTransport) => (await sending()).sendMail({ id }, transport);
const one = async () => {
  const [row] = await rows();
  if (!row) throw new Error("nothing is in the outbox");
  return row;
};

describe("announcing", () => {
  test("writes a mail for each person and puts it into the queue, all in the transaction of what it tells", async () => {
    await announce({ to: ["engineer", "technician", "engineer"] });
    expect(await told()).toEqual(["engineer", "technician"]);
    expect(await queued()).toEqual((await rows()).map(({ id }) => `mail ${id}`).toSorted());
    expect((await one()).message_id).toMatch(/^<[0-9a-f-]{36}@site\.example>$/);
  });

  test("leaves nothing, in outbox or queue, when what it tells did not happen", async () => {
    const { inScope } = await scopes();
    const { announce: write } = await announcing();
    const undone = inScope(people["process-owner"], async (em) => {
      await write(em, {
        program: tern,
        announcement: HELD,
        key: "1",
        to: [idOf("engineer")],
        by: idOf("process-owner"),
      });
      throw new Error("the save failed");
    });
    await expect(undone).rejects.toThrow("the save failed");
    expect(await rows()).toEqual([]);
    expect(await queued()).toEqual([]);
  });

  test("tells nobody the same twice, and something else of the same kind again", async () => {
    await announce({ key: "revision 1" });
    await announce({ key: "revision 1", to: ["engineer", "technician"] });
    await announce({ key: "revision 2" });
    expect(await told()).toEqual(["engineer", "technician", "engineer"]);
  });

  test("passes over whoever did it, and whom the page would not open for", async () => {
    await announce({ to: ["process-owner", "guest", "administrator", "engineer"] });
    expect(await told()).toEqual(["engineer"]);
    await announce({ announcement: RELEASED, to: ["guest", "administrator"] });
    expect(await told()).toEqual(["engineer", "administrator", "guest"]);
  });

  test("passes over who is not of the program, and who has no account in use", async () => {
    await announce({ program: programOf("petrel"), to: ["technician", "guest"] });
    expect(await told()).toEqual([]);
    await asOwner(database, "update person set active = false where id = ?", [idOf("technician")]);
    await announce({ to: ["technician"] });
    await asOwner(database, "update person set active = true where id = ?", [idOf("technician")]);
    expect(await told()).toEqual([]);
  });

  test("tells a guest that a sheet came, and not what the program wrote about it", async () => {
    await announce({ announcement: RELEASED, to: ["guest", "engineer"] });
    const changes = (await rows()).map(({ email, announcement }) => [email, announcement["changes"]]);
    expect(changes).toEqual([
      ["engineer", ["Copper, plated: thickness"]],
      ["guest", []],
    ]);
  });

  test("into a program that is not one's own is refused by the database", async () => {
    const { inScope } = await scopes();
    const foreign = inScope(people["technician"], (em) =>
      em.execute(
        `insert into mail_outbox (id, program_id, person_id, kind, key, state, message_id, attempts, next_try_at, reason, created_at, created_by_id)
           values (gen_random_uuid(), ?, ?, 'lot held', '1', 'waiting', '<1>', 0, now(), '', now(), ?)`,
        [programOf("petrel"), idOf("engineer"), idOf("technician")],
      ),
    );
    await expect(foreign).rejects.toThrow(/row-level security/);
  });
});

describe("choices", () => {
  test("keep a kind away, or for the digest; an essential one comes at once, whatever was sent", async () => {
    const { saveMailChoices, mailChoices } = await choosing();
    await saveMailChoices(people["engineer"], { "sheet released": "not at all", "lot held": "not at all" });
    await saveMailChoices(people["technician"], { "sheet released": "daily digest" });
    await announce({ announcement: RELEASED, to: ["engineer", "technician"] });
    await announce({ to: ["engineer"] });
    expect((await rows()).map(({ email, kind, state }) => [email, kind, state])).toEqual([
      ["technician", "sheet released", "digest"],
      ["engineer", "lot held", "waiting"],
    ]);
    expect(await queued()).toHaveLength(1);
    const kept = await mailChoices(people["engineer"]);
    expect(kept.find(({ kind }) => kind === "sheet released")?.choice).toBe("not at all");
    expect(kept.find(({ kind }) => kind === "lot held")).toMatchObject({ essential: true, choice: "at once" });
  });

  test("of a guest are those of sheets, and of the webhooks that they may keep", async () => {
    const { mailChoices } = await choosing();
    const kinds = (await mailChoices(people["guest"])).map(({ kind }) => kind);
    expect(kinds).toEqual(["sheet released", "sheet superseded", "sheet withdrawn", "webhook switched off"]);
  });

  test("are changed by the link of a mail without signing in, and by no other", async () => {
    await announce({ announcement: RELEASED });
    const { transport, got } = server([]);
    await send((await one()).id, transport);
    const link = new URL(got[0]?.unsubscribe ?? "");
    expect(link.href).toMatch(/^https:\/\/planeward\.site\.example\/unsubscribe\/[\w-]{43}\?kind=sheet%20released$/);
    const token = link.pathname.split("/").at(-1) ?? "";
    const { askedToStop, stopMail, mailChoices } = await choosing();
    expect(await askedToStop(token, "sheet released", "test")).toMatchObject({ kinds: ["sheet released"] });
    await stopMail(token, "lot held", "test");
    await stopMail(token, "sheet released", "test");
    await stopMail(token, "sheet released", "test");
    expect(await askedToStop(token, "sheet released", "test")).toMatchObject({ kinds: [] });
    const choices = await mailChoices(people["engineer"]);
    expect(choices.filter(({ choice }) => choice === "not at all").map(({ kind }) => kind)).toEqual(["sheet released"]);
    await expect(stopMail("a".repeat(43), "sheet released", "test")).rejects.toMatchObject({ init: { status: 404 } });
  });
});

describe("sending", () => {
  test("hands the mail over once, and a second time does nothing", async () => {
    await announce();
    const { id, message_id } = await one();
    const { transport, got } = server([]);
    await send(id, transport);
    await send(id, transport);
    expect(await one()).toMatchObject({ state: "sent", attempts: 1, reason: "" });
    expect(got).toHaveLength(1);
    expect(got[0]).toMatchObject({
      messageId: message_id,
      to: { address: "engineer@kestrel-ridge.example" },
      subject: "Tern: lot T-0412 is held",
      unsubscribe: null,
    });
    expect(got[0]?.text).toContain("https://planeward.site.example/sheets\n");
  });

  test("waits longer each time that the server is not there, and parks the mail in the end, from where it is tried again", async () => {
    await announce();
    const { id } = await one();
    const away: Delivery = { outcome: "not now", reason: "connect ECONNREFUSED" };
    const { transport, got } = server(Array.from({ length: 14 }, () => away));
    for (let attempt = 1; attempt <= 14; attempt += 1) {
      await send(id, transport);
      const row = await one();
      expect(row).toMatchObject({ attempts: attempt, state: attempt < 14 ? "waiting" : "parked" });
      // It is not due: an early worker leaves it be.
      await send(id, transport);
      expect(got).toHaveLength(attempt);
      await asOwner(database, "update mail_outbox set next_try_at = now()");
    }
    expect((await one()).reason).toBe("It could not be sent in 14 attempts, lastly: connect ECONNREFUSED");
    expect(new Set(got.map(({ messageId }) => messageId)).size).toBe(1);

    const { tryAgain } = await outbox();
    await expect(tryAgain(people["engineer"], id)).rejects.toMatchObject({ init: { status: 404 } });
    await tryAgain(people["process-owner"], id);
    await send(id, transport);
    expect(await one()).toMatchObject({ state: "sent", attempts: 1 });
    await expect(tryAgain(people["process-owner"], id)).rejects.toMatchObject({ init: { status: 409 } });
  });

  test("parks at once what the server refuses, with its words", async () => {
    await announce();
    const { transport } = server([{ outcome: "refused", reason: "550 nobody of that name" }]);
    await send((await one()).id, transport);
    expect(await one()).toMatchObject({
      state: "parked",
      reason: "The mail server refused it: 550 nobody of that name",
    });
  });

  test.each([
    { announcement: HELD, arrived: null, state: "waiting", why: "essential: it is repeated under its Message-ID" },
    { announcement: RELEASED, arrived: null, state: "parked", why: "somebody looks at it" },
  ] as const)("when nobody knows whether a $announcement.kind mail arrived: $why", async ({ announcement, state }) => {
    await announce({ announcement });
    const { transport } = server([{ outcome: "unsure", reason: "the connection ended" }]);
    await send((await one()).id, transport);
    expect((await one()).state).toBe(state);
  });

  test.each([
    { announcement: HELD, arrived: true, state: "sent", deliveries: 0 },
    { announcement: HELD, arrived: false, state: "sent", deliveries: 1 },
    { announcement: HELD, arrived: null, state: "sent", deliveries: 1 },
    { announcement: RELEASED, arrived: true, state: "sent", deliveries: 0 },
    { announcement: RELEASED, arrived: false, state: "sent", deliveries: 1 },
    { announcement: RELEASED, arrived: null, state: "parked", deliveries: 0 },
  ] as const)(
    "settles a $announcement.kind mail that a dead process left in the middle, arrived: $arrived",
    async ({ announcement, arrived, state, deliveries }) => {
      await announce({ announcement });
      const { id } = await one();
      await asOwner(
        database,
        "update mail_outbox set state = 'sending', attempts = 1, attempt_id = gen_random_uuid(), lease_until = now() + interval '1 minute'",
      );
      const { transport, got } = server([], arrived);
      // While the lease lasts, whoever has it may still be at it.
      await send(id, transport);
      expect(got).toHaveLength(0);
      expect((await one()).state).toBe("sending");
      await asOwner(database, "update mail_outbox set lease_until = now() - interval '1 second'");
      await send(id, transport);
      expect((await one()).state).toBe(state);
      expect(got).toHaveLength(deliveries);
    },
  );

  test("drops what is no longer for its recipient, before a word of it is sent", async () => {
    await announce({ to: ["engineer", "technician"] });
    const [first, second] = await rows();
    await asOwner(database, "update person set active = false where id = ?", [idOf("engineer")]);
    await asOwner(database, "update membership set role = 'guest' where person_id = ?", [idOf("technician")]);
    const { transport, got } = server([]);
    await send(first?.id ?? "", transport);
    await send(second?.id ?? "", transport);
    await asOwner(database, "update person set active = true where id = ?", [idOf("engineer")]);
    await asOwner(database, "update membership set role = 'technician' where person_id = ?", [idOf("technician")]);
    expect(got).toEqual([]);
    expect((await rows()).map(({ state }) => state)).toEqual(["dropped", "dropped"]);
  });

  test("two workers at once hand it over once", async () => {
    await announce();
    const { id } = await one();
    const { transport, got } = server([]);
    await Promise.all([send(id, transport), send(id, transport), send(id, transport)]);
    expect(got).toHaveLength(1);
  });

  test("without a mail server everything waits, and is found once there is one", async () => {
    await announce();
    const { id } = await one();
    await (await sending()).sendMail({ id }, null);
    await asOwner(database, "select graphile_worker.complete_jobs(array(select id from graphile_worker.jobs))");
    expect((await one()).state).toBe("waiting");
    await (await lost()).queueLostMail();
    expect(await queued()).toEqual([]);
    await asOwner(database, "update mail_outbox set next_try_at = now() - interval '1 minute'");
    await (await lost()).queueLostMail();
    expect(await queued()).toEqual([`mail ${id}`]);
  });
});

describe("the digest", () => {
  test("is one mail a day of everything that waited for it, and what comes later waits for the next", async () => {
    const { saveMailChoices } = await choosing();
    await saveMailChoices(people["engineer"], { "sheet released": "daily digest" });
    await announce({ announcement: RELEASED });
    await announce({ announcement: { ...RELEASED, sheet: "TERN-S002" } });
    const { makeDigests } = await digests();
    await makeDigests("2026-12-02");
    await announce({ announcement: { ...RELEASED, sheet: "TERN-S003" } });
    await makeDigests("2026-12-02");
    const digest = (await rows()).filter(({ kind }) => kind === "digest");
    expect(digest).toHaveLength(1);
    expect((await rows()).map(({ state }) => state).toSorted()).toEqual([
      "digest",
      "in digest",
      "in digest",
      "waiting",
    ]);
    const { transport, got } = server([]);
    await send(digest[0]?.id ?? "", transport);
    expect(got[0]?.subject).toBe("Planeward, the day's digest: 2 things");
    expect(got[0]?.text).toMatch(/TERN-S001[^]*TERN-S002/);
    expect(got[0]?.text).not.toContain("TERN-S003");
    await makeDigests("2026-12-03");
    expect((await rows()).filter(({ kind }) => kind === "digest")).toHaveLength(2);
  });

  test("leaves out the program that its reader has left since", async () => {
    const { saveMailChoices } = await choosing();
    await saveMailChoices(people["engineer"], { "sheet released": "daily digest" });
    await announce({ announcement: RELEASED });
    await announce({
      announcement: { ...RELEASED, program: "Petrel", sheet: "PETREL-S001" },
      program: programOf("petrel"),
    });
    await (await digests()).makeDigests("2026-12-02");
    await asOwner(database, "update membership set person_id = ? where person_id = ? and program_id = ?", [
      idOf("guest"),
      idOf("engineer"),
      programOf("petrel"),
    ]);
    const { transport, got } = server([]);
    const digest = (await rows()).find(({ kind }) => kind === "digest");
    await send(digest?.id ?? "", transport);
    await asOwner(database, "update membership set person_id = ? where person_id = ? and program_id = ?", [
      idOf("engineer"),
      idOf("guest"),
      programOf("petrel"),
    ]);
    expect(got[0]?.text).toContain("TERN-S001");
    expect(got[0]?.text).not.toContain("PETREL");
  });
});

describe("the outbox", () => {
  const LIST = { query: "", sort: "written", descending: true, page: 1, filters: {} };
  const seen = async (person: (typeof PEOPLE)[number], changes = {}) =>
    (await (await outbox()).listOutbox(people[person], { ...LIST, ...changes })).rows;

  test("is seen by process owners and administrators, program by program, and holds no word of a mail", async () => {
    await announce({ to: ["engineer"] });
    for (const person of ["process-owner", "administrator"] as const) {
      const [row] = await seen(person);
      expect(row).toMatchObject({ kind: "lot held", program: "Tern", email: "engineer@kestrel-ridge.example" });
      expect(JSON.stringify(row)).not.toContain("T-0412");
    }
    for (const person of ["engineer", "technician", "guest"] as const)
      await expect(seen(person)).rejects.toMatchObject({ init: { status: 403 } });
    expect(await seen("process-owner", { filters: { state: "parked" } })).toEqual([]);
    expect(await seen("process-owner", { query: "engineer@" })).toHaveLength(1);
  });

  test("shows its own mail to a recipient, and nobody else's, below the services as well", async () => {
    await announce({ to: ["engineer", "technician"] });
    const { inScope } = await scopes();
    const own = await inScope(people["technician"], (em) =>
      em.execute<{ person_id: string }[]>("select person_id from mail_outbox"),
    );
    expect(own).toEqual([{ person_id: idOf("technician") }]);
    const guest = await inScope(people["guest"], (em) =>
      em.execute("select * from mail_readers(?, array[?]::uuid[])", [tern, idOf("engineer")]),
    );
    expect(guest).toEqual([]);
  });
});
