import { scopeOf } from "#app/server/contexts.server.ts";
import { sentGround, trialHead, trialQuestion } from "#app/services/assessments/trial-ground.server.ts";
import type { SentTrial } from "#app/schemas/trial.ts";
import type { Route } from "./+types/trial";

/** What the engine in the browser tries changes on. Read each time that a search is begun, and kept nowhere. */
export async function loader({ context, params, url }: Route.LoaderArgs) {
  const ground = await sentGround(scopeOf(context), params.assessmentId, url.searchParams);
  const sent: SentTrial = { head: trialHead(ground), question: trialQuestion(ground) };
  return Response.json(sent, { headers: { "Cache-Control": "no-store" } });
}
