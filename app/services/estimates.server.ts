import type { EstimateAnswer } from "#app/schemas/estimate.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { answerEstimate } from "./estimate-answer.ts";
import { readEstimateRequest } from "./estimate-request.ts";
import { siteLimits } from "./limits.server.ts";
import { requireOnSite } from "./permission.server.ts";

/**
 * An estimate for somebody on the staff, by the site's own limits.
 * @param body whatever was sent
 * @throws EstimateRefused with a pointer for every fault
 */
export async function estimate(scope: ActorScope, body: unknown): Promise<EstimateAnswer> {
  requireOnSite(scope, "see the library");
  return answerEstimate(readEstimateRequest(body), await siteLimits(scope));
}
