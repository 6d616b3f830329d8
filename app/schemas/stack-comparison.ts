import type { ComparisonAsked } from "#app/lib/stack-comparison/asked.ts";
import type { FilmLines } from "#app/engine/patterned/pattern.ts";
import type { Measured } from "#app/engine/measured.ts";
import type { Side } from "#app/engine/vocabulary.ts";

/** A stored stack as a comparison takes it: SI, films of a side from the silicon outwards, device side first. */
export interface ComparedInputs {
  id: string;
  name: string;
  program: { name: string };
  silicon: { name: string; diameter: number; nominalThickness: number };
  siliconThickness: Measured;
  layers: readonly {
    side: Side;
    filmId: string;
    filmName: string;
    thickness: Measured;
    stress: Measured;
    coverage: number;
    lines?: FilmLines | null;
  }[];
}

/** What a row of the table says of one stack. `differs`: it is not what it says of the first. */
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

/** Rows that belong together: a film, or the shape. */
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

/** The curve of one stack. */
export interface ComparedCurve {
  letter: string;
  /** at the end of its line */
  label: string;
  points: Place[];
  /** its own thickness, where that is in the range */
  own: Place | null;
  /** where it begins to curl, m; null when it does nowhere */
  onset: Place | null;
}

interface LimitLine {
  value: number;
  lines: readonly string[];
}

/** What the chart of a comparison is drawn from; SI. */
export interface ComparisonChart {
  scale: "log" | "linear";
  range: { from: number; to: number };
  curves: ComparedCurve[];
  thicknessLimits: LimitLine[];
  warpLimits: LimitLine[];
  crossings: (Place & { number: number })[];
}

/** What two stacks have in common, in words. */
export interface CrossingWords {
  key: string;
  /** the numbers of its marks in the chart */
  numbers: number[];
  sentence: string;
}

/** How far the inputs of one stack move its warp. */
export interface StackSensitivity {
  letter: string;
  name: string;
  /** what is to be said instead of, or about, the list */
  remark: string | null;
  /** largest first; `share` of the largest of all stacks */
  lines: { input: string; tolerance: string; moves: string; share: number }[];
}

/** Stacks side by side, in words and as a chart. */
export interface ComparedView {
  /** at which temperature */
  temperature: string;
  /** what is wrong with what was typed, by the name of its field */
  faults: Partial<Record<"at" | "from" | "to", string>>;
  summary: string[];
  chart: ComparisonChart;
  groups: ComparedGroup[];
  sensitivities: StackSensitivity[];
  crossings: CrossingWords[];
}

/** A stack that may be compared. */
export interface StackChoice {
  id: string;
  name: string;
  program: string;
}

/** A comparison as its page and its paper show it. */
export interface ComparisonView {
  /** with the ids of the stacks that are there alone */
  asked: ComparisonAsked;
  /** how many of those asked for are not there, or not the reader's to see: which, nobody is told */
  missing: number;
  stacks: (StackChoice & { letter: string })[];
  /** stacks that may be added */
  choices: StackChoice[];
  tools: { value: string; label: string }[];
  /** null with fewer stacks than two or more than six */
  compared: ComparedView | null;
}
