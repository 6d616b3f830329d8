import { beforeAll, expect, test } from "vitest";
import { refusedSentence } from "#app/server/problem.server.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { scopeOfPerson } from "#tests/db/people.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";

const database = useDatabase({ demo: true });

const people = () => import("#app/services/people/delegations.server.ts");
const actors = () => import("#app/services/actor.server.ts");
const assessments = () => import("#app/services/assessments/assessments.server.ts");
const asking = () => import("#app/services/sheets/ask-review.server.ts");
const deeds = () => import("#app/services/sheets/review-deeds.server.ts");
const releasing = () => import("#app/services/sheets/release.server.ts");

const LONG = { timeout: 60_000 };
const DAY = 24 * 3600e3;
const ORIGIN = "https://planeward.site.example";
const status = (code: number) => expect.objectContaining({ init: { status: code } }) as unknown;
const refused = async (work: Promise<unknown>) =>
  refusedSentence(
    await work.then(
      () => null,
      (error: unknown) => error,
    ),
  );

let owner: ActorScope;
let second: ActorScope;
let technician: ActorScope;
let guest: ActorScope;
let tern = "";

// Loading the server's modules takes longer than a test should.
beforeAll(async () => {
  await Promise.all([people(), actors(), assessments(), asking(), deeds(), releasing()]);
  owner = await scopeOfPerson(database, "process-owner");
  second = await scopeOfPerson(database, "second-process-owner");
  technician = await scopeOfPerson(database, "technician");
  guest = await scopeOfPerson(database, "guest");
  tern = owner.actor.memberships.find(({ programSlug }) => programSlug === "tern")?.programId ?? "";
}, 90_000);

/** The engineer as they stand now, whoever they stand in for. */
async function engineer(): Promise<ActorScope> {
  const { actor, ...asked } = await scopeOfPerson(database, "engineer");
  const now = await (await actors()).actorById(actor.id, "test");
  if (!now) throw new Error("The engineer is gone.");
  return { ...asked, actor: now };
}

async function name(by: ActorScope, days: [from: number, until: number], whom?: string) {
  const { actor } = await engineer();
  return (await people()).nameDelegate(by, {
    intent: "name",
    whom: { program: tern, person: whom ?? actor.id },
    from: new Date(Date.now() + days[0] * DAY),
    until: new Date(Date.now() + days[1] * DAY),
    reason: "On leave",
  });
}

/** A revision of the first flow of Tern, assessed and asked for by somebody. */
async function ask(by: ActorScope): Promise<string> {
  const [flow] = await asOwner<{ id: string }>(
    database,
    "select f.id from flow f where f.program_id = ? order by f.name limit 1",
    [tern],
  );
  const ran = await (await assessments()).runAssessment(by, flow?.id ?? "");
  if (ran.outcome !== "stored") throw new Error(ran.outcome);
  await (await asking()).askReview(by, ran.id, "");
  const [revision] = await asOwner<{ id: string }>(database, "select id from sheet_revision where assessment_id = ?", [
    ran.id,
  ]);
  return revision?.id ?? "";
}

test("only a process owner names somebody, and nobody who could not see what they sign", LONG, async () => {
  await expect(name(technician, [0, 5])).rejects.toEqual(status(403));
  await expect(name(guest, [0, 5])).rejects.toEqual(status(404));
  expect(await name(owner, [0, 5], guest.actor.id)).toContain("somebody else of the program");
  expect(await name(owner, [0, 5], second.actor.id)).toContain("process owner of this program already");
  expect(await name(owner, [0, 5], owner.actor.id)).toContain("somebody else");
  expect((await (await people()).delegations(technician)).choices).toEqual([]);
  await expect((await people()).delegations(guest)).rejects.toEqual(status(403));
});

test(
  "a delegation counts from its first day to its last, and lets release what is not the work of either",
  LONG,
  async () => {
    expect(await name(owner, [3, 5])).toBeNull();
    const revision = await ask(second);
    await expect((await releasing()).releaseRevision(await engineer(), revision, "", ORIGIN)).rejects.toEqual(
      status(403),
    );
    expect(await name(owner, [-1, 2])).toBeNull();
    expect(await name(owner, [1, 2])).toContain("stands in for you");
    await (await releasing()).releaseRevision(await engineer(), revision, "", ORIGIN);
    const [document] = await asOwner<{ by: string }>(
      database,
      "select document->'titleBlock'->>'released' as by from sheet_document where revision_id = ? limit 1",
      [revision],
    );
    expect(document?.by).toBe(`${(await engineer()).actor.name}, for ${owner.actor.name}`);
  },
);

