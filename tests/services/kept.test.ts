import { beforeAll, describe, expect, test } from "vitest";
import { DEFAULT_PREFERENCES } from "#app/lib/preferences.ts";
import { readListParams } from "#app/lib/list-params.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { leave, scopeOfPerson } from "#tests/db/people.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";

const database = useDatabase({ demo: true });

const visits = () => import("#app/services/kept/visits.server.ts");
const favourites = () => import("#app/services/kept/favourites.server.ts");
const filters = () => import("#app/services/kept/saved-filters.server.ts");
const mine = () => import("#app/services/kept/mine.server.ts");
const search = () => import("#app/services/search.server.ts");
const stacks = () => import("#app/services/stacks.server.ts");

let engineer: ActorScope;
let technician: ActorScope;
let guest: ActorScope;

// Loading the server's modules takes longer than a test should.
beforeAll(async () => {
  await Promise.all([visits(), favourites(), filters(), mine(), search(), stacks()]);
  engineer = await scopeOfPerson(database, "engineer");
  technician = await scopeOfPerson(database, "technician");
  guest = await scopeOfPerson(database, "guest");
}, 60_000);

const idOf = async (table: string, like: string) => {
  const [row] = await asOwner<{ id: string }>(database, `select id from ${table} where name like ? limit 1`, [like]);
  return row?.id ?? "";
};
const group = async (scope: ActorScope, kind: string) => {
  const { searchEverything } = await search();
  return (await searchEverything(scope, "")).groups.find((found) => found.kind === kind)?.rows ?? [];
};

describe("what was opened", () => {
  test("is shown newest first, once each, by the name that it has now", async () => {
    const { noteVisit } = await visits();
    const flow = await idOf("flow", "Tern%");
    const film = await idOf("film", "Polymer dielectric A");
    await noteVisit(engineer, "flow", flow);
    await noteVisit(engineer, "film", film);
    await noteVisit(engineer, "flow", flow);
    await asOwner(database, "update flow set name = 'Tern renamed' where id = ?", [flow]);
    expect(await group(engineer, "recent")).toMatchObject([
      { name: "Tern renamed", about: "flow, Tern", path: `/flows/${flow}` },
      { name: "Polymer dielectric A", about: "film, polymer" },
    ]);
    expect(await group(technician, "recent")).toEqual([]);
  });

  test("and is gone since, or lies in a program that was left, is left out", async () => {
    const { noteVisit } = await visits();
    const petrel = await idOf("stack", "Petrel%");
    await noteVisit(technician, "stack", petrel);
    await noteVisit(technician, "stack", await idOf("stack", "Tern%"));
    expect(await group(technician, "recent")).toHaveLength(2);
    await leave(database, "technician", "petrel");
    const now = await scopeOfPerson(database, "technician");
    expect(JSON.stringify(await group(now, "recent"))).not.toContain("Petrel");
    // Row-level security alone, with the rights of before.
    expect(JSON.stringify(await group(technician, "recent"))).not.toContain("Petrel");
    await asOwner(database, "update recent_visit set record_id = gen_random_uuid() where person_id = ?", [
      now.actor.id,
    ]);
    expect(await group(now, "recent")).toEqual([]);
  });

  test("by who may not is not noted, and thirty are kept", async () => {
    const { noteVisit } = await visits();
    await noteVisit(guest, "flow", await idOf("flow", "Tern%"));
    await noteVisit(guest, "film", await idOf("film", "%"));
    await noteVisit(engineer, "wafer", "00000000-0000-4000-8000-000000000000");
    const [none] = await asOwner<{ visits: number }>(
      database,
      "select count(*)::int as visits from recent_visit where person_id = ? or kind = 'wafer'",
      [guest.actor.id],
    );
    expect(none).toEqual({ visits: 0 });
    await asOwner(
      database,
      `insert into recent_visit (id, person_id, kind, record_id, at)
         select gen_random_uuid(), ?, 'film', gen_random_uuid(), now() - interval '1 day' from generate_series(1, 60)`,
      [engineer.actor.id],
    );
    await noteVisit(engineer, "film", await idOf("film", "%"));
    const [kept] = await asOwner<{ visits: number }>(
      database,
      "select count(*)::int as visits from recent_visit where person_id = ?",
      [engineer.actor.id],
    );
    expect(kept).toEqual({ visits: 30 });
  });
});

