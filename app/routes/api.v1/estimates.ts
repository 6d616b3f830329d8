import { actorContext, scopeOf } from "#app/server/contexts.server.ts";
import { JsonBodyRefused, readJsonBody } from "#app/server/json-body.server.ts";
import { problemJson } from "#app/server/problem-json.server.ts";
import { mayOnSite } from "#app/policies/permissions.ts";
import { EstimateRefused } from "#app/lib/estimate-answer.ts";
import { estimate } from "#app/services/estimates.server.ts";
import type { Route } from "./+types/estimates";

/** A stack of sixty films with every property is some 20 kB. */
const LARGEST_BODY = 256 * 1024;

const onlyPost = () => problemJson(405, "Send a POST.", { headers: { Allow: "POST" } });

export const loader = onlyPost;

export async function action({ request, context }: Route.ActionArgs) {
  if (request.method !== "POST") return onlyPost();
  const actor = context.get(actorContext);
  if (!actor) return problemJson(401, "Sign in first; the session cookie is what counts here.");
  if (!mayOnSite(actor, "see the library")) return problemJson(403, "Your role may not ask for estimates.");
  try {
    const body = await readJsonBody(request, LARGEST_BODY);
    return Response.json(await estimate(scopeOf(context), body));
  } catch (error) {
    // What is left of the body is not read, so the connection can't carry another request.
    if (error instanceof JsonBodyRefused)
      return problemJson(error.status, error.message, { headers: { Connection: "close" } });
    if (error instanceof EstimateRefused) return problemJson(422, sentence(error), { errors: error.faults });
    throw error;
  }
}

function sentence({ faults }: EstimateRefused): string {
  return faults.length === 1
    ? "One thing in the request is wrong."
    : `${faults.length} things in the request are wrong.`;
}
