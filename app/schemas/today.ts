import type { FaceUp, Holding, Outcome } from "#app/engine/vocabulary.ts";
import type { ShapeResult } from "./assessment-result.ts";
import type { FoundGroup } from "./search.ts";
import type { ScanRow } from "./scan-view.ts";

/** A flow with its newest assessment, as Today groups them. Times are ISO. */
export interface TodayFlow {
  id: string;
  name: string;
  program: string;
  updatedAt: string;
  /** whether this person may assess it */
  mayAssess: boolean;
  newest: { id: string; number: number; outcome: Outcome; at: string } | null;
}

/** A flow whose newest assessment is shown, with what decides it. */
export interface TodayAssessed extends TodayFlow {
  newest: NonNullable<TodayFlow["newest"]>;
  /** the sentence that decides */
  sentence: string;
  diameter: number;
  /** the wafer at the deciding step, as it lies there */
  wafer: { shape: ShapeResult | null; faceUp: FaceUp; holding: Holding } | null;
}

export interface TodayProgram {
  id: string;
  name: string;
  slug: string;
  /** m */
  diameter: number;
  purpose: string;
  flows: number;
  stacks: number;
}

/** A group of rows: the first of them, and how many there are in all. */
export interface TodayGroup<Row> {
  rows: Row[];
  total: number;
}

/** What Today shows to a person. A guest has programs alone. */
export interface TodayView {
  now: string;
  /** sees the work of a program */
  works: boolean;
  mayAssess: boolean;
  mayUpload: boolean;
  decisions: TodayGroup<TodayAssessed>;
  outOfDate: TodayGroup<TodayAssessed>;
  notAssessed: TodayGroup<TodayFlow>;
  scans: ScanRow[];
  programs: TodayProgram[];
  /** for who may load and remove it: whether the demo is on the site, with its programs that this person belongs to */
  demo: { here: boolean; programs: string[] } | null;
  /** what the person marked and opened last */
  kept: FoundGroup[];
}
