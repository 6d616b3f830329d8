import { beforeAll, describe, expect, test } from "vitest";
import { MONITOR_PARAMETERS, monitorProfile, profileCsv } from "#app/db/seeders/demo-monitor.ts";
import type { AcceptValues } from "#app/schemas/accept-form.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { leave, scopeOfPerson } from "#tests/db/people.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";

const database = useDatabase({ demo: true });

const uploads = () => import("#app/services/scan-upload.server.ts");
const accepting = () => import("#app/services/films/accept-scan.server.ts");
const changing = () => import("#app/services/films/change-values.server.ts");
const histories = () => import("#app/services/films/stress-history.server.ts");
const library = () => import("#app/services/library/library.server.ts");
const assessments = () => import("#app/services/assessments/assessments.server.ts");
const changes = () => import("#app/services/assessments/what-changed.server.ts");

const FILM = "Polymer dielectric A";
const status = (code: number) => expect.objectContaining({ init: { status: code } }) as unknown;

let engineer: ActorScope;
let technician: ActorScope;
let guest: ActorScope;
let film = "";

beforeAll(async () => {
  await Promise.all([uploads(), accepting(), changing(), histories(), library(), assessments(), changes()]);
  engineer = await scopeOfPerson(database, "engineer");
  technician = await scopeOfPerson(database, "technician");
  guest = await scopeOfPerson(database, "guest");
  film = await idOf("film", FILM);
}, 90_000);

async function idOf(table: "program" | "film", name: string): Promise<string> {
  const [row] = await asOwner<{ id: string }>(database, `select id from "${table}" where name = ?`, [name]);
  return row?.id ?? "";
}

/** A scan of the film; its stress goes with 5 µm over the film thickness that is stated. */
async function scanOf(seed: number, { program = "Tern", filmId = film, thickness = 5e-6 } = {}): Promise<string> {
  const { uploadScan } = await uploads();
  const file = (which: "before" | "after") => ({
    name: `${seed}-${which}.csv`,
    bytes: new TextEncoder().encode(profileCsv(monitorProfile(which, { seed }))),
  });
  const stored = await uploadScan(
    engineer,
    {
      ...MONITOR_PARAMETERS,
      program: await idOf("program", program),
      label: `W-${seed}`,
      film: filmId || null,
      filmThickness: thickness,
    },
    { before: file("before"), after: file("after") },
  );
  if (stored.outcome !== "stored") throw new Error(stored.reason);
  return stored.id;
}

const VALUES: AcceptValues = {
  reason: "Steady process, monitor of lot K-17",
  instrument: "Laser profiler 2",
  measuredAt: new Date("2026-11-20T12:00:00Z"),
  use: false,
};

async function accept(scanId: string, changed: Partial<AcceptValues> = {}, who: ActorScope = engineer) {
  const { acceptScan, acceptance } = await accepting();
  const { film: seen } = await acceptance(who, scanId);
  return acceptScan(who, scanId, { version: seen?.version ?? 0, values: { ...VALUES, ...changed } });
}

async function historyOf(who: ActorScope, search = "", filmId = film) {
  const { stressHistory } = await histories();
  return stressHistory(who, filmId, new URLSearchParams(search));
}

async function stressOf(filmId = film) {
  const { getLibraryRecord } = await library();
  return (await getLibraryRecord(engineer, "film", filmId)).record.stress;
}

