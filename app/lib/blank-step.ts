import { ROOM_TEMPERATURE } from "#app/engine/laminate/layer.ts";
import type { StepValues } from "#app/schemas/flow.ts";
import type { StepHandlingValues } from "#app/schemas/step-handling.ts";

/** Nothing of what the handling rules ask is given. */
export const BLANK_HANDLING: StepHandlingValues = {
  exposureTimes: {},
  solvent: null,
  dehydrationBake: null,
  contactFace: null,
  contactMeans: null,
  timeSincePrevious: null,
  inLine: null,
  bumpHeight: null,
  bumpPeelForce: null,
  topography: null,
  viaProtrusion: null,
  thicknessVariation: null,
  bondFace: null,
  debondFace: null,
  bondThicknessVariation: null,
  profile: null,
  sideUp: null,
  machine: null,
  recipe: null,
  slots: null,
  carrierPiece: null,
  tapeName: null,
  tapeTemperatureLimit: null,
  tapeEmbeddingDepth: null,
  tapeThicknessVariation: null,
  tapeLongestTime: null,
  tapeReleasesInLight: null,
  tapeVacuum: null,
  tapePlasma: null,
  tapeSolvent: null,
  tapeAcid: null,
  tapeBase: null,
  tapeUltraviolet: null,
};

/** A step that does nothing, on a bare wafer at room temperature. */
export const BLANK_STEP: Omit<StepValues, "kind" | "title"> = {
  peakTemperature: ROOM_TEMPERATURE,
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
  tape: null,
  films: [],
  handling: BLANK_HANDLING,
};

/** A stored step with everything that has been added to steps since it was stored, blank. */
export function completeStep<Step extends StepValues>(stored: Step): Step {
  return { ...BLANK_STEP, ...stored, handling: { ...BLANK_HANDLING, ...stored.handling } };
}
