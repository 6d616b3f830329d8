import { randomUUID } from "node:crypto";
import { beforeAll, describe, expect, test } from "vitest";
import type { StepMeasurementValues } from "#app/schemas/step-measurement-form.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { leave, scopeOfPerson } from "#tests/db/people.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";

const database = useDatabase({ demo: true });

const measured = () => import("#app/services/predictions/step-measurements.server.ts");
const predictions = () => import("#app/services/predictions/predictions.server.ts");
const lots = () => import("#app/services/assessments/lot.server.ts");

const status = (code: number) => expect.objectContaining({ init: { status: code } }) as unknown;
const um = (micrometres: number) => micrometres / 1e6;

let engineer: ActorScope;
let technician: ActorScope;
let guest: ActorScope;
let assessment = "";
let flow = "";
let program = "";

beforeAll(async () => {
  await Promise.all([measured(), predictions(), lots()]);
  engineer = await scopeOfPerson(database, "engineer");
  technician = await scopeOfPerson(database, "technician");
  guest = await scopeOfPerson(database, "guest");
  const [row] = await asOwner<{ id: string; flow_id: string; program_id: string }>(
    database,
    "select a.id, a.flow_id, a.program_id from assessment a join flow f on f.id = a.flow_id where f.name like 'Tern %'",
  );
  [assessment, flow, program] = [row?.id ?? "", row?.flow_id ?? "", row?.program_id ?? ""];
}, 90_000);

const page = async (who = engineer) => (await measured()).stepMeasurements(who, assessment);

/** The first step with a bow, and what is predicted there. */
async function firstStep() {
  const [step] = (await page()).steps;
  if (!step?.predicted) throw new Error("no step of the demo has a bow");
  return step.predicted;
}

async function values(changed: Partial<StepMeasurementValues> = {}): Promise<StepMeasurementValues> {
  const { step, bow } = await firstStep();
  return {
    step,
    summary: null,
    lot: "K-20",
    wafers: [1, 2, 3].map((slot) => ({ slot, bow: bow + um(40 + slot), thickness: null })),
    uncertainty: um(4),
    measuredAt: new Date("2026-11-25T12:00:00Z"),
    instrument: "Bow gauge 1",
    sideUp: "device",
    gravity: "compensated",
    ...changed,
  };
}

const compare = async (search: string, who = engineer) =>
  (await predictions()).predictionsPage(who, new URLSearchParams(search));

