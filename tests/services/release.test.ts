import { beforeAll, expect, test } from "vitest";
import { refusedSentence } from "#app/server/problem.server.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { scopeOfPerson } from "#tests/db/people.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";
import { heardOf, listen } from "./listening.ts";
import { assessFirstFlow } from "./lot-on-sheet.ts";

const database = useDatabase({ demo: true });

const assessments = () => import("#app/services/assessments/assessments.server.ts");
const asking = () => import("#app/services/sheets/ask-review.server.ts");
const deeds = () => import("#app/services/sheets/review-deeds.server.ts");
const releasing = () => import("#app/services/sheets/release.server.ts");
const withdrawing = () => import("#app/services/sheets/withdraw.server.ts");
const pages = () => import("#app/services/sheets/review-page.server.ts");
const revisions = () => import("#app/services/sheets/revision-page.server.ts");
const files = () => import("#app/services/sheets/sheet-file.server.ts");
const lists = () => import("#app/services/sheets/sheet-list.server.ts");
const statuses = () => import("#app/services/sheets/sheet-status.server.ts");

const ORIGIN = "https://planeward.site.example";
const LIST = { query: "", sort: "", descending: false, page: 1, filters: {} };
const PAPER = { format: "pdf", paper: "a4", pages: "all", leg: 0 } as const;
const LONG = { timeout: 60_000 };

const status = (code: number) => expect.objectContaining({ init: { status: code } }) as unknown;
const refused = async (work: Promise<unknown>) =>
  refusedSentence(
    await work.then(
      () => null,
      (error: unknown) => error,
    ),
  );

let engineer: ActorScope;
let owner: ActorScope;
let technician: ActorScope;
let guest: ActorScope;

// Loading the server's modules takes longer than a test should.
beforeAll(async () => {
  await Promise.all([
    assessments(),
    asking(),
    deeds(),
    releasing(),
    withdrawing(),
    pages(),
    revisions(),
    files(),
    lists(),
    statuses(),
  ]);
  engineer = await scopeOfPerson(database, "engineer");
  owner = await scopeOfPerson(database, "process-owner");
  technician = await scopeOfPerson(database, "technician");
  guest = await scopeOfPerson(database, "guest");
}, 90_000);

async function inReview(slug: string): Promise<{ assessment: string; revision: string }> {
  const { askReview } = await asking();
  const { reviewPage } = await pages();
  const assessment = await assessFirstFlow(database, slug);
  await askReview(engineer, assessment, "Lot of next week");
  const { revision } = await reviewPage(engineer, assessment);
  return { assessment, revision: revision?.id ?? "" };
}

const stateOf = async (id: string) => {
  const [row] = await asOwner<{
    state: string;
    number: number | null;
    token: string | null;
    superseded_by: number | null;
  }>(database, "select state, number, token, superseded_by from sheet_revision where id = ?", [id]);
  return row;
};
const mails = (kind: string, key: string) =>
  asOwner<{ name: string }>(
    database,
    "select p.name from mail_outbox m join person p on p.id = m.person_id where m.kind = ? and m.key = ?",
    [kind, key],
  );

let first = { assessment: "", revision: "" };
let second = { assessment: "", revision: "" };

test("a review is asked for once, and told to the process owners", LONG, async () => {
  const { askReview } = await asking();
  first = await inReview("tern");
  expect(await stateOf(first.revision)).toMatchObject({ state: "in review", number: null, token: null });
  expect((await mails("review asked", first.revision)).map(({ name }) => name)).toContain(owner.actor.name);
  expect(await refused(askReview(engineer, first.assessment, ""))).toContain("in review already");
  await expect(askReview(technician, first.assessment, "")).rejects.toEqual(status(403));
  await expect(askReview(guest, first.assessment, "")).rejects.toEqual(status(404));
});

test("nobody releases their own work, nor without being a process owner", LONG, async () => {
  const { releaseRevision } = await releasing();
  await expect(releaseRevision(engineer, first.revision, "", ORIGIN)).rejects.toEqual(status(403));
  await expect(releaseRevision(guest, first.revision, "", ORIGIN)).rejects.toEqual(status(404));
  const { runAssessment } = await assessments();
  const { askReview } = await asking();
  const { returnRevision } = await deeds();
  const [flow] = await asOwner<{ id: string }>(database, "select flow_id as id from assessment where id = ?", [
    first.assessment,
  ]);
  await returnRevision(owner, first.revision, { reason: "Another look" });
  expect(await stateOf(first.revision)).toMatchObject({ state: "returned", number: null });
  expect((await mails("review returned", first.revision)).map(({ name }) => name)).toEqual([engineer.actor.name]);
  const own = await runAssessment(owner, flow?.id ?? "");
  if (own.outcome !== "stored") throw new Error(own.outcome);
  await askReview(engineer, own.id, "");
  const { reviewPage } = await pages();
  const { revision } = await reviewPage(owner, own.id);
  expect(await refused(releaseRevision(owner, revision?.id, "", ORIGIN))).toContain("It is your own work");
  await returnRevision(engineer, revision?.id ?? "", { reason: "Taken back" });
});

