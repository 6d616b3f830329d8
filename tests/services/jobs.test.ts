import { readFileSync } from "node:fs";
import { beforeAll, describe, expect, test, vi } from "vitest";
import { filesOf } from "#app/lib/job-files.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { leave, scopeOfPerson } from "#tests/db/people.ts";
import { asOwner, useDatabase } from "#tests/db/test-database.ts";

const database = useDatabase({ demo: true });

const imports = () => import("#app/services/scan-readings/import-files.server.ts");
const jobs = () => import("#app/services/jobs/jobs.server.ts");
const running = () => import("#app/services/jobs/run-job.server.ts");

let technician: ActorScope;
let guest: ActorScope;
let program = "";

beforeAll(async () => {
  await Promise.all([imports(), jobs(), running()]);
  technician = await scopeOfPerson(database, "technician");
  guest = await scopeOfPerson(database, "guest");
  program = technician.actor.memberships.find(({ programSlug }) => programSlug === "tern")?.programId ?? "";
}, 60_000);

const ALL = { query: "", filters: {} };
const SETTINGS = { profile: {}, edgeExclusion: 0.005 };
const monitor = readFileSync(
  new URL("../../fixtures/scans/monitor-200mm-725um-before-film-seed-7.csv", import.meta.url),
  "utf8",
);
let made = 0;
/** A file of its own each time: a comment sets its bytes apart. */
const good = () => file(`good-${(made += 1)}.csv`, `${monitor}\n# copy ${made}\n`);
const file = (name: string, text: string) => ({ name, bytes: new TextEncoder().encode(text) });

async function started(files = [good(), good()], scope = technician): Promise<string> {
  const { importScanFiles } = await imports();
  const imported = await importScanFiles(scope, { program, files, settings: SETTINGS });
  if (imported.outcome !== "job") throw new Error(`not a job: ${JSON.stringify(imported)}`);
  return imported.job;
}

const run = async (id: string, isLastAttempt = true, signal?: AbortSignal) =>
  (await running()).runJob({ id }, { isLastAttempt, signal });
const seen = async (id: string, scope = technician) => (await jobs()).getJob(scope, id);
const queued = (id: string) =>
  asOwner<{ attempts: number }>(database, "select attempts from graphile_worker.jobs where key = ?", [id]);

describe("a job", () => {
  test("is put into the queue with its files, reads them, and says how each went", async () => {
    const bad = file("bad.csv", "not\na\nscan\n");
    const id = await started([good(), bad, good()]);
    expect(await seen(id)).toMatchObject({ state: "waiting", done: 0, unit: "bytes", mayChange: true });
    expect(await queued(id)).toHaveLength(1);
    await run(id);
    const job = await seen(id);
    expect(job).toMatchObject({ state: "done", done: job.total, sentence: "Two read, one refused." });
    expect(filesOf(job.outcome).map(({ outcome }) => outcome)).toEqual(["read", "refused", "read"]);
    const [stored] = await asOwner<{ files: number }>(
      database,
      "select count(*)::int as files from scan_file where name = 'bad.csv'",
    );
    expect(stored).toEqual({ files: 1 });
  });

  test("that is done again finds what it has read, and one that has ended is left alone", async () => {
    const files = [good(), good()];
    const [one, two] = [await started(files), await started(files)];
    expect(two).toBe(one);
    await run(one);
    await run(one);
    const again = await started(files);
    expect(again).not.toBe(one);
    await run(again);
    expect((await seen(again)).sentence).toBe("Two had been read before.");
  });

  test("of which nothing can be read keeps its reason and is started again by hand", async () => {
    const id = await started([file("one.csv", "x,y\nno,numbers\n"), file("two.csv", "only words\nhere\n")]);
    await run(id);
    const failed = await seen(id);
    expect(failed).toMatchObject({ state: "failed", sentence: expect.stringContaining("one.csv") as string });
    const { startJobAgain } = await jobs();
    await startJobAgain(technician, id);
    expect(await seen(id)).toMatchObject({ state: "waiting", sentence: "", endedAt: null });
    expect(await queued(id)).toHaveLength(1);
    await run(id);
    expect(await seen(id)).toMatchObject({ state: "failed", sentence: failed.sentence });
  });

  test("that waits is stopped at once, and only what has ended otherwise is started again", async () => {
    const { startJobAgain, stopJob } = await jobs();
    const id = await started();
    await expect(startJobAgain(technician, id)).rejects.toMatchObject({ init: { status: 409 } });
    await stopJob(technician, id);
    expect(await seen(id)).toMatchObject({ state: "stopped", sentence: "It had not begun." });
    await run(id);
    expect((await seen(id)).state).toBe("stopped");
    await startJobAgain(technician, id);
    await run(id);
    expect((await seen(id)).state).toBe("done");
    await expect(startJobAgain(technician, id)).rejects.toMatchObject({ init: { status: 409 } });
  });

  test("that runs looks between two pieces whether it is to stop, and whether its worker is ending", async () => {
    const { progressOf, JobInterrupted, JobStopped } = await import("#app/services/jobs/progress.server.ts");
    const id = await started();
    await asOwner(database, "update job set state = 'running' where id = ?", [id]);
    const work = { personId: null, atWork: true, requestId: "test" };
    await progressOf(work, id, undefined)(77);
    expect((await seen(id)).done).toBe(77);
    await (await jobs()).stopJob(technician, id);
    expect(await seen(id)).toMatchObject({ state: "running", stopAsked: true });
    await expect(progressOf(work, id, undefined)(78)).rejects.toThrow(JobStopped);
    await expect(progressOf(work, id, AbortSignal.abort())(79)).rejects.toThrow(JobInterrupted);
    await run(id);
    expect(await seen(id)).toMatchObject({ state: "stopped" });
  });

  test("that is interrupted waits for the queue to try it again, and is parked after the last attempt", async () => {
    const id = await started();
    await expect(run(id, false, AbortSignal.abort())).rejects.toThrow("stopping");
    expect(await seen(id)).toMatchObject({ state: "waiting", sentence: "It was interrupted and is tried again." });
    await run(id, true, AbortSignal.abort());
    expect(await seen(id)).toMatchObject({ state: "failed", sentence: expect.stringContaining("its log") as string });
  });
});

