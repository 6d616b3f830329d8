import { supportClassOf } from "#app/engine/vocabulary.ts";
import type { AssessmentInput } from "#app/schemas/assessment-changes.ts";
import type { AssessmentResult, StepResult } from "#app/schemas/assessment-result.ts";
import type { StoodPrediction } from "#app/schemas/incident.ts";
import { filmsAtStep } from "./films-at-step.ts";

/** Legs of an assessment, by their number from 1; the whole under 0 where its flow does not part by slot. */
export function numberedLegs(result: AssessmentResult): { leg: number; slots: number[]; result: AssessmentResult }[] {
  const { legs = [] } = result;
  if (legs.length === 0) return [{ leg: 0, slots: [], result }];
  return legs.map((each, index) => ({ leg: index + 1, slots: each.slots, result: each.result ?? result }));
}

/** A step as the wafers of a leg take it; nothing where there is no such leg or step, or they are passed over. */
export function stepOfLeg(result: AssessmentResult, leg: number, step: number): StepResult | undefined {
  return numberedLegs(result)
    .find((each) => each.leg === leg)
    ?.result.steps.find(({ number, skipped }) => number === step && !skipped);
}

/** What an assessment says of one of its steps, to stand beside an incident; null where the leg has no such step. */
export function stepPrediction(
  { flow }: Pick<AssessmentInput, "flow">,
  result: AssessmentResult,
  leg: number,
  step: number,
): StoodPrediction | null {
  const found = stepOfLeg(result, leg, step);
  if (!found) return null;
  return {
    stepKind: found.kind,
    stepTitle: found.title,
    silicon: found.silicon,
    planned: supportClassOf(found.planned),
    required: found.required,
    warp: found.atRoom?.warp ?? null,
    warpUncertainty: found.atRoom?.standardUncertainty ?? null,
    films: filmsAtStep(flow, leg, step),
  };
}
