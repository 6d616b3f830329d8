import { beforeAll, beforeEach, describe, expect, test } from "vitest";
import type { ActorScope } from "#app/server/scope.server.ts";
import { leave, scopeOfPerson } from "#tests/db/people.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";

const database = useDatabase({ demo: true });
const ticked = () => import("#app/services/ticked/ticked-flows.server.ts");
const copies = () => import("#app/services/flows/new-flow.server.ts");
const favourites = () => import("#app/services/kept/favourites.server.ts");

let engineer: ActorScope;
let technician: ActorScope;
let guest: ActorScope;

// Loading the server's modules takes longer than a test should.
beforeAll(async () => {
  await Promise.all([ticked(), copies(), favourites()]);
  engineer = await scopeOfPerson(database, "engineer");
  technician = await scopeOfPerson(database, "technician");
  guest = await scopeOfPerson(database, "guest");
}, 60_000);

const NOWHERE = "00000000-0000-4000-8000-000000000000";
const demoFlow = async (slug: string) => {
  const [row] = await asOwner<{ id: string; name: string }>(
    database,
    `select f.id, f.name from flow f join program p on p.id = f.program_id
      where p.slug = ? and f.name !~ ', copy' order by f.name limit 1`,
    [slug],
  );
  if (!row) throw new Error(`no flow of ${slug}`);
  return row;
};
/** A copy of the program's flow, which nobody has assessed yet. */
const freshFlow = async (slug: string) => {
  const { copyFlow } = await copies();
  const copied = await copyFlow(engineer, (await demoFlow(slug)).id);
  if (copied.outcome !== "saved") throw new Error("not copied");
  return copied.id;
};
const revisionsOf = async (flow: string) => {
  const rows = await asOwner<{ number: number }>(
    database,
    "select number from assessment where flow_id = ? order by number",
    [flow],
  );
  return rows.map(({ number }) => number);
};

describe("flows that are ticked", () => {
  test("are assessed while they are not up to date, and say what came of each", async () => {
    const { assessTicked, tickedFlows } = await ticked();
    const [tern, petrel] = [await freshFlow("tern"), await freshFlow("petrel")];
    const asked = await tickedFlows(engineer, [petrel, NOWHERE, tern]);
    expect(asked.rows.map(({ id, state, words }) => [id, state, words])).toEqual([
      [petrel, "to do", "Not assessed yet."],
      [tern, "to do", "Not assessed yet."],
    ]);
    expect(asked.hidden).toBe(1);
    const done = await assessTicked(engineer, [petrel, NOWHERE, tern]);
    expect(done.hidden).toBe(1);
    expect(done.rows.map(({ state, program }) => [state, program])).toEqual([
      ["done", "Petrel"],
      ["done", "Tern"],
    ]);
    for (const { words, path } of done.rows) {
      expect(words).toMatch(/^Revision A: (clear|caution|needs support|do not run|cannot judge)\.$/);
      const [stored] = await asOwner<{ outcome: string }>(database, "select outcome from assessment where id = ?", [
        path?.replace("/assessments/", ""),
      ]);
      expect(words).toBe(`Revision A: ${stored?.outcome}.`);
    }
    expect((await assessTicked(engineer, [tern])).rows).toMatchObject([
      { state: "left", words: "Revision A is up to date: nothing that it rests on has changed." },
    ]);
    expect(await revisionsOf(tern)).toEqual([1]);
  });

  test("get the next revision once something that they rest on has changed", async () => {
    const { assessTicked, tickedFlows } = await ticked();
    const flow = await freshFlow("tern");
    await assessTicked(engineer, [flow]);
    await asOwner(
      database,
      `update flow_step set peak_temperature = peak_temperature + 5
        where id = (select id from flow_step where flow_id = ? order by position limit 1)`,
      [flow],
    );
    await asOwner(database, "update flow set version = version + 1, updated_at = now() where id = ?", [flow]);
    expect((await tickedFlows(engineer, [flow])).rows).toMatchObject([
      { state: "to do", words: "Revision A is out of date." },
    ]);
    expect((await assessTicked(engineer, [flow])).rows[0]?.words).toMatch(/^Revision B: /);
    expect(await revisionsOf(flow)).toEqual([1, 2]);
  });

  test("get one revision when they are asked for twice at once", async () => {
    const { assessTicked } = await ticked();
    const ids = [await freshFlow("tern"), await freshFlow("petrel")];
    const answers = await Promise.all([assessTicked(engineer, ids), assessTicked(engineer, [...ids].reverse())]);
    const states = answers.flatMap(({ rows }) => rows.map(({ state }) => state)).sort();
    expect(states).toEqual(["done", "done", "left", "left"]);
    for (const id of ids) expect(await revisionsOf(id)).toEqual([1]);
  });

  test("stay where they cannot be computed, with the step and the reason, and the others are assessed", async () => {
    const { assessTicked } = await ticked();
    const [empty, broken, sound] = [await freshFlow("tern"), await freshFlow("tern"), await freshFlow("tern")];
    await asOwner(
      database,
      "delete from flow_step_film where step_id in (select id from flow_step where flow_id = ?)",
      [empty],
    );
    await asOwner(database, "delete from flow_step where flow_id = ?", [empty]);
    await asOwner(
      database,
      `update flow_step set silicon_after = jsonb_set(silicon_after::jsonb, '{value}', '-1e-4')
        where flow_id = ? and silicon_after is not null`,
      [broken],
    );
    const { rows } = await assessTicked(engineer, [empty, broken, sound]);
    expect(rows.map(({ state }) => state)).toEqual(["left", "left", "done"]);
    expect(rows[0]?.words).toBe("It cannot be computed. The flow has no steps yet. Add the first one.");
    expect(rows[1]?.words).toMatch(/^It cannot be computed\. Step \d+: /);
    expect([await revisionsOf(empty), await revisionsOf(broken)]).toEqual([[], []]);
  });

  test("are refused to whoever may assess none, and row by row where the role differs from program to program", async () => {
    const { assessTicked, tickedFlows } = await ticked();
    const [tern, petrel, fulmar] = [await freshFlow("tern"), await freshFlow("petrel"), await freshFlow("fulmar")];
    const ids = [tern, petrel, fulmar];
    for (const scope of [technician, guest]) {
      await expect(tickedFlows(scope, ids)).rejects.toMatchObject({ init: { status: 403 } });
      await expect(assessTicked(scope, ids)).rejects.toMatchObject({ init: { status: 403 } });
    }
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
    const done = await assessTicked(mixed, ids);
    expect(done.rows.map(({ state }) => state)).toEqual(["done", "left"]);
    expect(done.rows[1]?.words).toBe("Your role in Petrel may not run assessments. Ask its process owner.");
    expect(done.hidden).toBe(1);
    expect(JSON.stringify(done)).not.toContain("Fulmar");
    expect(await revisionsOf(petrel)).toEqual([]);
  });
});

