import type { FileOutcome, JobOutcome } from "#app/schemas/job.ts";

/** How the files of a job went that reads each by itself. */
export const filesOf = (outcome: JobOutcome | null): FileOutcome[] =>
  outcome && "files" in outcome ? outcome.files : [];

/** The scan that a job has made of a pair; null where it has made none. */
export const scanOf = (outcome: JobOutcome | null): string | null =>
  outcome && "scan" in outcome ? outcome.scan : null;