test("what the person stood in for has asked for is as little to be released as one's own work", LONG, async () => {
  const { returnRevision } = await deeds();
  const theirs = await ask(owner);
  expect(await refused((await releasing()).releaseRevision(await engineer(), theirs, "", ORIGIN))).toContain(
    `the work of ${owner.actor.name}`,
  );
  const { todayView } = await import("#app/services/today.server.ts");
  expect((await todayView(await engineer())).sheets.toRelease.total).toBe(0);
  expect((await todayView(second)).sheets.toRelease.total).toBe(1);
  await returnRevision(second, theirs, { reason: "Asked for by another" });
  const own = await ask(await engineer());
  expect(await refused((await releasing()).releaseRevision(await engineer(), own, "", ORIGIN))).toContain(
    "your own work",
  );
  const told = await asOwner<{ name: string }>(
    database,
    "select p.name from mail_outbox m join person p on p.id = m.person_id where m.kind = 'review asked' and m.key = ?",
    [theirs],
  );
  expect(told.map(({ name: who }) => who)).toContain((await engineer()).actor.name);
  await returnRevision(second, own, { reason: "Enough" });
});

test("nothing else of a process owner is handed over", LONG, async () => {
  const { mayInProgram, mayOnSite } = await import("#app/policies/permissions.ts");
  const { actor } = await engineer();
  expect(mayInProgram(actor, "release, return and withdraw sheets", tern)).toBe(true);
  for (const permission of ["see the outbox", "name a delegate"] as const)
    expect(mayInProgram(actor, permission, tern)).toBe(false);
  for (const permission of ["edit carriers, bonds and limits", "load and remove the demo"] as const)
    expect(mayOnSite(actor, permission)).toBe(false);
  const petrel = actor.memberships.find(({ programSlug }) => programSlug === "petrel")?.programId ?? "";
  expect(mayInProgram(actor, "release, return and withdraw sheets", petrel)).toBe(false);
});

test("either of the two ends it at once, nobody else, and it never changes else", LONG, async () => {
  const { delegations, endDelegation } = await people();
  const { rows } = await delegations(owner);
  expect(rows.map(({ state, mayEnd }) => `${state} ${mayEnd}`)).toEqual(["coming true", "running true"]);
  const running = rows.find(({ state }) => state === "running")?.id ?? "";
  await expect(endDelegation(second, running)).rejects.toEqual(status(403));
  await expect(endDelegation(guest, running)).rejects.toEqual(status(403));
  await endDelegation(await engineer(), running);
  await expect(endDelegation(owner, running)).rejects.toEqual(status(409));
  expect((await engineer()).actor.memberships.flatMap(({ standsInFor = [] }) => standsInFor)).toEqual([]);
  const { inScope } = await import("#app/server/scope.server.ts");
  const direct = (scope: ActorScope, sql: string) => inScope(scope, (em) => em.execute(sql));
  await expect(
    direct(owner, "update delegation set ends_at = ends_at + interval '1 year', ended_by_id = app_person()"),
  ).rejects.toThrow(/ended once and else never changes/);
  await expect(
    direct(
      technician,
      `insert into delegation select gen_random_uuid(), program_id, app_person(), delegate_id, begins_at, ends_at, '', now() from delegation limit 1`,
    ),
  ).rejects.toThrow(/row-level security/);
});

test("who is no process owner any more is not stood in for", LONG, async () => {
  expect(await name(owner, [-1, 2])).toBeNull();
  expect((await engineer()).actor.memberships.flatMap(({ standsInFor = [] }) => standsInFor)).toHaveLength(1);
  await asOwner(database, "update membership set role = 'engineer' where person_id = ?", [owner.actor.id]);
  expect((await engineer()).actor.memberships.flatMap(({ standsInFor = [] }) => standsInFor)).toEqual([]);
});
