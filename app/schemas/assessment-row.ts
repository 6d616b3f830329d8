import type { Outcome } from "#app/engine/vocabulary.ts";

/** The newest assessment of a flow in a list: what a sheet is printed from. */
export interface AssessmentRow {
  id: string;
  /** counts within the flow, for the revision */
  number: number;
  documentNumber: number;
  flow: string;
  program: string;
  programSlug: string;
  outcome: Outcome;
  createdAt: string;
  createdBy: string;
  /** the flow, or something that it uses, has changed since */
  outOfDate: boolean;
}
