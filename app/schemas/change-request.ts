import type { LimitKey } from "#app/engine/rules/limits.ts";
import type { StepKind } from "#app/engine/flow/model.ts";
import type { Outcome } from "#app/engine/vocabulary.ts";
import type { InputChange, Movement } from "./assessment-changes.ts";

/** Kinds of record of the library that a change can be about. */
export const LIBRARY_SUBJECTS = ["film", "carrier", "bondingMaterial", "equipment"] as const;
export type LibrarySubject = (typeof LIBRARY_SUBJECTS)[number];

/** What a change is about: a record of the library, a limit of the site, or all steps of a kind. */
export type ChangeSubject = { name: string } & (
  { kind: LibrarySubject; id: string } | { kind: "limit"; id: LimitKey } | { kind: "step"; id: StepKind }
);

/** One property of a subject set to another value, SI. `title` narrows steps to those whose title has it. */
export interface Change {
  subject: ChangeSubject;
  property: string;
  value: number;
  title: string;
}

/** A flow that a change touches, and how its answer moves. */
export interface TouchedFlow {
  id: string;
  name: string;
  program: { name: string; slug: string };
  newest: { id: string; number: number; outcome: Outcome; createdAt: string } | null;
  changes: InputChange[];
  movement: Movement;
}

/** What a change would do to the flows of a person's programs. Nothing of it is stored. */
export interface ChangeReach {
  /** flows looked at */
  flows: number;
  /** those that would come out differently first, then by program and name */
  touched: TouchedFlow[];
  /** further flows that it touches and that were not computed */
  more: number;
}
