import type { ComparisonAsked } from "#app/lib/comparison/asked.ts";

/** What a row of the table says of one of those compared. `differs`: it is not what it says of the first. */
export interface ComparedCell {
  text: string;
  note: string | null;
  differs: boolean;
}

export interface ComparedRow {
  key: string;
  label: string;
  cells: ComparedCell[];
  differs: boolean;
}

/** Rows that belong together: a film, the shape, or the steps. */
export interface ComparedGroup {
  key: string;
  title: string;
  rows: ComparedRow[];
}

interface Place {
  /** silicon thickness, m */
  x: number;
  /** warp of the free wafer, m */
  y: number;
}

/** The curve of one of those compared, over silicon thickness. */
export interface ComparedCurve {
  letter: string;
  /** at the end of its line */
  label: string;
  points: Place[];
  /** the thickness that it is planned for, where that is in the range */
  own: Place | null;
  /** where it begins to curl, m; null when it does nowhere */
  onset: Place | null;
  /** stretches of thickness over which it is curled about one axis, m */
  curled: { from: number; to: number }[];
  /** stretches over which it has no value and no line, m */
  gaps?: { from: number; to: number }[];
}

interface LimitLine {
  value: number;
  lines: readonly string[];
}

/** What the chart of a comparison over silicon thickness is drawn from; SI. */
export interface ComparisonChart {
  scale: "log" | "linear";
  range: { from: number; to: number };
  curves: ComparedCurve[];
  thicknessLimits: LimitLine[];
  warpLimits: LimitLine[];
  crossings: (Place & { number: number })[];
}

/** What two of them have in common, in words. */
export interface CrossingWords {
  key: string;
  /** the numbers of its marks in the chart */
  numbers: number[];
  sentence: string;
}

/** How far the inputs of one of them move its warp. */
export interface ComparedSensitivity {
  letter: string;
  name: string;
  /** what is to be said instead of, or about, the list */
  remark: string | null;
  /** largest first; `share` of the largest of all */
  lines: { input: string; tolerance: string; moves: string; share: number }[];
}

/** One that may be compared. */
export interface ComparisonChoice {
  id: string;
  name: string;
  program: string;
}

/** One that is compared, by the letter of its column. */
export interface ComparedMember extends ComparisonChoice {
  letter: string;
}

/** What is wrong with what was typed, by the name of its field. */
export type ComparisonFaults = Partial<Record<"at" | "from" | "to", string>>;

/** What pages and papers show of every comparison, in words. */
export interface ComparedWords {
  faults: ComparisonFaults;
  summary: string[];
  groups: ComparedGroup[];
  sensitivities: ComparedSensitivity[];
  crossings: CrossingWords[];
}

/** A comparison as its page and its paper show it. */
export interface ComparisonView<Compared> {
  /** with the ids of what is there alone */
  asked: ComparisonAsked;
  /** how many of those asked for are not there, or not the reader's to see: which, nobody is told */
  missing: number;
  members: ComparedMember[];
  /** what may be added */
  choices: ComparisonChoice[];
  tools: { value: string; label: string }[];
  /** null with fewer than two or more than six */
  compared: Compared | null;
}
