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
  filmStressFromScans,
  type FilmStressFromProfilesInput,
  type FilmStressFromScans,
  type FilmStressFromScansInput,
  type FilmStressUncertainties,
  type MonitorWafer,
} from "./profile/film-stress.ts";
export { combineUncertainty, type CombinedUncertainty, type UncertainInput } from "./uncertainty/combine.ts";

// Stack estimate
export type { StackFilm, StackInput } from "./stack/model.ts";
export { estimateStack, type StackEstimate } from "./stack/estimate-stack.ts";
export { stackSupport, type StackSupport } from "./stack/stack-support.ts";
export { curlingThickness, thicknessSweep, type SweepPoint } from "./stack/thickness-sweep.ts";
export { warpModel, warpUncertainty } from "./stack/warp-uncertainty.ts";

// Process flow
export type { Measured } from "./measured.ts";
export type { FlowInput, StepInput } from "./flow/model.ts";
export { walkFlow, type StepState, type WalkOptions } from "./flow/walk.ts";
export { assessFlow, type FlowAssessment } from "./flow/assess.ts";
export { judgeFlow, type AssessedStep, type JudgedFlow, type JudgedLeg, type Verdict } from "./flow/judge.ts";
export { hasLegs, legFlows, slotsInWords } from "./flow/legs.ts";
export { answerSentences, supportSpans } from "./flow/answer.ts";

// Handling rules
export type { Figure, Finding, FindingLimit, Rule, RuleContext } from "./rules/finding.ts";
export { defaultLimits, LIMIT_DEFINITIONS, type LimitKey, type SiteLimits } from "./rules/limits.ts";
export { DESCRIBED_RULES } from "./rules/described-rules.ts";
export { RULES } from "./rules/rules.ts";

// Directional stack and patterned films
export type { DirectionalFilm, DirectionalLayer, DirectionalSilicon } from "./directional/layer.ts";
export type { PlaneStiffness, PlaneTensor, SiliconDirection } from "./directional/plane-stiffness.ts";
export { solveDirectionalLaminate, type DirectionalLaminateResult } from "./directional/solve-directional-laminate.ts";
export { directionalLaminateWorking, type SurfacePart } from "./directional/working.ts";
export type { FilmPattern } from "./patterned/pattern.ts";
export { patternedFilm, type PatternedFilm, type PatternedFilmInput } from "./patterned/patterned-film.ts";
export { directionalStoneyCurvature } from "./patterned/directional-stoney.ts";
export { directionalStoneyWorking, edgeReliefWorking, patternedFilmWorking } from "./patterned/working.ts";

// Own weight, chuck, strength, thickness, die
export { gravitySag, STANDARD_GRAVITY, type GravitySag, type GravitySagInput } from "./gravity/gravity-sag.ts";
export { siliconSagConstants } from "./gravity/silicon-sag-constants.ts";
export type { Support } from "./gravity/support.ts";
export { gravitySagWorking, largeSagWorking } from "./gravity/working.ts";
export { chuckFlattening, type ChuckFlattening, type ChuckFlatteningInput } from "./chuck/chuck-flattening.ts";
export { flatChuckStress, type FlatChuckStress } from "./chuck/flat-chuck-stress.ts";
export {
  chuckPressureWorking,
  chuckRimLiftWorking,
  chuckSurfaceStressWorking,
  flatChuckStressWorking,
} from "./chuck/working.ts";
export { bendingStress, minimumBendRadius, type BendDirection } from "./strength/bending.ts";
export { designStress, type DesignStress, type EdgeState } from "./strength/design-stress.ts";
export { STRENGTH_DATA, type Finish, type StrengthDatum } from "./strength/strength-data.ts";
export { failureProbability, scaledStrength, type WeibullStrength } from "./strength/weibull.ts";
export {
  bendingStressWorking,
  failureProbabilityWorking,
  minimumBendRadiusWorking,
  scaledStrengthWorking,
} from "./strength/working.ts";
export { bumpCover } from "./thickness-budget/bump-cover.ts";
export {
  thicknessBudget,
  type ThicknessBudget,
  type ThicknessBudgetInput,
  type ThicknessContribution,
} from "./thickness-budget/thickness-budget.ts";
export { bumpCoverWorking, thicknessBudgetWorking } from "./thickness-budget/working.ts";
export { dieAfterDicing, type DieAfterDicing, type DieAtTemperature, type DieInput } from "./die/die-after-dicing.ts";
export { dieWarpWorking } from "./die/working.ts";

