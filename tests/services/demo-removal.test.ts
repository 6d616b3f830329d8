import { randomUUID } from "node:crypto";
import { beforeAll, describe, expect, test } from "vitest";
import { refusedStatus } from "#app/server/problem.server.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import type { DemoHere } from "#app/schemas/demo.ts";
import { scopeOfPerson } from "#tests/db/people.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";

const database = useDatabase({ demo: true });

const view = () => import("#app/services/demo/demo-view.server.ts");
const removal = () => import("#app/services/demo/remove-demo.server.ts");
const loading = () => import("#app/services/demo/load-demo.server.ts");

// Loading the server's modules takes longer than a test should.
beforeAll(() => Promise.all([view(), removal(), loading()]), 60_000);

async function look(scope: ActorScope): Promise<DemoHere> {
  const seen = await (await view()).demoView(scope);
  if (seen.state !== "here") throw new Error(`The demo is ${seen.state}.`);
  return seen;
}

async function remove(scope: ActorScope, asked: Partial<{ confirm: string; seen: string; name: string }> = {}) {
  const seen = asked.seen ?? (await look(scope)).seen;
  return (await removal()).removeTheDemo(scope, {
    confirm: "remove",
    name: "Kestrel",
    diameter: "200",
    ...asked,
    seen,
  });
}

const sentenceOf = (removed: Awaited<ReturnType<typeof remove>>) =>
  removed.outcome === "refused" ? removed.sentence : "";
const idOf = async (sql: string, params: unknown[] = []) =>
  (await asOwner<{ id: string }>(database, sql, params))[0]?.id ?? "";
const countIn = async (table: string) =>
  (await asOwner<{ count: number }>(database, `select count(*)::int as count from "${table}"`))[0]?.count;

test("only a process owner sees what would go", async () => {
  for (const account of ["engineer", "technician", "shift-lead", "administrator", "guest"]) {
    const refused = await view()
      .then(async ({ demoView }) => demoView(await scopeOfPerson(database, account)))
      .catch((error: unknown) => refusedStatus(error));
    expect(refused).toBe(403);
  }
});

test("the preview counts what came, kind by kind, and says who keeps their role where", async () => {
  const seen = await look(await scopeOfPerson(database, "process-owner"));
  expect(Object.fromEntries(seen.goes.map(({ kind, total }) => [kind, total]))).toMatchObject({
    programs: 3,
    stacks: 3,
    flows: 6,
    assessment: 1,
    scans: 5,
    lots: 2,
    wafers: 26,
    "raw files": 11,
    instrument: 1,
  });
  expect(seen.programs).toEqual(["Fulmar", "Petrel", "Tern"]);
  expect([seen.added.total, seen.changed.total, seen.kept, seen.jobs]).toEqual([0, 0, [], 0]);
  expect(seen.stranded.map(({ name, role }) => `${name}: ${role}`)).toContain("Lea Winter: guest");
  expect(seen.stranded).toHaveLength(7);
});

