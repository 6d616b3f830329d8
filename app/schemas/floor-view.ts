import type { BlockCause } from "#app/lib/floor/block-causes.ts";
import type { Clock } from "#app/lib/floor/clocks.ts";
import type { FloorStep } from "#app/lib/floor/floor-steps.ts";
import type { LotProgress } from "#app/lib/floor/lot-progress.ts";
import type { FloorContent } from "./floor-entry.ts";
import type { RevisionState } from "./sheet-revision.ts";
import type { SheetHands } from "./sheet-document.ts";

/** Something that a lot must not go on with, in words, and whom to call. */
export interface FloorBlock {
  kind: "hold" | "stop" | "revision" | "assessment";
  /** id of the hold or stop */
  id: string | null;
  /** number of the step that it concerns; null for all of them */
  step: number | null;
  what: string;
  remedy: string;
  /** of a hold or stop */
  opened: { cause: BlockCause; reason: string; by: string; at: string } | null;
  /** whether whoever asks may clear it */
  mayClear: boolean;
}

/** The revision of a sheet that a lot is on. */
export interface PinnedSheet {
  revision: string;
  /** that it was released from */
  assessment: string;
  /** 'TERN-H001' */
  number: string;
  letter: string;
  title: string;
  state: RevisionState;
  /** letter of the revision that is in force instead; null where there is none */
  successor: { id: string; letter: string } | null;
  since: string;
  by: string;
  reason: string;
  fromStep: number;
}

/** What somebody said of a lot, as it is listed. */
export interface FloorEntryRow {
  id: string;
  step: number | null;
  content: FloorContent;
  at: string;
  receivedAt: string;
  by: string;
}

/** What a screen of the floor shows of a lot: one part of its flow, whole, so that it can be read again without a connection. */
export interface FloorSheet {
  pin: PinnedSheet;
  /** parts of a flow that parts by slot; one where it does not */
  legs: { leg: number; name: string }[];
  leg: number;
  /** m */
  diameter: number;
  exaggeration: number;
  steps: FloorStep[];
  support: SheetHands["support"];
  cautions: SheetHands["cautions"];
  emergency: SheetHands["emergency"];
  deviations: string[];
  progress: LotProgress;
  /** ISO, when whoever asks acknowledged this revision; null before */
  acknowledgedAt: string | null;
  blocks: FloorBlock[];
  clocks: Clock[];
  /** newest first */
  entries: FloorEntryRow[];
}

export interface FloorLot {
  id: string;
  name: string;
  note: string;
  program: string;
  wafers: { total: number; inLine: number };
  holds: FloorBlock[];
  /** null where the lot is on no sheet */
  sheet: FloorSheet | null;
  mayHold: boolean;
  person: string;
  personId: string;
  /** ISO, when all this was so */
  checkedAt: string;
}

/** Where one part of a lot is in its flow. */
export interface LotPlace {
  leg: number;
  name: string;
  /** null when its last step is done */
  here: { number: number; title: string; underWay: boolean } | null;
  done: number;
  total: number;
  /** steps that were passed without a word */
  missing: number[];
}

/** What the desk sees of a lot on the floor. */
export interface LotDesk {
  pin: PinnedSheet | null;
  parts: LotPlace[];
  blocks: FloorBlock[];
  /** revisions that it was on before, newest first */
  before: PinnedSheet[];
  /** released revisions that it can be put on, for who may put it there */
  choices: { id: string; name: string }[];
  mayAssign: boolean;
  mayHold: boolean;
}

/** A lot as the floor finds it. */
export interface FoundLot {
  id: string;
  name: string;
  program: string;
  /** number and letter of its sheet; null where it is on none */
  sheet: string | null;
}

export interface FoundLots {
  query: string;
  /** the one lot of that very name; then there is nothing to choose */
  exact: string | null;
  rows: FoundLot[];
  /** the lots that this person entered something of, newest first */
  mine: FoundLot[];
}
