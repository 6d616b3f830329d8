import type { JobRow } from "#app/schemas/job.ts";
import { filesOf, scanOf } from "./job-files.ts";

/** A job as the API gives it. Each file that was read names the address of what it says. */
export function jobJson({ id, state, done, total, unit, sentence, outcome, createdAt, startedAt, endedAt }: JobRow) {
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
    ...(scanOf(outcome) === null ? {} : { page: `/scans/${scanOf(outcome)}` }),
    files: filesOf(outcome).map((each) => ({
      name: each.name,
      outcome: each.outcome,
      ...(each.outcome === "refused" ? { reason: each.reason } : { scan: `/api/v1/scans/${each.reading}` }),
    })),
  };
}
