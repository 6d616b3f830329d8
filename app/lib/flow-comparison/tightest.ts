import { tightestStep } from "#app/engine/flow/answer.ts";
import type { Moment } from "#app/engine/flow/warp-response.ts";
import type { AssessmentResult, ShapeResult, StepResult } from "#app/schemas/assessment-result.ts";

/** A warp of a flow that decides: of which step and moment, m. */
export interface DecidingWarp {
  step: StepResult;
  moment: Moment;
  warp: number;
  /** what the tool takes of it, m, and how it lies there; null where no tool of the flow has a limit that was judged */
  limit: { value: number; label: string } | null;
  /** step at which it is judged, by number: a wafer comes to a tool as the step before has left it */
  judgedAt: number;
}

/** Relative difference below which two warps are one. */
const ALIKE = 1e-9;

/**
 * The warp that comes nearest to, or lies farthest beyond, the limit of its tool; where no limit was judged the largest that the flow
 * has as it lies. Null where the wafer lies on nothing with a shape of its own.
 */
export function decidingWarp(result: AssessmentResult): DecidingWarp | null {
  const tightest = tightestStep(result);
  const figure = tightest?.figures[0];
  const lying = result.steps.flatMap((step) => momentsOf(step));
  if (!tightest?.limit || !figure)
    return lying.reduce<DecidingWarp | null>((most, next) => (most && most.warp >= next.warp ? most : next), null);
  const { value, label } = tightest.limit;
  // A step is judged as it is loaded too, with the shape that the last step before it left.
  const found = lying
    .filter(({ step, warp }) => step.number <= tightest.step && Math.abs(warp - figure.value) <= ALIKE * figure.value)
    .at(-1);
  return found ? { ...found, limit: { value, label }, judgedAt: tightest.step } : null;
}

function momentsOf(step: StepResult): DecidingWarp[] {
  const at = (moment: Moment, shape: ShapeResult | null) =>
    shape ? [{ step, moment, warp: shape.warp, limit: null, judgedAt: step.number }] : [];
  return [...at("atPeak", step.atPeak), ...at("atRoom", step.atRoom)];
}
