import { FINDING_WORKINGS } from "../rules/finding-workings.ts";
import type { SiteLimits } from "../rules/limits.ts";
import { judgeFlow, type FlowAssessment } from "./judge.ts";
import type { FlowInput } from "./model.ts";

/**
 * Walks a flow, judges every rule at every step and gives the verdict, each figure with its working.
 * @throws EngineInputError when an input cannot be computed with; nothing that could not be computed counts as passed
 */
export function assessFlow(flow: FlowInput, limits: SiteLimits): FlowAssessment {
  return judgeFlow(flow, limits, FINDING_WORKINGS);
}
