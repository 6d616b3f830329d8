import { beforeAll, expect, test } from "vitest";
import type { ActorScope } from "#app/server/scope.server.ts";
import { leave, scopeOfPerson } from "#tests/db/people.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";

const database = useDatabase({ demo: true });

const comparisons = () => import("#app/services/flow-comparison/comparison.server.ts");
const drawings = () => import("#app/services/flow-comparison/drawing.server.tsx");

const LONG = { timeout: 60_000 };
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
    "select distinct on (p.slug) p.slug, f.id from flow f join program p on p.id = f.program_id order by p.slug, f.name",
  );
  ids = Object.fromEntries(rows.map(({ slug, id }) => [slug, id]));
}, 90_000);

test("flows stand side by side in the order asked for, each with its course and its figures", LONG, async () => {
  const { flowComparison } = await comparisons();
  const view = await flowComparison(engineer, ask(idOf("petrel"), idOf("tern"), idOf("fulmar")));
  expect(view.missing).toBe(0);
  expect(view.members.map(({ letter, program }) => `${letter} ${program}`)).toEqual(["A Petrel", "B Tern", "C Fulmar"]);
  for (const { rows } of view.compared?.groups ?? []) for (const { cells } of rows) expect(cells).toHaveLength(3);
  expect(view.choices.map(({ id }) => id)).not.toContain(idOf("tern"));
});

test(
  "a flow of another program is no such flow, like one that does not exist and one that is no id",
  LONG,
  async () => {
    const { flowComparison } = await comparisons();
    const foreign = await flowComparison(technician, ask(idOf("tern"), idOf("fulmar"), idOf("petrel")));
    const lost = await flowComparison(technician, ask(idOf("tern"), NOWHERE, idOf("petrel")));
    const odd = await flowComparison(technician, ask(idOf("tern"), "1' or '1'='1", idOf("petrel")));
    expect(foreign).toEqual(lost);
    expect(odd).toEqual(lost);
    expect(lost.missing).toBe(1);
    expect(lost.members.map(({ letter, program }) => `${letter} ${program}`)).toEqual(["A Tern", "B Petrel"]);
    expect(JSON.stringify(foreign)).not.toContain(idOf("fulmar"));
    expect(JSON.stringify(foreign)).not.toContain("Fulmar");
  },
);

test("one flow, or only foreign ones, are nothing to compare, neither here nor in a file", LONG, async () => {
  const { flowComparison, comparedFlows } = await comparisons();
  const { flowComparisonDrawing } = await drawings();
  for (const search of [ask(), ask(idOf("tern")), ask(idOf("tern"), idOf("fulmar"))]) {
    expect((await flowComparison(technician, search)).compared).toBeNull();
    await expect(comparedFlows(technician, search)).rejects.toEqual(status(400));
    await expect(flowComparisonDrawing(technician, search)).rejects.toEqual(status(400));
  }
});

test("who may see no work compares none: guest and administrator", async () => {
  const { flowComparison, comparedFlows } = await comparisons();
  for (const scope of [guest, administrator]) {
    await expect(flowComparison(scope, ask(idOf("tern"), idOf("petrel")))).rejects.toEqual(status(403));
    await expect(comparedFlows(scope, ask(idOf("tern"), idOf("petrel")))).rejects.toEqual(status(403));
  }
});
