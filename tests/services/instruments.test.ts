import { readFileSync } from "node:fs";
import { beforeAll, describe, expect, test } from "vitest";
import { monitorProfile, profileCsv } from "#app/db/seeders/demo-monitor.ts";
import { referenceReadingSchema, studySchema } from "#app/schemas/instrument.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { scopeOfPerson } from "#tests/db/people.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";

const database = useDatabase({ demo: true });

const load = async () => ({
  ...(await import("#app/services/instruments/list-instruments.server.ts")),
  ...(await import("#app/services/instruments/get-instrument.server.ts")),
  ...(await import("#app/services/instruments/add-study.server.ts")),
  ...(await import("#app/services/instruments/reference-readings.server.ts")),
  ...(await import("#app/services/instruments/set-aside.server.ts")),
});

let technician: ActorScope;
let service: Awaited<ReturnType<typeof load>>;

// Loading the server's modules takes longer than a test should.
beforeAll(async () => {
  service = await load();
  technician = await scopeOfPerson(database, "technician");
}, 60_000);

const LIST = { query: "", sort: "name", descending: false, page: 1, filters: {} };
const repeat = (seed: number) => ({
  name: `repeat-${seed}.csv`,
  bytes: new TextEncoder().encode(profileCsv(monitorProfile("before", { seed }))),
});
const study = (changes: Record<string, string> = {}) =>
  studySchema.parse({ wafer: "M-1", diameter: "200 mm", edgeExclusion: "5 mm", typedAs: "bow", ...changes });
const TYPED = { typed: "-4.0 µm\n-4.1 µm\n-3.9 µm\n-4.05 µm" };

async function added(name: string): Promise<string> {
  const saved = await service.addInstrument(technician, name);
  if (saved.outcome !== "saved") throw new Error(saved.outcome);
  return saved.id;
}

describe("a study", () => {
  test("from files keeps their curvatures and not the files, and is the one in use", async () => {
    const id = await added("Stylus A");
    const stored = await service.addStudy(technician, id, study(), [1, 11, 21, 31, 41].map(repeat));
    expect(stored.outcome).toBe("stored");
    const { studies, inUse } = await service.getInstrument(technician, id);
    expect(studies).toHaveLength(1);
    expect(inUse).toBe(studies[0]?.id);
    expect(studies[0]?.readings.map(({ file }) => file)).toEqual(
      [1, 11, 21, 31, 41].map((seed) => `repeat-${seed}.csv`),
    );
    expect(Math.abs((studies[0]?.result.mean ?? 0) - 0.0008)).toBeLessThan(3e-6);
    expect(studies[0]?.working.result.value).toBeCloseTo(studies[0]?.result.forTwo ?? 0, 15);
    const trail = await asOwner(
      database,
      "select 1 from audit_event where subject = 'repeatability study' and subject_id = ?",
      [studies[0]?.id],
    );
    expect(trail.length).toBeGreaterThan(0);
  });

  test("that is set aside stays with its reason; the one before it counts again", async () => {
    const id = await added("Stylus B");
    await service.addStudy(technician, id, study(TYPED), []);
    await service.addStudy(technician, id, study({ typed: "-4 µm\n-9 µm\n-4 µm" }), []);
    const [newest, older] = (await service.getInstrument(technician, id)).studies;
    if (!newest || !older) throw new Error("two studies were kept");
    const aside = { what: "study", id: newest.id, reason: "wafer slipped" } as const;
    await service.setAside(technician, id, aside);
    await service.setAside(technician, id, { ...aside, reason: "something else" });
    const instrument = await service.getInstrument(technician, id);
    expect(instrument.inUse).toBe(older.id);
    expect(instrument.studies[0]?.setAside).toBe("wafer slipped");
    await expect(service.setAside(technician, await added("Stylus C"), aside)).rejects.toMatchObject({
      init: { status: 404 },
    });
  });

  const fixture = new Uint8Array(
    readFileSync(new URL("../../fixtures/scans/monitor-200mm-725um-before-film-seed-7.csv", import.meta.url)),
  );
  test.each([
    ["two repeats", {}, [1, 11].map(repeat), "files", /2 repeats are too few/],
    [
      "the same file twice",
      {},
      [repeat(1), repeat(11), { name: "again.csv", bytes: repeat(1).bytes }],
      "files",
      /same bytes/,
    ],
    ["a picture", {}, [{ name: "a.png", bytes: new Uint8Array([137, 80, 78, 71, 0, 0]) }], "files", /a\.png/],
    ["another wafer's size", { diameter: "100 mm" }, [{ name: "big.csv", bytes: fixture }], "files", /big\.csv/],
    ["a list and files", TYPED, [1, 11, 21].map(repeat), "typed", /not both/],
    ["a line without unit", { typed: "-4 µm\n-4" }, [], "typed", /^Line 2/],
    ["nothing", {}, [], "files", /No repeat is too few/],
  ])("of %s leaves nothing behind", async (_, changes, files, field, says) => {
    const id = await added(`Stylus of ${_}`);
    const outcome = await service.addStudy(technician, id, study(changes as Record<string, string>), files);
    expect(outcome).toMatchObject({ outcome: "refused", field, reason: expect.stringMatching(says) as string });
    expect((await service.getInstrument(technician, id)).studies).toEqual([]);
  });
});

