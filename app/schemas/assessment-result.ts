import type {
  Exposure,
  FaceUp,
  Holding,
  Outcome,
  ShapeRegime,
  ShapeWord,
  Side,
  SupportClass,
} from "#app/engine/vocabulary.ts";
import type { ReleaseMethod, StepKind } from "#app/engine/flow/model.ts";
import type { Finding } from "#app/engine/rules/finding.ts";
import type { AssumedInput } from "#app/engine/flow/assess.ts";
import type { Verdict } from "#app/engine/flow/judge.ts";
import type { TemperatureProfile } from "#app/engine/flow/temperature-profile.ts";
import type { Contribution } from "#app/engine/flow/uncertainty.ts";
import type { Working } from "#app/engine/working.ts";

/** How a wafer or pair lies at one temperature. `bow` is the standard one; SI. */
export interface ShapeResult {
  temperature: number;
  bow: number;
  /** bow along the axis across, where the directions differ; absent in results of before it was kept */
  bowAcross?: number | null;
  warp: number;
  edgesUp: boolean;
  regime: ShapeRegime;
  stabilityRatio: number;
  rollRadius: number | null;
  standardUncertainty: number | null;
  /** how its bow was computed; null for a wafer let go that nothing held */
  working: Working | null;
}

/** One step of a stored assessment, complete for screens and sheets. SI. */
export interface StepResult {
  number: number;
  kind: StepKind;
  title: string;
  peakTemperature: number;
  holdTime: number | null;
  exposures: Exposure[];
  /** how it gets hot, where that is known; which of several tools and by which recipe */
  profile?: TemperatureProfile;
  machine?: string;
  recipe?: string;
  /** slots that take it; absent: all of them */
  slots?: number[];
  /** the wafers that this result is of are in none of its slots, so that it does nothing to them */
  skipped?: true;
  equipment: { name: string; edgesUp: number | null; edgesDown: number | null } | null;
  siliconBefore: number;
  silicon: number;
  siliconLeast: number;
  /** half-width of the interval of `silicon`; null when nobody gave one */
  siliconTolerance: number | null;
  planned: Holding;
  /** what that is by name: the carrier or both carriers, else the holding itself */
  plannedName: string;
  required: SupportClass;
  faceUp: FaceUp;
  /** side up as it is loaded, where it is turned over for the step */
  loadedFaceUp?: FaceUp;
  lies: ShapeWord;
  atRoom: ShapeResult | null;
  atPeak: ShapeResult | null;
  /** if nothing held it, at 25 °C */
  released: ShapeResult;
  /** what its figures rest on that nobody stated, a sentence each; absent in results of before they were kept */
  remarks?: string[];
  filmForce: { front: number; back: number };
  outcome: Outcome;
  /** inputs that move this step's bow most, largest first */
  budget: Contribution[];
}

/** What a bond of the flow is, for the sheet. */
export interface BondResult {
  fromStep: number;
  toStep: number;
  /** absent in results of before it was kept, which had bonds by the device side alone */
  face?: Side;
  carrier: string;
  /** mark of the piece that is named */
  piece?: string;
  carrierDiameter: number;
  material: string;
  thickness: number;
  temperatureLimit: number;
  /** from where on it flows, K; null for a material that does not */
  flowsFrom: number | null;
  release: ReleaseMethod;
}

/** An assessment's results as they are stored, for ever. */
export interface AssessmentResult {
  wafer: { name: string; diameter: number; orientation: "100" | "111"; thickness: number };
  sentences: string[];
  verdict: Verdict;
  steps: StepResult[];
  findings: Finding[];
  assumed: AssumedInput[];
  /** how many inputs there are, assumed ones included */
  inputs: number;
  bonds: BondResult[];
  /** highest temperature on tape or film frame that the site allowed, K */
  tapeTemperature: number;
  /** of a flow that parts by slot: the slots that steps, findings and verdict are of, those of its worst leg */
  slots?: number[];
  /** all its legs, by their first slot */
  legs?: LegResult[];
}

/** One leg of a flow that parts by slot. */
export interface LegResult {
  slots: number[];
  verdict: Verdict;
  /** null for the worst, whose result is that of the assessment itself */
  result: AssessmentResult | null;
}
