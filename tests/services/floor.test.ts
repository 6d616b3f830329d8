import { randomUUID } from "node:crypto";
import { beforeAll, describe, expect, test } from "vitest";
import type { FloorEntryForm } from "#app/schemas/floor-entry.ts";
import { refusedSentence } from "#app/server/problem.server.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { scopeOfPerson } from "#tests/db/people.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";
import { newLot, releaseFirstFlow } from "./lot-on-sheet.ts";

const database = useDatabase({ demo: true });

const withdrawing = () => import("#app/services/sheets/withdraw.server.ts");
const assigning = () => import("#app/services/floor/assign-sheet.server.ts");
const entering = () => import("#app/services/floor/entries.server.ts");
const blocking = () => import("#app/services/floor/hold-and-stop.server.ts");
const looking = () => import("#app/services/floor/floor-lot.server.ts");

const LONG = { timeout: 60_000 };
const status = (code: number) => expect.objectContaining({ init: { status: code } }) as unknown;

let engineer: ActorScope;
let owner: ActorScope;
let technician: ActorScope;
let lead: ActorScope;
let guest: ActorScope;
let tern = "";
let revision = "";
let lot = "";
let other = "";

// Loading the server's modules takes longer than a test should, and so does drawing the papers.
beforeAll(async () => {
  await Promise.all([assigning(), entering(), blocking(), looking(), withdrawing()]);
  engineer = await scopeOfPerson(database, "engineer");
  owner = await scopeOfPerson(database, "process-owner");
  technician = await scopeOfPerson(database, "technician");
  lead = await scopeOfPerson(database, "shift-lead");
  guest = await scopeOfPerson(database, "guest");
  const [program] = await asOwner<{ id: string }>(database, "select id from program where slug = 'tern'");
  tern = program?.id ?? "";
  revision = await releaseFirstFlow(database, "tern");
  lot = await newLot(database, "T-0420", "tern");
  other = await newLot(database, "T-0421", "tern");
}, 120_000);

type Content = Pick<FloorEntryForm, "kind"> & Record<string, unknown>;

const entry = (content: Content, step: number | null = null, of = revision): FloorEntryForm =>
  ({ id: randomUUID(), revision: of, leg: 0, step, at: null, ...content }) as FloorEntryForm;
const say = async (who: ActorScope, form: FloorEntryForm, of = lot) => {
  const entered = await (await entering()).enter(who, of, form);
  return entered.outcome === "stored" ? "stored" : entered.sentence;
};
const look = async (who: ActorScope, of = lot) => (await looking()).floorLot(who, of, null);
const refusal = async (work: Promise<unknown>) =>
  refusedSentence(
    await work.then(
      () => null,
      (error: unknown) => error,
    ),
  );
const toldOf = async (key: string) =>
  (
    await asOwner<{ name: string }>(
      database,
      "select p.name from mail_outbox m join person p on p.id = m.person_id where m.key = ?",
      [key],
    )
  ).map(({ name }) => name);

describe("a lot on a sheet", () => {
  test("is put there by an engineer, on a released revision of its own program alone", LONG, async () => {
    const { assignSheet } = await assigning();
    const values = { revision, fromStep: 1, reason: "" };
    await expect(assignSheet(technician, lot, values)).rejects.toEqual(status(403));
    await expect(assignSheet(guest, lot, values)).rejects.toEqual(status(404));
    expect(await assignSheet(engineer, lot, { ...values, fromStep: 99 })).toMatchObject({ field: "fromStep" });
    const strange = await newLot(database, "P-7", "petrel");
    expect(await assignSheet(engineer, strange, values)).toMatchObject({ field: "revision" });
    expect(await assignSheet(engineer, lot, values)).toEqual({ outcome: "stored" });
    expect(await assignSheet(engineer, other, values)).toEqual({ outcome: "stored" });
    expect(await assignSheet(engineer, lot, values)).toMatchObject({ field: "revision" });
    const { sheet } = await look(technician);
    expect(sheet?.pin).toMatchObject({ letter: "A", state: "released", successor: null });
    expect(sheet?.progress).toMatchObject({ here: 1, underWay: null });
    expect(sheet?.steps.length).toBeGreaterThan(10);
  });

  test("is not for guests, and not for who is of another program", async () => {
    const { floorLot } = await looking();
    await expect(floorLot(guest, lot, null)).rejects.toEqual(status(404));
    await expect(floorLot(technician, randomUUID(), null)).rejects.toEqual(status(404));
    await expect((await entering()).enter(guest, lot, entry({ kind: "acknowledged" }))).rejects.toEqual(status(404));
  });
});

