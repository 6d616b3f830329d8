import { redirect, type MiddlewareFunction } from "react-router";
import { actorContext, heldContext } from "#app/server/contexts.server.ts";

/** Sends whoever is not signed in to the door, who has to set up one-time codes to that page, and back here afterwards. */
export const signedIn: MiddlewareFunction<Response> = async ({ request, context, url }, next) => {
  if (context.get(actorContext)) return next();
  const { pathname, search } = url;
  const back = request.method === "GET" ? `${pathname}${search}` : "/";
  const door = context.get(heldContext) ? "/sign-in/set-up" : "/sign-in";
  throw redirect(back === "/" ? door : `${door}?next=${encodeURIComponent(back)}`);
};