describe("bows after a step", () => {
  test("are recorded by a technician with what the assessment predicts of the step", async () => {
    const { recordBows } = await measured();
    const before = await firstStep();
    expect(await recordBows(technician, assessment, await values())).toEqual({ outcome: "stored", count: 3 });
    const { rows } = await page(technician);
    expect(rows).toHaveLength(3);
    expect(rows[0]).toMatchObject({ lot: "K-20", wafer: "slot 1", predicted: before.bow, stated: true });
    expect(rows[0]?.standardUncertainty).toBeCloseTo(um(2), 12);
  });

  test("stand in the comparison with bias and its uncertainty, step by step", async () => {
    const { of, all, groups, flows, points, working } = await compare("of=bow");
    expect(of).toBe("bow");
    expect(points).toHaveLength(3);
    expect(all?.bias).toBeCloseTo(um(42), 9);
    expect(all?.biasUncertainty).toBeGreaterThan(0);
    expect(groups).toMatchObject([{ step: expect.stringMatching(/^Tern .*: step \d+, /) as string, count: 3 }]);
    expect(flows).toMatchObject([{ step: expect.stringMatching(/^Tern [^:]*$/) as string, count: 3 }]);
    expect(working?.equation).toBe("predicted-slope");
  });

  test("of the same wafer and day are refused, and so are those with the weight in them or of no step", async () => {
    const { recordBows } = await measured();
    expect(await recordBows(technician, assessment, await values())).toMatchObject({
      outcome: "refused",
      field: "wafers",
      reasons: [expect.stringMatching(/slot 1 is recorded/), expect.anything(), expect.anything()] as string[],
    });
    expect(await recordBows(technician, assessment, await values({ gravity: "included" }))).toMatchObject({
      field: "gravity",
    });
    expect(await recordBows(technician, assessment, await values({ sideUp: null }))).toMatchObject({ field: "sideUp" });
    expect(await recordBows(technician, assessment, await values({ step: 999, lot: "K-21" }))).toMatchObject({
      reasons: expect.arrayContaining([expect.stringMatching(/there is no step 999/)]) as string[],
    });
    expect((await page()).rows).toHaveLength(3);
  });

  test("are turned device side up, and have the usual uncertainty where none is stated", async () => {
    const { recordBows } = await measured();
    const { bow } = await firstStep();
    const wafers = [{ slot: 4, bow: -bow, thickness: null }];
    const turned = await values({ lot: "K-22", wafers, sideUp: "back", uncertainty: null });
    expect(await recordBows(engineer, assessment, turned)).toMatchObject({ outcome: "stored" });
    const row = (await page()).rows.find(({ lot }) => lot === "K-22");
    expect(row?.bow).toBeCloseTo(bow, 12);
    expect(row).toMatchObject({ stated: false });
    expect(row?.standardUncertainty).toBeCloseTo(um(2) / Math.sqrt(3), 12);
  });

  test("are set aside with a reason and put back, by who may assess", async () => {
    const { setBowAside } = await measured();
    const row = (await page()).rows.find(({ lot }) => lot === "K-22");
    const id = row?.id;
    await expect(setBowAside(technician, assessment, { id, reason: "x" })).rejects.toEqual(status(403));
    expect(await setBowAside(engineer, assessment, { id, reason: "Chipped" })).toBeNull();
    expect((await compare("of=bow")).points).toHaveLength(3);
    expect((await page()).rows.find((each) => each.id === id)?.setAside).toMatchObject({ reason: "Chipped" });
    expect(await setBowAside(engineer, assessment, { id, reason: "again" })).toMatch(/already/);
    expect(await setBowAside(engineer, assessment, { id, reason: null })).toBeNull();
    expect((await compare("of=bow")).points).toHaveLength(4);
  });
});

test("a lot's summary is placed at a step, each wafer once, by what its file says of side and weight", async () => {
  const person = technician.actor.id;
  const [lot, reading, file] = [randomUUID(), randomUUID(), randomUUID()];
  await asOwner(
    database,
    `insert into scan_file (id, program_id, name, hash, size, bytes, created_at, created_by_id)
       values (?, ?, 'lot.csv', 'h', 1, '\\x00', now(), ?)`,
    [file, program, person],
  );
  await asOwner(
    database,
    `insert into scan_reading (id, program_id, file_id, settings, settings_hash, result, engine_version, created_at, created_by_id)
       values (?, ?, ?, '{}', 'h', '{}', '0', now(), ?)`,
    [reading, program, file, person],
  );
  await asOwner(
    database,
    "insert into lot (id, program_id, name, note, created_at, created_by_id) values (?, ?, 'K-30', '', now(), ?)",
    [lot, program, person],
  );
  const figures = (bow: number) => [
    { column: 1, heading: "Bow", quantity: "bow", statistic: null, reference: null, edgeExclusion: null, value: bow },
  ];
  for (const slot of [1, 2]) {
    const wafer = randomUUID();
    await asOwner(
      database,
      "insert into wafer (id, program_id, lot_id, slot, name, created_at, created_by_id) values (?, ?, ?, ?, ?, now(), ?)",
      [wafer, program, lot, slot, `W${slot}`, person],
    );
    await asOwner(
      database,
      `insert into wafer_measurement (id, program_id, wafer_id, reading_id, kind, content, measured_at, created_at, created_by_id)
         values (gen_random_uuid(), ?, ?, ?, 'summary', ?, '2026-11-28', now(), ?)`,
      [
        program,
        wafer,
        reading,
        JSON.stringify({
          kind: "summary",
          figures: figures(um(-30 - slot)),
          measured: { sideUp: "back", support: "three points", gravity: "compensated" },
        }),
        person,
      ],
    );
  }
  const { recordBows } = await measured();
  const choice = (await page()).summaries.find((summary) => summary.lot === "K-30");
  expect(choice).toMatchObject({ wafers: 2, measuredOn: "2026-11-28", known: true });
  const summary = { reading, lot };
  const form = await values({ summary, wafers: [], measuredAt: null, sideUp: null, gravity: null });
  expect(await recordBows(technician, assessment, form)).toEqual({ outcome: "stored", count: 2 });
  const rows = (await page()).rows.filter((row) => row.lot === "K-30");
  expect(rows.map(({ wafer }) => wafer)).toEqual(["W1", "W2"]);
  expect(rows[0]?.bow).toBeCloseTo(um(31), 12);
  expect(await recordBows(technician, assessment, form)).toMatchObject({ outcome: "refused", field: "summary" });
  await expect(asOwner(database, "delete from wafer_measurement where reading_id = ?", [reading])).rejects.toThrow(
    /violates/,
  );
});

