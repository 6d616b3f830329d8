import { setImmediate as nextTurn } from "node:timers/promises";
import { Job } from "#app/db/entities/job.ts";
import { inScope, type Scope } from "#app/server/scope.server.ts";

/** Somebody asked for the job to be stopped. */
export class JobStopped extends Error {}
/** The process is ending; the job goes back into the queue. */
export class JobInterrupted extends Error {}
/** A job that cannot be done, with the sentence for the person who asked for it. */
export class JobRefused extends Error {}

/** What a job calls between two pieces of its work. */
export type Tell = (done: number) => Promise<void>;

/** A person does not see more often than this, milliseconds. */
const NOTE_AFTER = 250;

/**
 * Notes how far a job is, not more often than a person sees, and looks whether it is to go on.
 * @returns a function that throws JobStopped and JobInterrupted
 */
export function progressOf(scope: Scope, id: string, signal: AbortSignal | undefined): Tell {
  let noted = 0;
  return async (done) => {
    if (signal?.aborted) throw new JobInterrupted("The worker is stopping.");
    if (Date.now() - noted < NOTE_AFTER) return nextTurn();
    noted = Date.now();
    await inScope(scope, async (em) => {
      await em.nativeUpdate(Job, { id }, { done });
      const job = await em.findOneOrFail(Job, { id }, { fields: ["stopAsked"] });
      if (job.stopAsked) throw new JobStopped("It was stopped.");
    });
  };
}
