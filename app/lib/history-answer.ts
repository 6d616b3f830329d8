import type { SubmissionResult } from "@conform-to/react";

/** What the page of a film is told when a change of its history did not go through. */
export interface HistoryAnswer {
  /** of the form that adds a value */
  lastResult: SubmissionResult<string[]> | null;
  /** why the change was not made */
  refused: string | null;
  /** the value that it was about; null for the history as a whole */
  value: string | null;
}
