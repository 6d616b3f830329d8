import { randomUUID } from "node:crypto";
import { beforeAll, expect, test } from "vitest";
import { refusedStatus } from "#app/server/problem.server.ts";
import { scopeOfPerson } from "#tests/db/people.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";

/** A site with reference data, people and a program of its own. */
const database = useDatabase();

const view = () => import("#app/services/demo/demo-view.server.ts");
const removal = () => import("#app/services/demo/remove-demo.server.ts");
const loading = () => import("#app/services/demo/load-demo.server.ts");

const PEOPLE = ["process owner", "engineer", "guest"] as const;
const account = (role: string) => `own-${role.replace(" ", "-")}`;

beforeAll(async () => {
  await Promise.all([view(), removal(), loading()]);
  const program = randomUUID();
  await asOwner(database, "insert into program values (?, 'Heron', 'heron', 0.3, '', now())", [program]);
  for (const role of PEOPLE) {
    const person = randomUUID();
    await asOwner(database, "insert into person values (?, ?, ?, null, true, now())", [
      person,
      `${account(role)}@kestrel-ridge.example`,
      role,
    ]);
    await asOwner(database, "insert into membership values (gen_random_uuid(), ?, ?, ?, now())", [
      person,
      program,
      role,
    ]);
  }
}, 60_000);

/** How many rows each table has, but for the trail, which only grows. */
async function counts(): Promise<Record<string, number>> {
  const tables = await asOwner<{ name: string }>(
    database,
    "select tablename as name from pg_tables where schemaname = 'public' and tablename not in ('audit_event', 'mikro_orm_migrations')",
  );
  const counted = tables.map(async ({ name }) => {
    const [row] = await asOwner<{ count: number }>(database, `select count(*)::int as count from "${name}"`);
    return [name, row?.count ?? 0] as const;
  });
  return Object.fromEntries(await Promise.all(counted));
}

test("an engineer may not load it", async () => {
  const { loadTheDemo } = await loading();
  const engineer = await scopeOfPerson(database, account("engineer"));
  expect(await loadTheDemo(engineer).catch((error: unknown) => refusedStatus(error))).toBe(403);
});

test("the demo comes whole, is seen by the staff in their roles, and goes without a trace but the trail", async () => {
  const before = await counts();
  const { loadTheDemo } = await loading();
  const { demoView } = await view();
  let owner = await scopeOfPerson(database, account("process owner"));
  expect(await demoView(owner)).toEqual({ state: "absent" });
  await loadTheDemo(owner);
  expect(await loadTheDemo(owner).catch((error: unknown) => refusedStatus(error))).toBe(409);

  const there = await counts();
  expect([there["flow"], there["stack"], there["assessment"], there["scan"]]).toEqual([6, 3, 1, 5]);
  const roles = async (role: string) =>
    (await scopeOfPerson(database, account(role))).actor.memberships
      .map((held) => `${held.programSlug} ${held.role}`)
      .toSorted();
  expect(await roles("engineer")).toEqual(["fulmar engineer", "heron engineer", "petrel engineer", "tern engineer"]);
  expect(await roles("guest")).toEqual(["heron guest"]);
  // Its people are names that nobody can sign in as.
  const names = await asOwner(database, "select 1 from person where not active and site_role is null");
  expect(names).toHaveLength(7);
  expect(there["credential"]).toBe(before["credential"]);

  owner = await scopeOfPerson(database, account("process owner"));
  const { todayView } = await import("#app/services/today.server.ts");
  expect(await todayView(owner)).toMatchObject({ demo: { here: true }, notAssessed: { total: 5 } });
  const seen = await demoView(owner);
  if (seen.state !== "here") throw new Error(seen.state);
  expect([seen.stranded, seen.added.total, seen.changed.total]).toEqual([[], 0, 0]);
  const asked = { confirm: "Remove", seen: seen.seen, name: "", diameter: "300" as const };
  expect(await (await removal()).removeTheDemo(owner, asked)).toEqual({ outcome: "removed" });
  expect(await counts()).toEqual(before);
}, 60_000);

test("a program that has one of its names is in its way, and nothing is left behind", async () => {
  await asOwner(database, "insert into program values (gen_random_uuid(), 'Tern', 'our-tern', 0.3, '', now())");
  const before = await counts();
  const { loadTheDemo } = await loading();
  const owner = await scopeOfPerson(database, account("process owner"));
  expect(await loadTheDemo(owner).catch((error: unknown) => refusedStatus(error))).toBe(409);
  expect(await counts()).toEqual(before);
});
