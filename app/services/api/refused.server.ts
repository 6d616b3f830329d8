import type { EstimateFault } from "#app/schemas/estimate.ts";
import type { ProblemStatus } from "#app/server/problem-json.server.ts";

/** A refusal of the API: its status, what is wrong and, where it is known, at which places of what was sent. */
export class ApiRefused extends Error {
  constructor(
    readonly status: ProblemStatus,
    sentence: string,
    readonly errors?: EstimateFault[],
    readonly headers?: Record<string, string>,
  ) {
    super(sentence);
  }
}

/** The refusal of a service that names one thing as wrong. */
export const refusedAt = (pointer: string, detail: string) =>
  new ApiRefused(422, "One thing in the request is wrong.", [{ pointer, detail }]);
