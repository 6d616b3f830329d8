import { beforeAll, expect, test } from "vitest";
import type { ActorScope } from "#app/server/scope.server.ts";
import { scopeOfPerson } from "#tests/db/people.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";

const database = useDatabase({ demo: true });

const today = () => import("#app/services/today.server.ts");
const assessments = () => import("#app/services/assessments/assessments.server.ts");
const asking = () => import("#app/services/sheets/ask-review.server.ts");
const deeds = () => import("#app/services/sheets/review-deeds.server.ts");
const releasing = () => import("#app/services/sheets/release.server.ts");
const reviews = () => import("#app/services/sheets/review-page.server.ts");
const withdrawing = () => import("#app/services/sheets/withdraw.server.ts");

const LONG = { timeout: 60_000 };

let people: Record<"engineer" | "owner" | "second" | "technician" | "guest", ActorScope>;

// Loading the server's modules takes longer than a test should.
beforeAll(async () => {
  await Promise.all([today(), assessments(), asking(), deeds(), releasing(), reviews(), withdrawing()]);
  people = {
    engineer: await scopeOfPerson(database, "engineer"),
    owner: await scopeOfPerson(database, "process-owner"),
    second: await scopeOfPerson(database, "second-process-owner"),
    technician: await scopeOfPerson(database, "technician"),
    guest: await scopeOfPerson(database, "guest"),
  };
}, 90_000);

/** Assesses the first flow of a program and asks for its review; id of the revision. */
async function ask(by: ActorScope, note: string, program = "tern"): Promise<string> {
  const { runAssessment } = await assessments();
  const { askReview } = await asking();
  const [flow] = await asOwner<{ id: string }>(
    database,
    "select f.id from flow f join program p on p.id = f.program_id where p.slug = ? order by f.name limit 1",
    [program],
  );
  const ran = await runAssessment(people.engineer, flow?.id ?? "");
  if (ran.outcome !== "stored") throw new Error(ran.outcome);
  await askReview(by, ran.id, note);
  const [revision] = await asOwner<{ id: string }>(database, "select id from sheet_revision where assessment_id = ?", [
    ran.id,
  ]);
  return revision?.id ?? "";
}

/** How many sheets of each kind wait or are told to a person. */
async function totals(who: keyof typeof people) {
  const { todayView } = await today();
  const { toRelease, toSign, returned, asked, lapsing, lately, inForce } = (await todayView(people[who])).sheets;
  return {
    toRelease: toRelease.total,
    toSign: toSign.total,
    returned: returned.total,
    asked: asked.total,
    lapsing: lapsing.total,
    lately: lately.total,
    inForce,
  };
}

const NOTHING = { toRelease: 0, toSign: 0, returned: 0, asked: 0, lapsing: 0, lately: 0, inForce: 0 };

test("a review waits for those who may release, not for who asked, and comes back with its reason", LONG, async () => {
  const { todayView } = await today();
  const { returnRevision } = await deeds();
  const revision = await ask(people.engineer, "Lot of next week");
  expect(await totals("engineer")).toEqual({ ...NOTHING, asked: 1 });
  expect(await totals("technician")).toEqual(NOTHING);
  expect(await totals("guest")).toEqual(NOTHING);
  const { toRelease } = (await todayView(people.owner)).sheets;
  expect(toRelease.rows).toMatchObject([{ id: revision, program: "Tern", words: "Lot of next week", released: false }]);
  await returnRevision(people.owner, revision, { reason: "Take the thicker carrier" });
  expect(await totals("owner")).toEqual(NOTHING);
  const { returned } = (await todayView(people.engineer)).sheets;
  expect(returned.rows).toMatchObject([{ id: revision, state: "returned", words: "Take the thicker carrier" }]);
  await ask(people.engineer, "");
  expect(await totals("engineer")).toEqual({ ...NOTHING, asked: 1 });
});

test("who asked as a process owner is not told to release it", LONG, async () => {
  const { returnRevision } = await deeds();
  const [open] = await asOwner<{ id: string }>(database, "select id from sheet_revision where state = 'in review'");
  await returnRevision(people.owner, open?.id ?? "", { reason: "Asked for again" });
  await ask(people.owner, "");
  expect(await totals("owner")).toEqual({ ...NOTHING, asked: 1 });
  expect(await totals("second")).toEqual({ ...NOTHING, toRelease: 1 });
});

test("what comes into force is told to everybody who may see it, and what is withdrawn too", LONG, async () => {
  const { releaseRevision } = await releasing();
  const { withdrawRevision } = await withdrawing();
  const [open] = await asOwner<{ id: string }>(database, "select id from sheet_revision where state = 'in review'");
  await releaseRevision(people.second, open?.id ?? "", "", "https://planeward.site.example");
  for (const who of ["technician", "guest", "engineer"] as const)
    expect(await totals(who)).toEqual({ ...NOTHING, lately: 1, inForce: 1 });
  await withdrawRevision(people.owner, open?.id ?? "", "The tape was recalled");
  expect(await totals("technician")).toEqual({ ...NOTHING, lately: 1 });
  const { todayView } = await today();
  const { lately } = (await todayView(people.technician)).sheets;
  expect(lately.rows).toMatchObject([{ state: "withdrawn", words: "The tape was recalled" }]);
});

test("a deviation waits for somebody else's signature, and is told of before it ends", LONG, async () => {
  const { recordDeviation, signDeviation } = await deeds();
  const { releaseRevision } = await releasing();
  const { reviewPage } = await reviews();
  const { todayView } = await today();
  const revision = await ask(people.engineer, "", "petrel");
  const [asked] = await asOwner<{ id: string }>(
    database,
    "select assessment_id as id from sheet_revision where id = ?",
    [revision],
  );
  const { blocking } = await reviewPage(people.owner, asked?.id ?? "");
  const until = new Date(Date.now() + 24 * 3600e3);
  await recordDeviation(people.owner, revision, {
    findings: blocking.map(({ key }) => key),
    reason: "Qualified by hand on dummies",
    scope: "lot P-7",
    until,
  });
  expect(await totals("owner")).toMatchObject({ toRelease: 1, toSign: 0 });
  const { toSign } = (await todayView(people.second)).sheets;
  expect(toSign.rows).toMatchObject([{ revisionId: revision, words: "lot P-7", at: until.toISOString() }]);
  expect(await totals("engineer")).toMatchObject({ toSign: 0 });
  await signDeviation(people.second, revision, { deviation: toSign.rows[0]?.id ?? "" });
  expect(await totals("second")).toMatchObject({ toSign: 0, lapsing: 0 });
  await releaseRevision(people.owner, revision, "", "https://planeward.site.example");
  expect(await totals("engineer")).toMatchObject({ lapsing: 1, inForce: 1 });
  expect(await totals("technician")).toMatchObject({ lapsing: 0 });
});
