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
