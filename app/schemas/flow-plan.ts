import type { WaferKind } from "#app/engine/flow/handling-inputs.ts";
import type { Measured } from "#app/engine/measured.ts";
import type { StepValues } from "./flow.ts";

/** A step as it is typed, with its identity: what it uses stands as ids of the library. */
export type StepPlan = StepValues & { id: string };

/** Everything of a flow that a person can change, as one value: what a revision keeps and undo puts back. */
export interface FlowPlan {
  name: string;
  note: string;
  /** id of the silicon wafer */
  silicon: string;
  incomingThickness: Measured;
  incomingBowAlong: Measured | null;
  incomingBowAcross: Measured | null;
  incomingFilmShare: Measured | null;
  waferKind: WaferKind;
  gateBow: Measured | null;
  gateWarp: Measured | null;
  steps: StepPlan[];
}

export const REVISION_KINDS = ["start", "edit", "undo", "redo"] as const;
export type RevisionKind = (typeof REVISION_KINDS)[number];

/** A change of a flow as a line of its history. */
export interface RevisionLine {
  number: number;
  kind: RevisionKind;
  words: string;
  by: string;
  at: string;
}

/** What can be taken back and done again, in the words of the change itself. */
export interface FlowHistory {
  undo: string | null;
  redo: string | null;
  /** newest first */
  lines: RevisionLine[];
}

/** A field of a step that two people have left differently, as text. */
export interface StepDifference {
  label: string;
  mine: string;
  theirs: string;
}

/** Somebody changed the flow between this person's reading and saving it. */
export interface FlowConflict {
  by: string;
  at: string;
  /** version to send along with 'keep mine' */
  version: number | null;
  /** what they did, in the order in which they did it */
  changes: string[];
  /** where the step as it is saved differs from the one posted; null for what is no step, or a new one */
  step: StepDifference[] | "removed" | null;
}