describe("accepting a scan", () => {
  test("adds its figures to the history and leaves the value in use until somebody uses the mean", async () => {
    const before = await stressOf();
    const scan = await scanOf(101);
    const { acceptance, acceptedAs } = await accepting();
    const offer = await acceptance(engineer, scan);
    expect(offer.offer?.mean.stress).toMatchObject({ source: "measured here", meanOf: 1, note: expect.any(String) });
    expect(await acceptedAs(technician, scan)).toMatchObject({ value: null, mayAccept: false });
    expect(await accept(scan)).toEqual({ outcome: "saved", id: film });
    expect(await stressOf()).toEqual(before);
    const { page, mean, usesMean } = await historyOf(engineer);
    expect(page.rows).toMatchObject([
      {
        origin: { kind: "scan", label: "W-101", program: "Tern" },
        reason: VALUES.reason,
        state: "accepted",
        number: 1,
      },
    ]);
    expect(usesMean).toBe(false);
    expect(mean?.stress.value).toBeCloseTo(page.rows[0]?.value ?? 0, -3);
    expect(await acceptedAs(technician, scan)).toMatchObject({ value: { state: "accepted", by: engineer.actor.name } });
  });

  test("with the mean in use, it follows each acceptance, and the library's half-width gives the uncertainty back", async () => {
    expect(await accept(await scanOf(102, { thickness: 4.9e-6 }), { use: true })).toMatchObject({ outcome: "saved" });
    expect(await stressOf()).toMatchObject({ source: "measured here", meanOf: 2, on: "2026-11-20" });
    expect(await accept(await scanOf(103, { thickness: 5.1e-6 }))).toMatchObject({ outcome: "saved" });
    const stress = await stressOf();
    expect(stress).toMatchObject({ meanOf: 3, note: "mean of 3 accepted values, 2026-11-20" });
    const { mean, page, usesMean } = await historyOf(engineer);
    expect(usesMean).toBe(true);
    expect((stress.tolerance ?? 0) / Math.sqrt(3) / (mean?.standardUncertainty ?? 1)).toBeCloseTo(1, 4);
    const own = page.rows.map(({ value }) => value);
    expect(stress.value).toBeCloseTo(own.reduce((sum, value) => sum + value, 0) / own.length, -4);
  });

  test("every value in use stays on record, from when to when and by whom", async () => {
    const { inUse } = await historyOf(technician);
    expect(inUse.map(({ stress }) => stress.meanOf ?? null)).toEqual([3, 2, null]);
    expect(inUse.map(({ until }) => until === null)).toEqual([true, false, false]);
    expect(inUse[0]?.by).toBe(engineer.actor.name);
  });

  test("is refused a second time, for a scan of no film, and for a page that is no longer current", async () => {
    const { acceptScan, acceptance } = await accepting();
    const scan = await scanOf(104);
    const { film: seen } = await acceptance(engineer, scan);
    const version = seen?.version ?? 0;
    expect(await accept(await scanOf(105))).toMatchObject({ outcome: "saved" });
    expect(await acceptScan(engineer, scan, { version, values: VALUES })).toMatchObject({
      outcome: "conflict",
      conflict: { by: engineer.actor.name },
    });
    expect(await accept(scan)).toMatchObject({ outcome: "saved" });
    const again = {
      outcome: "refused",
      reason: expect.stringMatching(/accepted into the film’s history already/) as string,
    };
    expect(await accept(scan)).toMatchObject(again);
    expect(await accept(await scanOf(106, { filmId: "" }))).toMatchObject({
      outcome: "refused",
      reason: expect.stringMatching(/No film of the library/) as string,
    });
  });

  test("at the same moment from two tabs is done once", async () => {
    const { acceptScan, acceptance } = await accepting();
    const scan = await scanOf(107);
    const { film: seen } = await acceptance(engineer, scan);
    const version = seen?.version ?? 0;
    const both = await Promise.all([1, 2].map(() => acceptScan(engineer, scan, { version, values: VALUES })));
    expect(both.map(({ outcome }) => outcome).toSorted()).toEqual(["refused", "saved"]);
  });

  test("is not a technician's or guest's, and the database keeps a scan that a history rests on", async () => {
    const { acceptScan, acceptance } = await accepting();
    const scan = await scanOf(108);
    await expect(acceptance(technician, scan)).rejects.toEqual(status(403));
    await expect(acceptScan(technician, scan, { version: 1, values: VALUES })).rejects.toEqual(status(403));
    await expect(acceptance(guest, scan)).rejects.toEqual(status(404));
    await expect(historyOf(guest)).rejects.toEqual(status(403));
    await accept(scan);
    await expect(asOwner(database, "delete from scan where id = ?", [scan])).rejects.toThrow(/violates/);
  });
});

