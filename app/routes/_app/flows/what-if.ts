import { scopeOf } from "#app/server/contexts.server.ts";
import { whatIfSnapshot } from "#app/services/flows/what-if.server.ts";
import type { Route } from "./+types/what-if";

/** What the engine in the browser is given. Read each time that a what-if is opened, and kept nowhere. */
export async function loader({ context, params }: Route.LoaderArgs) {
  const snapshot = await whatIfSnapshot(scopeOf(context), params.flowId);
  return Response.json(snapshot, { headers: { "Cache-Control": "no-store" } });
}