describe("marking what is ticked", () => {
  beforeEach(() => asOwner(database, "delete from favourite"));

  test("marks each once, whether marked before or not, and passes over what is not the person's to open", async () => {
    const { listFavourites, markFavourites, setFavourite } = await favourites();
    const [tern, petrel] = [await demoFlow("tern"), await demoFlow("petrel")];
    await setFavourite(engineer, "flow", tern.id, true);
    expect(await markFavourites(engineer, "flow", [tern.id, NOWHERE, petrel.id])).toBe(2);
    expect((await listFavourites(engineer)).map(({ name }) => name).sort()).toEqual([petrel.name, tern.name]);
    expect(await markFavourites(guest, "flow", [tern.id, petrel.id])).toBe(0);
    expect(await listFavourites(technician)).toEqual([]);
  });

  test("marks none where there would be more than are kept", async () => {
    const { markFavourites } = await favourites();
    await asOwner(
      database,
      `insert into favourite (id, person_id, kind, record_id, at)
         select gen_random_uuid(), ?, 'film', gen_random_uuid(), now() from generate_series(1, 199)`,
      [engineer.actor.id],
    );
    const [tern, petrel] = [await demoFlow("tern"), await demoFlow("petrel")];
    await expect(markFavourites(engineer, "flow", [tern.id, petrel.id])).rejects.toMatchObject({
      init: { status: 409 },
    });
    const [kept] = await asOwner<{ n: number }>(database, "select count(*)::int as n from favourite");
    expect(kept?.n).toBe(199);
    expect(await markFavourites(engineer, "flow", [tern.id])).toBe(1);
  });

  test("reaches nothing of a program that the person has left", async () => {
    const { markFavourites } = await favourites();
    const petrel = await demoFlow("petrel");
    await leave(database, "technician", "petrel");
    // What the scope still says is one wall; the database asks by itself.
    expect(await markFavourites(technician, "flow", [petrel.id])).toBe(0);
  });
});
