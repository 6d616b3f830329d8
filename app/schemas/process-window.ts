import type { ContourPoint } from "#app/engine/window/contours.ts";
import type { FlowInput } from "#app/engine/flow/model.ts";
import type { SiteLimits } from "#app/engine/rules/limits.ts";
import type { Outcome } from "#app/engine/vocabulary.ts";
import type { TrialHead } from "./trial.ts";

/** An input that a process window can be drawn over. */
export interface WindowInput {
  /** 'silicon after 12', 'film thickness 6 0' */
  key: string;
  label: string;
  /** what is planned, with its unit */
  planned: string;
  /** planned value in the unit of the axis */
  value: number;
  unit: string;
}

/** One side of a window as it was asked: texts as typed, and what is wrong with them. */
export interface AskedAxis {
  input: string;
  from: string;
  to: string;
  faults: { from?: string; to?: string };
}

/** Places in a row of the grid that come to the same. */
export interface WindowRun {
  outcome: Outcome;
  row: number;
  from: number;
  to: number;
}

/** A process window ready to be drawn: values in the axes' units. */
export interface WindowDrawing {
  x: number[];
  y: number[];
  runs: WindowRun[];
  /** boundary between what runs and what does not */
  boundary: ContourPoint[][];
  /** the planned values, where they lie in the window */
  planned: ContourPoint | null;
  /** every few places, for the table */
  table: { y: number; cells: { outcome: Outcome; margin: number | null }[] }[];
  tableX: number[];
  walks: number;
}

export interface WindowPageData {
  head: TrialHead;
  inputs: WindowInput[];
  steps: { number: number; title: string }[];
  /** the only step that is judged; null for the whole flow */
  step: number | null;
  x: AskedAxis;
  y: AskedAxis;
  /** why nothing is drawn, where no field is at fault */
  fault: string | null;
  drawing: WindowDrawing | null;
}

/** One side of a window as the engine is asked: which input, and its range, SI. */
export interface WindowSide {
  input: string;
  from: number;
  to: number;
}

/** What the engine needs to work a window out, wherever it runs. */
export interface WindowQuestion {
  flow: FlowInput;
  limits: SiteLimits;
  x: WindowSide;
  y: WindowSide;
  step: number | null;
}

/** A window as it is asked, on its way to the browser: its page without a drawing, and what to draw; null while there is nothing to. */
export interface SentWindow {
  page: WindowPageData;
  question: WindowQuestion | null;
}
