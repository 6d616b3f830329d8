import { jobJson } from "#app/lib/job-json.ts";
import { actorContext, scopeOf } from "#app/server/contexts.server.ts";
import { problemJson, problemJsonOf } from "#app/server/problem-json.server.ts";
import { getJob } from "#app/services/jobs/jobs.server.ts";
import type { Route } from "./+types/job";

/** How a job stands. */
export async function loader({ context, params }: Route.LoaderArgs) {
  if (!context.get(actorContext)) return problemJson(401, "Sign in first; the session cookie is what counts here.");
  try {
    return Response.json(jobJson(await getJob(scopeOf(context), params.jobId)), {
      headers: { "Cache-Control": "no-store" },
    });
  } catch (error) {
    return problemJsonOf(error);
  }
}

export const action = () => problemJson(405, "Send a GET.", { headers: { Allow: "GET" } });
