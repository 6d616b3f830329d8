import type { StressRecord, TapeInput, WaferKind } from "#app/engine/flow/handling-inputs.ts";
import type {
  BondingMaterialInput,
  CarrierInput,
  EquipmentInput,
  FilmInput,
  StepKind,
} from "#app/engine/flow/model.ts";
import type { Measured } from "#app/engine/measured.ts";
import type { FilmLines } from "#app/engine/patterned/pattern.ts";
import type { Exposure, Holding, Outcome, Side } from "#app/engine/vocabulary.ts";
import type { StepHandlingValues } from "./step-handling.ts";
import type { RecordStamp } from "./record-stamp.ts";

/** A film that a step adds or takes off, as screens and the engine need it. */
export interface StepFilmDetail {
  change: "adds" | "removes";
  side: Side;
  film: FilmInput;
  thickness: Measured | null;
  ownStress: Measured | null;
  /** own, else the film's */
  stress: Measured;
  /** what the film's own stress was measured on; null for another stress, or when nothing of it is given */
  stressRecord: StressRecord | null;
  coverage: number;
  /** of a film cut in lines; null bends both directions alike */
  lines: FilmLines | null;
}

/** A step with all that it uses, as screens and the engine need it. */
export interface StepDetail {
  id: string;
  kind: StepKind;
  title: string;
  peakTemperature: number;
  holdTime: number | null;
  equipment: EquipmentInput | null;
  exposures: Exposure[];
  planned: Holding;
  siliconAfter: Measured | null;
  trimWidth: Measured | null;
  trimDepth: Measured | null;
  carrier: CarrierInput | null;
  bondingMaterial: BondingMaterialInput | null;
  bondThickness: Measured | null;
  groundFaceForce: Measured | null;
  /** the library's; what `handling` says of a tape counts before it */
  tape: (TapeInput & { id: string }) | null;
  handling: StepHandlingValues;
  films: StepFilmDetail[];
}

/** A flow with its steps, whole. */
export interface FlowDetail {
  id: string;
  name: string;
  note: string;
  program: { id: string; name: string; slug: string };
  silicon: { id: string; name: string; diameter: number; orientation: "100" | "111" };
  incomingThickness: Measured;
  incomingBowAlong: Measured | null;
  incomingBowAcross: Measured | null;
  incomingFilmShare: Measured | null;
  waferKind: WaferKind;
  gateBow: Measured | null;
  gateWarp: Measured | null;
  steps: StepDetail[];
  stamp: RecordStamp;
  mayEdit: boolean;
  mayAssess: boolean;
}

/** A flow in a list, with its newest assessment. */
export interface FlowRow {
  id: string;
  name: string;
  program: string;
  diameter: number;
  steps: number;
  updatedAt: string;
  latest: { id: string; number: number; outcome: Outcome; at: string } | null;
}

/** An assessment of a flow as a line of its history. */
export interface FlowAssessmentRow {
  id: string;
  number: number;
  outcome: Outcome;
  sentences: string[];
  createdAt: string;
  createdBy: string;
  /** the flow, or something that it uses, has been changed since */
  outOfDate: boolean;
}
