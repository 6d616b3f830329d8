import type { FlowInput } from "#app/engine/flow/model.ts";
import { defaultLimits } from "#app/engine/rules/limits.ts";
import { flowFigures, type FlowFigures } from "#app/lib/flow-comparison/figures.ts";
import type { AssessmentResult } from "#app/schemas/assessment-result.ts";
import { compute } from "#app/services/assessments/compute.ts";
import { demoFlow } from "../../fixtures/demo-flow-input.ts";

export const limits = defaultLimits();

/** The assessment of a flow that can be walked. */
export function assessed(flow: FlowInput): AssessmentResult {
  const computed = compute({ flow, limits });
  if (computed.outcome !== "computed") throw new Error(computed.reason);
  return computed.result;
}

const known = new Map<string, FlowFigures>();

/** Figures of a demo flow of the fixture, made once. */
export function figuresOf(name: string): FlowFigures {
  const { flow } = demoFlow(name);
  const figures = known.get(name) ?? flowFigures(flow, assessed(flow));
  known.set(name, figures);
  return figures;
}
