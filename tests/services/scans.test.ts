import { readFileSync } from "node:fs";
import { beforeAll, describe, expect, test } from "vitest";
import type { ScanValues } from "#app/schemas/scan.ts";
import { MONITOR_PARAMETERS, monitorProfile, profileCsv } from "#app/db/seeders/demo-monitor.ts";
import { leave, scopeOfPerson } from "#tests/db/people.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";

const database = useDatabase({ demo: true });

const uploads = () => import("#app/services/scan-upload.server.ts");
const scans = () => import("#app/services/scans.server.ts");

// Loading the server's modules takes longer than a test should.
beforeAll(() => Promise.all([uploads(), scans()]), 60_000);

const fixture = (name: string) =>
  new Uint8Array(readFileSync(new URL(`../../fixtures/scans/${name}`, import.meta.url)));
const FILES = {
  before: { name: "before.csv", bytes: fixture("monitor-200mm-725um-before-film-seed-7.csv") },
  after: { name: "after.csv", bytes: fixture("monitor-200mm-725um-after-5um-film-31MPa-seed-7.csv") },
};
const file = (name: string, text: string) => ({ name, bytes: new TextEncoder().encode(text) });

async function idOf(table: "program" | "film", name: string): Promise<string> {
  const [row] = await asOwner<{ id: string }>(database, `select id from "${table}" where name = ?`, [name]);
  if (!row) throw new Error(`there is no ${table} ${name}`);
  return row.id;
}

async function values(label: string, changes: Partial<ScanValues> = {}): Promise<ScanValues> {
  return {
    program: await idOf("program", "Tern"),
    label,
    film: await idOf("film", "Polymer dielectric A"),
    ...MONITOR_PARAMETERS,
    ...changes,
  };
}

const rowsOf = async (table: string) =>
  (await asOwner<{ rows: number }>(database, `select count(*)::int as rows from "${table}"`))[0]?.rows ?? 0;

const kept = async () => [await rowsOf("scan"), await rowsOf("scan_file"), await rowsOf("audit_event")];

const LIST = { query: "", sort: "uploaded", descending: true, page: 1, filters: { program: "" } };

describe("an upload", () => {
  test("keeps both files byte for byte, the result, and a trail", async () => {
    const technician = await scopeOfPerson(database, "technician");
    const { uploadScan } = await uploads();
    const { getScan, getScanFile } = await scans();
    const stored = await uploadScan(technician, await values("M-1"), FILES);
    if (stored.outcome !== "stored") throw new Error(stored.reason);
    const scan = await getScan(technician, stored.id);
    expect(Math.abs(scan.result.stress - 31e6)).toBeLessThan(2 * scan.result.stressUncertainty);
    expect(scan).toMatchObject({ label: "M-1", program: { slug: "tern" }, createdBy: technician.actor.name });
    for (const which of ["before", "after"] as const) {
      const { name, bytes } = await getScanFile(technician, scan.files[which].id);
      expect(name).toBe(FILES[which].name);
      expect(Buffer.from(bytes).equals(Buffer.from(FILES[which].bytes))).toBe(true);
    }
    const trail = await asOwner<{ subject: string }>(
      database,
      "select subject from audit_event where subject_id in (?)",
      [[stored.id, scan.files.before.id, scan.files.after.id]],
    );
    expect(trail.map(({ subject }) => subject).toSorted()).toEqual(["scan", "scan file", "scan file"]);
  });

  test("of the same bytes again, at the same moment too, keeps them once", async () => {
    const engineer = await scopeOfPerson(database, "engineer");
    const { uploadScan } = await uploads();
    const files = {
      before: file("b.csv", profileCsv(monitorProfile("before", { seed: 41 }))),
      after: file("a.csv", profileCsv(monitorProfile("after", { seed: 41 }))),
    };
    const before = await rowsOf("scan_file");
    const upload = async (label: string) => uploadScan(engineer, await values(label), files);
    const outcomes = await Promise.all([upload("M-2"), upload("M-3"), upload("M-4")]);
    expect(outcomes.map(({ outcome }) => outcome)).toEqual(["stored", "stored", "stored"]);
    expect(await rowsOf("scan_file")).toBe(before + 2);
  });

  test.each<[what: string, files: Partial<typeof FILES>, changes: Partial<ScanValues>, field: string, says: RegExp]>([
    ["a zip", { before: { name: "x.zip", bytes: new Uint8Array([0x50, 0x4b, 3, 4]) } }, {}, "before", /zip archive/],
    ["three rows", { after: file("s.csv", "1,2\n3,4\n5,6") }, {}, "after", /3 usable rows/],
    [
      "the same file twice",
      { after: { ...FILES.before, name: "again.csv" } },
      {},
      "after",
      /again\.csv holds the same bytes/,
    ],
    ["a wrong unit", {}, { positionUnit: "m" }, "before", /headed “x_mm”, in mm, but m is chosen/],
    [
      "a wafer too small for the scan",
      {},
      { diameter: 0.1 },
      "before",
      /run over 190.mm, but the wafer measures 100.mm/,
    ],
    ["a film that is gone", {}, { film: "00000000-0000-4000-8000-000000000000" }, "film", /no longer in the library/],
  ])("%s is refused at its field and leaves nothing behind", async (_, files, changes, field, says) => {
    const engineer = await scopeOfPerson(database, "engineer");
    const { uploadScan } = await uploads();
    const before = await kept();
    const refused = await uploadScan(engineer, await values("M-5", changes), { ...FILES, ...files });
    expect(refused).toMatchObject({ outcome: "refused", field, reason: expect.stringMatching(says) as string });
    expect(await kept()).toEqual(before);
  });
});