// Flow in full: incoming shape, bonds that slide, expansion curves; inverse questions; calibration
export { flowUncertainty, type FlowUncertainty } from "./flow/uncertainty.ts";
export { sampledWarps, type SampledStep, type SampledWarp, type SampledWarps } from "./flow/sample-warps.ts";
export { incomingFromBows } from "./flow/silicon.ts";
export type { IncomingShape } from "./flow/model.ts";
export { flowPoint, glassTransition, lockTemperature, type BondState } from "./flow/bond.ts";
export type { ExpansionCurve } from "./laminate/expansion-curve.ts";
export { solveFor, type InverseAnswer, type InverseQuestion, type NoAnswer } from "./inverse/solve-for.ts";
export { answerInWords, type Wording } from "./inverse/words.ts";
export { balancingFilm, leastThickness, mostFilm, type Balance, type FilmQuantity } from "./inverse/stack-questions.ts";
export { carrierExpansionFor, sagittaAfter, sagittasAfter } from "./inverse/flow-questions.ts";
export {
  balancingFilmWorking,
  carrierExpansionWorking,
  curlingThicknessWorking,
  leastThicknessWorking,
  mostFilmWorking,
} from "./inverse/working.ts";
export { calibrationWorkings } from "./calibration/working.ts";
export { calibratePair, type Calibration, type CalibratedValue } from "./calibration/calibrate-pair.ts";
export { withCalibration, type Calibrated, type PairMeasurement } from "./calibration/pair-model.ts";

// Uncertainty: distributions, first order, Monte Carlo, lots
export { spreadUncertainty, uncertainQuantity, type Spread, type UncertainQuantity } from "./uncertainty/quantity.ts";
export type { Correlation } from "./uncertainty/correlation.ts";
export type { BlockModel, ScalarModel } from "./uncertainty/model.ts";
export {
  firstOrderUncertainty,
  type Budget,
  type BudgetLine,
  type FirstOrderInput,
  type FirstOrderUncertainty,
} from "./uncertainty/first-order.ts";
export { firstOrderShare, type FirstOrderShare } from "./uncertainty/first-order-share.ts";
export { inverseNormal, normalShareBelow } from "./uncertainty/random/inverse-normal.ts";
export {
  sampleUncertainty,
  sampling,
  type SamplingInput,
  type SamplingProgress,
} from "./uncertainty/sample-uncertainty.ts";
export { SAMPLING_METHODS, type Chance, type SampledUncertainty, type SamplingMethod } from "./uncertainty/summary.ts";
export { sampleSteps, stepsSampling, type StepsSamplingInput } from "./uncertainty/sample-steps.ts";
export { lotSampling, lotShare, type LotInput, type LotShare } from "./uncertainty/lot.ts";
export {
  laminateInputNames,
  laminateInputValues,
  laminateModel,
  type LaminateModel,
} from "./uncertainty/laminate-model.ts";
export { shapeCurve, type ShapeCurve } from "./uncertainty/shape-curve.ts";
export { firstOrderWorking, lotShareWorking, sampledChanceWorking, sampledWorking } from "./uncertainty/working.ts";

export { rankBendingSteps, type RankedStep } from "./rules/rank-bending.ts";

// What the handling rules ask beyond the physics
export {
  CLAMPINGS,
  CONTACT_MEANS,
  RESISTANCE_WORDS,
  SOLVENT_FAMILIES,
  WAFER_KINDS,
  type BumpsInput,
  type Clamping,
  type ContactInput,
  type ContactMeans,
  type IncomingGate,
  type Resistance,
  type Resistances,
  type ResistanceWord,
  type SolventFamily,
  type StressRecord,
  type TapeInput,
  type WaferKind,
} from "./flow/handling-inputs.ts";

// What would make it pass: carriers and bonds, smallest changes, process window
export type { Catalogue, CatalogueMaterial, CatalogueTool } from "./trial/catalogue.ts";
export { blocks, relativeMargin } from "./trial/margin.ts";
export { bondSpans, type BondSpan } from "./finder/bond-spans.ts";
export { findBonds, type BondSearch, type Misfit, type TriedBond, type WarpTarget } from "./finder/find-bonds.ts";
export { withBond, type BondChoice } from "./finder/with-bond.ts";
export {
  applyChange,
  framedSteps,
  originsOf,
  REMEDY_NOTE,
  type FilmQuantity as ChangedFilmQuantity,
  type FlowChange,
  type StepQuantity,
} from "./trial/change.ts";
export {
  findRemedies,
  type Remedy,
  type RemedyAnswer,
  type RemedyProgress,
  type Worsened,
} from "./remedy/find-remedies.ts";
export { processWindow, type ProcessWindow, type WindowAxis, type WindowPoint } from "./window/window.ts";
export { contours, type ContourPoint } from "./window/contours.ts";

