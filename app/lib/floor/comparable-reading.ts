import type { StepResult } from "#app/schemas/assessment-result.ts";
import type { FloorContent } from "#app/schemas/floor-entry.ts";
import { bowOfStep, type PredictedBow } from "../predicted-bow.ts";

/**
 * What the assessment says of a reading of the floor; null where the two are not alike. The predicted bow is of a wafer after its step,
 * with no weight in it, so that a warp, a reading with the weight left in, on a film frame, or from the middle of a step stand for
 * themselves.
 * @param step the step at which it was read
 * @param isDone whether the floor had entered that step as done
 */
export function comparableReading(
  reading: Extract<FloorContent, { kind: "measured" }>,
  step: StepResult | undefined,
  isDone: boolean,
): (PredictedBow & { measured: number }) | null {
  if (reading.what !== "bow" || reading.gravity !== "taken out" || reading.on === "film frame") return null;
  if (!step || !isDone) return null;
  if (reading.on === "carrier, as a pair" && step.planned !== "carrier") return null;
  const predicted = bowOfStep(step);
  // Standard bow is that of a wafer with its device side up.
  return predicted && { ...predicted, measured: reading.sideUp === "back side" ? -reading.value : reading.value };
}