test("a release gives letter and code, freezes the papers and tells everybody", LONG, async () => {
  const { releaseRevision } = await releasing();
  const { storedSheet } = await files();
  first = await inReview("tern");
  await releaseRevision(owner, first.revision, "For lot T-0412 first", ORIGIN);
  const row = await stateOf(first.revision);
  expect(row).toMatchObject({ state: "released", number: 1 });
  expect(row?.token).toMatch(/^[\w-]{22}$/);
  const paper = await storedSheet(technician, first.revision, PAPER);
  expect(new TextDecoder().decode(paper.bytes.slice(0, 5))).toBe("%PDF-");
  expect(paper.name).toMatch(/^Handling-risk sheet TERN-H\d{3} A$/);
  expect((await storedSheet(technician, first.revision, PAPER)).bytes).toEqual(paper.bytes);
  const html = new TextDecoder().decode(
    (await storedSheet(technician, first.revision, { ...PAPER, format: "html" })).bytes,
  );
  expect(html).toContain("Effective from");
  expect(html).not.toContain("Draft");
  expect((await mails("sheet released", first.revision)).map(({ name }) => name)).toContain(guest.actor.name);
  await expect(releaseRevision(owner, first.revision, "", ORIGIN)).rejects.toEqual(status(409));
});

test("a guest gets the page for hands alone, and prints it with an entry", LONG, async () => {
  const { printSheet, storedSheet } = await files();
  const { revisionPage } = await revisions();
  const { listSheets } = await lists();
  const { reviewPage } = await pages();
  const read = async (who: ActorScope) =>
    new TextDecoder().decode((await storedSheet(who, first.revision, { ...PAPER, format: "html" })).bytes);
  expect(await read(guest)).not.toContain("for engineers");
  expect(await read(technician)).toContain("for engineers");
  await printSheet(guest, first.revision, { paper: "letter", pages: "all", leg: 0, place: "Goods in" });
  const view = await revisionPage(guest, first.revision);
  expect(view).toMatchObject({ staff: null, changes: [], remark: "", deviations: [] });
  expect((await revisionPage(owner, first.revision)).staff?.prints).toMatchObject([
    { by: guest.actor.name, place: "Goods in", paper: "letter", pages: "hands" },
  ]);
  expect((await listSheets(guest, LIST)).rows.map(({ id }) => id)).toEqual([first.revision]);
  await expect(reviewPage(guest, first.assessment)).rejects.toEqual(status(404));
});

test(
  "the next release supersedes it in the same transaction, and its papers carry the mark from then on",
  LONG,
  async () => {
    const { releaseRevision } = await releasing();
    const { storedSheet } = await files();
    const { sheetStatus } = await statuses();
    const released = await storedSheet(owner, first.revision, PAPER);
    await listen(database, "guest", "tern");
    second = await inReview("tern");
    await releaseRevision(owner, second.revision, "", ORIGIN);
    expect(await stateOf(first.revision)).toMatchObject({ state: "superseded", superseded_by: 2 });
    expect(await stateOf(second.revision)).toMatchObject({ state: "released", number: 2 });
    const sheet = { sheet: "TERN-H001", flow: expect.any(String) as string };
    expect(await heardOf(database, second.revision)).toMatchObject([
      {
        event: "sheet.released",
        program: { slug: "tern" },
        data: { ...sheet, revision_id: second.revision, revision: "B" },
      },
    ]);
    expect(await heardOf(database, first.revision)).toMatchObject([
      { event: "sheet.superseded", data: { ...sheet, revision_id: first.revision, revision: "A", superseded_by: "B" } },
    ]);
    const marked = await storedSheet(owner, first.revision, PAPER);
    expect(marked.bytes).not.toEqual(released.bytes);
    expect((await storedSheet(owner, first.revision, PAPER)).bytes).toEqual(marked.bytes);
    const html = await storedSheet(owner, first.revision, { ...PAPER, format: "html" });
    expect(new TextDecoder().decode(html.bytes)).toContain("Superseded by B: do not work from this paper");
    await expect(storedSheet(guest, first.revision, PAPER)).rejects.toEqual(status(404));
    const [old, now] = [await stateOf(first.revision), await stateOf(second.revision)];
    const said = await sheetStatus(old?.token ?? "", "test");
    expect(said).toMatchObject({ letter: "A", state: "superseded", supersededBy: "B", current: now?.token });
    expect(await sheetStatus(now?.token ?? "", "test")).toMatchObject({
      letter: "B",
      state: "released",
      current: null,
    });
    expect(await sheetStatus("A".repeat(22), "test")).toBeNull();
  },
);

