import type { FileOutcome, JobOutcome } from "#app/schemas/job.ts";
import type { KeptFile } from "#app/schemas/scan-import.ts";
import { keptFilePath } from "./kept-file.ts";

/** How the files of a job went that reads each by itself. */
export const filesOf = (outcome: JobOutcome | null): FileOutcome[] =>
  outcome && "files" in outcome ? outcome.files : [];

/** What came of the file of an import that a job has read; null for other jobs. */
export const keptOf = (outcome: JobOutcome | null): KeptFile | null =>
  outcome && "kept" in outcome ? outcome.kept : null;

/** The page of what a job has made; null where it has made none. */
export function pageOf(outcome: JobOutcome | null): string | null {
  if (outcome && "scan" in outcome) return `/scans/${outcome.scan}`;
  const kept = keptOf(outcome);
  return kept && keptFilePath(kept);
}
