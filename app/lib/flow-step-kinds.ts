import type { StepKind } from "#app/engine/flow/model.ts";

/** Kinds of step that work the back face of the silicon and so leave it with a force of its own. */
export const FACE_KINDS: readonly StepKind[] = ["grind", "stress relief", "polish", "via reveal"];

/** Inputs of a step that only some kinds have. */
export interface KindInputs {
  trim: boolean;
  bond: boolean;
  groundFace: boolean;
}

/** Which of those inputs a kind of step has; none for a kind that is not known. */
export function inputsOf(kind: string | undefined): KindInputs {
  return {
    trim: kind === "edge trim",
    bond: kind === "bond",
    groundFace: FACE_KINDS.some((known) => known === kind),
  };
}
