import { BLANK_STEP } from "#app/lib/blank-step.ts";
import type { StepPlan } from "#app/schemas/flow-plan.ts";

/** A step that does nothing, but for what is said. */
export const plannedStep = (overrides: Partial<StepPlan> = {}): StepPlan => ({
  ...BLANK_STEP,
  id: "step",
  title: "Measure",
  kind: "measure",
  ...overrides,
});
