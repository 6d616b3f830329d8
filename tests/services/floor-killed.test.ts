import { randomUUID } from "node:crypto";
import { beforeAll, expect, test } from "vitest";
import type { ActorScope } from "#app/server/scope.server.ts";
import { scopeOfPerson } from "#tests/db/people.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";
import type { FloorDeed } from "./deed-in-process.ts";
import { useDeeds, type WrittenTable } from "./killed-deed.ts";
import { newLot, releaseFirstFlow } from "./lot-on-sheet.ts";

/** What each deed writes last. */
const LAST_WRITTEN: Record<FloorDeed["kind"], WrittenTable> = {
  assign: "lot_sheet",
  enter: "floor_entry",
  stop: "mail_outbox",
  hold: "mail_outbox",
  clear: "step_stop",
  report: "mail_outbox",
};

const database = useDatabase({ demo: true });
const { done, killedBeforeItsEnd } = useDeeds(database);

let engineer: ActorScope;
let owner: ActorScope;

beforeAll(async () => {
  await import("#app/services/assessments/assessments.server.ts");
  engineer = await scopeOfPerson(database, "engineer");
  owner = await scopeOfPerson(database, "process-owner");
}, 90_000);

/** Everything that a deed on a lot leaves behind. */
async function traces() {
  const [row] = await asOwner<
    Record<"pins" | "entries" | "blocks" | "cleared" | "incidents" | "mails" | "events" | "jobs", number>
  >(
    database,
    `select (select count(*)::int from lot_sheet) as pins, (select count(*)::int from floor_entry) as entries,
            (select count(*)::int from lot_hold) + (select count(*)::int from step_stop) as blocks,
            (select count(cleared_at)::int from lot_hold) + (select count(cleared_at)::int from step_stop) as cleared,
            (select count(*)::int from incident) as incidents, (select count(*)::int from mail_outbox) as mails, (select count(*)::int from audit_event) as events,
            (select count(*)::int from graphile_worker.jobs) as jobs`,
  );
  if (!row) throw new Error("nothing was counted");
  return row;
}

const twice = () =>
  asOwner(database, "select kind, key, person_id from mail_outbox group by kind, key, person_id having count(*) > 1");

/** Kills the deed, then does it: only then it is there, and once. What has its own id is sent once more and adds nothing. */
async function killedThenDone(deed: FloorDeed, adds: Partial<Awaited<ReturnType<typeof traces>>>): Promise<void> {
  const before = await traces();
  const tells = deed.kind === "hold" || deed.kind === "stop" || deed.kind === "report";
  await killedBeforeItsEnd(deed, LAST_WRITTEN[deed.kind]);
  expect(await traces()).toEqual(before);
  await done(deed);
  const after = await traces();
  for (const key of ["pins", "entries", "blocks", "cleared", "incidents"] as const)
    expect(after[key], key).toBe(before[key] + (adds[key] ?? 0));
  expect(after.mails > before.mails, "mails").toBe(tells);
  if (tells || deed.kind === "enter") {
    await done(deed);
    expect(await traces()).toEqual(after);
  }
  expect(await twice()).toEqual([]);
}

test(
  "whoever is killed while putting a lot on a sheet, entering, holding, stopping, clearing or reporting has done nothing",
  { timeout: 240_000 },
  async () => {
    const revision = await releaseFirstFlow(database, "tern");
    const id = await newLot(database, "K-1", "tern");
    await killedThenDone(
      { kind: "assign", scope: engineer, id, form: { revision, fromStep: 1, reason: "" } },
      { pins: 1 },
    );
    const enter = (
      form: { kind: "acknowledged"; step: null } | { kind: "started"; step: 1 } | { kind: "done"; step: 1; count: 24 },
    ) =>
      killedThenDone(
        { kind: "enter", scope: engineer, id, form: { id: randomUUID(), revision, leg: 0, at: null, ...form } },
        { entries: 1 },
      );
    await enter({ kind: "acknowledged", step: null });
    await enter({ kind: "started", step: 1 });
    await enter({ kind: "done", step: 1, count: 24 });
    const stop = randomUUID();
    const cause = "tool trouble";
    await killedThenDone(
      {
        kind: "stop",
        scope: owner,
        id,
        form: { id: stop, revision, leg: 0, step: 2, cause, reason: "The chuck leaks" },
      },
      { blocks: 1 },
    );
    await killedThenDone(
      { kind: "hold", scope: owner, id, form: { id: randomUUID(), cause, reason: "The gauge drifts" } },
      { blocks: 1 },
    );
    await killedThenDone(
      { kind: "clear", scope: owner, id, form: { block: stop, kind: "stop", words: "Seal changed" } },
      { cleared: 1 },
    );
    const [pinned] = await asOwner<{ assessment: string }>(
      database,
      "select assessment_id as assessment from sheet_revision where id = ?",
      [revision],
    );
    await killedThenDone(
      {
        kind: "report",
        scope: engineer,
        id,
        form: {
          id: randomUUID(),
          assessment: pinned?.assessment ?? "",
          leg: "0",
          step: "2",
          kind: "crack",
          severity: "wafer lost",
          affected: "1",
          broken: "1",
          words: "Cracked when it was lifted",
        },
      },
      { incidents: 1 },
    );
  },
);
