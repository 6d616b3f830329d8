import { expect, test } from "vitest";
import { scopeOfPerson } from "#tests/db/people.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";
import { BLANK_FILM_HANDLING } from "#app/lib/blank-handling.ts";
import { measured } from "#app/db/seeders/measured.ts";

const database = useDatabase({ demo: true });

const library = () => import("#app/services/library/library.server.ts");

const newFilm = (name: string) => ({
  id: null,
  version: null,
  values: {
    name,
    kind: "polymer",
    note: "",
    stressState: "",
    stress: measured(30e6, 3e6, "measured here"),
    youngsModulus: measured(3e9, null, "supplier"),
    poissonsRatio: measured(0.35, null, "supplier"),
    expansion: measured(40e-6, null, "supplier"),
    yieldStress: null,
    zeroStressTemperature: null,
    temperatureLimit: null,
    handling: BLANK_FILM_HANDLING,
  },
});

test("a second save from an old version is a conflict and writes nothing", async () => {
  const { getLibraryRecord, saveLibraryRecord } = await library();
  const [engineer, owner] = [await scopeOfPerson(database, "engineer"), await scopeOfPerson(database, "process-owner")];
  const created = await saveLibraryRecord(engineer, "film", newFilm("Twice edited"));
  if (created.outcome !== "saved") throw new Error("not created");
  const { record, stamp } = await getLibraryRecord(owner, "film", created.id);
  const edit = (note: string) => ({
    id: record.id,
    version: stamp.version,
    values: { ...newFilm("Twice edited").values, note },
  });
  expect(await saveLibraryRecord(owner, "film", edit("first"))).toMatchObject({ outcome: "saved" });
  const second = await saveLibraryRecord(engineer, "film", edit("second"));
  expect(second).toMatchObject({ outcome: "conflict", conflict: { by: owner.actor.name, version: stamp.version + 1 } });
  expect((await getLibraryRecord(engineer, "film", record.id)).record.note).toBe("first");
});

test("two saves at the same moment: one wins, the other is told", async () => {
  const { getLibraryRecord, saveLibraryRecord } = await library();
  const scope = await scopeOfPerson(database, "engineer");
  const created = await saveLibraryRecord(scope, "film", newFilm("Raced"));
  if (created.outcome !== "saved") throw new Error("not created");
  const { stamp } = await getLibraryRecord(scope, "film", created.id);
  const edit = (note: string) => ({
    id: created.id,
    version: stamp.version,
    values: { ...newFilm("Raced").values, note },
  });
  const outcomes = await Promise.all([
    saveLibraryRecord(scope, "film", edit("one")),
    saveLibraryRecord(scope, "film", edit("two")),
  ]);
  expect(outcomes.map(({ outcome }) => outcome).sort()).toEqual(["conflict", "saved"]);
});

test("a name is given once, also when two people type it at the same moment", async () => {
  const { saveLibraryRecord } = await library();
  const scope = await scopeOfPerson(database, "engineer");
  const outcomes = await Promise.all([1, 2, 3].map(() => saveLibraryRecord(scope, "film", newFilm("Only once"))));
  expect(outcomes.map(({ outcome }) => outcome).sort()).toEqual(["name taken", "name taken", "saved"]);
  expect(await asOwner(database, "select 1 from film where name = 'Only once'")).toHaveLength(1);
});

test("what a role may not, the service refuses whatever the page showed", async () => {
  const { saveLibraryRecord, listLibrary } = await library();
  const [technician, guest] = [await scopeOfPerson(database, "technician"), await scopeOfPerson(database, "guest")];
  await expect(saveLibraryRecord(technician, "film", newFilm("Not mine"))).rejects.toMatchObject({
    init: { status: 403 },
  });
  const params = { query: "", sort: "name", descending: false, page: 1, filters: {} };
  await expect(listLibrary(guest, "film", params)).rejects.toMatchObject({ init: { status: 403 } });
});

test("a foreign or made-up id is not there, in the same words", async () => {
  const { getStack } = await import("#app/services/stacks.server.ts");
  const guest = await scopeOfPerson(database, "guest");
  const [petrel] = await asOwner<{ id: string }>(
    database,
    "select s.id from stack s join program p on p.id = s.program_id where p.slug = 'petrel'",
  );
  const answers = await Promise.all(
    [petrel?.id, "00000000-0000-4000-8000-000000000000", "not an id", "1; drop table stack"].map((id) =>
      getStack(guest, id).catch((refused: unknown) => refused as { data: unknown }),
    ),
  );
  const sentence = (answers[0] as { data: unknown }).data;
  for (const answer of answers) expect(answer).toMatchObject({ init: { status: 404 }, data: sentence });
});

test("the form of a film is told, property by property, what somebody else has saved meanwhile", async () => {
  const { getLibraryRecord, saveLibraryRecord } = await library();
  const { saveLibraryForm } = await import("#app/services/library/library-form.server.ts");
  const [engineer, owner] = [await scopeOfPerson(database, "engineer"), await scopeOfPerson(database, "process-owner")];
  const created = await saveLibraryRecord(engineer, "film", newFilm("In two hands"));
  if (created.outcome !== "saved") throw new Error("not created");
  const { stamp } = await getLibraryRecord(engineer, "film", created.id);
  const changed = { ...newFilm("In two hands").values, note: "theirs", stress: measured(45e6, 2e6, "measured here") };
  await saveLibraryRecord(owner, "film", { id: created.id, version: stamp.version, values: changed });
  const text = (value: string, tolerance = "", source = "supplier") => ({ value, tolerance, source });
  const typed = {
    stress: text("30 MPa", "3 MPa", "measured here"),
    youngsModulus: text("3 GPa"),
    poissonsRatio: text("0.35"),
    expansion: text("40 ppm/K"),
  };
  const body = new FormData();
  for (const [name, parts] of Object.entries(typed))
    for (const [part, said] of Object.entries(parts)) body.append(`${name}.${part}`, said);
  for (const [name, said] of Object.entries({ name: "In two hands", kind: "polymer", note: "mine", stressState: "" }))
    body.append(name, said);
  body.append("version", String(stamp.version));
  const request = new Request("http://127.0.0.1/films", { method: "POST", body });
  const answer = await saveLibraryForm(request, engineer, "film", { id: created.id, list: "/films" });
  const told: unknown = JSON.parse(JSON.stringify(answer.data.conflict).replaceAll("\u00A0", " "));
  expect(told).toEqual({
    by: owner.actor.name,
    rows: [
      { label: "Stress", theirs: "45.0 ± 2.0 MPa, measured here", mine: "30.0 ± 3.0 MPa, measured here" },
      { label: "Note", theirs: "theirs", mine: "mine" },
    ],
  });
});