test("a withdrawn sheet says so to whoever holds its paper", LONG, async () => {
  const { withdrawRevision } = await withdrawing();
  const { sheetStatus } = await statuses();
  await expect(withdrawRevision(engineer, second.revision, "no")).rejects.toEqual(status(403));
  await withdrawRevision(owner, second.revision, "The chuck of the trimmer was changed");
  const row = await stateOf(second.revision);
  expect(await sheetStatus(row?.token ?? "", "test")).toMatchObject({ state: "withdrawn", current: null });
  expect((await mails("sheet withdrawn", second.revision)).map(({ name }) => name)).toContain(technician.actor.name);
  await expect(withdrawRevision(owner, second.revision, "again")).rejects.toEqual(status(409));
});

test("what blocks is released over by a deviation with two signatures alone", LONG, async () => {
  const { releaseRevision } = await releasing();
  const { recordDeviation, signDeviation } = await deeds();
  const { reviewPage } = await pages();
  const { sheetStatus } = await statuses();
  const { assessment, revision } = await inReview("petrel");
  const { blocking } = await reviewPage(owner, assessment);
  expect(blocking.length).toBeGreaterThan(0);
  expect(await refused(releaseRevision(owner, revision, "", ORIGIN))).toMatch(
    /blocks? the release and no deviation covers/,
  );
  const until = new Date(Date.now() + 24 * 3600 * 1000);
  const values = { reason: "Qualified by hand on dummies", scope: "lot P-7", until };
  await expect(recordDeviation(engineer, revision, { ...values, findings: ["1:99"] })).rejects.toEqual(status(409));
  await recordDeviation(engineer, revision, { ...values, findings: blocking.map(({ key }) => key) });
  const deviation = (await reviewPage(owner, assessment)).revision?.deviations[0];
  expect(deviation).toMatchObject({ inForce: false, maySign: true });
  expect(await refused(releaseRevision(owner, revision, "", ORIGIN))).toContain("no deviation covers");
  await expect(signDeviation(engineer, revision, { deviation: deviation?.id ?? "" })).rejects.toEqual(status(403));
  await signDeviation(owner, revision, { deviation: deviation?.id ?? "" });
  await releaseRevision(owner, revision, "", ORIGIN);
  const row = await stateOf(revision);
  expect((await sheetStatus(row?.token ?? "", "test"))?.deviationUntil).toBe(until.toISOString());
});

test("one that is not the newest assessment of its flow is not released", LONG, async () => {
  const { releaseRevision } = await releasing();
  const { returnRevision } = await deeds();
  const { revision } = await inReview("tern");
  await assessFirstFlow(database, "tern");
  expect(await refused(releaseRevision(owner, revision, "", ORIGIN))).toContain("has been assessed again since");
  await returnRevision(owner, revision, { reason: "A newer one is there" });
});

test("the list has what waits first, and is sorted and searched by what stands on paper", LONG, async () => {
  const { listSheets, SHEET_SORTS } = await lists();
  const waiting = await inReview("tern");
  const { rows, total } = await listSheets(owner, { ...LIST, sort: "state" });
  expect(rows[0]?.id).toBe(waiting.revision);
  for (const sort of SHEET_SORTS)
    for (const descending of [false, true])
      expect((await listSheets(owner, { ...LIST, sort, descending })).rows).toHaveLength(rows.length);
  const dates = (await listSheets(owner, { ...LIST, sort: "date" })).rows.map(({ at }) => at);
  expect(dates).toEqual(dates.toSorted());
  const number = rows[0]?.sheet ?? "";
  const found = await listSheets(owner, { ...LIST, query: `${number} A` });
  expect(found.total).toBeLessThan(total);
  expect(new Set(found.rows.map(({ sheet }) => sheet))).toEqual(new Set([number]));
});