describe("a program's wall", () => {
  test("lets the figure through, and neither wafer, program, reason nor link", async () => {
    const nitride = await idOf("film", "Passivation nitride A");
    const scan = await scanOf(201, { program: "Petrel", filmId: nitride });
    const reason = "Wafer PT-9 of the Petrel pilot";
    expect(await accept(scan, { reason })).toMatchObject({ outcome: "saved" });
    await leave(database, "second-process-owner", "petrel");
    const owner = await scopeOfPerson(database, "second-process-owner");
    const seen = await historyOf(owner, "", nitride);
    expect(seen.page.rows).toMatchObject([
      { origin: { kind: "another program" }, reason: null, instrument: VALUES.instrument, number: 1 },
    ]);
    const text = JSON.stringify(seen);
    for (const secret of ["Petrel", "PT-9", "W-201", scan]) expect(text).not.toContain(secret);
    for (const query of ["petrel", "PT-9", "W-201"])
      expect((await historyOf(owner, `q=${query}`, nitride)).page.total).toBe(0);
    expect((await historyOf(engineer, "q=pt-9", nitride)).page.total).toBe(1);
    const { acceptance } = await accepting();
    await expect(acceptance(owner, scan)).rejects.toEqual(status(404));
    const trail = await asOwner<{ name: string | null; to: object }>(
      database,
      `select p.name, e.to from audit_event e left join program p on p.id = e.program_id
        where e.subject = 'stress of a film' and e.to->>'reason' = ?`,
      [reason],
    );
    expect(trail.map(({ name }) => name)).toEqual(["Petrel"]);
  });
});

describe("setting aside", () => {
  const asked = async () => ({ filmId: film, version: (await historyOf(engineer)).film.version });

  test("takes a value out of the mean with its reason, and putting it back brings the mean back", async () => {
    const { setValueAside, putValueBack } = await changing();
    const before = await stressOf();
    const [row] = (await historyOf(engineer, "sort=value")).page.rows;
    const id = row?.id;
    expect(await setValueAside(engineer, await asked(), { id, reason: "Chuck was dirty" })).toMatchObject({
      outcome: "saved",
    });
    const after = await stressOf();
    expect(after.meanOf).toBe((before.meanOf ?? 0) - 1);
    expect(after.value).toBeGreaterThan(before.value);
    const aside = await historyOf(technician, "state=set aside");
    expect(aside.page.rows).toMatchObject([{ id, setAside: { reason: "Chuck was dirty" }, putBack: null }]);
    expect(await putValueBack(engineer, await asked(), { id })).toMatchObject({ outcome: "saved" });
    expect(await stressOf()).toMatchObject({ value: before.value, tolerance: before.tolerance, meanOf: before.meanOf });
    const back = await historyOf(engineer, "q=dirty");
    expect(back.page.rows).toMatchObject([{ id, state: "accepted", putBack: { by: engineer.actor.name } }]);
  });

  test("is a conflict on an old page, twice refused, never of the last value in use, and no technician's", async () => {
    const { setValueAside, putValueBack, putMeanIntoUse } = await changing();
    const [row] = (await historyOf(engineer)).page.rows;
    const id = row?.id;
    const old = { filmId: film, version: 1 };
    expect(await setValueAside(engineer, old, { id, reason: "x" })).toMatchObject({ outcome: "conflict" });
    expect(await putValueBack(engineer, await asked(), { id })).toMatchObject({ outcome: "refused" });
    await expect(setValueAside(technician, old, { id, reason: "x" })).rejects.toEqual(status(403));
    await expect(putMeanIntoUse(technician, old)).rejects.toEqual(status(403));
    const oxide = await idOf("film", "Back-side oxide A (low temperature)");
    await accept(await scanOf(301, { filmId: oxide }), { use: true });
    const one = await historyOf(engineer, "", oxide);
    expect(
      await setValueAside(
        engineer,
        { filmId: oxide, version: one.film.version },
        { id: one.page.rows[0]?.id, reason: "x" },
      ),
    ).toMatchObject({ outcome: "refused", reason: expect.stringMatching(/last one that counts/) as string });
  });
});

