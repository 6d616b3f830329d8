import { scopeOf } from "#app/server/contexts.server.ts";
import { windowAsked } from "#app/services/assessments/window.server.ts";
import type { Route } from "./+types/window-asked";

/** What the engine in the browser draws a process window from, as the address asks; with the page about it. */
export async function loader({ context, params, url }: Route.LoaderArgs) {
  const sent = await windowAsked(scopeOf(context), params.assessmentId, url.searchParams);
  return Response.json(sent, { headers: { "Cache-Control": "no-store" } });
}
