import { randomUUID } from "node:crypto";
import type { MiddlewareFunction } from "react-router";
import { requestIdContext } from "#app/server/contexts.server.ts";
import { log } from "#app/server/log.server.ts";
import { loggedPath } from "#app/server/logged-path.server.ts";

/** Gives every request an id and writes one line for it. The query is left out: it may hold what people typed. */
export const requestLog: MiddlewareFunction<Response> = async ({ request, context }, next) => {
  const requestId = randomUUID();
  context.set(requestIdContext, requestId);
  const started = performance.now();
  const response = await next();
  response.headers.set("X-Request-Id", requestId);
  log.info({
    requestId,
    method: request.method,
    path: loggedPath(request),
    status: response.status,
    milliseconds: Math.round(performance.now() - started),
  });
  return response;
};
