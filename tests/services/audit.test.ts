import { expect, test } from "vitest";
import { scopeOfPerson } from "#tests/db/people.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";

const database = useDatabase({ demo: true });

interface Event {
  action: string;
  subject: string;
  field: string | null;
  from: unknown;
  to: unknown;
  actor_id: string;
  program_id: string | null;
  request_id: string;
}

async function copperFilm() {
  const { Film } = await import("#app/db/entities/film.ts");
  const film = await database.owner.em.fork().findOneOrFail(Film, { name: "Plated copper A" });
  const { name, kind, note, stressState, stress, youngsModulus, poissonsRatio, expansion } = film;
  return {
    id: film.id,
    version: film.version,
    values: {
      name,
      kind,
      note,
      stressState,
      stress,
      youngsModulus,
      poissonsRatio,
      expansion,
      yieldStress: film.yieldStress ?? null,
      zeroStressTemperature: null,
      temperatureLimit: film.temperatureLimit ?? null,
    },
  };
}

test("a change leaves one event for each field that changed, with from, to, who and request", async () => {
  const { saveLibraryRecord } = await import("#app/services/library/library.server.ts");
  const scope = await scopeOfPerson(database, "engineer");
  const { id, version, values } = await copperFilm();
  const saved = await saveLibraryRecord(scope, "film", {
    id,
    version,
    values: { ...values, note: "after the new bath", stress: { ...values.stress, value: 25e6 } },
  });
  expect(saved).toEqual({ outcome: "saved", id });
  const events = await asOwner<Event>(
    database,
    "select * from audit_event where subject_id = ? and action = 'changed' order by field",
    [id],
  );
  expect(events.map(({ field }) => field)).toEqual(["note", "stress"]);
  expect(events[0]).toMatchObject({
    subject: "film",
    from: "",
    to: "after the new bath",
    actor_id: scope.actor.id,
    program_id: null,
    request_id: "test",
  });
  expect(events[1]).toMatchObject({ from: { value: 20e6 }, to: { value: 25e6 } });
});

test("a save that changes nothing of substance leaves no event", async () => {
  const { saveLibraryRecord } = await import("#app/services/library/library.server.ts");
  const scope = await scopeOfPerson(database, "engineer");
  const { id, version, values } = await copperFilm();
  const count = async () => (await asOwner(database, "select 1 from audit_event")).length;
  const before = await count();
  await saveLibraryRecord(scope, "film", { id, version, values });
  expect(await count()).toBe(before);
});

test("what belongs to a program says so", async () => {
  const { removeStack } = await import("#app/services/stacks.server.ts");
  const scope = await scopeOfPerson(database, "engineer");
  const [stack] = await asOwner<{ id: string; program_id: string }>(
    database,
    "select s.id, s.program_id from stack s join program p on p.id = s.program_id where p.slug = 'fulmar'",
  );
  await removeStack(scope, stack?.id ?? "");
  const events = await asOwner<Event>(database, "select * from audit_event where action = 'removed' order by subject");
  expect(events.map(({ subject }) => subject)).toEqual(["stack", "stack layer", "stack layer"]);
  expect(events.every(({ program_id }) => program_id === stack?.program_id)).toBe(true);
});

test("a change outside the door is refused, so none can go unnoted", async () => {
  const { orm } = await import("#app/db/orm.server.ts");
  const { Film } = await import("#app/db/entities/film.ts");
  const em = (await orm()).em.fork();
  const film = em.create(Film, {
    ...(await copperFilm()).values,
    id: crypto.randomUUID(),
    name: "Nobody's film",
  } as never);
  await expect(em.persistAndFlush(film)).rejects.toThrow(/outside inScope/);
});

test("a transaction that fails leaves neither the change nor its event", async () => {
  const { inScope } = await import("#app/server/scope.server.ts");
  const { Film } = await import("#app/db/entities/film.ts");
  const scope = await scopeOfPerson(database, "engineer");
  const { id } = await copperFilm();
  await expect(
    inScope(scope, async (em) => {
      const film = await em.findOneOrFail(Film, { id });
      film.note = "never to be seen";
      await em.flush();
      throw new Error("the rest went wrong");
    }),
  ).rejects.toThrow("the rest went wrong");
  expect(await asOwner(database, "select 1 from film where note = 'never to be seen'")).toEqual([]);
  expect(await asOwner(database, `select 1 from audit_event where "to" = '"never to be seen"'`)).toEqual([]);
});