// What scans say: fit, pairs, azimuths, surface, stress, budgets, mistakes, charts
export { type AscendingColumns, columnsOf, MOST_POINTS, type ScanColumns } from "./profile/columns.ts";
export { fitScan, NOT_SPHERICAL, type ShapeTest } from "./profile/fit-scan.ts";
export type { Scatter } from "./profile/scatter.ts";
export type { RejectedRun, ScanGap } from "./profile/scan-features.ts";
export { BISQUARE } from "./profile/robust-points.ts";
export { interpolationError, matchScans, type MatchedScans } from "./profile/match-scans.ts";
export {
  angleBetween,
  faceUpScan,
  lineAzimuth,
  pairScans,
  type PairedScans,
  type ScanLie,
  type ScanPlace,
} from "./profile/orient-scan.ts";
export {
  curvatureAlong,
  fitAzimuths,
  ONE_LINE,
  type AzimuthFit,
  type AzimuthReading,
  type CurvatureWord,
  type PlaneCurvature,
} from "./profile/azimuths.ts";
export { azimuthsWorking, filmStressFromProfilesWorking, fitScanWorking } from "./profile/working.ts";
export { fitSurface, type SiteColumns, type SurfaceInput } from "./profile/map/fit-surface.ts";
export {
  combinedSurface,
  secondOrderCurvature,
  surfaceEvaluator,
  surfaceHeight,
  type Surface,
} from "./profile/map/surface.ts";
export type { ZernikeIndex } from "./profile/map/zernike.ts";
export {
  extremes,
  shapeFigures,
  type GravityHandling,
  type ShapeFigure,
  type ShapeFigures,
  type ShapeFiguresInput,
} from "./profile/map/shape-figures.ts";
export { surfaceContours, type SurfaceContours } from "./profile/map/surface-contours.ts";
export { thicknessFigures, type ThicknessFigures } from "./profile/map/thickness-sites.ts";
export { shapeFiguresWorkings, surfaceWorking } from "./profile/map/working.ts";
export { smallDeflection, type MonitorShapeInput, type SmallDeflection } from "./profile/small-deflection.ts";
export { stressBothWays, WORTH_BOTH, type FullModelInput, type StressBothWays } from "./profile/stress/full-model.ts";
export {
  directionalFilmStress,
  type DirectionalStress,
  type DirectionalStressInput,
} from "./profile/stress/directional-stress.ts";
export { gravityRemark, type GravityRemark } from "./profile/stress/gravity-remark.ts";
export {
  stressBudget,
  type StatedUncertainty,
  type StressBudget,
  type StressBudgetInput,
  type StressBudgetLine,
  type ToolUncertainty,
} from "./profile/stress/stress-budget.ts";
export { directionalStressWorking, fullStressWorking, stressBudgetWorking } from "./profile/stress/working.ts";
export {
  referenceCheck,
  repeatabilityStudy,
  type ReferenceCheck,
  type RepeatabilityStudy,
} from "./profile/tool/repeatability.ts";
export { referenceCheckWorking, repeatabilityWorking } from "./profile/tool/working.ts";
export { findMistakes, judged as judgeMistake, MISTAKES } from "./profile/mistakes/find-mistakes.ts";
export type { Mistake, MistakeFinding, MistakeState } from "./profile/mistakes/mistake.ts";
export type { CalendarDay, CheckedScan, Estimate, ScanChecks } from "./profile/mistakes/scan-checks.ts";
export {
  controlChart,
  type ChartRule,
  type ChartSignal,
  type ChartValue,
  type ControlChart,
  type ControlLimits,
} from "./profile/lot-figures/control-chart.ts";
export { acceptedValue, type AcceptedReading, type AcceptedValue } from "./profile/lot-figures/accepted-value.ts";
export {
  predictedAgainstMeasured,
  type Parity,
  type ParityPoint,
} from "./profile/lot-figures/predicted-against-measured.ts";
export { acceptedValueWorking, controlLimitsWorking, parityWorking } from "./profile/lot-figures/working.ts";
export { binomialInterval, type ShareInterval } from "./uncertainty/binomial-interval.ts";
export { studentFactor } from "./uncertainty/student.ts";
