import { expect, test } from "vitest";
import { scopeOfPerson } from "#tests/db/people.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";

const database = useDatabase({ demo: true });

const services = () => import("#app/services/library/calibrate.server.ts");

async function idOf(table: string, name: string): Promise<string> {
  const [row] = await asOwner<{ id: string }>(database, `select id from "${table}" where name = ?`, [name]);
  if (!row) throw new Error(`There is no ${name}.`);
  return row.id;
}

const laser = () => idOf("bonding_material", "Laser-release adhesive B");

/** Bows in metres, near those that the flow is computed to have. */
async function bowsOf(flow: string) {
  const bows = [
    [10, -410e-6],
    [12, -140e-6],
    [14, -196e-6],
    [15, -5e-6],
  ] as const;
  return {
    flow: await idOf("flow", flow),
    fit: "both" as const,
    bows: bows.map(([step, bow], row) => ({ row, step, bow, standardUncertainty: 4e-6 })),
  };
}

const PETREL = "Petrel P-3, on glass 3.3 ppm";

test("fitted values take the place of the stated ones, say where they come from, and are in the audit trail", async () => {
  const { calibrate, takeCalibration } = await services();
  const owner = await scopeOfPerson(database, "process-owner");
  const [material, values] = [await laser(), await bowsOf(PETREL)];
  const computed = await calibrate(owner, material, values);
  if (computed.outcome !== "computed" || computed.calibration.kind !== "fitted") throw new Error("not fitted");
  const [modulus, expansion] = computed.calibration.values;
  const used = await takeCalibration(owner, material, { values, seen: computed.versions });
  expect(used).toEqual({ outcome: "saved", id: material });
  const [stored] = await asOwner<{ effective_modulus: object }>(
    database,
    "select effective_modulus from bonding_material where id = ?",
    [material],
  );
  expect(stored?.effective_modulus).toMatchObject({
    value: expect.closeTo(modulus?.value ?? 0, 0),
    tolerance: expect.closeTo((modulus?.standardUncertainty ?? 0) * Math.sqrt(3), 0),
    source: "measured here",
    note: "calibrated on 4 measured bows of pairs, together with the expansion of Glass carrier 3.3 ppm",
  });
  const [carrier] = await asOwner<{ id: string; expansion: object }>(
    database,
    "select id, expansion from carrier where name = 'Glass carrier 3.3 ppm'",
  );
  expect(carrier?.expansion).toMatchObject({
    value: expect.closeTo(expansion?.value ?? 0, 12),
    source: "measured here",
  });
  const events = await asOwner<{ field: string }>(
    database,
    "select field from audit_event where subject_id in (?, ?) and field in ('effectiveModulus', 'expansion')",
    [material, carrier?.id],
  );
  expect(events.map(({ field }) => field).toSorted()).toEqual(["effectiveModulus", "expansion"]);
  // What was seen is no longer what there is: the same press once more is told so.
  expect(await takeCalibration(owner, material, { values, seen: computed.versions })).toMatchObject({
    outcome: "conflict",
  });
});

test("a flow that was changed since the result was seen is not used", async () => {
  const { calibrate, takeCalibration } = await services();
  const owner = await scopeOfPerson(database, "process-owner");
  const [material, values] = [await laser(), await bowsOf(PETREL)];
  const computed = await calibrate(owner, material, values);
  if (computed.outcome !== "computed") throw new Error("not computed");
  const seen = { ...computed.versions, flow: computed.versions.flow + 1 };
  expect(await takeCalibration(owner, material, { values, seen })).toEqual({ outcome: "changed" });
});

test("only who may edit carriers and bonds uses values, and only who may assess the flow fits them", async () => {
  const { calibrate, takeCalibration } = await services();
  const [material, values] = [await laser(), await bowsOf(PETREL)];
  const seen = { material: 1, carrier: 1, flow: 1 };
  const refused = { init: { status: 403 } };
  const [engineer, technician] = [
    await scopeOfPerson(database, "engineer"),
    await scopeOfPerson(database, "technician"),
  ];
  await expect(takeCalibration(engineer, material, { values, seen })).rejects.toMatchObject(refused);
  await expect(calibrate(technician, material, values)).rejects.toMatchObject(refused);
});

test("a flow that bonds with another material says nothing of this one", async () => {
  const { calibrate } = await services();
  const engineer = await scopeOfPerson(database, "engineer");
  const values = await bowsOf("Fulmar F-1 A, to 20 µm, slide adhesive");
  await expect(calibrate(engineer, await laser(), values)).rejects.toMatchObject({ init: { status: 404 } });
});

test("a step at which the pair has no bow of its own is named at its row", async () => {
  const { calibrate } = await services();
  const engineer = await scopeOfPerson(database, "engineer");
  const values = await bowsOf(PETREL);
  const bows = [{ row: 2, step: 1, bow: -1e-4, standardUncertainty: 1e-6 }];
  expect(await calibrate(engineer, await laser(), { ...values, bows })).toEqual({
    outcome: "fault",
    fieldErrors: { "rows[2].step": [expect.stringContaining("no bow of its own")] },
  });
});
