import type { MiddlewareFunction } from "react-router";
import {
  actorContext,
  bearerContext,
  heldContext,
  requestIdContext,
  sessionContext,
} from "#app/server/contexts.server.ts";
import { clearedSessionCookie, sessionCookie, tokenOf } from "#app/server/session-cookie.server.ts";
import { resumeSession } from "#app/services/sessions.server.ts";

/** Finds out who is asking, for every request below it; nobody is a fine answer. */
export const session: MiddlewareFunction<Response> = async ({ request, context }, next) => {
  if (context.get(bearerContext)) return next();
  const token = await tokenOf(request);
  if (!token) return next();
  const resumed = await resumeSession(token, context.get(requestIdContext));
  if (resumed?.session.codes === "missing") context.set(heldContext, resumed);
  else if (resumed) {
    context.set(actorContext, resumed.actor);
    context.set(sessionContext, resumed.session);
  }
  const response = await next();
  // A sign-in or sign-out below has already said what the cookie is to be.
  if (response.headers.has("Set-Cookie")) return response;
  if (!resumed) response.headers.append("Set-Cookie", await clearedSessionCookie(request));
  else if (resumed.renewed) response.headers.append("Set-Cookie", await sessionCookie(request, resumed.renewed));
  return response;
};
