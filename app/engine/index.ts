/**
 * The engine: films on a wafer to bow, stress and shape, and profilometer scans back to film stress. Pure functions, SI in and
 * SI out; z points out of the device side, curvature is positive for a bowl, stress in tension. Bows carry the sign of the
 * curvature inside; `standardBow` turns one into the standard bow. Bad input throws `EngineInputError`, nothing returns NaN.
 */
export { ENGINE_VERSION } from "./version.ts";

export { EngineInputError } from "./errors.ts";
export * from "./vocabulary.ts";

// Where numbers come from
export { citation, SOURCES, type Source, type SourceBasis, type SourceId } from "./sources.ts";
export { EQUATIONS, type Equation, type EquationId } from "./equations.ts";
export type { UnitSymbol, Working, WorkingLine } from "./working.ts";

// Quantities as text
export { DIMENSIONS, type Dimension } from "./units/dimensions.ts";
export { parseQuantity, type QuantityFault, type QuantityReading } from "./units/parse-quantity.ts";
export type { DecimalMark } from "./units/read-number.ts";
export { formatQuantity, formatWithUncertainty, type QuantityStyle } from "./units/format.ts";
export { formatNumber, type NumberStyle } from "./units/format-number.ts";

// Silicon
export type { Orientation } from "./silicon/orientation.ts";
export { siliconStiffness, type CubicStiffness } from "./silicon/elastic-constants.ts";
export { cubicBiaxialModulus, siliconBiaxialModulus } from "./silicon/biaxial-modulus.ts";
export { siliconDirectionalConstants, siliconPlateConstants, type PlateConstants } from "./silicon/plane-constants.ts";
export { siliconExpansion, siliconThermalStrain } from "./silicon/expansion.ts";
export { SILICON_DENSITY } from "./silicon/density.ts";

// Thin film
export { stoneyCurvature, stoneyStress, type StoneyFilm } from "./stoney/stoney.ts";
export { bowFromCurvature, standardBow } from "./stoney/bow.ts";
export { filmForce } from "./stoney/film-force.ts";
export {
  bowFromCurvatureWorking,
  filmForceWorking,
  stoneyCurvatureWorking,
  stoneyStressWorking,
} from "./stoney/working.ts";

// Stack of layers
export { ROOM_TEMPERATURE, type Expansion, type Layer } from "./laminate/layer.ts";
export { thermalStrain } from "./laminate/thermal-strain.ts";
export { layerFreeStrain } from "./laminate/free-strain.ts";
export { solveLaminate, type LaminateResult } from "./laminate/solve-laminate.ts";
export { mismatchStress } from "./laminate/mismatch-stress.ts";
export { laminateWorking } from "./laminate/working.ts";

// Free wafer
export {
  freeWaferShape,
  type FreeWaferShape,
  type FreeWaferShapeInput,
  type PlateInput,
} from "./plate/free-wafer-shape.ts";
export { criticalFilmForce, criticalLinearCurvature } from "./plate/critical-load.ts";
export { criticalFilmForceWorking, freeWaferShapeWorking } from "./plate/working.ts";

// Scans and uncertainty
export type { ProfilePoint } from "./profile/points.ts";
export { commonPoints, type ScanPair } from "./profile/common-points.ts";
export { fitProfile, type FitOptions, type ProfileFit } from "./profile/fit-profile.ts";
export { fittedHeight, levelHeight } from "./profile/fitted-height.ts";
export {
  filmStressFromCurvature,
  filmStressFromProfiles,
  type FilmStressFromProfiles,
  type FilmStressFromProfilesInput,
  type FilmStressUncertainties,
  type MonitorWafer,
} from "./profile/film-stress.ts";
export { filmStressFromProfilesWorking } from "./profile/working.ts";
export { combineUncertainty, type CombinedUncertainty, type UncertainInput } from "./uncertainty/combine.ts";

// Stack estimate
export type { StackFilm, StackInput } from "./stack/model.ts";
export { estimateStack, type StackEstimate } from "./stack/estimate-stack.ts";
export { stackSupport, type StackSupport } from "./stack/stack-support.ts";
export { curlingThickness, thicknessSweep, type SweepPoint } from "./stack/thickness-sweep.ts";

// Process flow
export type { Measured } from "./measured.ts";
export type { FlowInput, StepInput } from "./flow/model.ts";
export { walkFlow, type StepState, type WalkOptions } from "./flow/walk.ts";
export { assessFlow, type AssessedStep, type FlowAssessment, type Verdict } from "./flow/assess.ts";
export { answerSentences, supportSpans } from "./flow/answer.ts";

// Handling rules
export type { Figure, Finding, FindingLimit, Rule, RuleContext } from "./rules/finding.ts";
export { defaultLimits, LIMIT_DEFINITIONS, type LimitKey, type SiteLimits } from "./rules/limits.ts";
export { RULES } from "./rules/rules.ts";
