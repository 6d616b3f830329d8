import { beforeAll, expect, test } from "vitest";
import type { ActorScope } from "#app/server/scope.server.ts";
import { leave, scopeOfPerson } from "#tests/db/people.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";

const database = useDatabase({ demo: true });
const ticked = () => import("#app/services/ticked/ticked-stacks.server.ts");
const stacks = () => import("#app/services/stacks.server.ts");

let engineer: ActorScope;
let technician: ActorScope;

// Loading the server's modules takes longer than a test should.
beforeAll(async () => {
  await Promise.all([ticked(), stacks()]);
  engineer = await scopeOfPerson(database, "engineer");
  technician = await scopeOfPerson(database, "technician");
}, 60_000);

const NOWHERE = "00000000-0000-4000-8000-000000000000";
const demo = async () => {
  const rows = await asOwner<{ id: string; name: string; slug: string; version: number }>(
    database,
    `select s.id, s.name, s.version, p.slug from stack s join program p on p.id = s.program_id
      where s.name ~ '^(Tern|Petrel|Fulmar)' and s.name !~ ', [0-9]+$' order by s.name`,
  );
  return new Map(rows.map((row) => [row.slug, row]));
};
const of = async (slug: string) => {
  const stack = (await demo()).get(slug);
  if (!stack) throw new Error(`no stack of ${slug}`);
  return stack;
};

test("copies stand beside their stacks with every layer, each under a free name, twice as well", async () => {
  const { duplicateStacks } = await ticked();
  const { getStack } = await stacks();
  const [tern, petrel] = [await of("tern"), await of("petrel")];
  const first = await duplicateStacks(engineer, [petrel.id, tern.id, NOWHERE]);
  expect(first.rows.map(({ name, state }) => [name, state])).toEqual([
    [`${petrel.name}, 2`, "done"],
    [`${tern.name}, 2`, "done"],
  ]);
  expect(first.hidden).toBe(1);
  const again = await duplicateStacks(engineer, [tern.id]);
  expect(again.rows).toMatchObject([{ name: `${tern.name}, 3`, words: `Copy of ${tern.name}.` }]);
  const [original, copy] = [await getStack(engineer, petrel.id), await getStack(engineer, first.rows[0]?.id)];
  expect(copy.layers).toEqual(original.layers);
  expect(copy).toMatchObject({ program: original.program, siliconThickness: original.siliconThickness });
  expect(copy.stamp.updatedBy).toBe(engineer.actor.name);
});

test("goes by what the person may in each program, row by row", async () => {
  const { duplicateStacks, removeStacks, tickedStacks } = await ticked();
  const [tern, petrel, fulmar] = [await of("tern"), await of("petrel"), await of("fulmar")];
  // As a technician in Petrel, and in Fulmar not at all.
  const mixed: ActorScope = {
    ...engineer,
    actor: {
      ...engineer.actor,
      memberships: engineer.actor.memberships
        .filter(({ programSlug }) => programSlug !== "fulmar")
        .map((held) => (held.programSlug === "petrel" ? { ...held, role: "technician" } : held)),
    },
  };
  const ids = [tern.id, petrel.id, fulmar.id];
  const asked = await tickedStacks(mixed, ids, "It goes.");
  expect(asked.rows.map(({ state }) => state)).toEqual(["to do", "left"]);
  expect(asked.rows[1]?.words).toBe("Your role in Petrel may not edit stacks and flows. Ask its process owner.");
  expect(asked.hidden).toBe(1);
  expect((await duplicateStacks(mixed, ids)).rows.map(({ state }) => state)).toEqual(["done", "left"]);
  const removed = await removeStacks(mixed, new Map([tern, petrel, fulmar].map(({ id, version }) => [id, version])));
  expect(removed.rows.map(({ state }) => state)).toEqual(["done", "left"]);
  const left = await asOwner<{ id: string }>(database, "select id from stack where id = any (array[?]::uuid[])", [ids]);
  expect(left.map(({ id }) => id).sort()).toEqual([petrel.id, fulmar.id].sort());
});

test("one that somebody has changed since it was ticked stays, by name; the others go", async () => {
  const { duplicateStacks, removeStacks } = await ticked();
  const petrel = await of("petrel");
  const { rows } = await duplicateStacks(engineer, [petrel.id, petrel.id]);
  const { rows: more } = await duplicateStacks(engineer, [petrel.id]);
  const [one, other] = [rows[0], more[0]];
  if (!one || !other) throw new Error("no copies");
  await asOwner(database, "update stack set version = version + 1 where id = ?", [one.id]);
  const removed = await removeStacks(engineer, new Map([one, other].map(({ id, version }) => [id, version])));
  expect(removed.rows).toMatchObject([
    { name: one.name, state: "left", words: expect.stringContaining("after you had ticked it") as string },
    { name: other.name, state: "done", path: null },
  ]);
  const events = await asOwner<{ n: number }>(
    database,
    "select count(*)::int as n from audit_event where action = 'removed' and subject_id = ?",
    [other.id],
  );
  expect(events[0]?.n).toBeGreaterThan(0);
});

test("is refused to whoever may edit no stack, and to who has left the program", async () => {
  const { removeStacks, tickedStacks } = await ticked();
  const petrel = await of("petrel");
  await expect(tickedStacks(technician, [petrel.id], "")).rejects.toMatchObject({ init: { status: 403 } });
  await expect(removeStacks(technician, new Map([[petrel.id, petrel.version]]))).rejects.toMatchObject({
    init: { status: 403 },
  });
  // What the scope still says is one wall; the database asks by itself.
  await leave(database, "engineer", "petrel");
  const removed = await removeStacks(engineer, new Map([[petrel.id, petrel.version]]));
  expect(removed).toEqual({ rows: [], hidden: 1 });
});
