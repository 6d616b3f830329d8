import type { AssumedInput } from "#app/engine/flow/assess.ts";
import type { BlockingFinding } from "#app/lib/blocking-findings.ts";
import type { SinceRelease } from "#app/lib/since-release.ts";
import type { Obstacle } from "#app/policies/release.ts";
import type { ProofAsked } from "./proof.ts";
import type { RevisionState } from "./sheet-revision.ts";

export interface DeviationView {
  id: string;
  findings: string[];
  reason: string;
  scope: string;
  /** ISO date-times */
  until: string;
  recordedAt: string;
  recordedBy: string;
  signedAt: string | null;
  signedBy: string | null;
  inForce: boolean;
  /** the reader may put the second signature under it */
  maySign: boolean;
}

export interface CommentView {
  id: string;
  step: number | null;
  text: string;
  at: string;
  by: string;
}

/** A review as it stands: who asked, what became of it, and everything that a reviewer goes through. */
export interface ReviewRevision {
  id: string;
  state: RevisionState;
  note: string;
  askedAt: string;
  askedBy: string;
  decidedAt: string | null;
  decidedBy: string | null;
  reason: string | null;
  /** letter that it was released with; null before */
  letter: string | null;
  obstacles: Obstacle[];
  deviations: DeviationView[];
  comments: CommentView[];
}

/** Page of the review of an assessment. */
export interface ReviewView {
  assessment: { id: string; name: string; number: string; letter: string; program: string };
  /** number of its sheet; null before the first review of its flow */
  sheet: string | null;
  sheetId: string | null;
  /** the newest attempt of this assessment; null when no review was ever asked for */
  revision: ReviewRevision | null;
  steps: { number: number; title: string }[];
  blocking: BlockingFinding[];
  assumed: AssumedInput[];
  inputs: number;
  since: SinceRelease | null;
  /** why no review can be asked for now; null when it can */
  notAsked: string | null;
  may: { ask: boolean; comment: boolean; deviate: boolean; return: boolean; release: boolean };
  /** what the reader has to prove who they are with to release */
  proofAsked: ProofAsked;
}
