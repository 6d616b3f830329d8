import { spawnSync } from "node:child_process";
import { beforeAll, expect, test } from "vitest";
import { readListParams } from "#app/lib/list-params.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { scopeOfPerson } from "#tests/db/people.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";

const database = useDatabase({ demo: true });
const seals = () => import("#app/services/audit/seal.server.ts");
const lists = () => import("#app/services/audit/audit-list.server.ts");

let administrator: ActorScope;

beforeAll(async () => {
  await Promise.all([seals(), lists(), import("#app/services/site-settings.server.ts")]);
  administrator = await scopeOfPerson(database, "administrator");
}, 60_000);

const events = async () =>
  (await asOwner<{ count: number }>(database, "select count(*)::int from audit_event"))[0]?.count ?? 0;

/** Gets past every rule of the database, as somebody does who has its files. */
async function tamper(sql: string): Promise<void> {
  await asOwner(database, "alter table audit_event disable trigger never_changes");
  await asOwner(database, sql);
  await asOwner(database, "alter table audit_event enable trigger never_changes");
}

const paramsOf = async (search: string) => {
  const { AUDIT_FILTERS, AUDIT_SORTS } = await lists();
  return readListParams(new URLSearchParams(search), { sorts: AUDIT_SORTS, filters: AUDIT_FILTERS, descending: true });
};

test("every event is sealed once, in the chain of its program, and what comes later goes on from there", async () => {
  const { sealAudit, auditState } = await seals();
  const { saveSiteSettings, siteSettings } = await import("#app/services/site-settings.server.ts");
  const before = await events();
  expect(before).toBeGreaterThan(50);
  expect(await sealAudit()).toBe(before);
  expect(await sealAudit()).toBe(0);
  const first = await auditState(administrator);
  expect(first.faults).toEqual([]);
  expect(first.sealed).toBe(before);
  expect(first.chains.map(({ program }) => program)).toEqual([null, "Fulmar", "Petrel", "Tern"]);
  const { stamp } = await siteSettings(administrator);
  await saveSiteSettings(administrator, { paper: "letter", version: stamp.version });
  expect(await sealAudit()).toBe(1);
  const second = await auditState(administrator);
  expect(second.faults).toEqual([]);
  expect(second.chains[0]?.hash).not.toBe(first.chains[0]?.hash);
  expect(second.chains.slice(1)).toEqual(first.chains.slice(1));
});

test("two processes that seal at once seal each event once", async () => {
  const { sealAudit, auditState } = await seals();
  await asOwner(
    database,
    `insert into audit_event (id, at, action, subject, request_id) select gen_random_uuid(), now(), 'refused', 'sign-in', 'r' from generate_series(1, 500)`,
  );
  const sealed = await Promise.all([sealAudit(), sealAudit(), sealAudit()]);
  expect(sealed.toSorted((a, b) => a - b)).toEqual([0, 0, 500]);
  expect((await auditState(administrator)).faults).toEqual([]);
});

test("the list is found by program, kind, day, person and whole id, and only by administrators", async () => {
  const { listAudit, allAudit, auditChoices } = await lists();
  const list = async (search: string) => listAudit(administrator, await paramsOf(search));
  const all = await list("");
  expect(all.total).toBe(await events());
  expect(all.rows).toHaveLength(25);
  const settings = await list("subject=site+setting");
  expect(settings.rows).toMatchObject([
    { actor: administrator.actor.name, program: null, action: "changed", field: "paper", from: '"a4"', to: '"letter"' },
  ]);
  const [event] = settings.rows;
  expect((await list(`q=${event?.subjectId ?? ""}`)).rows.map(({ id }) => id)).toContain(event?.id);
  expect((await list(`q=${administrator.actor.name}`)).total).toBeGreaterThan(0);
  const tern = await list("program=tern&action=created");
  expect(new Set(tern.rows.map(({ program, action }) => `${program} ${action}`))).toEqual(new Set(["Tern created"]));
  expect((await list("program=site")).rows.every(({ program }) => program === null)).toBe(true);
  expect((await list("until=2020-01-01")).total).toBe(0);
  expect((await list("since=2020-01-01&until=2999-01-01")).total).toBe(all.total);
  expect((await list("since=yesterday&q=%27%3B+drop+table+film%3B--")).total).toBe(0);
  expect(await allAudit(administrator, await paramsOf(""))).toHaveLength(all.total);
  const { programs, subjects } = await auditChoices(administrator);
  expect(programs.map(({ value }) => value)).toEqual(["site", "fulmar", "petrel", "tern"]);
  expect(subjects).toContain("site setting");
  const { auditState } = await seals();
  for (const who of ["process-owner", "engineer", "shift-lead", "technician", "guest"]) {
    const scope = await scopeOfPerson(database, who);
    const refused = expect.objectContaining({ init: { status: 403 } }) as unknown;
    await expect(listAudit(scope, await paramsOf(""))).rejects.toEqual(refused);
    await expect(auditState(scope)).rejects.toEqual(refused);
  }
});

function command(): { status: number | null; told: string } {
  const { status, stdout } = spawnSync(process.execPath, ["app/cli/audit.mjs"], {
    encoding: "utf8",
    env: { ...process.env, DATABASE_URL: database.appUrl, DATABASE_OWNER_URL: database.ownerUrl },
  });
  return { status, told: stdout };
}

test("what was changed, taken out or slipped in past every rule shows", { timeout: 60_000 }, async () => {
  const { sealAudit, auditState } = await seals();
  await sealAudit();
  const sealed = await asOwner<{ id: string; number: number }>(
    database,
    `select s.event_id as id, s.number from audit_seal s join program p on p.id = s.chain where p.slug = 'tern' order by number limit 3`,
  );
  const [first, second, third] = sealed;
  const faults = async () => (await auditState(administrator)).faults;
  const [was] = await asOwner<{ to: string }>(database, `select "to"::text from audit_event where id = ?`, [first?.id]);
  await tamper(`update audit_event set "to" = '"10 um"' where id = '${first?.id ?? ""}'`);
  expect(await faults()).toEqual([
    { program: "Tern", number: 1, eventId: first?.id, fault: "it, or what was before it, has been changed" },
  ]);
  expect(command()).toMatchObject({
    status: 1,
    told: expect.stringContaining("The trail does not agree with its seals in one place.") as unknown,
  });
  await tamper(`update audit_event set "to" = $$${was?.to ?? ""}$$ where id = '${first?.id ?? ""}'`);
  expect(await faults()).toEqual([]);
  expect(command()).toMatchObject({ status: 0, told: expect.stringMatching(/^Fulmar: \d+ events sealed/) as unknown });
  await tamper(`delete from audit_event where id = '${second?.id ?? ""}'`);
  expect(await faults()).toEqual([{ program: "Tern", number: 2, eventId: second?.id, fault: "its event is gone" }]);
  await asOwner(
    database,
    `insert into audit_event (id, at, action, subject, request_id) values (gen_random_uuid(), now() - interval '3 days', 'changed', 'film', 'r')`,
  );
  expect((await faults()).map(({ fault }) => fault)).toEqual(["its event is gone", "it was never sealed"]);
  await asOwner(database, "alter table audit_seal disable trigger never_changes");
  await asOwner(database, "delete from audit_seal where event_id = ?", [third?.id]);
  await asOwner(database, "alter table audit_seal enable trigger never_changes");
  expect((await faults()).map(({ fault }) => fault)).toContain("seals before it are gone");
});
