import { randomUUID } from "node:crypto";
import { z } from "zod";
import { Job } from "#app/db/entities/job.ts";
import type { JobInput, JobKind, JobKinds, JobOutcome, JobState } from "#app/schemas/job.ts";
import { log } from "#app/server/log.server.ts";
import { refusedSentence } from "#app/server/problem.server.ts";
import { inScope, type ActorScope, type Scope } from "#app/server/scope.server.ts";
import { actorById } from "../actor.server.ts";
import { readStoredPair } from "../scan-pair-job.server.ts";
import { readStoredFiles } from "../scan-readings/read-stored-files.server.ts";
import { importStoredFile } from "../wafers/import-by-job.server.ts";
import { JobInterrupted, JobRefused, JobStopped, progressOf, type Tell } from "./progress.server.ts";

const payloadSchema = z.object({ id: z.uuid() });

/** What a job has done, with the sentence that says so. */
export interface Worked {
  outcome: JobOutcome;
  sentence: string;
}

type Work<Kind extends JobKind> = (
  scope: ActorScope,
  input: JobKinds[Kind]["input"],
  tell: Tell,
  job: string,
) => Promise<Worked>;

const WORK: { [Kind in JobKind]: Work<Kind> } = {
  "scan files": readStoredFiles,
  "scan pair": readStoredPair,
  "file import": importStoredFile,
};

/** The input of a job is that of its kind: both were put into the queue together. */
const workOf = (kind: JobKind) => WORK[kind] as Work<JobKind>;

interface Attempt {
  isLastAttempt: boolean;
  signal?: AbortSignal | undefined;
}

/**
 * Works one job off as the person who asked for it and notes how it ended. Twice the same is harmless: one that has ended is left
 * alone. A refusal fails it at once, with its sentence; a fault of ours is tried again by the queue, and fails it at the last attempt.
 * @throws what the queue is to try again
 */
export async function runJob(payload: unknown, { isLastAttempt, signal }: Attempt): Promise<void> {
  const { id } = payloadSchema.parse(payload);
  const work: Scope = { personId: null, atWork: true, requestId: randomUUID() };
  const job = await takeUp(work, id);
  if (!job) return;
  const end = (state: JobState, sentence: string, outcome: JobOutcome | null = null) =>
    note(work, id, { state, sentence, outcome, endedAt: state === "waiting" ? null : new Date() });
  try {
    const actor = await actorById(job.personId, work.requestId);
    if (!actor) throw new JobRefused("Whoever asked for this no longer has an account in use.");
    const scope = { actor, requestId: work.requestId };
    const { outcome, sentence } = await workOf(job.kind)(scope, job.input, progressOf(work, id, signal), id);
    await note(work, id, { state: "done", sentence, outcome, done: job.total, endedAt: new Date() });
  } catch (error) {
    if (error instanceof JobStopped) return end("stopped", "What had been read by then stays.");
    const refusal = error instanceof JobRefused ? error.message : refusedSentence(error);
    if (refusal !== null) return end("failed", refusal);
    if (!(error instanceof JobInterrupted))
      log.error(
        { job: id, error: error instanceof Error ? (error.stack ?? error.message) : String(error) },
        "a job failed",
      );
    if (isLastAttempt) return end("failed", "Something went wrong in Planeward itself; its log says what.");
    await end("waiting", "It was interrupted and is tried again.");
    throw error;
  }
}

interface TakenUp {
  kind: JobKind;
  input: JobInput;
  total: number;
  personId: string;
}

/** Marks a job as running, or as stopped when it is to be. Null when there is nothing to do any more. */
function takeUp(work: Scope, id: string): Promise<TakenUp | null> {
  return inScope(work, async (em) => {
    const job = await em.findOne(Job, { id, state: { $in: ["waiting", "running"] } });
    if (!job) return null;
    if (job.stopAsked) {
      Object.assign(job, { state: "stopped", sentence: "It had not begun.", endedAt: new Date() });
      await em.flush();
      return null;
    }
    Object.assign(job, { state: "running", done: 0, sentence: "", startedAt: new Date() });
    await em.flush();
    return { kind: job.kind, input: job.input, total: job.total, personId: job.createdBy.id };
  });
}

function note(
  work: Scope,
  id: string,
  changes: Partial<Pick<Job, "state" | "sentence" | "outcome" | "done" | "endedAt">>,
) {
  return inScope(work, async (em) => {
    const job = await em.findOneOrFail(Job, { id });
    Object.assign(job, changes);
    await em.flush();
  });
}
