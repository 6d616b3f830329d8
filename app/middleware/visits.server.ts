import type { MiddlewareFunction } from "react-router";
import { keptRecordAt } from "#app/lib/kept-kinds.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { log } from "#app/server/log.server.ts";
import { noteVisit } from "#app/services/kept/visits.server.ts";

/** Remembers which records a person opens, once the page is on its way; a note that fails is no page's failure. */
export const visits: MiddlewareFunction<Response> = async ({ request, context, url }, next) => {
  const response = await next();
  const visited = request.method === "GET" && response.ok ? keptRecordAt(url.pathname) : null;
  if (visited) {
    const scope = scopeOf(context);
    setImmediate(() => {
      noteVisit(scope, visited.kind, visited.id).catch((error: unknown) =>
        log.warn({ requestId: scope.requestId, error: String(error) }, "a visit was not noted"),
      );
    });
  }
  return response;
};
