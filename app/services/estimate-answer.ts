import type { SiteLimits } from "#app/engine/rules/limits.ts";
import { EstimateRefused, estimating } from "#app/lib/estimate-answer.ts";
import { estimateWorkings } from "#app/lib/estimate-workings.ts";
import type { StackDraft } from "#app/lib/stack-draft.ts";
import { panelRequests, type StackPanel } from "#app/lib/stack-panel.ts";
import type { Estimated } from "#app/lib/stack-words.ts";
import type { EstimateAnswer, EstimateRequest } from "#app/schemas/estimate.ts";

/**
 * The answer to a request, with the workings that it asks for.
 * @throws EstimateRefused with pointers for what the engine cannot take
 */
export function answerEstimate(request: EstimateRequest, limits: SiteLimits): EstimateAnswer {
  const run = estimating(request, limits, estimateWorkings);
  for (;;) {
    const step = run.next();
    if (step.done) return step.value;
  }
}

/** The answer where nobody could do anything about a refusal, as in a list: null then. */
export function answerOrNull(request: EstimateRequest, limits: SiteLimits): EstimateAnswer | null {
  try {
    return answerEstimate(request, limits);
  } catch (error) {
    if (error instanceof EstimateRefused) return null;
    throw error;
  }
}

/** The panel of a stack as it is typed, at 25 °C and at `temperature` (K) if there is one; null while something is missing. */
export function stackPanel(draft: StackDraft, temperature: number | null, limits: SiteLimits): StackPanel | null {
  const requests = panelRequests(draft, temperature);
  const room = requests && estimated(requests.room, limits);
  return room && { room, hot: requests.hot && estimated(requests.hot, limits) };
}

function estimated(request: EstimateRequest, limits: SiteLimits): Estimated | null {
  const answer = answerOrNull(request, limits);
  return answer && { request, answer };
}
