import { FINDING_WORKINGS } from "../rules/finding-workings.ts";
import type { SiteLimits } from "../rules/limits.ts";
import { judgeFlow, type JudgedFlow } from "./judge.ts";
import type { FlowInput } from "./model.ts";
import { statedInputs } from "./stated-inputs.ts";

export interface AssumedInput {
  step: number;
  what: string;
}

/** What a flow rests on. */
export interface InputsCounted {
  /** inputs that nobody measured or looked up */
  assumed: AssumedInput[];
  /** how many inputs there are, assumed ones included */
  inputs: number;
}

export interface FlowAssessment extends JudgedFlow, InputsCounted {}

/** The inputs of a flow; of one that parts by slot, those of all its legs. */
export function inputsCounted(flow: FlowInput): InputsCounted {
  const inputs = statedInputs(flow);
  return {
    assumed: inputs.flatMap(({ step, what, source }) => (source === "assumed" ? [{ step, what }] : [])),
    inputs: inputs.length,
  };
}

/**
 * Walks a flow, judges every rule at every step and gives the verdict, each figure with its working.
 * @throws EngineInputError when an input cannot be computed with; nothing that could not be computed counts as passed
 */
export function assessFlow(flow: FlowInput, limits: SiteLimits): FlowAssessment {
  return { ...judgeFlow(flow, limits, FINDING_WORKINGS), ...inputsCounted(flow) };
}
