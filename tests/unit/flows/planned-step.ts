import type { StepPlan } from "#app/schemas/flow-plan.ts";

/** A step that does nothing at room temperature, but for what is said. */
export const plannedStep = (overrides: Partial<StepPlan> = {}): StepPlan => ({
  id: "step",
  title: "Measure",
  kind: "measure",
  peakTemperature: 298.15,
  holdTime: null,
  equipment: null,
  exposures: [],
  planned: "bare",
  siliconAfter: null,
  trimWidth: null,
  trimDepth: null,
  carrier: null,
  bondingMaterial: null,
  bondThickness: null,
  groundFaceForce: null,
  films: [],
  ...overrides,
});
