import { randomUUID } from "node:crypto";
import type { EntityManager } from "@mikro-orm/postgresql";
import { Job } from "#app/db/entities/job.ts";
import type { JobKind, JobKinds } from "#app/schemas/job.ts";
import type { ActorScope } from "#app/server/scope.server.ts";

/** The queue's name for every job of ours; the payload is the id. */
export const JOB_TASK = "job";
/** A worker that is killed in the middle of a job costs it one of these; after them it is parked with its reason. */
const MOST_ATTEMPTS = 5;

export interface NewJob<Kind extends JobKind> {
  program: string;
  kind: Kind;
  title: string;
  total: number;
  unit: string;
  input: JobKinds[Kind]["input"];
}

/** Puts a job into the queue within the caller's transaction: what it is about and the job are there together or not at all. */
async function enqueue<Kind extends JobKind>(em: EntityManager, scope: ActorScope, job: NewJob<Kind>): Promise<string> {
  const { id } = em.create(Job, {
    ...job,
    id: randomUUID(),
    state: "waiting",
    done: 0,
    sentence: "",
    outcome: null,
    stopAsked: false,
    createdAt: new Date(),
    createdBy: scope.actor.id,
    startedAt: null,
    endedAt: null,
  });
  await em.flush();
  await putIntoQueue(em, id);
  return id;
}

/** The same, or the job that is at the very same already: two requests for it wait for each other. */
export async function enqueueOnce<Kind extends JobKind>(
  em: EntityManager,
  scope: ActorScope,
  job: NewJob<Kind>,
): Promise<string> {
  const input = JSON.stringify(job.input);
  await em.execute("select pg_advisory_xact_lock(hashtext(?))", [input]);
  const [running] = await em.execute<{ id: string }[]>(
    "select id from job where program_id = ? and kind = ? and state in ('waiting', 'running') and input = ?::jsonb",
    [job.program, job.kind, input],
  );
  return running?.id ?? enqueue(em, scope, job);
}

/** Has a job that is marked as waiting worked off; a worker hears of it when the transaction ends. */
export async function putIntoQueue(em: EntityManager, id: string): Promise<void> {
  await em.execute(
    `select graphile_worker.add_job(?, json_build_object('id', ?::text), max_attempts := ?, job_key := ?)`,
    [JOB_TASK, id, MOST_ATTEMPTS, id],
  );
}
