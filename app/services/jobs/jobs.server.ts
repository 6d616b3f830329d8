import { LockMode } from "@mikro-orm/core";
import { Job } from "#app/db/entities/job.ts";
import type { ListParams } from "#app/lib/list-params.ts";
import { JOB_STATES, type JobRow } from "#app/schemas/job.ts";
import { mayInProgram } from "#app/policies/permissions.ts";
import { notFound, problem } from "#app/server/problem.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { requireInProgram, requireInSomeProgram } from "../permission.server.ts";
import { escapeLike } from "../like.server.ts";
import { programFilter } from "../program-filter.server.ts";
import { idFrom } from "../uuid.server.ts";
import { putIntoQueue } from "./enqueue.server.ts";

/** What the list shows; older ones have been seen. */
const MOST_SHOWN = 50;

export const JOB_SORTS = ["newest"] as const;

/** The newest jobs of the programs that the person works in, searched by file, wafer and person. */
export async function listJobs(
  scope: ActorScope,
  { query, filters }: Pick<ListParams, "query" | "filters">,
): Promise<JobRow[]> {
  requireInSomeProgram(scope, "see the work");
  const pattern = { $ilike: `%${escapeLike(query)}%` };
  const state = JOB_STATES.find((known) => known === filters["state"]);
  return inScope(scope, async (em) => {
    const jobs = await em.find(
      Job,
      {
        program: programFilter(scope.actor, "see the work", filters["program"]),
        ...(state ? { state } : {}),
        ...(query ? { $or: [{ title: pattern }, { createdBy: { name: pattern } }] } : {}),
      },
      { populate: ["program", "createdBy"], orderBy: [{ createdAt: "desc" }, { id: "asc" }], limit: MOST_SHOWN },
    );
    return jobs.map((job) => rowOf(scope, job));
  });
}

/** One job as it stands now. */
export async function getJob(scope: ActorScope, id: string | undefined): Promise<JobRow> {
  return inScope(scope, async (em) => {
    const job = await em.findOne(Job, { id: idFrom(id, "job") }, { populate: ["program", "createdBy"] });
    if (!job) throw notFound("job");
    requireInProgram(scope, "see the work", job.program.id, "job");
    return rowOf(scope, job);
  });
}

function rowOf(
  { actor }: ActorScope,
  job: Job & { program: { id: string; name: string }; createdBy: { name: string } },
): JobRow {
  const { id, kind, title, state, done, total, unit, sentence, stopAsked, outcome } = job;
  return {
    id,
    kind,
    title,
    state,
    done,
    total,
    unit,
    sentence,
    stopAsked,
    outcome: outcome ?? null,
    program: job.program.name,
    createdAt: job.createdAt.toISOString(),
    createdBy: job.createdBy.name,
    startedAt: job.startedAt?.toISOString() ?? null,
    endedAt: job.endedAt?.toISOString() ?? null,
    mayChange: mayInProgram(actor, "upload scans", job.program.id),
  };
}

/**
 * Has a job stopped: at once when nobody works on it yet, else between two pieces of its work. One that has ended stays as it is.
 * @throws 403 for a role that may not, 404 for one of another program
 */
export async function stopJob(scope: ActorScope, id: string | undefined): Promise<void> {
  await changeJob(scope, id, (job) => {
    if (job.state === "waiting")
      Object.assign(job, { state: "stopped", sentence: "It had not begun.", endedAt: new Date() });
    if (job.state === "running") job.stopAsked = true;
    return false;
  });
}

/**
 * Starts a job that has failed or was stopped again, from its beginning; what it had stored is found there.
 * @throws 403 for a role that may not, 404 for one of another program, 409 for one that has not ended or is done
 */
export async function startJobAgain(scope: ActorScope, id: string | undefined): Promise<void> {
  await changeJob(scope, id, (job) => {
    if (job.state !== "failed" && job.state !== "stopped")
      throw problem(
        409,
        "Only what has failed or was stopped is started again. Open the page anew to see how it stands.",
      );
    Object.assign(job, {
      state: "waiting",
      done: 0,
      sentence: "",
      outcome: null,
      stopAsked: false,
      startedAt: null,
      endedAt: null,
    });
    return true;
  });
}

/** @param change says whether the job goes into the queue */
async function changeJob(scope: ActorScope, id: string | undefined, change: (job: Job) => boolean): Promise<void> {
  await inScope(scope, async (em) => {
    const job = await em.findOne(Job, { id: idFrom(id, "job") }, { lockMode: LockMode.PESSIMISTIC_WRITE });
    if (!job) throw notFound("job");
    requireInProgram(scope, "upload scans", job.program.id, "job");
    const queued = change(job);
    await em.flush();
    if (queued) await putIntoQueue(em, job.id);
  });
}
