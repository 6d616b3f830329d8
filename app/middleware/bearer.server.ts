import type { MiddlewareFunction } from "react-router";
import { actorContext, bearerContext, requestIdContext } from "#app/server/contexts.server.ts";
import { problemJson } from "#app/server/problem-json.server.ts";
import { bearerOf } from "#app/services/api/token-actor.server.ts";

const BEARER = /^Bearer +(\S+)$/i;

/**
 * Finds out for whom a request of the API with a token asks. A token that is not good is refused here, whatever cookie came with it:
 * a request is never answered as somebody whom its sender did not mean.
 */
export const bearer: MiddlewareFunction<Response> = async ({ request, context }, next) => {
  const sent = request.headers.get("Authorization");
  if (sent === null || !new URL(request.url).pathname.startsWith("/api/v1/")) return next();
  const token = BEARER.exec(sent)?.[1];
  const found = token ? await bearerOf(token, context.get(requestIdContext)) : null;
  if (!found)
    return problemJson(401, "The token is unknown, over or revoked. Make another one under /tokens.", {
      headers: { "WWW-Authenticate": 'Bearer realm="Planeward", error="invalid_token"' },
    });
  context.set(bearerContext, found);
  context.set(actorContext, found.actor);
  return next();
};