test("a value measured elsewhere is typed in with its source, and the mean can be put into use by a press", async () => {
  const { addTypedValue, putMeanIntoUse } = await changing();
  const copper = await idOf("film", "Plated copper A");
  const version = async () => (await historyOf(engineer, "", copper)).film.version;
  expect(await putMeanIntoUse(engineer, { filmId: copper, version: await version() })).toMatchObject({
    outcome: "refused",
  });
  const typed = {
    value: 24e6,
    uncertainty: 2e6,
    filmThickness: null,
    instrument: "",
    measuredAt: new Date("2026-10-01T12:00:00Z"),
    source: "Report MR-7 of the outside laboratory",
    reason: "Same bath",
  };
  expect(await addTypedValue(engineer, { filmId: copper, version: await version() }, typed)).toMatchObject({
    outcome: "saved",
  });
  expect(await putMeanIntoUse(engineer, { filmId: copper, version: await version() })).toMatchObject({
    outcome: "saved",
  });
  expect(await stressOf(copper)).toMatchObject({
    value: 24e6,
    tolerance: expect.closeTo(1e6 * Math.sqrt(3), -2),
    meanOf: 1,
  });
  expect((await historyOf(engineer, "", copper)).page.rows).toMatchObject([
    { origin: { kind: "typed", source: typed.source }, standardUncertainty: 1e6 },
  ]);
});

test("a film that is saved without a change to its stress goes on using the mean; another stress ends that", async () => {
  const { getLibraryRecord, saveLibraryRecord } = await library();
  const save = async (stress: object, note: string) => {
    const { record, stamp } = await getLibraryRecord(engineer, "film", film);
    const { id, ...rest } = record;
    // What a form gives back: all but what it does not show.
    const { meanOf: _notShown, ...shown } = record.stress;
    const values = { ...rest, note, stress: { ...shown, text: "typed", ...stress } };
    return saveLibraryRecord(engineer, "film", { id, version: stamp.version, values });
  };
  expect(await save({}, "looked at")).toMatchObject({ outcome: "saved" });
  expect((await historyOf(engineer)).usesMean).toBe(true);
  expect(await save({ value: 25e6, note: "by hand" }, "")).toMatchObject({ outcome: "saved" });
  const { usesMean, inUse } = await historyOf(engineer);
  expect(usesMean).toBe(false);
  expect(inUse[0]?.stress).toMatchObject({ value: 25e6, note: "by hand" });
  const { putMeanIntoUse } = await changing();
  const { film: now } = await historyOf(engineer);
  await putMeanIntoUse(engineer, { filmId: film, version: now.version });
  expect((await stressOf()).meanOf).toBeGreaterThan(1);
});

test("assessments that used the old value are out of date by an acceptance, and say by how much", async () => {
  const { runAssessment, getAssessment } = await assessments();
  const [flow] = await asOwner<{ id: string }>(database, "select id from flow where name like 'Tern %'");
  const ran = await runAssessment(engineer, flow?.id ?? "");
  const id = ran.outcome === "stored" ? ran.id : "";
  expect((await getAssessment(engineer, id)).outOfDate).toBe(false);
  await accept(await scanOf(401, { thickness: 4e-6 }));
  expect((await getAssessment(engineer, id)).outOfDate).toBe(true);
  const { whatChanged } = await changes();
  const changed = await whatChanged(engineer, id);
  expect(changed?.changes).toMatchObject([
    { subject: FILM, property: "Stress at 25\u00A0°C, tension positive", by: engineer.actor.name },
  ]);
  expect(changed?.movement).toMatchObject({ outcome: "computed" });
}, 30_000);

test("limits of an instrument come from five values on and name what lies beyond them", async () => {
  const seed = await idOf("film", "Nickel pad metal A");
  for (const [n, thickness] of [5, 5.02, 4.98, 5.01, 4.99, 5, 3.9].entries())
    await accept(await scanOf(500 + n, { filmId: seed, thickness: thickness * 1e-6 }), {
      measuredAt: new Date(Date.UTC(2026, 9, n + 1, 12)),
    });
  const { chart, instruments } = await historyOf(technician, "", seed);
  expect(instruments).toEqual([VALUES.instrument]);
  expect(chart?.limits?.from).toBe(7);
  expect(chart?.signals.some(({ rule, at }) => rule === "moving range" && at.includes(6))).toBe(true);
  expect(chart?.values).toHaveLength(7);
  const few = await historyOf(engineer, "", await idOf("film", "Plated copper A"));
  expect(few.chart).toMatchObject({ limits: null, tooFew: expect.stringMatching(/from five on/) as string });
}, 30_000);
