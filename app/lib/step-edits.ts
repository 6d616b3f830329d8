import { withPeak } from "#app/engine/flow/temperature-profile.ts";
import type { StepValues } from "#app/schemas/flow.ts";

/** A stored step with another peak, K; a profile is stretched to it as the engine stretches it. */
export function planWithPeak<Step extends Pick<StepValues, "peakTemperature" | "holdTime" | "handling">>(
  step: Step,
  peak: number,
): Step {
  const { peakTemperature, holdTime, handling } = step;
  const { profile = null, ...heat } = withPeak({ peakTemperature, holdTime, profile: handling.profile }, peak);
  return { ...step, ...heat, handling: { ...handling, profile } };
}

/** A stored step with another kind of carrier: the piece that was named is one of the old kind. */
export function planWithCarrier<Step extends StepValues>(step: Step, carrier: string): Step {
  if (step.carrier === carrier) return step;
  return { ...step, carrier, handling: { ...step.handling, carrierPiece: null } };
}

/** A step as it is kept for every flow: which piece was bonded is a matter of one. */
export function forLibrary<Step extends StepValues>(step: Step): Step {
  return { ...step, handling: { ...step.handling, carrierPiece: null } };
}
