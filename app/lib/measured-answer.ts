import type { SubmissionResult } from "@conform-to/react";

/** What the page of measured bows is told when something was not done. */
export interface MeasuredAnswer {
  /** of the form that records bows */
  lastResult: SubmissionResult<string[]> | null;
  /** why a bow was not set aside or put back */
  refused: string | null;
}
