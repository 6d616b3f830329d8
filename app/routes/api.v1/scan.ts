import { actorContext, scopeOf } from "#app/server/contexts.server.ts";
import { problemJson, problemJsonOf } from "#app/server/problem-json.server.ts";
import { getReading } from "#app/services/scan-readings/get-reading.server.ts";
import { scanAnswer } from "./scan-answer.server.ts";
import type { Route } from "./+types/scan";

/** A file that was read, as JSON or CSV. */
export async function loader({ request, context, params }: Route.LoaderArgs) {
  if (!context.get(actorContext)) return problemJson(401, "Sign in first; the session cookie is what counts here.");
  try {
    return scanAnswer(request, await getReading(scopeOf(context), params.readingId), 200);
  } catch (error) {
    return problemJsonOf(error);
  }
}

export const action = () => problemJson(405, "Send a GET.", { headers: { Allow: "GET" } });
