import type { FaceUp, Holding, Outcome } from "#app/engine/vocabulary.ts";
import type { ShapeResult } from "./assessment-result.ts";
import type { Severity } from "./incident.ts";
import type { FoundGroup } from "./search.ts";
import type { ScanRow } from "./scan-view.ts";
import type { RevisionState } from "./sheet-revision.ts";

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

/** A revision of a sheet, or a deviation of one, as Today lists it. */
export interface TodaySheet {
  id: string;
  revisionId: string;
  assessmentId: string;
  /** number, and letter once it has one: 'TERN-H003 B' */
  name: string;
  /** whether it has ever been released, and so has a page of its own */
  released: boolean;
  state: RevisionState;
  /** of the flow */
  title: string;
  program: string;
  /** ISO date-time since which it stands so; of a deviation, its end */
  at: string;
  /** what was said: the note to the reviewer, the reason it was returned or withdrawn for, the scope of a deviation */
  words: string;
}

export interface TodaySheets {
  /** in review, and this person may release it */
  toRelease: TodayGroup<TodaySheet>;
  /** deviations that wait for this person's signature */
  toSign: TodayGroup<TodaySheet>;
  /** returned to this person, and not asked for again */
  returned: TodayGroup<TodaySheet>;
  /** asked for by this person, waiting for somebody else */
  asked: TodayGroup<TodaySheet>;
  /** deviations of sheets in force that have ended or end soon */
  lapsing: TodayGroup<TodaySheet>;
  /** released or withdrawn lately, newest first */
  lately: TodayGroup<TodaySheet>;
  /** how many sheets are in force in the person's programs */
  inForce: number;
}

/** A lot that does not go on, as Today lists it. */
export interface TodayLot {
  id: string;
  /** where it is looked at, and dealt with */
  path: string;
  title: string;
  words: string;
  program: string;
  /** ISO date-time since which it stands so */
  at: string;
  /** whether this person may do something about it */
  mine: boolean;
}

/** An incident that nobody follows up yet. */
export interface TodayIncident {
  id: string;
  title: string;
  severity: Severity;
  words: string;
  lot: string;
  program: string;
  /** ISO date-time at which it happened */
  at: string;
}

export interface TodayLots {
  /** open holds of lots and stops of steps, longest first */
  blocked: TodayGroup<TodayLot>;
  /** on a sheet that is not in force any more, for who may move them */
  toMove: TodayGroup<TodayLot>;
  /** places that a shift handed over and nobody has taken, for who works in shifts */
  toTake: TodayGroup<TodayLot>;
}

/** What Today shows to a person. A guest has programs and released sheets alone. */
export interface TodayView {
  now: string;
  /** sees the work of a program */
  works: boolean;
  mayAssess: boolean;
  mayUpload: boolean;
  decisions: TodayGroup<TodayAssessed>;
  outOfDate: TodayGroup<TodayAssessed>;
  notAssessed: TodayGroup<TodayFlow>;
  sheets: TodaySheets;
  lots: TodayLots;
  incidents: TodayGroup<TodayIncident>;
  scans: ScanRow[];
  programs: TodayProgram[];
  /** for who may load and remove it: whether the demo is on the site, with its programs that this person belongs to */
  demo: { here: boolean; programs: string[] } | null;
  /** what the person marked and opened last */
  kept: FoundGroup[];
}