describe("what a killed worker held", () => {
  test("goes back into the queue, or is parked when it has used up its attempts", async () => {
    const { freeLostJobs } = await import("#app/services/jobs/lost-jobs.server.ts");
    const [once, often] = [await started(), await started()];
    await asOwner(
      database,
      `update graphile_worker._private_jobs set locked_by = 'pool-gone', locked_at = now() - interval '1 minute',
         attempts = case key when ? then max_attempts else 1 end where key in (?, ?)`,
      [often, once, often],
    );
    await asOwner(database, "update job set state = 'running' where id in (?, ?)", [once, often]);
    await freeLostJobs();
    const locked = await asOwner(database, "select 1 from graphile_worker.jobs where locked_by = 'pool-gone'");
    expect(locked).toEqual([]);
    expect((await seen(once)).state).toBe("running");
    expect(await seen(often)).toMatchObject({
      state: "failed",
      sentence: expect.stringContaining("several times") as string,
    });
  });
});

describe("who may", () => {
  test("a guest sees no job and starts none", async () => {
    const { listJobs, stopJob } = await jobs();
    const { importScanFiles } = await imports();
    const id = await started();
    await expect(listJobs(guest, ALL)).rejects.toMatchObject({ init: { status: 403 } });
    await expect(seen(id, guest)).rejects.toMatchObject({ init: { status: 404 } });
    await expect(stopJob(guest, id)).rejects.toMatchObject({ init: { status: 404 } });
    await expect(importScanFiles(guest, { program, files: [good()], settings: SETTINGS })).rejects.toMatchObject({
      init: { status: 404 },
    });
    expect((await listJobs(technician, ALL)).some((job) => job.id === id)).toBe(true);
    const found = async (query: string, filters: Record<string, string> = {}) =>
      (await listJobs(technician, { query, filters })).map((job) => job.id);
    const { title } = await seen(id);
    expect(await found(title.slice(0, 9), { state: "waiting", program: "tern" })).toContain(id);
    expect(await found(title, { state: "done" })).not.toContain(id);
    expect(await found("no such file")).toEqual([]);
    expect(await found("", { program: "somebody-elses" })).toEqual([]);
  });

  test("a job of somebody who has left the program fails with the reason and reads nothing", async () => {
    const owner = await scopeOfPerson(database, "shift-lead");
    const id = await started([good(), good()], owner);
    await leave(database, "shift-lead", "tern");
    await run(id);
    expect(await seen(id)).toMatchObject({ state: "failed", sentence: expect.stringContaining("no such") as string });
  });

  test("a fault of our own is not shown, but logged and tried again", async () => {
    const { log } = await import("#app/server/log.server.ts");
    const logged = vi.spyOn(log, "error");
    const id = await started();
    await asOwner(database, "update job set input = '{}' where id = ?", [id]);
    await expect(run(id, false)).rejects.toThrow();
    expect(logged).toHaveBeenCalledOnce();
    await run(id, true);
    expect((await seen(id)).sentence).toBe("Something went wrong in Planeward itself; its log says what.");
  });
});

test("one small file is read at once, and the same bytes again are found", async () => {
  const { importScanFiles } = await imports();
  const files = [good()];
  const first = await importScanFiles(technician, { program, files, settings: SETTINGS });
  expect(first.outcome).toBe("read");
  const second = await importScanFiles(technician, { program, files, settings: SETTINGS });
  expect(second).toEqual({ ...first, outcome: "already read" });
  const other = await importScanFiles(technician, { program, files, settings: { ...SETTINGS, edgeExclusion: 0.01 } });
  expect(other.outcome).toBe("read");
  const before = await asOwner(database, "select 1 from scan_file");
  const refused = await importScanFiles(technician, { program, files: [file("z.csv", "a\nb\n")], settings: SETTINGS });
  expect(refused.outcome).toBe("refused");
  expect(await asOwner(database, "select 1 from scan_file")).toHaveLength(before.length);
});