describe("who may", () => {
  test("a guest of the program may neither upload, nor list, nor see a scan or its file", async () => {
    const [guest, engineer] = [await scopeOfPerson(database, "guest"), await scopeOfPerson(database, "engineer")];
    const { uploadScan } = await uploads();
    const { getScan, getScanFile, listScans, scanPrograms } = await scans();
    const stored = await uploadScan(engineer, await values("M-6"), FILES);
    if (stored.outcome !== "stored") throw new Error(stored.reason);
    const { files } = await getScan(engineer, stored.id);
    const status = (code: number) => ({ init: { status: code } });
    await expect(uploadScan(guest, await values("M-7"), FILES)).rejects.toMatchObject(status(404));
    await expect(listScans(guest, LIST)).rejects.toMatchObject(status(403));
    await expect(getScan(guest, stored.id)).rejects.toMatchObject(status(404));
    await expect(getScanFile(guest, files.before.id)).rejects.toMatchObject(status(404));
    expect(() => scanPrograms(guest, "upload scans")).toThrow();
  });

  test("somebody who has left a program finds nothing of it", async () => {
    const engineer = await scopeOfPerson(database, "engineer");
    const { uploadScan } = await uploads();
    const { getScan, listScans } = await scans();
    const program = await idOf("program", "Fulmar");
    const stored = await uploadScan(engineer, await values("M-8", { program }), FILES);
    if (stored.outcome !== "stored") throw new Error(stored.reason);
    await leave(database, "shift-lead", "fulmar");
    const left = await scopeOfPerson(database, "shift-lead");
    await expect(getScan(left, stored.id)).rejects.toMatchObject({ init: { status: 404 } });
    await expect(uploadScan(left, await values("M-9", { program }), FILES)).rejects.toMatchObject({
      init: { status: 404 },
    });
    expect((await listScans(left, { ...LIST, query: "M-8" })).total).toBe(0);
    expect((await listScans(engineer, { ...LIST, query: "M-8" })).total).toBe(1);
  });
});

test("a list sorts by stress and bow in the database, and is searched by wafer, film and person", async () => {
  const owner = await scopeOfPerson(database, "process-owner");
  const { uploadScan } = await uploads();
  const { listScans } = await scans();
  for (const [label, filmThickness] of [
    ["S-thick", 10e-6],
    ["S-thin", 2e-6],
    ["S-middle", 5e-6],
  ] as const) {
    const stored = await uploadScan(owner, await values(label, { filmThickness, film: null }), FILES);
    expect(stored.outcome).toBe("stored");
  }
  const labels = async (params: Partial<typeof LIST>) =>
    (await listScans(owner, { ...LIST, query: "S-", ...params })).rows.map(({ label }) => label);
  expect(await labels({ sort: "stress", descending: false })).toEqual(["S-thick", "S-middle", "S-thin"]);
  expect(await labels({ sort: "stress", descending: true })).toEqual(["S-thin", "S-middle", "S-thick"]);
  expect(await labels({ sort: "label", descending: false })).toEqual(["S-middle", "S-thick", "S-thin"]);
  for (const sort of ["uploaded", "film", "bow", "program", "person"])
    expect((await labels({ sort })).toSorted()).toEqual(["S-middle", "S-thick", "S-thin"]);
  expect((await listScans(owner, { ...LIST, query: owner.actor.name })).total).toBe(3);
  expect((await listScans(owner, { ...LIST, query: "%" })).total).toBe(0);
  const [row] = (await listScans(owner, { ...LIST, query: "S-middle" })).rows;
  expect(row).toMatchObject({ film: null, diameter: 0.2, program: "Tern" });
  expect(row?.bowChange).toBeCloseTo(-49.09e-6, 7);
});