describe("favourites", () => {
  test("are marked and taken away, twice as once, and filter a list", async () => {
    const { setFavourite, listFavourites } = await favourites();
    const { mineOf } = await mine();
    const { listStacks, STACK_SORTS } = await stacks();
    const stack = await idOf("stack", "Fulmar%");
    await setFavourite(engineer, "stack", stack, true);
    await setFavourite(engineer, "stack", stack, true);
    expect(await listFavourites(engineer)).toMatchObject([{ kind: "stack", id: stack, about: "stack, Fulmar" }]);
    expect((await mineOf(engineer)).favourites).toEqual([`stack ${stack}`]);
    expect(await group(engineer, "favourite")).toMatchObject([{ path: `/stacks/${stack}` }]);
    const params = readListParams(new URLSearchParams("favourites=mine"), {
      sorts: STACK_SORTS,
      filters: ["favourites"],
    });
    expect((await listStacks(engineer, params)).rows.map(({ id }) => id)).toEqual([stack]);
    expect((await listStacks(await scopeOfPerson(database, "process-owner"), params)).rows).toEqual([]);
    await setFavourite(engineer, "stack", stack, false);
    await setFavourite(engineer, "stack", stack, false);
    expect(await listFavourites(engineer)).toEqual([]);
  });

  test("of what one may not open are answered as of what is not there", async () => {
    const { setFavourite } = await favourites();
    const refused = { init: { status: 404 } };
    const flow = await idOf("flow", "Petrel%");
    await expect(setFavourite(guest, "flow", flow, true)).rejects.toMatchObject(refused);
    await expect(setFavourite(guest, "film", await idOf("film", "%"), true)).rejects.toMatchObject(refused);
    await expect(setFavourite(technician, "flow", flow, true)).rejects.toMatchObject(refused);
    await expect(setFavourite(engineer, "scan", "00000000-0000-4000-8000-000000000000", true)).rejects.toMatchObject(
      refused,
    );
  });
});

describe("searches of lists", () => {
  test("are kept by name, replaced by the same name and removed", async () => {
    const { keepFilter, removeFilter } = await filters();
    const { mineOf } = await mine();
    expect(await keepFilter(engineer, { list: "/films", name: "Metals", query: "kind=metal" })).toBeNull();
    expect(await keepFilter(engineer, { list: "/films", name: "metals", query: "kind=metal&sort=name" })).toBeNull();
    const [filter, ...more] = (await mineOf(engineer)).filters;
    expect(more).toEqual([]);
    expect(filter).toMatchObject({ list: "/films", name: "metals", query: "kind=metal&sort=name" });
    await removeFilter(technician, filter?.id ?? "");
    expect((await mineOf(engineer)).filters).toHaveLength(1);
    await removeFilter(engineer, filter?.id ?? "");
    expect((await mineOf(engineer)).filters).toEqual([]);
  });

  test("are twenty of a list at most", async () => {
    const { keepFilter } = await filters();
    for (let number = 1; number <= 20; number++)
      expect(await keepFilter(engineer, { list: "/scans", name: `${number}`, query: `q=${number}` })).toBeNull();
    const more = { list: "/scans", name: "one more", query: "q=x" };
    expect(await keepFilter(engineer, more)).toMatch(/20 searches/);
    expect(await keepFilter(engineer, { ...more, name: "7" })).toBeNull();
    expect(await keepFilter(engineer, { ...more, list: "/lots" })).toBeNull();
  });
});

test("preferences are as delivered until they are saved, and are the person's own", async () => {
  const { mineOf, savePreferences } = await mine();
  expect((await mineOf(guest)).preferences).toEqual(DEFAULT_PREFERENCES);
  const own = { ...DEFAULT_PREFERENCES, density: "tight", length: "mil", decimalMark: "comma" } as const;
  await savePreferences(guest, { ...own, theme: "dark" });
  await savePreferences(guest, { ...own, theme: "light" });
  expect((await mineOf(guest)).preferences).toEqual({ ...own, theme: "light" });
  expect((await mineOf(engineer)).preferences).toEqual(DEFAULT_PREFERENCES);
  await asOwner(database, `update preference set value = '{"theme": "sepia", "density": "tight"}'`);
  expect((await mineOf(guest)).preferences).toEqual({ ...DEFAULT_PREFERENCES, density: "tight" });
});
