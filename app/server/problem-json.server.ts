import type { EstimateFault } from "#app/schemas/estimate.ts";

const TITLES = {
  400: "The request could not be read",
  401: "Please sign in",
  403: "That is not yours to ask",
  405: "That cannot be done here",
  413: "The request is too large",
  415: "The request has the wrong content type",
  422: "The request cannot be estimated",
} as const;

/** Refusals that the API knows. */
export type ProblemStatus = keyof typeof TITLES;

/** A refusal of the API as `application/problem+json` (RFC 9457); `errors` points at each fault. */
export function problemJson(
  status: ProblemStatus,
  detail: string,
  { errors, headers }: { errors?: EstimateFault[]; headers?: Record<string, string> } = {},
): Response {
  const body = { type: "about:blank", title: TITLES[status], status, detail, ...(errors && { errors }) };
  return new Response(JSON.stringify(body), {
    status,
    headers: { "Content-Type": "application/problem+json", ...headers },
  });
}
