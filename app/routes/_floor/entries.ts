import { problem } from "#app/server/problem.server.ts";
import { signedIn } from "#app/middleware/signed-in.server.ts";
import { scopeOf } from "#app/server/contexts.server.ts";
import { takeFloorForm } from "./floor-forms.server.ts";
import type { Route } from "./+types/entries";

export const middleware: Route.MiddlewareFunction[] = [signedIn];

export function loader({ context }: Route.LoaderArgs) {
  scopeOf(context);
  throw problem(404, "There is nothing to see here. Open the lot.");
}

/** Takes one entry of the floor that a browser sends by itself, at once or when the connection is back. */
export async function action({ request, context, params }: Route.ActionArgs) {
  const taken = await takeFloorForm(scopeOf(context), params.lotId, request);
  if (taken.outcome === "stored") return Response.json({ outcome: "stored" });
  const { sentence } = taken;
  return Response.json({ outcome: "refused", sentence }, { status: sentence === null ? 400 : 409 });
}