const reading = (changes: Record<string, string>) =>
  referenceReadingSchema.parse({ measuredOn: "2026-11-02", ...changes });
const NEW = { newName: "R-1", knownBow: "-45 µm", knownUncertainty: "0.4 µm", diameter: "200 mm", bow: "-45.1 µm" };

describe("a reading of a wafer of known bow", () => {
  test("brings the wafer with it, is held against it, and is set aside alone", async () => {
    const id = await added("Gauge A");
    await service.addStudy(technician, id, study(TYPED), []);
    expect(await service.addReferenceReading(technician, id, reading(NEW))).toEqual({ outcome: "stored" });
    const { wafers } = await service.referenceForm(technician, id);
    const wafer = wafers.find(({ name }) => name === "R-1");
    expect(wafer?.bowUncertainty).toBeCloseTo(0.2e-6, 12);
    await service.addReferenceReading(
      technician,
      id,
      reading({ wafer: wafer?.id ?? "", bow: "-60 µm", measuredOn: "2026-11-09" }),
    );
    const [reference] = (await service.getInstrument(technician, id)).references;
    expect(reference?.summary.errors.map(({ passes }) => passes)).toEqual([true, false]);
    expect(reference?.workings.map(({ equation }) => equation)).toEqual(["reference-check"]);
    const off = reference?.readings[1]?.id ?? "";
    await service.setAside(technician, id, { what: "reading", id: off, reason: "upside down" });
    const [after] = (await service.getInstrument(technician, id)).references;
    expect(after?.summary.bias?.value).toBeCloseTo(-0.1e-6, 9);
    expect((await service.listInstruments(technician, { ...LIST, query: "Gauge A" })).rows).toMatchObject([
      { name: "Gauge A", checkedOn: "2026-11-02", study: { repeats: 4 } },
    ]);
  });

  test("under a name that is taken, and of a wafer that is not there, is answered", async () => {
    const id = await added("Gauge B");
    await service.addReferenceReading(technician, id, reading({ ...NEW, newName: "R-2" }));
    expect(await service.addReferenceReading(technician, id, reading({ ...NEW, newName: "R-2" }))).toMatchObject({
      outcome: "refused",
      field: "newName",
    });
    expect(
      await service.addReferenceReading(technician, id, reading({ wafer: crypto.randomUUID(), bow: "1 µm" })),
    ).toMatchObject({ outcome: "refused", field: "wafer" });
  });

  test("without a wafer, or with two, is no reading", () => {
    const faults = (values: Record<string, string>) =>
      (referenceReadingSchema.safeParse({ measuredOn: "2026-11-02", bow: "1 µm", ...values }).error?.issues ?? []).map(
        ({ path }) => path.join("."),
      );
    expect(faults({})).toEqual(["newName", "knownBow", "knownUncertainty", "diameter"]);
    expect(faults({ wafer: crypto.randomUUID(), newName: "R" })).toEqual(["newName"]);
  });
});

test("a guest sees none; an administrator sees them and changes nothing", async () => {
  const [guest, administrator] = [
    await scopeOfPerson(database, "guest"),
    await scopeOfPerson(database, "administrator"),
  ];
  const refused = { init: { status: 403 } };
  await expect(service.listInstruments(guest, LIST)).rejects.toMatchObject(refused);
  const { rows } = await service.listInstruments(administrator, LIST);
  const [first] = rows;
  if (!first) throw new Error("the demo has an instrument");
  await expect(service.getInstrument(guest, first.id)).rejects.toMatchObject(refused);
  expect((await service.getInstrument(administrator, first.id)).mayCheck).toBe(false);
  await expect(service.addInstrument(administrator, "Mine")).rejects.toMatchObject(refused);
  await expect(service.addStudy(administrator, first.id, study(TYPED), [])).rejects.toMatchObject(refused);
  await expect(service.addReferenceReading(administrator, first.id, reading(NEW))).rejects.toMatchObject(refused);
  await expect(service.getInstrument(technician, crypto.randomUUID())).rejects.toMatchObject({ init: { status: 404 } });
});