describe("with things of their own beside it", () => {
  let owner: ActorScope;
  const own = { program: randomUUID(), film: randomUUID(), stack: randomUUID(), flow: randomUUID() };

  beforeAll(async () => {
    const person = await idOf("select id from person where email = 'process-owner@kestrel-ridge.example'");
    const silicon = await idOf("select id from silicon limit 1");
    const [demoFilm, carrier] = [
      await idOf("select id from film where name = 'Polymer dielectric A'"),
      await idOf("select id from carrier where name = 'Glass carrier 3.0 ppm'"),
    ];
    await asOwner(database, "insert into program values (?, 'Heron', 'heron', 0.3, '', now())", [own.program]);
    await asOwner(database, "insert into membership values (gen_random_uuid(), ?, ?, 'process owner', now())", [
      person,
      own.program,
    ]);
    await asOwner(
      database,
      `insert into film select (jsonb_populate_record(f, jsonb_build_object('id', ?::uuid, 'name', 'Our oxide', 'created_by_id', ?::uuid))).*
         from film f where f.id = ?`,
      [own.film, person, demoFilm],
    );
    await asOwner(
      database,
      `insert into stack (id, program_id, name, note, silicon_id, silicon_thickness, created_at, updated_at, created_by_id)
         values (?, ?, 'Heron H-1', '', ?, '{"value": 1e-4}', now(), now(), ?)`,
      [own.stack, own.program, silicon, person],
    );
    for (const film of [own.film, demoFilm])
      await asOwner(
        database,
        `insert into stack_layer (id, program_id, stack_id, side, position, film_id, thickness, coverage)
           values (gen_random_uuid(), ?, ?, 'front', 0, ?, '{"value": 1e-6}', 1)`,
        [own.program, own.stack, film],
      );
    await asOwner(
      database,
      `insert into flow select (jsonb_populate_record(f, jsonb_build_object('id', ?::uuid, 'program_id', ?::uuid, 'name', 'Heron flow', 'created_by_id', ?::uuid))).*
         from flow f where f.name like 'Petrel%3.0 ppm'`,
      [own.flow, own.program, person],
    );
    await asOwner(
      database,
      `insert into flow_step select (jsonb_populate_record(s, jsonb_build_object('id', gen_random_uuid(), 'program_id', ?::uuid, 'flow_id', ?::uuid, 'carrier_id', ?::uuid, 'bonding_material_id', null, 'tape_id', null))).*
         from flow_step s join flow f on f.id = s.flow_id where f.name like 'Petrel%3.0 ppm' and s.kind = 'bond'`,
      [own.program, own.flow, carrier],
    );
    await asOwner(
      database,
      `insert into film_stress_value (id, film_id, scan_id, value, standard_uncertainty, common_uncertainty, instrument, measured_at, state, reason, source, accepted_at, accepted_by_id)
         select gen_random_uuid(), ?, s.id, 3e7, 1e6, 1e6, 'Stylus 1', now(), 'as deposited', '', 'measured here', now(), ? from scan s where label = 'M-0388'`,
      [own.film, person],
    );
    owner = await scopeOfPerson(database, "process-owner");
  });

  test("what people have put into the demo and changed of it is named, and what stays of it too", async () => {
    const { copyFlow } = await import("#app/services/flows/new-flow.server.ts");
    await copyFlow(owner, await idOf("select id from flow where name like 'Tern T-2%'"));
    await asOwner(database, "update film set version = 2, updated_by_id = ? where name = 'Passivation nitride A'", [
      owner.actor.id,
    ]);
    const seen = await look(owner);
    expect(seen.added).toMatchObject({ total: 1, rows: [{ kind: "flow", by: "Mikael Lindqvist" }] });
    expect(seen.changed).toMatchObject({ total: 1, rows: [{ kind: "film", name: "Passivation nitride A" }] });
    expect(seen.kept).toEqual([
      { kind: "carrier", name: "Glass carrier 3.0 ppm" },
      { kind: "film", name: "Polymer dielectric A" },
    ]);
    expect(seen.keptStresses).toBe(1);
    expect(seen.stranded.map(({ name }) => name)).not.toContain("Mikael Lindqvist");
  });

  test("nothing goes without the word, by an old look, without a name, or under work", async () => {
    const { seen } = await look(owner);
    expect(sentenceOf(await remove(owner, { confirm: "yes" }))).toMatch(/type the word remove/);
    expect(sentenceOf(await remove(owner, { seen: "of yesterday" }))).toMatch(/has changed since you looked/);
    expect(sentenceOf(await remove(owner, { seen, name: "" }))).toMatch(/name the program/);
    expect(sentenceOf(await remove(owner, { seen, name: "Heron" }))).toMatch(/that name already/);
    const job = randomUUID();
    await asOwner(
      database,
      `insert into job (id, program_id, kind, title, state, done, total, unit, sentence, input, stop_asked, created_at, created_by_id)
         select ?, id, 'scan pair', 'x', 'running', 0, 1, 'bytes', '', '{}', false, now(), ? from program where slug = 'tern'`,
      [job, owner.actor.id],
    );
    expect(sentenceOf(await remove(owner))).toMatch(/under way/);
    const { inScope } = await import("#app/server/scope.server.ts");
    const direct = (scope: ActorScope) => inScope(scope, (em) => em.execute("select remove_demo()"));
    await expect(direct({ ...owner, atTheDemo: true })).rejects.toThrow(/under way/);
    await asOwner(database, "delete from job where id = ?", [job]);
    await expect(direct(owner)).rejects.toThrow(/only where the demo is taken out/);
    const engineer = await scopeOfPerson(database, "engineer");
    await expect(direct({ ...engineer, atTheDemo: true })).rejects.toThrow(/process owner/);
    expect((await look(owner)).programs).toHaveLength(3);
  });

  test("who does not own every program of the demo is told no figure of it", async () => {
    const partly = {
      ...owner,
      actor: {
        ...owner.actor,
        memberships: owner.actor.memberships.filter(({ programSlug }) => programSlug !== "tern"),
      },
    };
    const { demoView } = await view();
    expect(await demoView(partly)).toEqual({ state: "not yours" });
    expect(await remove(partly, { seen: "" }).catch((error: unknown) => refusedStatus(error))).toBe(403);
  });

  test("two who press at once remove it once; everything else goes, and what is their own stays", async () => {
    const { seen } = await look(owner);
    const outcomes = await Promise.all([remove(owner, { seen }), remove(owner, { seen })]);
    expect(outcomes.map(({ outcome }) => outcome).toSorted()).toEqual(["gone", "removed"]);

    const walled = await asOwner<{ name: string }>(
      database,
      `select table_name as name from information_schema.columns
        where table_schema = 'public' and column_name = 'program_id' and table_name not in ('membership', 'audit_event')`,
    );
    const counts = await Promise.all(walled.map(async ({ name }) => [name, await countIn(name)] as const));
    expect(Object.fromEntries(counts.filter(([, count]) => count !== 0))).toEqual({
      stack: 1,
      stack_layer: 2,
      flow: 1,
      flow_step: 1,
    });
    const [step] = await asOwner<{ carrier_id: string | null }>(database, "select carrier_id from flow_step");
    expect(step?.carrier_id).not.toBeNull();
    const films = await asOwner<{ name: string }>(
      database,
      "select name from film where name in ('Our oxide', 'Polymer dielectric A', 'Passivation nitride A')",
    );
    expect(films.map(({ name }) => name).toSorted()).toEqual(["Our oxide", "Polymer dielectric A"]);
    expect(await asOwner(database, "select value, scan_id from film_stress_value")).toEqual([
      { value: 3e7, scan_id: null },
    ]);
    expect([await countIn("import_profile"), await countIn("reference_wafer"), await countIn("demo_record")]).toEqual([
      0, 0, 0,
    ]);
    expect(await countIn("carrier_unit")).toBe(await idCountOfKeptPieces());
    const removed = await asOwner<{ from: unknown }>(database, `select "from" from audit_event where subject = 'demo'`);
    expect(removed).toMatchObject([
      { from: { names: ["Fulmar", "Petrel", "Tern"], programs: 3, stacks: 3, flows: 7 } },
    ]);
  });

  const idCountOfKeptPieces = async () =>
    (
      await asOwner(
        database,
        "select u.id from carrier_unit u join carrier c on c.id = u.carrier_id where c.name = 'Glass carrier 3.0 ppm'",
      )
    ).length;

  test("everybody is still there, with a role in a program", async () => {
    const people = await asOwner<{ name: string; programs: string; roles: string }>(
      database,
      `select w.name, string_agg(p.name, ', ') as programs, string_agg(m.role, ', ') as roles
         from person w left join membership m on m.person_id = w.id left join program p on p.id = m.program_id
        group by w.name order by w.name`,
    );
    expect(people).toHaveLength(7);
    expect(people).toContainEqual({ name: "Mikael Lindqvist", programs: "Heron", roles: "process owner" });
    expect(people).toContainEqual({ name: "Ana Prado", programs: "Kestrel", roles: "process owner" });
    expect(people).toContainEqual({ name: "Lea Winter", programs: "Kestrel", roles: "guest" });
  });

  test("what came with it leaves no page broken, and it can be loaded again, once", async () => {
    owner = await scopeOfPerson(database, "process-owner");
    const { todayView } = await import("#app/services/today.server.ts");
    expect(await todayView(owner)).toMatchObject({ demo: { here: false, programs: [] } });
    const { loadTheDemo } = await loading();
    const outcomes = await Promise.allSettled([loadTheDemo(owner), loadTheDemo(owner)]);
    expect(outcomes.map(({ status }) => status).toSorted()).toEqual(["fulfilled", "rejected"]);
    const again = await look(await scopeOfPerson(database, "process-owner"));
    expect(again.programs).toEqual(["Fulmar", "Petrel", "Tern"]);
    // The film and the carrier that stayed are the site's own by now.
    expect([again.added.total, again.changed.total, again.kept]).toEqual([0, 0, []]);
    expect(await countIn("person")).toBe(7);
  }, 30_000);
});