describe("what the floor says", () => {
  test("begins with the acknowledgement, once for each revision and person", async () => {
    expect(await say(technician, entry({ kind: "started" }, 1))).toContain("not acknowledged");
    expect(await say(technician, entry({ kind: "acknowledged" }))).toBe("stored");
    expect(await say(technician, entry({ kind: "acknowledged" }))).toBe("stored");
    const rows = await asOwner(database, "select id from floor_entry where kind = 'acknowledged'");
    expect(rows).toHaveLength(1);
    expect((await look(technician)).sheet?.acknowledgedAt).not.toBeNull();
    expect((await look(engineer)).sheet?.acknowledgedAt).toBeNull();
  });

  test("moves the lot step by step, and the same entry counts once however often it is sent", async () => {
    const form = entry({ kind: "started" }, 1);
    expect(await say(technician, form)).toBe("stored");
    expect(await say(technician, form)).toBe("stored");
    expect(await asOwner(database, "select id from floor_entry where kind = 'started'")).toHaveLength(1);
    expect((await look(technician)).sheet?.progress).toMatchObject({ underWay: 1, here: 1 });
    expect(await say(technician, entry({ kind: "started" }, 2))).toContain("Step 1 is under way");
    expect(await say(technician, entry({ kind: "done", count: null }, 2))).toContain("Step 1 is under way");
    expect(await say(technician, entry({ kind: "done", count: 24 }, 1))).toBe("stored");
    expect(await say(technician, entry({ kind: "done", count: null }, 1))).toContain("has not been started");
    expect((await look(technician)).sheet?.progress).toMatchObject({ underWay: null, here: 2, done: [1] });
    expect(await say(technician, entry({ kind: "started" }, 99))).toContain("not on this sheet");
  });

  test("keeps readings with how they were taken, and a clock that runs ahead is not believed", async () => {
    const reading = {
      kind: "measured" as const,
      what: "bow",
      value: -41e-6,
      uncertainty: null,
      wafer: "W03",
      on: "three pins",
      sideUp: "device side",
      gravity: "taken out",
      remark: "",
    };
    const form = { ...entry(reading, 2), at: new Date(Date.now() + 3_600_000) };
    expect(await say(technician, form)).toBe("stored");
    const [first] = (await look(technician)).sheet?.entries ?? [];
    expect(first).toMatchObject({ step: 2, content: reading, by: technician.actor.name });
    expect(Date.parse(first?.at ?? "")).toBeLessThanOrEqual(Date.now());
  });

  test("puts a bow beside the prediction where the two are alike, once, the other side up with its sign turned", async () => {
    const { stepMeasurements } = await import("#app/services/predictions/step-measurements.server.ts");
    const [{ assessment_id: assessment = "" } = {}] = await asOwner<{ assessment_id: string }>(
      database,
      "select assessment_id from sheet_revision where id = ?",
      [revision],
    );
    const [first] = (await stepMeasurements(engineer, assessment)).steps;
    const step = first?.step ?? 0;
    const bow = {
      kind: "measured" as const,
      what: "bow",
      value: 41e-6,
      uncertainty: 4e-6,
      wafer: "W03",
      on: "three pins",
      sideUp: "back side",
      gravity: "taken out",
      remark: "",
    };
    const count = async () => (await stepMeasurements(engineer, assessment)).rows.length;
    expect(await say(technician, entry({ kind: "started" }, step))).toBe("stored");
    expect(await say(technician, entry(bow, step))).toBe("stored");
    expect(await count(), "in the middle of a step").toBe(0);
    expect(await say(technician, entry({ kind: "done", count: null }, step))).toBe("stored");
    for (const unlike of [{ what: "warp" }, { gravity: "left in" }, { gravity: "not known" }, { on: "film frame" }])
      expect(await say(technician, entry({ ...bow, ...unlike }, step))).toBe("stored");
    expect(await count()).toBe(0);
    const form = entry(bow, step);
    expect(await say(technician, form)).toBe("stored");
    expect(await say(technician, form)).toBe("stored");
    const { rows } = await stepMeasurements(engineer, assessment);
    expect(rows).toMatchObject([{ step, lot: "T-0420", wafer: "W03", stated: true, instrument: "floor, three pins" }]);
    expect(rows[0]?.bow).toBe(-41e-6);
    expect(rows[0]?.standardUncertainty).toBeCloseTo(2e-6, 12);
    expect(rows[0]?.predicted).toBe(first?.predicted?.bow);
  });

  test("is refused of a sheet that the lot was never on", async () => {
    expect(await say(technician, entry({ kind: "observed", text: "Dust", count: null }, null, randomUUID()))).toContain(
      "never on this sheet",
    );
  });
});

