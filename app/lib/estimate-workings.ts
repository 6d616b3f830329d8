import { estimateStack, type StackEstimate } from "#app/engine/stack/estimate-stack.ts";
import type { StackInput } from "#app/engine/stack/model.ts";
import { stackWorking } from "#app/engine/stack/working.ts";
import type { EstimateAnswer, EstimateRequest } from "#app/schemas/estimate.ts";
import { shownWorking } from "./shown-working.ts";
import { stackOf } from "./stack-of-request.ts";

type Workings = NonNullable<EstimateAnswer["working"]>;

/** The calculations behind an estimate, each with the words of its equation. */
export function estimateWorkings(stack: StackInput, estimate: StackEstimate): Workings {
  const { shape, stoney, filmForces } = stackWorking(stack, estimate);
  return { shape: shownWorking(shape), stoney: shownWorking(stoney), film_forces: filmForces.map(shownWorking) };
}

/** The same for a request that has been answered already. */
export function workingsOfRequest(request: EstimateRequest): Workings {
  const stack = stackOf(request);
  return estimateWorkings(stack, estimateStack(stack));
}
