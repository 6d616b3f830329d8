import { data } from "react-router";

/** What a refused request is told: what happened and what to do, in one or two sentences. */
export interface ProblemBody {
  sentence: string;
}

/**
 * A refusal to throw from a service or a loader. The status reaches the browser and the error page shows the sentence; what only
 * the log should know is logged where it is known.
 */
export function problem(status: 400 | 401 | 403 | 404 | 409 | 413, sentence: string) {
  return data<ProblemBody>({ sentence }, { status });
}

/** For anything that does not exist, or that this person may not know to exist: both look the same. */
export function notFound(what: string) {
  return problem(404, `There is no such ${what}, or it belongs to a program that is not yours.`);
}

/** The sentence of a refusal that `problem` or `notFound` made; null for anything else that was thrown. */
export function refusedSentence(error: unknown): string | null {
  if (typeof error !== "object" || error === null || !("data" in error)) return null;
  const { data: body } = error;
  if (typeof body !== "object" || body === null || !("sentence" in body)) return null;
  return typeof body.sentence === "string" ? body.sentence : null;
}

/** The status of such a refusal; null for anything else. */
export function refusedStatus(error: unknown): number | null {
  if (refusedSentence(error) === null || typeof error !== "object" || error === null || !("init" in error)) return null;
  const { init } = error;
  if (typeof init !== "object" || init === null || !("status" in init)) return null;
  return typeof init.status === "number" ? init.status : null;
}