describe("a hold and a stop", () => {
  const hold = () => ({ id: randomUUID(), cause: "tool trouble" as const, reason: "Chuck leaks" });

  test("a lot is held by a shift lead, who is the one to clear what the shift can", LONG, async () => {
    const { clearBlock, holdLot } = await blocking();
    const form = hold();
    await expect(holdLot(technician, lot, form)).rejects.toEqual(status(403));
    await holdLot(lead, lot, form);
    await holdLot(lead, lot, form);
    expect(await asOwner(database, "select id from lot_hold")).toHaveLength(1);
    expect(await toldOf(form.id)).toContain(owner.actor.name);
    expect(await toldOf(form.id)).not.toContain(guest.actor.name);
    expect(await say(technician, entry({ kind: "started" }, 2))).toContain("Lot T-0420 is held: tool trouble");
    expect(await say(technician, entry({ kind: "observed", text: "Waits", count: null }))).toBe("stored");
    const clear = { block: form.id, kind: "hold" as const, words: "Seal changed" };
    await expect(clearBlock(technician, lot, clear)).rejects.toEqual(status(403));
    await clearBlock(lead, lot, clear);
    expect(await refusal(clearBlock(owner, lot, clear))).toContain("cleared already");
    expect((await look(lead)).holds).toEqual([]);
  });

  test("a step is stopped by anybody of the floor, for every lot of the sheet", LONG, async () => {
    const { clearBlock, stopStep } = await blocking();
    const form = {
      id: randomUUID(),
      revision,
      leg: 0,
      step: 2,
      cause: "reading beyond the sheet" as const,
      reason: "Twice the bow",
    };
    await expect(stopStep(guest, lot, form)).rejects.toEqual(status(404));
    await stopStep(technician, lot, form);
    expect(await toldOf(form.id)).toEqual(expect.arrayContaining([owner.actor.name, engineer.actor.name]));
    expect(await say(technician, entry({ kind: "started" }, 2))).toContain("is stopped for every lot");
    const elsewhere = await look(lead, other);
    expect(elsewhere.sheet?.blocks).toMatchObject([{ kind: "stop", step: 2, mayClear: false }]);
    const clear = { block: form.id, kind: "stop" as const, words: "Measured again" };
    await expect(clearBlock(lead, other, clear)).rejects.toEqual(status(403));
    await clearBlock(owner, other, clear);
    expect(await say(technician, entry({ kind: "started" }, 2))).toBe("stored");
  });

  test("stays as it was opened, whoever asks the database", async () => {
    await expect(asOwner(database, "update lot_hold set cleared_words = 'else'")).rejects.toThrow("cleared once");
    await expect(asOwner(database, "delete from step_stop")).rejects.toThrow("never deleted");
    await expect(asOwner(database, "update floor_entry set step = 1")).rejects.toThrow("never changed");
    await expect(asOwner(database, "delete from lot_sheet")).rejects.toThrow("never changed");
  });
});