test("lots stand beside the bow that their assessment took for granted, and scans beside the stress in use then", async () => {
  const { keepLot } = await lots();
  const kept = await keepLot(engineer, assessment, {
    name: "K-17",
    bow: um(-100),
    thickness: null,
    warp: null,
    edgeChips: null,
    identity: null,
    wafers: [
      { slot: 1, bow: um(-90), thickness: null },
      { slot: 2, bow: um(-110), thickness: null },
    ],
  });
  expect(kept.outcome).toBe("stored");
  const bows = await compare("of=bow&q=K-17");
  expect(bows.page.rows.map(({ name }) => name).toSorted()).toEqual(["K-17, slot 1", "K-17, slot 2"]);
  const stresses = await compare("of=stress");
  expect(stresses.points).toContainEqual(
    expect.objectContaining({
      name: "M-0388",
      group: "Polymer dielectric A",
      predicted: 30e6,
      measured: expect.closeTo(31e6, -6) as number,
    }),
  );
  expect(stresses.all?.sentence).toMatch(/agree/);
}, 30_000);

test("filters by program, film and flow; a program that is not one's own gives nothing", async () => {
  const [film] = await asOwner<{ id: string }>(database, "select id from film where name = 'Polymer dielectric A'");
  const [other] = await asOwner<{ id: string }>(
    database,
    "select id from film where name = 'Back-side oxide A (low temperature)'",
  );
  const count = async (search: string, who = engineer) => (await compare(search, who)).counts;
  const all = await count("");
  expect(all.bow).toBeGreaterThan(5);
  expect(await count(`flow=${flow}`)).toEqual(all);
  expect(await count(`film=${film?.id}`)).toEqual(all);
  expect(await count(`film=${other?.id}&of=stress`)).toEqual({ bow: 0, stress: 0 });
  expect(await count("program=petrel")).toEqual({ bow: 0, stress: 0 });
  expect(await count("film=nonsense")).toEqual({ bow: 0, stress: 0 });
  await expect(compare("", guest)).rejects.toEqual(status(403));
  const { stepMeasurements, recordBows } = await measured();
  await expect(stepMeasurements(guest, assessment)).rejects.toEqual(status(404));
  await leave(database, "second-process-owner", "tern");
  const left = await scopeOfPerson(database, "second-process-owner");
  expect(await count("", left)).toEqual({ bow: 0, stress: 0 });
  await expect(recordBows(left, assessment, await values())).rejects.toEqual(status(404));
  const { predictionPoints } = await predictions();
  expect((await predictionPoints(left, new URLSearchParams("of=bow"))).points).toEqual([]);
});
