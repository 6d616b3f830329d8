import type { JobRow } from "#app/schemas/job.ts";
import { filesOf, pageOf } from "./job-files.ts";

/** A job as the API gives it. Each file that was read names the address of what it says. */
export function jobJson({ id, state, done, total, unit, sentence, outcome, createdAt, startedAt, endedAt }: JobRow) {
  const page = pageOf(outcome);
  return {
    id,
    state,
    done,
    total,
    unit,
    sentence,
    created_at: createdAt,
    started_at: startedAt,
    ended_at: endedAt,
    ...(page === null ? {} : { page }),
    files: filesOf(outcome).map((each) => ({
      name: each.name,
      outcome: each.outcome,
      ...(each.outcome === "refused" ? { reason: each.reason } : { scan: `/api/v1/scans/${each.reading}` }),
    })),
  };
}
