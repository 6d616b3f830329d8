import { beforeAll, describe, expect, test } from "vitest";
import type { SearchAnswer } from "#app/schemas/search.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { leave, scopeOfPerson } from "#tests/db/people.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";

const database = useDatabase({ demo: true });

const search = () => import("#app/services/search.server.ts");

let engineer: ActorScope;
let technician: ActorScope;

// Loading the server's modules takes longer than a test should.
beforeAll(async () => {
  await search();
  await leave(database, "technician", "petrel");
  engineer = await scopeOfPerson(database, "engineer");
  technician = await scopeOfPerson(database, "technician");
}, 60_000);

async function found(scope: ActorScope, query: string): Promise<SearchAnswer> {
  const { searchEverything } = await search();
  return searchEverything(scope, query);
}

const rowsOf = (answer: SearchAnswer, kind: string) => answer.groups.find((group) => group.kind === kind)?.rows ?? [];
const namesOf = (answer: SearchAnswer, kind: string) => rowsOf(answer, kind).map(({ name }) => name);

describe("what an engineer finds", () => {
  test("are records of every kind by a part of their name", async () => {
    const asOwnerOne = async (sql: string) => (await asOwner<{ name: string }>(database, sql))[0]?.name ?? "";
    for (const [kind, table] of [
      ["flow", "flow"],
      ["stack", "stack"],
      ["film", "film"],
      ["carrier", "carrier"],
      ["bondingMaterial", "bonding_material"],
      ["tape", "tape"],
      ["silicon", "silicon"],
      ["tool", "equipment"],
      ["instrument", "import_profile"],
      ["importProfile", "import_profile"],
      ["wafer", "wafer"],
      ["lot", "lot"],
    ] as const) {
      const name = await asOwnerOne(`select name from ${table} order by name limit 1`);
      if (name === "") continue;
      expect(namesOf(await found(engineer, name.toLowerCase()), kind)[0]).toBe(name);
    }
    expect(namesOf(await found(engineer, "m-0388"), "scan")).toContain("M-0388");
    expect(rowsOf(await found(engineer, "grind to 110"), "step")[0]).toMatchObject({
      name: "Grind to 110 µm",
      about: "Tern T-2, to 100 µm on tape",
    });
  });

  test("are places, rules, equations and words", async () => {
    const lots = await found(engineer, "lots");
    expect(lots.groups[0]?.rows[0]).toMatchObject({ name: "Lots", path: "/lots" });
    expect(namesOf(await found(engineer, "bow line"), "method")[0]).toBe("bow line");
    expect(rowsOf(await found(engineer, "rule 3"), "method")[0]?.path).toMatch(/^\/method#rule-/);
    expect(rowsOf(await found(engineer, "Glossary"), "method")[0]).toMatchObject({ path: "/method#glossary" });
  });

  test("stand in the order exact, beginning, beginning of a word, anywhere", async () => {
    for (const name of ["abcopper", "copper", "Copper two", "the copper"])
      await asOwner(
        database,
        `insert into film select changed.* from film original,
           jsonb_populate_record(original, jsonb_build_object('id', gen_random_uuid(), 'name', ?::text)) changed
           where original.name = 'Polymer dielectric A'`,
        [name],
      );
    const names = namesOf(await found(engineer, "copper"), "film");
    const places = ["copper", "Copper two", "the copper", "abcopper"].map((name) => names.indexOf(name));
    expect(places[0]).toBe(0);
    expect(places.filter((place) => place >= 0)).toEqual(
      places.filter((place) => place >= 0).toSorted((a, b) => a - b),
    );
    const { total } = (await found(engineer, "copper")).groups.find(({ kind }) => kind === "film") ?? {};
    expect(total).toBeGreaterThanOrEqual(4);
  });

  test("are at most eight of a kind, counted whole, with the way to the list", async () => {
    const answer = await found(engineer, "e");
    const films = answer.groups.find(({ kind }) => kind === "film");
    const [count] = await asOwner<{ films: number }>(
      database,
      "select count(*)::int as films from film where name ilike '%e%'",
    );
    expect(films?.rows).toHaveLength(8);
    expect(films).toMatchObject({ total: count?.films, list: "/films?q=e" });
  });

  test("have every word, in any order", async () => {
    expect(namesOf(await found(engineer, "110 grind"), "step")).toContain("Grind to 110 µm");
    expect(namesOf(await found(engineer, "tape tern"), "flow")).toContain("Tern T-2, to 100 µm on tape");
  });

  test.each(["%", "_", "\\", "(", "[a", "*", "'", "?", "??", ":x", "$1", "\0", "  ", "é".repeat(300), "\\m", "🙂"])(
    "are looked for as typed: %j",
    async (query) => {
      const answer = await found(engineer, query);
      for (const group of answer.groups) expect(group.rows.length).toBeLessThanOrEqual(8);
      if (["%", "_", "\\"].includes(query)) expect(namesOf(answer, "flow")).toEqual([]);
    },
  );
});

describe("what lies beyond a person's reach", () => {
  test("is not found by somebody of another program, whatever they type", async () => {
    for (const query of ["petrel", "PETREL-A", "glass", "50 µm", "e"]) {
      const { groups } = await found(technician, query);
      expect(JSON.stringify(groups)).not.toMatch(/Petrel/i);
    }
    expect(JSON.stringify(await found(engineer, "petrel"))).toMatch(/Petrel/);
  });

  test("a guest finds places and the method page, and nothing else", async () => {
    const guest = await scopeOfPerson(database, "guest");
    for (const query of ["tern", "e", "polymer", "M-0388", "1"]) {
      const { groups } = await found(guest, query);
      for (const { kind } of groups) expect(["place", "method"]).toContain(kind);
      for (const { path } of groups.flatMap(({ rows }) => rows))
        expect(path).toMatch(
          /^\/(sheets|method.*|preferences(\/mail)?|search|account(\/codes)?|tokens|webhooks|api)?$/,
        );
    }
    expect(namesOf(await found(guest, "e"), "place")).toEqual([
      ...["E-mail", "Sheets", "Method", "Preferences"],
      ...["Account", "One-time codes", "API tokens", "Webhooks"],
    ]);
  });

  test("an administrator finds the library and nothing of the programs' work", async () => {
    const administrator = await scopeOfPerson(database, "administrator");
    const kinds = (await found(administrator, "e")).groups.map(({ kind }) => kind);
    expect(kinds).toContain("film");
    for (const kind of ["flow", "stack", "step", "scan", "assessment", "wafer", "lot"])
      expect(kinds).not.toContain(kind);
  });
});

test("an answer takes under a tenth of a second", async () => {
  await found(engineer, "warm");
  const started = performance.now();
  for (const query of ["e", "tern", "grind", "µm", "1"]) await found(engineer, query);
  expect((performance.now() - started) / 5).toBeLessThan(100);
});
