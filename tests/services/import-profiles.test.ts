import { beforeAll, expect, test } from "vitest";
import { importProfileOf } from "#app/lib/scan-reading/import-profile-of.ts";
import { readScanFile } from "#app/lib/scan-reading/scan-reader.ts";
import { importProfileRecordSchema } from "#app/schemas/import-profile.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { scopeOfPerson } from "#tests/db/people.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";
import { scanFile, trueScan } from "#tests/fixtures/scan-files.ts";

const database = useDatabase({ demo: true });

const profiles = () => import("#app/services/import-profiles.server.ts");

let technician: ActorScope;

// The first import reads the whole server: that is no test's time.
beforeAll(async () => {
  await profiles();
  technician = await scopeOfPerson(database, "technician");
}, 60_000);

const file = scanFile(trueScan(), { delimiter: ";", decimalComma: true, lines: ["Position [mm];Höhe [µm]"] });
const values = (name: string) =>
  importProfileRecordSchema.parse({
    name,
    profile: importProfileOf(readScanFile(file.bytes, "a.csv").reading),
  });

async function kept(name: string) {
  const { listImportProfiles, saveImportProfile } = await profiles();
  const saved = await saveImportProfile(technician, { id: null, version: null, values: values(name) });
  expect(saved.outcome).toBe("saved");
  const row = (await listImportProfiles(technician)).find((one) => one.name === name);
  if (!row) throw new Error(`no profile ${name}`);
  return row;
}

test("a profile that was kept reads the next file of its instrument, and leaves a trail", async () => {
  const { id, profile } = await kept("Stylus 2");
  const again = readScanFile(file.bytes, "b.csv", profile);
  expect(again).toEqual(readScanFile(file.bytes, "b.csv", values("Stylus 2").profile));
  expect(again.outcome).toBe("read");
  const trail = await asOwner(
    database,
    "select 1 from audit_event where subject = 'import profile' and subject_id = ?",
    [id],
  );
  expect(trail).toHaveLength(1);
});

test("a change moves the version on; an old version and a name that is taken are answered", async () => {
  const { saveImportProfile, listImportProfiles } = await profiles();
  const { id, stamp } = await kept("Stylus 3");
  const change = {
    id,
    version: stamp.version,
    values: { ...values("Stylus 3"), profile: { decimalMark: "point" as const } },
  };
  expect(await saveImportProfile(technician, change)).toMatchObject({ outcome: "saved" });
  expect(await saveImportProfile(technician, change)).toMatchObject({ outcome: "conflict" });
  expect(await saveImportProfile(technician, { id: null, version: null, values: values("Stylus 3") })).toEqual({
    outcome: "name taken",
  });
  expect((await listImportProfiles(technician)).find((one) => one.id === id)?.profile).toEqual({
    decimalMark: "point",
  });
});

test("one that is removed is gone; what is not there is not found", async () => {
  const { removeImportProfile, listImportProfiles } = await profiles();
  const { id, stamp } = await kept("Stylus 4");
  expect(await removeImportProfile(technician, id, stamp.version + 1)).toMatchObject({ outcome: "conflict" });
  expect(await removeImportProfile(technician, id, stamp.version)).toMatchObject({ outcome: "saved" });
  expect((await listImportProfiles(technician)).some((one) => one.id === id)).toBe(false);
  await expect(removeImportProfile(technician, id, null)).rejects.toMatchObject({ init: { status: 404 } });
});

test("a guest may neither see nor keep one", async () => {
  const { listImportProfiles, saveImportProfile } = await profiles();
  const guest = await scopeOfPerson(database, "guest");
  await expect(listImportProfiles(guest)).rejects.toMatchObject({ init: { status: 403 } });
  await expect(saveImportProfile(guest, { id: null, version: null, values: values("Mine") })).rejects.toMatchObject({
    init: { status: 403 },
  });
});
