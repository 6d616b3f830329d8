import { FINDING_WORKINGS } from "../rules/finding-workings.ts";
import type { SiteLimits } from "../rules/limits.ts";
import { judgeFlow, type JudgedFlow } from "./judge.ts";
import type { FlowInput } from "./model.ts";
import { statedInputs } from "./stated-inputs.ts";

export interface AssumedInput {
  step: number;
  what: string;
}

export interface FlowAssessment extends JudgedFlow {
  /** inputs that nobody measured or looked up */
  assumed: AssumedInput[];
  /** how many inputs there are, assumed ones included */
  inputs: number;
}

/**
 * Walks a flow, judges every rule at every step and gives the verdict, each figure with its working.
 * @throws EngineInputError when an input cannot be computed with; nothing that could not be computed counts as passed
 */
export function assessFlow(flow: FlowInput, limits: SiteLimits): FlowAssessment {
  const judged = judgeFlow(flow, limits, FINDING_WORKINGS);
  const inputs = statedInputs(flow);
  return {
    ...judged,
    assumed: inputs.flatMap(({ step, what, source }) => (source === "assumed" ? [{ step, what }] : [])),
    inputs: inputs.length,
  };
}
