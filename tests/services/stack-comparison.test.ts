import { beforeAll, expect, test } from "vitest";
import type { ActorScope } from "#app/server/scope.server.ts";
import { leave, scopeOfPerson } from "#tests/db/people.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";

const database = useDatabase({ demo: true });

const comparisons = () => import("#app/services/stack-comparison/comparison.server.ts");
const drawings = () => import("#app/services/stack-comparison/drawing.server.tsx");

const status = (code: number) => expect.objectContaining({ init: { status: code } }) as unknown;
const NOWHERE = "00000000-0000-4000-8000-000000000000";

let engineer: ActorScope;
/** Belongs to Tern and Petrel, not to Fulmar. */
let technician: ActorScope;
let guest: ActorScope;
let administrator: ActorScope;
let ids: Record<string, string> = {};

const ask = (...of: string[]) => new URLSearchParams({ of: of.join(",") });
const idOf = (slug: string) => ids[slug] ?? "";

// Loading the server's modules takes longer than a test should.
beforeAll(async () => {
  await Promise.all([comparisons(), drawings()]);
  engineer = await scopeOfPerson(database, "engineer");
  await leave(database, "technician", "fulmar");
  technician = await scopeOfPerson(database, "technician");
  guest = await scopeOfPerson(database, "guest");
  administrator = await scopeOfPerson(database, "administrator");
  const rows = await asOwner<{ slug: string; id: string }>(
    database,
    "select p.slug, s.id from stack s join program p on p.id = s.program_id",
  );
  ids = Object.fromEntries(rows.map(({ slug, id }) => [slug, id]));
}, 90_000);

test("stacks stand side by side in the order asked for, each with its curve and its figures", async () => {
  const { stackComparison } = await comparisons();
  const view = await stackComparison(engineer, ask(idOf("petrel"), idOf("tern"), idOf("fulmar")));
  expect(view.missing).toBe(0);
  expect(view.members.map(({ letter, program }) => `${letter} ${program}`)).toEqual(["A Petrel", "B Tern", "C Fulmar"]);
  expect(view.compared?.chart.curves.map(({ letter }) => letter)).toEqual(["A", "B", "C"]);
  expect(view.compared?.crossings).toHaveLength(3);
  expect(view.compared?.sensitivities).toHaveLength(3);
  for (const { rows } of view.compared?.groups ?? []) for (const { cells } of rows) expect(cells).toHaveLength(3);
  expect(view.choices.map(({ id }) => id)).toEqual([]);
});

test("a stack of another program is no such stack, like one that does not exist and one that is no id", async () => {
  const { stackComparison } = await comparisons();
  const foreign = await stackComparison(technician, ask(idOf("tern"), idOf("fulmar"), idOf("petrel")));
  const lost = await stackComparison(technician, ask(idOf("tern"), NOWHERE, idOf("petrel")));
  const odd = await stackComparison(technician, ask(idOf("tern"), "1' or '1'='1", idOf("petrel")));
  expect(foreign).toEqual(lost);
  expect(odd).toEqual(lost);
  expect(lost.missing).toBe(1);
  expect(lost.compared?.chart.curves).toHaveLength(2);
  expect(JSON.stringify(foreign)).not.toContain(idOf("fulmar"));
  expect(JSON.stringify(foreign)).not.toContain("Fulmar");
});

test("one stack, or only foreign ones, are nothing to compare", async () => {
  const { stackComparison, comparedStacks } = await comparisons();
  const { comparisonDrawing } = await drawings();
  for (const search of [ask(), ask(idOf("tern")), ask(idOf("tern"), idOf("fulmar"))]) {
    expect((await stackComparison(technician, search)).compared).toBeNull();
    await expect(comparedStacks(technician, search)).rejects.toEqual(status(400));
    await expect(comparisonDrawing(technician, search)).rejects.toEqual(status(400));
  }
});

test("more than six are not compared", async () => {
  const rows = await asOwner<{ id: string }>(
    database,
    `insert into stack select changed.* from generate_series(1, 5) n, stack original,
       jsonb_populate_record(original, jsonb_build_object('id', gen_random_uuid(), 'name', 'Copy ' || n)) changed
       where original.id = ? returning id`,
    [idOf("tern")],
  );
  const copies = rows.map(({ id }) => id);
  const { stackComparison, comparedStacks } = await comparisons();
  const six = await stackComparison(engineer, ask(idOf("tern"), ...copies));
  expect(six.compared?.chart.curves).toHaveLength(6);
  const seven = ask(idOf("tern"), idOf("petrel"), ...copies);
  const view = await stackComparison(engineer, seven);
  expect(view.members).toHaveLength(7);
  expect(view.compared).toBeNull();
  await expect(comparedStacks(engineer, seven)).rejects.toEqual(status(400));
  await asOwner(database, "delete from stack where name like 'Copy %'");
});

test("who may see no work compares none: guest and administrator", async () => {
  const { stackComparison, comparedStacks } = await comparisons();
  for (const scope of [guest, administrator]) {
    await expect(stackComparison(scope, ask(idOf("tern"), idOf("petrel")))).rejects.toEqual(status(403));
    await expect(comparedStacks(scope, ask(idOf("tern"), idOf("petrel")))).rejects.toEqual(status(403));
  }
});

test("another temperature and range move the figures and the curve; what is wrong with them is said", async () => {
  const { stackComparison } = await comparisons();
  const search = ask(idOf("petrel"), idOf("tern"));
  const room = await stackComparison(engineer, search);
  search.set("at", "245 C");
  search.set("from", "100 µm");
  search.set("to", "500 µm");
  search.set("scale", "linear");
  const hot = await stackComparison(engineer, search);
  expect(hot.compared?.temperature).toBe("245\u00A0°C");
  expect(hot.compared?.chart).toMatchObject({ scale: "linear", range: { from: 100e-6, to: 500e-6 } });
  expect(hot.compared?.summary).not.toEqual(room.compared?.summary);
  search.set("at", "12 parsecs");
  const wrong = await stackComparison(engineer, search);
  expect(wrong.compared?.faults.at).toContain("parsecs");
  expect(wrong.compared?.temperature).toBe("25\u00A0°C");
});

test("files are of the same stacks: the table as CSV, the chart as a drawing that needs nothing from outside", async () => {
  const { comparedStacks } = await comparisons();
  const { comparisonDrawing } = await drawings();
  const search = ask(idOf("petrel"), idOf("tern"));
  const { name, stacks } = await comparedStacks(engineer, search);
  expect(name).toContain("Petrel");
  expect(stacks.map(({ letter }) => letter)).toEqual(["A", "B"]);
  const { svg } = await comparisonDrawing(engineer, search);
  expect(svg).toMatch(/^<\?xml version="1.0" encoding="UTF-8"\?>\n<svg xmlns="http:\/\/www.w3.org\/2000\/svg"/);
  expect(svg).not.toContain("var(--");
  for (const text of ["A  Petrel P-3", "B  Tern T-2", "Warp against silicon thickness"]) expect(svg).toContain(text);
});
