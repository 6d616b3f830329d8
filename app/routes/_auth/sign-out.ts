import { redirect } from "react-router";
import { requestIdContext } from "#app/server/contexts.server.ts";
import { clearedSessionCookie, tokenOf } from "#app/server/session-cookie.server.ts";
import { endSession } from "#app/services/sessions.server.ts";
import type { Route } from "./+types/sign-out";

export function loader() {
  throw redirect("/");
}

export async function action({ request, context }: Route.ActionArgs) {
  const token = await tokenOf(request);
  if (token) await endSession(token, context.get(requestIdContext));
  throw redirect("/sign-in", { headers: { "Set-Cookie": await clearedSessionCookie(request) } });
}
