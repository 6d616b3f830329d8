import { beforeAll, expect, test } from "vitest";
import type { ActorScope } from "#app/server/scope.server.ts";
import { scopeOfPerson } from "#tests/db/people.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";
import type { Deed } from "./deed-in-process.ts";
import { useDeeds } from "./killed-deed.ts";

const database = useDatabase({ demo: true });
const LONG = { timeout: 120_000 };

let engineer: ActorScope;
let owner: ActorScope;
const { done, killedBeforeItsEnd } = useDeeds(database);

// Loading the server's modules takes longer than a test should.
beforeAll(async () => {
  await import("#app/services/assessments/assessments.server.ts");
  engineer = await scopeOfPerson(database, "engineer");
  owner = await scopeOfPerson(database, "process-owner");
}, 90_000);

/** Everything that a deed on a sheet leaves behind. */
async function traces() {
  const revisions = await asOwner<{ state: string; number: number | null }>(
    database,
    "select state, number from sheet_revision order by asked_at, id",
  );
  const [counted] = await asOwner<Record<"files" | "documents" | "mails" | "events" | "jobs", number>>(
    database,
    `select (select count(*)::int from sheet_file) as files, (select count(*)::int from sheet_document) as documents,
            (select count(*)::int from mail_outbox) as mails, (select count(*)::int from audit_event) as events,
            (select count(*)::int from graphile_worker.jobs) as jobs`,
  );
  return { revisions: revisions.map(({ state, number }) => `${state} ${number ?? "-"}`), ...counted };
}

/** Mails of a kind that somebody gets twice. */
const twice = () =>
  asOwner(database, "select kind, key, person_id from mail_outbox group by kind, key, person_id having count(*) > 1");

async function assess(): Promise<string> {
  const { runAssessment } = await import("#app/services/assessments/assessments.server.ts");
  const [flow] = await asOwner<{ id: string }>(
    database,
    "select f.id from flow f join program p on p.id = f.program_id where p.slug = 'tern' order by f.name limit 1",
  );
  const ran = await runAssessment(engineer, flow?.id ?? "");
  if (ran.outcome !== "stored") throw new Error(ran.outcome);
  return ran.id;
}

async function killedThenDone(deed: Deed): Promise<void> {
  const before = await traces();
  await killedBeforeItsEnd(deed);
  expect(await traces()).toEqual(before);
  await done(deed);
  expect(await traces()).not.toEqual(before);
  expect(await twice()).toEqual([]);
}

const newest = async () => {
  const [row] = await asOwner<{ id: string }>(database, "select id from sheet_revision order by asked_at desc limit 1");
  return row?.id ?? "";
};

test(
  "whoever is killed while asking for, returning, releasing or withdrawing a sheet has done nothing",
  LONG,
  async () => {
    await killedThenDone({ kind: "ask", scope: engineer, id: await assess() });
    await killedThenDone({ kind: "return", scope: owner, id: await newest() });
    await done({ kind: "ask", scope: engineer, id: await assess() });
    await killedThenDone({ kind: "release", scope: owner, id: await newest() });
    expect((await traces()).revisions).toEqual(["returned -", "released 1"]);
  },
);

test("the revision in force stays so until the one that takes its place is whole", LONG, async () => {
  await done({ kind: "ask", scope: engineer, id: await assess() });
  await killedThenDone({ kind: "release", scope: owner, id: await newest() });
  expect((await traces()).revisions).toEqual(["returned -", "superseded 1", "released 2"]);
  await killedThenDone({ kind: "withdraw", scope: owner, id: await newest() });
  expect((await traces()).revisions).toEqual(["returned -", "superseded 1", "withdrawn 2"]);
});
