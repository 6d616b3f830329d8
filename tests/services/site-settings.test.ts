import { beforeAll, beforeEach, expect, test } from "vitest";
import type { ActorScope } from "#app/server/scope.server.ts";
import { scopeOfPerson } from "#tests/db/people.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";
import { releaseFirstFlow } from "./lot-on-sheet.ts";

const database = useDatabase({ demo: true });
const settings = () => import("#app/services/site-settings.server.ts");

let administrator: ActorScope;
let owner: ActorScope;
let guest: ActorScope;

// Loading the server's modules takes longer than a test should.
beforeAll(async () => {
  await settings();
  administrator = await scopeOfPerson(database, "administrator");
  owner = await scopeOfPerson(database, "process-owner");
  guest = await scopeOfPerson(database, "guest");
}, 60_000);

beforeEach(() => asOwner(database, "update site_setting set paper = 'a4'"));

const at = (search: string) => new URL(`http://127.0.0.1/sheets/1${search}`);
const events = () =>
  asOwner<{ actor: string; action: string; field: string; from: unknown; to: unknown }>(
    database,
    `select p.name as actor, e.action, e.field, e."from", e."to" from audit_event e join person p on p.id = e.actor_id
      where e.subject = 'site setting' order by e.at`,
  );

test("the paper is A4 as delivered, the administrator's choice from then on, and the change is in the trail", async () => {
  const { paperFor, saveSiteSettings, siteSettings } = await settings();
  expect(await paperFor(guest, at(""))).toBe("a4");
  const before = await siteSettings(administrator);
  expect(before).toMatchObject({ paper: "a4", stamp: { updatedBy: "delivered with Planeward" } });
  const saved = await saveSiteSettings(administrator, { paper: "letter", version: before.stamp.version });
  expect(saved).toEqual({ outcome: "saved" });
  for (const scope of [guest, owner, administrator]) expect(await paperFor(scope, at(""))).toBe("letter");
  expect(await siteSettings(administrator)).toMatchObject({
    paper: "letter",
    stamp: { version: before.stamp.version + 1, updatedBy: administrator.actor.name },
  });
  const trail = await events();
  expect(trail).toEqual([
    { actor: administrator.actor.name, action: "changed", field: "paper", from: "a4", to: "letter" },
  ]);
  // The same again is no change.
  await saveSiteSettings(administrator, { paper: "letter", version: before.stamp.version });
  expect(await events()).toHaveLength(trail.length);
});

test("an address that asks for a paper gets it, one that asks for none that there is gets the site's", async () => {
  const { paperFor } = await settings();
  await asOwner(database, "update site_setting set paper = 'letter'");
  expect(await paperFor(owner, at("?paper=a4"))).toBe("a4");
  expect(await paperFor(owner, at("?leg=2&paper=Letter"))).toBe("letter");
  for (const search of ["?paper=", "?paper=a3", "?leg=1"]) expect(await paperFor(owner, at(search))).toBe("letter");
});

test("of two who save, the second is told who was first, and may then save over it", async () => {
  const { saveSiteSettings, siteSettings } = await settings();
  const { stamp } = await siteSettings(administrator);
  await saveSiteSettings(administrator, { paper: "letter", version: stamp.version });
  const second = await saveSiteSettings(administrator, { paper: "a4", version: stamp.version });
  if (second.outcome !== "refused") throw new Error("saved over");
  expect(second.reason).toMatch(
    new RegExp(
      `^${administrator.actor.name} saved these settings, with Letter as the paper, at [-\\d]+ [:\\d]+ UTC, after you had opened`,
    ),
  );
  expect((await siteSettings(administrator)).paper).toBe("letter");
  expect(await saveSiteSettings(administrator, { paper: "a4", version: second.version })).toEqual({ outcome: "saved" });
  expect((await siteSettings(administrator)).paper).toBe("a4");
});

test("is refused to everybody else, by the service and by the database", async () => {
  const { saveSiteSettings, siteSettings } = await settings();
  const { inScope } = await import("#app/server/scope.server.ts");
  for (const scope of [owner, guest]) {
    await expect(siteSettings(scope)).rejects.toMatchObject({ init: { status: 403 } });
    await expect(saveSiteSettings(scope, { paper: "letter", version: 1 })).rejects.toMatchObject({
      init: { status: 403 },
    });
    await inScope(scope, (em) => em.execute("update site_setting set paper = 'letter'"));
  }
  const { paperFor } = await settings();
  expect(await paperFor(owner, at(""))).toBe("a4");
  // Nobody adds a second row or takes the only one away.
  await expect(inScope(administrator, (em) => em.execute("delete from site_setting"))).rejects.toThrow(/denied/);
  await expect(
    inScope(administrator, (em) => em.execute("insert into site_setting select * from site_setting")),
  ).rejects.toThrow(/denied/);
});

test(
  "prints older than their program keeps them go, younger ones stay, and the trail says how many went",
  { timeout: 60_000 },
  async () => {
    const { forgetOldPrints, printRetention, savePrintRetention } =
      await import("#app/services/sheets/print-retention.server.ts");
    await releaseFirstFlow(database, "tern");
    const printed = (age: string) =>
      asOwner(
        database,
        `insert into sheet_print (id, program_id, revision_id, file_id, place, created_at, created_by_id)
       select gen_random_uuid(), f.program_id, f.revision_id, f.id, 'bench', now() - ?::interval, ?
         from sheet_file f`,
        [age, owner.actor.id],
      );
    await printed("4 years");
    await printed("1 month");
    const count = async () =>
      (await asOwner<{ count: number }>(database, "select count(*)::int from sheet_print"))[0]?.count ?? 0;
    const all = await count();
    expect(all).toBeGreaterThan(1);
    expect(await forgetOldPrints()).toBe(0);
    const tern = (await printRetention(administrator)).find(({ name }) => name === "Tern");
    await savePrintRetention(administrator, [{ program: tern?.id ?? "", years: 3 }]);
    expect(await forgetOldPrints()).toBe(all / 2);
    expect(await count()).toBe(all / 2);
    const trail = await asOwner<{ from: { count: number } }>(
      database,
      `select "from" from audit_event where subject = 'prints of sheets' and program_id = ?`,
      [tern?.id],
    );
    expect(trail.map(({ from }) => from.count)).toEqual([all / 2]);
    await expect(savePrintRetention(owner, [{ program: tern?.id ?? "", years: 1 }])).rejects.toMatchObject({
      init: { status: 403 },
    });
  },
);
