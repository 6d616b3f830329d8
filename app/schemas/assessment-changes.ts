import type { FlowInput } from "#app/engine/flow/model.ts";
import type { SiteLimits } from "#app/engine/rules/limits.ts";
import type { AnswerSummary, ComparisonRow } from "#app/lib/result-comparison.ts";

/** Everything that an assessment rests on. */
export interface AssessmentInput {
  flow: FlowInput;
  limits: SiteLimits;
}

/** Kinds of record that an input comes from: the flow itself, a record of the library, a limit of the site. */
export const INPUT_RECORDS = ["flow", "film", "carrier", "bondingMaterial", "tape", "equipment", "limit"] as const;
export type InputRecord = (typeof INPUT_RECORDS)[number];

/** One property that differs between two inputs, in words. */
export interface InputChange {
  /** whose property: 'Copper, plated', 'Step 7, Cure', 'Site limit' */
  subject: string;
  property: string;
  from: string;
  to: string;
  /** the steps that use it, as they are numbered now; of a step that is gone, as they were */
  steps: number[];
  /** where it is kept; `id` of a library record, key of a limit, null for the flow */
  record: { kind: InputRecord; id: string | null };
}

/** A change with who saved its record last; null where the record does not tell, or was not saved since. */
export interface DatedChange extends InputChange {
  by: string | null;
  /** ISO */
  at: string | null;
}

/** How far an answer moves; or why there is none any more. */
export type Movement =
  | {
      outcome: "computed";
      /** said where the flow parts by slot: which slots are held against which */
      slots: string | null;
      before: AnswerSummary;
      after: AnswerSummary;
      /** steps whose finding or required support differs, or that only one of the two has */
      moved: ComparisonRow[];
    }
  | { outcome: "not computable"; step: number | null; reason: string };

/** What an assessment rested on and rests on no more, and what the answer would be now. */
export interface OutOfDate {
  /** versions, where another engine has come since */
  engine: { from: string; to: string } | null;
  changes: DatedChange[];
  movement: Movement;
}
