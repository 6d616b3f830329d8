import { randomUUID } from "node:crypto";
import { beforeAll, expect, test } from "vitest";
import type { ActorScope } from "#app/server/scope.server.ts";
import { scopeOfPerson } from "#tests/db/people.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";
import type { FloorDeed } from "./deed-in-process.ts";
import { useDeeds } from "./killed-deed.ts";

const database = useDatabase({ demo: true });
const { done, killedBeforeItsEnd } = useDeeds(database);

let engineer: ActorScope;
let owner: ActorScope;

beforeAll(async () => {
  await import("#app/services/assessments/assessments.server.ts");
  engineer = await scopeOfPerson(database, "engineer");
  owner = await scopeOfPerson(database, "process-owner");
}, 90_000);

async function releasedRevision(): Promise<string> {
  const { runAssessment } = await import("#app/services/assessments/assessments.server.ts");
  const [flow] = await asOwner<{ id: string }>(
    database,
    "select f.id from flow f join program p on p.id = f.program_id where p.slug = 'tern' order by f.name limit 1",
  );
  const ran = await runAssessment(engineer, flow?.id ?? "");
  if (ran.outcome !== "stored") throw new Error(ran.outcome);
  await done({ kind: "ask", scope: engineer, id: ran.id });
  const [row] = await asOwner<{ id: string }>(database, "select id from sheet_revision order by asked_at desc limit 1");
  await done({ kind: "release", scope: owner, id: row?.id ?? "" });
  return row?.id ?? "";
}

async function newLot(): Promise<string> {
  const id = randomUUID();
  await asOwner(
    database,
    `insert into lot (id, program_id, name, note, created_at, created_by_id)
       select ?, program.id, 'K-1', '', now(), ? from program where slug = 'tern'`,
    [id, engineer.actor.id],
  );
  return id;
}

/** Everything that a deed on a lot leaves behind. */
async function traces() {
  const [row] = await asOwner<Record<"pins" | "entries" | "blocks" | "cleared" | "mails" | "events" | "jobs", number>>(
    database,
    `select (select count(*)::int from lot_sheet) as pins, (select count(*)::int from floor_entry) as entries,
            (select count(*)::int from lot_hold) + (select count(*)::int from step_stop) as blocks,
            (select count(cleared_at)::int from lot_hold) + (select count(cleared_at)::int from step_stop) as cleared,
            (select count(*)::int from mail_outbox) as mails, (select count(*)::int from audit_event) as events,
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
  const tells = deed.kind === "hold" || deed.kind === "stop";
  await killedBeforeItsEnd(deed, tells ? "mail_outbox" : "audit_event");
  expect(await traces()).toEqual(before);
  await done(deed);
  const after = await traces();
  for (const key of ["pins", "entries", "blocks", "cleared"] as const)
    expect(after[key], key).toBe(before[key] + (adds[key] ?? 0));
  expect(after.mails > before.mails, "mails").toBe(tells);
  if (tells || deed.kind === "enter") {
    await done(deed);
    expect(await traces()).toEqual(after);
  }
  expect(await twice()).toEqual([]);
}

test(
  "whoever is killed while putting a lot on a sheet, entering, holding, stopping or clearing has done nothing",
  { timeout: 240_000 },
  async () => {
    const [id, revision] = [await newLot(), await releasedRevision()];
    await killedThenDone(
      { kind: "assign", scope: engineer, id, form: { revision, fromStep: 1, reason: "" } },
      { pins: 1 },
    );
    const enter = (form: { kind: "acknowledged" | "started"; step: number | null }) =>
      killedThenDone(
        { kind: "enter", scope: engineer, id, form: { id: randomUUID(), revision, leg: 0, at: null, ...form } },
        { entries: 1 },
      );
    await enter({ kind: "acknowledged", step: null });
    await enter({ kind: "started", step: 1 });
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
  },
);
