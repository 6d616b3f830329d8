import type { FileUnderWay, KeptFile } from "#app/schemas/scan-import.ts";

/** Between two looks at a job, ms. */
const PAUSE = 500;
/** A server that does not answer is asked so often before the screen gives up on it. */
const TRIES = 20;

/**
 * What comes of a large file that a job reads. A server that does not answer any more leaves the job at its work.
 * @param tell is told how many bytes are read, of how many
 */
export async function waitForJob(
  job: string,
  tell: (done: number, of: number) => void,
): Promise<KeptFile | { outcome: "refused"; reason: string }> {
  for (let failed = 0; failed < TRIES;) {
    const under = await look(job);
    failed = under === null ? failed + 1 : 0;
    if (under?.kept) return under.kept;
    if (under?.state === "failed" || under?.state === "stopped")
      return {
        outcome: "refused",
        reason: under.state === "stopped" ? "Its reading was stopped by somebody." : under.sentence,
      };
    if (under) tell(under.done, under.total);
    await new Promise((resolve) => setTimeout(resolve, PAUSE));
  }
  return {
    outcome: "refused",
    reason: "The server does not answer. The file is kept and is read all the same: see the work under way.",
  };
}

async function look(job: string): Promise<FileUnderWay | null> {
  try {
    const response = await fetch(`/scans/import/file?${new URLSearchParams({ job }).toString()}`);
    return response.ok && !response.redirected ? ((await response.json()) as FileUnderWay) : null;
  } catch {
    return null;
  }
}
