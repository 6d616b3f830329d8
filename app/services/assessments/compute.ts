import { EngineInputError } from "#app/engine/errors.ts";
import { assessFlow } from "#app/engine/flow/assess.ts";
import type { AssessmentInput } from "#app/schemas/assessment-changes.ts";
import type { AssessmentResult } from "#app/schemas/assessment-result.ts";
import { resultOf } from "./result-of.ts";

/** Why nothing could be computed, with the number of the step that it concerns. */
export interface NotComputable {
  outcome: "not computable";
  step: number | null;
  reason: string;
}

export type Computed = { outcome: "computed"; result: AssessmentResult } | NotComputable;

/** What the engine makes of an input; what cannot be computed comes back as a reason. Nothing is stored. */
export function compute({ flow, limits }: AssessmentInput): Computed {
  if (flow.steps.length === 0)
    return { outcome: "not computable", step: null, reason: "The flow has no steps yet. Add the first one." };
  try {
    return { outcome: "computed", result: resultOf(flow, limits, assessFlow(flow, limits)) };
  } catch (error) {
    if (error instanceof EngineInputError) return notComputable(error);
    throw error;
  }
}

/** `steps[3].siliconAfter` names step 4 to people. */
function notComputable({ field, reason, allowed }: EngineInputError): NotComputable {
  const index = /^steps\[(\d+)\]/.exec(field)?.[1];
  const what = field.replace(/^steps\[\d+\]\.?/, "");
  return {
    outcome: "not computable",
    step: index === undefined ? null : Number(index) + 1,
    reason: `${what ? `${what}: ` : ""}${reason}${allowed ? ` (allowed: ${allowed})` : ""}`,
  };
}
