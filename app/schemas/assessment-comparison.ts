import type { Outcome } from "#app/engine/vocabulary.ts";
import type { InputChange } from "./assessment-changes.ts";
import type { AssessmentResult } from "./assessment-result.ts";

/** An assessment by what it is called. */
export interface AssessmentName {
  id: string;
  /** counts within the flow */
  number: number;
  documentNumber: number;
  flow: { id: string; name: string };
  outcome: Outcome;
  createdAt: string;
}

/** One half of a comparison. */
export interface ComparedAssessment extends AssessmentName {
  engineVersion: string;
  result: AssessmentResult;
}

/** An assessment with what it may be compared with, and the two of them when one was chosen. */
export interface ComparisonOffer {
  asked: AssessmentName;
  program: { name: string; slug: string };
  /** of the same flow, newest first */
  sameFlow: AssessmentName[];
  /** the newest of each other flow of the program, by name */
  otherFlows: AssessmentName[];
  /** older first; null while nothing is chosen */
  chosen: { before: ComparedAssessment; after: ComparedAssessment; changes: InputChange[] } | null;
}
