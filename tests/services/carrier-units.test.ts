import { beforeAll, expect, test } from "vitest";
import { scopeOfPerson } from "#tests/db/people.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";
import type { ActorScope } from "#app/server/scope.server.ts";

const database = useDatabase({ demo: true });

const units = () => import("#app/services/library/carrier-units.server.ts");

let owner: ActorScope;
let glass: string;

// The first import reads the whole server: that is no test's time.
beforeAll(async () => {
  await units();
  owner = await scopeOfPerson(database, "process-owner");
  const [carrier] = await asOwner<{ id: string }>(
    database,
    "select id from carrier where name = 'Glass carrier 3.3 ppm'",
  );
  glass = carrier?.id ?? "";
}, 60_000);

async function piece(mark: string) {
  const { listCarrierUnits } = await units();
  const { page } = await listCarrierUnits(owner, glass, new URLSearchParams({ q: mark }));
  const [row] = page.rows;
  if (!row) throw new Error(`no piece ${mark}`);
  return row;
}

async function added(mark: string, uses = 0) {
  const { addCarrierUnit } = await units();
  expect(await addCarrierUnit(owner, glass, { mark, uses })).toMatchObject({ outcome: "saved" });
  return piece(mark);
}

test("a use that is counted moves the count, the state and the day on, and leaves a trail", async () => {
  const { changeCarrierUnit } = await units();
  const { id, stamp } = await added("T-COUNT", 3);
  const change = { id, version: stamp.version, change: "use" as const };
  expect(await changeCarrierUnit(owner, glass, change)).toMatchObject({ outcome: "saved" });
  expect(await piece("T-COUNT")).toMatchObject({
    uses: 4,
    state: "in use",
    lastUsedOn: new Date().toISOString().slice(0, 10),
  });
  const trail = await asOwner<{ field: string }>(
    database,
    "select field from audit_event where subject = 'carrier piece' and subject_id = ? and action = 'changed' and field = 'uses'",
    [id],
  );
  expect(trail).toHaveLength(1);
});

test("the same use sent twice is counted once", async () => {
  const { changeCarrierUnit } = await units();
  const { id, stamp } = await added("T-TWICE");
  const change = { id, version: stamp.version, change: "use" as const };
  const outcomes = await Promise.all([
    changeCarrierUnit(owner, glass, change),
    changeCarrierUnit(owner, glass, change),
  ]);
  expect(outcomes.map(({ outcome }) => outcome).sort()).toEqual(["conflict", "saved"]);
  expect((await piece("T-TWICE")).uses).toBe(1);
});

test("a scrapped piece is not used again until it is taken back", async () => {
  const { changeCarrierUnit } = await units();
  const { id } = await added("T-SCRAP");
  const change = async (what: "use" | "scrap" | "restore") =>
    (await changeCarrierUnit(owner, glass, { id, version: (await piece("T-SCRAP")).stamp.version, change: what }))
      .outcome;
  expect(await change("scrap")).toBe("saved");
  expect(await change("use")).toBe("not possible");
  expect(await change("restore")).toBe("saved");
  expect(await change("use")).toBe("saved");
});

test("pieces are found by mark and state; a mark stands once within its carrier", async () => {
  const { addCarrierUnit, listCarrierUnits } = await units();
  await added("T-SAME_1");
  expect(await addCarrierUnit(owner, glass, { mark: "T-SAME_1", uses: 0 })).toEqual({ outcome: "name taken" });
  const marks = async (search: Record<string, string>) =>
    (await listCarrierUnits(owner, glass, new URLSearchParams(search))).page.rows.map(({ mark }) => mark);
  expect(await marks({ q: "same_" })).toEqual(["T-SAME_1"]);
  expect(await marks({ q: "same_", state: "scrapped" })).toEqual([]);
  expect(await marks({ q: "same_", state: "no such state", sort: "nothing" })).toEqual(["T-SAME_1"]);
});

test("who may read them may not change them; a piece of another carrier is not there", async () => {
  const { addCarrierUnit, changeCarrierUnit, listCarrierUnits } = await units();
  const { id } = await added("T-ROLES");
  for (const account of ["engineer", "technician", "shift-lead", "guest"]) {
    const scope = await scopeOfPerson(database, account);
    await expect(addCarrierUnit(scope, glass, { mark: "T-MINE", uses: 0 })).rejects.toMatchObject({
      init: { status: 403 },
    });
    await expect(changeCarrierUnit(scope, glass, { id, version: null, change: "scrap" })).rejects.toMatchObject({
      init: { status: 403 },
    });
  }
  const guest = await scopeOfPerson(database, "guest");
  await expect(listCarrierUnits(guest, glass, new URLSearchParams())).rejects.toMatchObject({ init: { status: 403 } });
  const [other] = await asOwner<{ id: string }>(
    database,
    "select id from carrier where name = 'Glass carrier 7.2 ppm'",
  );
  await expect(changeCarrierUnit(owner, other?.id ?? "", { id, version: null, change: "scrap" })).rejects.toMatchObject(
    { init: { status: 404 } },
  );
});
