const TITLES = {
  400: "The request could not be read",
  401: "Please sign in",
  403: "That is not yours to ask",
  404: "There is nothing here",
  405: "That cannot be done here",
  406: "It cannot be given in that form",
  409: "It cannot be done as things stand",
  412: "It has changed since you read it",
  413: "The request is too large",
  415: "The request has the wrong content type",
  422: "What was sent cannot be used",
  428: "Say which version you mean",
  429: "Too many requests",
  500: "That did not work",
} as const;

/** Refusals that the API knows. */
export type ProblemStatus = keyof typeof TITLES;

/** A refusal of the API as `application/problem+json` (RFC 9457); `errors` points at each fault. */
export function problemJson(
  status: ProblemStatus,
  detail: string,
  { errors, headers }: { errors?: object[]; headers?: Record<string, string> } = {},
): Response {
  const body = { type: "about:blank", title: TITLES[status], status, detail, ...(errors && { errors }) };
  return new Response(JSON.stringify(body), {
    status,
    headers: { "Content-Type": "application/problem+json", ...headers },
  });
}
