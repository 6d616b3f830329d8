import { beforeAll, expect, test } from "vitest";
import type { ActorScope } from "#app/server/scope.server.ts";
import { scopeOfPerson } from "#tests/db/people.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";

const database = useDatabase({ demo: true });
const ticked = () => import("#app/services/ticked/ticked-films.server.ts");

let engineer: ActorScope;
let technician: ActorScope;
let guest: ActorScope;
let films: { id: string; name: string }[];

// Loading the server's modules takes longer than a test should.
beforeAll(async () => {
  await ticked();
  engineer = await scopeOfPerson(database, "engineer");
  technician = await scopeOfPerson(database, "technician");
  guest = await scopeOfPerson(database, "guest");
  films = await asOwner(database, "select id, name from film order by name");
}, 60_000);

const NOWHERE = "00000000-0000-4000-8000-000000000000";

test("gives the films that are ticked and no other, by name, whatever else was sent", async () => {
  const { tickedFilms } = await ticked();
  const [one, , other] = films;
  for (const scope of [engineer, technician]) {
    const found = await tickedFilms(scope, [other?.id ?? "", NOWHERE, one?.id ?? ""]);
    expect(found.map(({ name }) => name)).toEqual([one?.name, other?.name]);
  }
});

test("refuses when none of them is there: a table without rows would pass for an empty library", async () => {
  const { tickedFilms } = await ticked();
  for (const ids of [[], [NOWHERE]])
    await expect(tickedFilms(engineer, ids)).rejects.toMatchObject({ init: { status: 400 } });
});

test("is not for guests, who do not see the library", async () => {
  const { tickedFilms } = await ticked();
  await expect(tickedFilms(guest, [films[0]?.id ?? ""])).rejects.toMatchObject({ init: { status: 403 } });
});
