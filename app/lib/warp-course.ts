import type { AssessmentResult, ShapeResult, StepResult } from "#app/schemas/assessment-result.ts";
import { isRolled } from "./lying-as.ts";

/** Warp as it lies at one place of a flow, m: edges up positive, edges down negative; with its expanded uncertainty, k = 2. */
export interface CourseValue {
  warp: number;
  uncertainty: number;
}

/** A step for the chart along the flow. */
export interface CourseStep {
  number: number;
  title: string;
  /** null where something holds it flat, and where it has rolled up */
  room: CourseValue | null;
  /** at the hottest of the step; as at 25 °C where it is not heated */
  peak: CourseValue | null;
  rolled: boolean;
  /** what the tool takes, m; null where it has no such limit */
  limits: { up: number | null; down: number | null };
}

/** How a wafer lies along its flow, step by step. */
export function warpCourse({ steps }: Pick<AssessmentResult, "steps">): CourseStep[] {
  return steps.map((step) => ({
    number: step.number,
    title: step.title,
    room: courseValue(step.atRoom),
    peak: courseValue(step.atPeak ?? step.atRoom),
    rolled: [step.atRoom, step.atPeak].some((shape) => shape !== null && isRolled(shape)),
    limits: limitsOf(step),
  }));
}

function courseValue(shape: ShapeResult | null): CourseValue | null {
  if (!shape || isRolled(shape)) return null;
  return {
    warp: shape.edgesUp ? shape.warp : -shape.warp,
    uncertainty: 2 * (shape.standardUncertainty ?? 0),
  };
}

function limitsOf({ equipment }: StepResult): CourseStep["limits"] {
  return { up: equipment?.edgesUp ?? null, down: equipment?.edgesDown ?? null };
}
