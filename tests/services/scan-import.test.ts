import { beforeAll, expect, test } from "vitest";
import { MONITOR_PARAMETERS, monitorProfile, profileCsv } from "#app/db/seeders/demo-monitor.ts";
import type { ImportProfile } from "#app/schemas/import-profile.ts";
import { scopeOfPerson } from "#tests/db/people.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";

const database = useDatabase({ demo: true });

const imports = () => import("#app/services/scan-import.server.ts");
const scans = () => import("#app/services/scans.server.ts");

// Loading the server's modules takes longer than a test should.
beforeAll(() => Promise.all([imports(), scans()]), 60_000);

/** A scan without heads, so that only a profile says what its columns are. */
function bare(which: "before" | "after", seed: number) {
  const [, ...rows] = profileCsv(monitorProfile(which, { seed })).split("\n");
  return { name: `${which}.csv`, bytes: new TextEncoder().encode(rows.join("\n")) };
}
const pairOf = (seed: number) => ({ before: bare("before", seed), after: bare("after", seed) });

const PROFILE: ImportProfile = {
  columns: [
    { index: 0, role: "position", unit: "mm" },
    { index: 1, role: "height", unit: "µm" },
  ],
};
const BY_PROFILE = { before: PROFILE, after: PROFILE };

async function subject(label: string) {
  const [tern] = await asOwner<{ id: string }>(database, "select id from program where name = 'Tern'");
  const { positionUnit: _p, heightUnit: _h, decimalMark: _d, ...parameters } = MONITOR_PARAMETERS;
  return { program: tern?.id ?? "", label, film: null, ...parameters };
}

const kept = async () => asOwner(database, "select (select count(*) from scan), (select count(*) from scan_file)");

test("a pair is read by its profiles, kept, and known the next time", async () => {
  const technician = await scopeOfPerson(database, "technician");
  const { importPair } = await imports();
  const stored = await importPair(technician, await subject("M-51"), pairOf(51), BY_PROFILE);
  if (stored.outcome !== "stored") throw new Error(stored.outcome);
  const { getScan } = await scans();
  const { parameters, result } = await getScan(technician, stored.id);
  expect(Math.abs(result.stress - 31e6)).toBeLessThan(3 * result.stressUncertainty);
  expect(parameters).toMatchObject({ positionUnit: "mm", heightUnit: "µm", decimalMark: "point" });
  const before = await kept();
  expect(await importPair(technician, await subject("M-51 again"), pairOf(51), BY_PROFILE)).toEqual({
    outcome: "already",
    id: stored.id,
  });
  expect(await kept()).toEqual(before);
});

test("what is still open on the server is refused, whatever the browser said, and nothing is kept", async () => {
  const technician = await scopeOfPerson(database, "technician");
  const { importPair } = await imports();
  const before = await kept();
  expect(await importPair(technician, await subject("M-52"), pairOf(52), { before: PROFILE, after: {} })).toMatchObject(
    {
      outcome: "refused",
      field: "after",
      reason: expect.stringMatching(/^after\.csv: /) as string,
    },
  );
  expect(await kept()).toEqual(before);
});

test("a guest imports nothing", async () => {
  const guest = await scopeOfPerson(database, "guest");
  const { importPair } = await imports();
  await expect(importPair(guest, await subject("M-53"), pairOf(53), BY_PROFILE)).rejects.toMatchObject({
    init: { status: 404 },
  });
});