describe("a newer revision", () => {
  test("leaves the lot where it is, told and blocked, until a person moves it with a reason", LONG, async () => {
    const { assignSheet } = await assigning();
    const newer = await releaseFirstFlow(database, "tern");
    expect((await look(technician)).sheet?.pin).toMatchObject({ state: "superseded", successor: { letter: "B" } });
    expect(await say(technician, entry({ kind: "done", count: null }, 2))).toBe("stored");
    expect(await say(technician, entry({ kind: "started" }, 3))).toContain("start nothing by it");
    const values = { revision: newer, fromStep: 3, reason: "" };
    expect(await assignSheet(engineer, lot, values)).toMatchObject({ field: "reason" });
    await assignSheet(engineer, lot, { ...values, reason: "B has the new chuck" });
    const { sheet } = await look(technician);
    expect(sheet?.pin).toMatchObject({ letter: "B", reason: "B has the new chuck", by: engineer.actor.name });
    expect(sheet?.progress).toMatchObject({ here: 3 });
    expect(sheet?.acknowledgedAt).toBeNull();
    expect(await say(technician, entry({ kind: "started" }, 3))).toContain("has been moved to revision B");
    expect(await say(technician, entry({ kind: "acknowledged" }, null, newer))).toBe("stored");
    expect(await say(technician, entry({ kind: "started" }, 3, newer))).toBe("stored");
    expect(await assignSheet(engineer, other, { revision, fromStep: 1, reason: "back" })).toMatchObject({
      field: "revision",
    });
    await (await withdrawing()).withdrawRevision(owner, newer, "Chuck changed");
    expect((await look(technician)).sheet?.blocks).toMatchObject([{ kind: "revision", step: null }]);
  });

  test("is what the database holds a beginning to, even where a service forgot", async () => {
    const insert = (of: string) =>
      asOwner(
        database,
        `insert into floor_entry (id, program_id, lot_id, revision_id, leg, step, kind, content, at, received_at, created_by_id)
           values (gen_random_uuid(), ?, ?, ?, 0, 1, 'started', '{}', now(), now(), ?)`,
        [tern, other, of, technician.actor.id],
      );
    await expect(insert(revision)).rejects.toThrow("begins only by the released revision");
    await expect(insert(randomUUID())).rejects.toThrow("is or was on");
  });
});

describe("lots that are made", () => {
  const making = () => import("#app/services/wafers/new-lots.server.ts");
  const standing = () => import("#app/services/wafers/wafer-status.server.ts");

  test("come with their wafers, all of them or none", LONG, async () => {
    const { makeLots } = await making();
    const wafers = "lot,slot,wafer\nT-0500,1,W01\nT-0500,2,W02\nT-0501,1,W01";
    await expect(makeLots(guest, { program: tern, name: "", wafers })).rejects.toEqual(status(404));
    expect(await makeLots(technician, { program: tern, name: "", wafers })).toEqual({ outcome: "stored", only: null });
    const again = await makeLots(technician, { program: tern, name: "", wafers: "lot\nT-0502\nt-0501" });
    expect(again).toMatchObject({ outcome: "refused", faults: [expect.stringContaining("already a lot t-0501")] });
    expect(await asOwner(database, "select id from lot where name = 'T-0502'")).toEqual([]);
  });

  test("have wafers that stand somewhere", async () => {
    const { setWaferStatus } = await standing();
    const { floorLot } = await looking();
    const rows = await asOwner<{ id: string; lot: string }>(
      database,
      "select w.id, w.lot_id as lot from wafer w join lot l on l.id = w.lot_id where l.name = 'T-0500' order by slot",
    );
    const [first] = rows;
    await expect(setWaferStatus(guest, first?.lot, { wafers: [first?.id ?? ""], status: "broken" })).rejects.toEqual(
      status(404),
    );
    await setWaferStatus(technician, first?.lot, { wafers: [first?.id ?? ""], status: "broken" });
    expect((await floorLot(technician, first?.lot, null)).wafers).toEqual({ total: 2, inLine: 1 });
    const audit = await asOwner(
      database,
      "select 1 from audit_event where subject_id = ? and field = 'status' and actor_id = ?",
      [first?.id, technician.actor.id],
    );
    expect(audit).toHaveLength(1);
  });
});

describe("what the desk sees", () => {
  test("is the sheet, the place in the flow and the way to move the lot, for who may", LONG, async () => {
    const { lotDesk } = await import("#app/services/floor/lot-desk.server.ts");
    const desk = await lotDesk(engineer, lot);
    expect(desk).toMatchObject({ mayAssign: true, mayHold: false, pin: { letter: "B", state: "withdrawn" } });
    expect(desk.parts).toMatchObject([{ here: { number: 3, underWay: true }, missing: [] }]);
    expect(desk.before.map(({ letter }) => letter)).toEqual(["A"]);
    expect((await lotDesk(technician, lot)).choices).toEqual([]);
    await expect(lotDesk(guest, lot)).rejects.toEqual(status(404));
  });
});
