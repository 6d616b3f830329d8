import type { StepKind } from "#app/engine/flow/model.ts";
import type { StepHandlingValues } from "#app/schemas/step-handling.ts";

/** Kinds of step that work the back face of the silicon and so leave it with a force of its own. */
export const FACE_KINDS: readonly StepKind[] = ["grind", "stress relief", "polish", "via reveal"];

/** Kinds of step that put the wafer on a tape. */
const TAPE_KINDS: readonly StepKind[] = ["laminate tape", "mount on frame"];

/** Inputs of a step that only some kinds have. */
export interface KindInputs {
  trim: boolean;
  bond: boolean;
  debond: boolean;
  groundFace: boolean;
  tape: boolean;
}

/** Which of those inputs a kind of step has; none for a kind that is not known. */
export function inputsOf(kind: string | undefined): KindInputs {
  return {
    trim: kind === "edge trim",
    bond: kind === "bond",
    debond: kind === "debond",
    groundFace: FACE_KINDS.some((known) => known === kind),
    tape: TAPE_KINDS.some((known) => known === kind),
  };
}

interface KindField {
  field: Exclude<keyof StepHandlingValues, "exposureTimes">;
  group: keyof KindInputs;
  /** 'Only … has it' */
  who: string;
}

const TAPE = "a step that puts it on tape";
const THINNING = "a grind, stress relief, polish or via reveal";

/** What the handling rules ask of some kinds of step only. */
export const KIND_FIELDS: readonly KindField[] = [
  { field: "thicknessVariation", group: "groundFace", who: THINNING },
  { field: "viaProtrusion", group: "groundFace", who: THINNING },
  { field: "bondFace", group: "bond", who: "a bond" },
  { field: "debondFace", group: "debond", who: "a debond" },
  { field: "bondThicknessVariation", group: "bond", who: "a bond" },
  { field: "carrierPiece", group: "bond", who: "a bond" },
  { field: "tapeName", group: "tape", who: TAPE },
  { field: "tapeTemperatureLimit", group: "tape", who: TAPE },
  { field: "tapeEmbeddingDepth", group: "tape", who: TAPE },
  { field: "tapeThicknessVariation", group: "tape", who: TAPE },
  { field: "tapeLongestTime", group: "tape", who: TAPE },
  { field: "tapeReleasesInLight", group: "tape", who: TAPE },
  { field: "tapeVacuum", group: "tape", who: TAPE },
  { field: "tapePlasma", group: "tape", who: TAPE },
  { field: "tapeSolvent", group: "tape", who: TAPE },
  { field: "tapeAcid", group: "tape", who: TAPE },
  { field: "tapeBase", group: "tape", who: TAPE },
  { field: "tapeUltraviolet", group: "tape", who: TAPE },
];
