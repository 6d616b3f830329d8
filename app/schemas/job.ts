import type { FileValues, KeptFile } from "./scan-import.ts";
import type { ReadingSettings } from "./scan-reading.ts";
import type { ScanValues } from "./scan.ts";

export const JOB_STATES = ["waiting", "running", "done", "failed", "stopped"] as const;
export type JobState = (typeof JOB_STATES)[number];

/** A file of an instrument that is in the database. */
export interface StoredFile {
  id: string;
  name: string;
  size: number;
}

/** What each kind of job is given and what it leaves behind. */
export interface JobKinds {
  "scan files": {
    input: { files: StoredFile[]; settings: ReadingSettings };
    outcome: { files: FileOutcome[] };
  };
  "scan pair": {
    input: { values: ScanValues; files: { before: StoredFile; after: StoredFile } };
    outcome: { scan: string };
  };
  "file import": {
    input: { values: FileValues; file: StoredFile };
    outcome: { kept: KeptFile };
  };
}
export type JobKind = keyof JobKinds;
export type JobInput = JobKinds[JobKind]["input"];
export type JobOutcome = JobKinds[JobKind]["outcome"];

/** How a file of a batch went. */
export type FileOutcome = { file: string; name: string } & (
  | { outcome: "read"; reading: string }
  | { outcome: "already read"; reading: string }
  | { outcome: "refused"; reason: string }
);

/** A job as a page shows it. */
export interface JobRow {
  id: string;
  kind: JobKind;
  title: string;
  program: string;
  state: JobState;
  done: number;
  total: number;
  unit: string;
  sentence: string;
  stopAsked: boolean;
  outcome: JobOutcome | null;
  createdAt: string;
  createdBy: string;
  startedAt: string | null;
  endedAt: string | null;
  /** whether the person who looks may stop it or start it again */
  mayChange: boolean;
}
