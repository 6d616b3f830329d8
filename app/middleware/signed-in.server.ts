import { redirect, type MiddlewareFunction } from "react-router";
import { actorContext } from "#app/server/contexts.server.ts";

/** Sends whoever is not signed in to the door, and back here afterwards. */
export const signedIn: MiddlewareFunction<Response> = async ({ request, context, url }, next) => {
  if (context.get(actorContext)) return next();
  const { pathname, search } = url;
  const back = request.method === "GET" ? `${pathname}${search}` : "/";
  throw redirect(back === "/" ? "/sign-in" : `/sign-in?next=${encodeURIComponent(back)}`);
};
