import type { JobRow } from "#app/schemas/job.ts";

export const JOB_WORDS: Record<JobRow["state"], string> = {
  waiting: "Waiting",
  running: "Running",
  done: "Done",
  failed: "Failed",
  stopped: "Stopped",
};
