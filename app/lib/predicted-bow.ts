import type { AssessmentResult, StepResult } from "#app/schemas/assessment-result.ts";

/** A bow that an assessment predicts after one of its steps, at 25 °C; standard bow and standard uncertainty, m. */
export interface PredictedBow {
  step: number;
  title: string;
  bow: number;
  standardUncertainty: number;
}

/** What a step says of the bow at 25 °C; null where it is held flat, rolled, or no wafer of this leg takes it. */
export function bowOfStep({ number, title, atRoom, skipped }: StepResult): PredictedBow | null {
  if (skipped || !atRoom || atRoom.regime === "curled" || atRoom.rollRadius !== null) return null;
  return { step: number, title, bow: atRoom.bow, standardUncertainty: atRoom.standardUncertainty ?? 0 };
}

/** The steps after which a wafer has a bow of its own that can be measured, of any leg, by their number. */
export function measurableSteps(result: AssessmentResult): { step: number; title: string }[] {
  const found = new Map<number, string>();
  for (const leg of legsOf(result))
    for (const step of leg.steps) {
      const bow = bowOfStep(step);
      if (bow) found.set(bow.step, bow.title);
    }
  return [...found].toSorted(([a], [b]) => a - b).map(([step, title]) => ({ step, title }));
}

/** The results of the legs of an assessment; of a flow that does not part by slot, the one that there is. */
const legsOf = (result: AssessmentResult): AssessmentResult[] =>
  result.legs && result.legs.length > 0 ? result.legs.map((leg) => leg.result ?? result) : [result];

/**
 * What an assessment predicts of a wafer after a step. Where its flow parts by slot, the wafer's slot says which leg; a sentence says
 * why there is nothing.
 */
export function predictedBow(result: AssessmentResult, step: number, slot: number | null): PredictedBow | string {
  const leg = legOf(result, slot);
  if (typeof leg === "string") return leg;
  const found = leg.steps.find(({ number }) => number === step);
  if (!found) return `there is no step ${step}`;
  return (
    bowOfStep(found) ?? `after step ${step} it has no bow of its own: it is held, rolled up, or does not take the step`
  );
}

function legOf(result: AssessmentResult, slot: number | null): AssessmentResult | string {
  const { legs = [] } = result;
  if (legs.length === 0) return result;
  if (slot === null) return "the flow parts by slot, and its slot is not known";
  const leg = legs.find(({ slots }) => slots.includes(slot));
  return leg ? (leg.result ?? result) : `no leg of the flow has slot ${slot}`;
}
