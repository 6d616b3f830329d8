import { randomUUID } from "node:crypto";
import { beforeAll, expect, test } from "vitest";
import { incidentSchema } from "#app/schemas/incident-form.ts";
import type { FloorEntryForm } from "#app/schemas/floor-entry.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { leave, scopeOfPerson } from "#tests/db/people.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";

const database = useDatabase({ demo: true });

const rating = () => import("#app/services/incidents/incident-rates.server.ts");
const reporting = () => import("#app/services/incidents/report-incident.server.ts");
const assigning = () => import("#app/services/floor/assign-sheet.server.ts");
const entering = () => import("#app/services/floor/entries.server.ts");
const status = (code: number) => expect.objectContaining({ init: { status: code } }) as unknown;

let engineer: ActorScope;
let technician: ActorScope;
let assessment = "";
let revision = "";

// Loading the server's modules takes longer than a test should, and so does drawing the papers.
beforeAll(async () => {
  await Promise.all([rating(), reporting(), assigning(), entering()]);
  engineer = await scopeOfPerson(database, "engineer");
  technician = await scopeOfPerson(database, "technician");
  const { runAssessment } = await import("#app/services/assessments/assessments.server.ts");
  const { askReview } = await import("#app/services/sheets/ask-review.server.ts");
  const { releaseRevision } = await import("#app/services/sheets/release.server.ts");
  const [flow] = await asOwner<{ id: string }>(
    database,
    "select f.id from flow f join program p on p.id = f.program_id where p.slug = 'tern' order by f.name limit 1",
  );
  const ran = await runAssessment(engineer, flow?.id ?? "");
  if (ran.outcome !== "stored") throw new Error(ran.outcome);
  assessment = ran.id;
  await askReview(engineer, assessment, "");
  const [asked] = await asOwner<{ id: string }>(database, "select id from sheet_revision");
  revision = asked?.id ?? "";
  await releaseRevision(await scopeOfPerson(database, "process-owner"), revision, "", "https://planeward.site.example");
}, 120_000);

async function report(changed: Record<string, unknown>): Promise<void> {
  const values = incidentSchema.parse({
    id: randomUUID(),
    assessment,
    leg: 0,
    step: 1,
    lot: "T-0500",
    kind: "crack",
    severity: "wafer lost",
    affected: "2",
    broken: "1",
    words: "Cracked",
    occurredAt: "2026-11-20 22:15",
    ...changed,
  });
  const reported = await (await reporting()).reportIncident(technician, values, []);
  if (reported.outcome !== "stored") throw new Error(reported.reasons.join(" "));
}

/** A lot of three wafers on the sheet, its first step done. */
async function workedLot(name: string, count: number | null): Promise<void> {
  const lot = randomUUID();
  await asOwner(
    database,
    `insert into lot (id, program_id, name, note, created_at, created_by_id)
       select ?, p.id, ?, '', now(), ? from program p where p.slug = 'tern'`,
    [lot, name, engineer.actor.id],
  );
  for (const wafer of ["W1", "W2", "W3"])
    await asOwner(
      database,
      `insert into wafer select (jsonb_populate_record(w, jsonb_build_object('id', gen_random_uuid(), 'name', ?::text, 'lot_id', ?::uuid, 'slot', null))).*
         from wafer w join program p on p.id = w.program_id and p.slug = 'tern' limit 1`,
      [`${name} ${wafer}`, lot],
    );
  const { assignSheet } = await assigning();
  const { enter } = await entering();
  expect(await assignSheet(engineer, lot, { revision, fromStep: 1, reason: "" })).toEqual({ outcome: "stored" });
  for (const [kind, step] of [
    ["acknowledged", null],
    ["started", 1],
    ["done", 1],
  ] as const) {
    const more = kind === "done" ? { count } : {};
    const form = { id: randomUUID(), revision, leg: 0, step, at: null, kind, ...more } as FloorEntryForm;
    expect(await enter(technician, lot, form)).toMatchObject({ outcome: "stored" });
  }
}

const rates = async (scope = engineer, program = "") =>
  (await (await rating()).incidentRatesView(scope, program)).rates;

test("nothing is known before anything was done or reported", async () => {
  expect((await rates()).all).toMatchObject({ incidents: 0, through: 0, rate: null });
});

test("wafers that went through without an incident count, and what the floor counted before what the lot has", async () => {
  await workedLot("T-0500", null);
  expect((await rates()).all).toMatchObject({ incidents: 0, through: 3, broken: 0 });
  await workedLot("T-0501", 24);
  const { all, bySupport, byStep } = await rates();
  expect(all).toMatchObject({ through: 27, broken: 0 });
  expect(all.rate?.share).toBe(0);
  expect(bySupport.map(({ name, through }) => `${name} ${through}`)).toEqual(["bare 27"]);
  expect(byStep).toHaveLength(1);
});

test("a report counts at its place, with the larger of both counts; one that nobody counted is in no rate", async () => {
  await report({ through: "3" });
  expect((await rates()).all).toMatchObject({ incidents: 1, affected: 2, broken: 1, through: 27, brokenOfThrough: 1 });
  await report({ lot: "T-0600", step: 14, through: "", occurredAt: "2026-11-21 08:00" });
  const { all, byThickness } = await rates();
  expect(all).toMatchObject({ incidents: 2, broken: 2, through: 27, brokenOfThrough: 1, uncounted: 1 });
  expect(byThickness.map(({ name }) => name)).toEqual(["60 to 120 µm", "over 300 µm"]);
});

test("incidents and sheets are found by their numbers, and an incident waits on Today until somebody follows it up", async () => {
  const { searchEverything } = await import("#app/services/search.server.ts");
  const foundBy = async (query: string, kind: string) =>
    (await searchEverything(engineer, query)).groups.find((group) => group.kind === kind)?.rows.map(({ name }) => name);
  expect(await foundBy("tern-i001", "incident")).toEqual(["TERN-I001"]);
  expect(await foundBy("tern-h001", "sheet")).toEqual(["TERN-H001"]);
  const { todayView } = await import("#app/services/today.server.ts");
  expect((await todayView(engineer)).incidents).toMatchObject({
    total: 2,
    rows: [{ lot: "T-0500" }, { lot: "T-0600" }],
  });
  expect((await todayView(technician)).incidents.total).toBe(0);
  const { followUp } = await import("#app/services/incidents/follow-up.server.ts");
  const { rows } = (await todayView(engineer)).incidents;
  await followUp(engineer, rows[0]?.id, { text: "Finger set anew", state: "closed" });
  expect((await todayView(engineer)).incidents.total).toBe(1);
});

test("each reader counts their own programs alone", async () => {
  expect((await rates(engineer, "petrel")).all.incidents).toBe(0);
  expect((await rates(engineer, "tern")).all.incidents).toBe(2);
  expect((await rates(engineer, "nowhere")).all.incidents).toBe(0);
  await leave(database, "technician", "tern");
  expect((await rates(await scopeOfPerson(database, "technician"))).all).toMatchObject({ incidents: 0, through: 0 });
  const guest = await scopeOfPerson(database, "guest");
  await expect((await rating()).incidentRatesView(guest, "")).rejects.toEqual(status(403));
});
