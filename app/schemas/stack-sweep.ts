import type { ContourPoint } from "#app/engine/window/contours.ts";
import type { Dimension } from "#app/engine/units/dimensions.ts";
import type { SweepAsked } from "#app/lib/stack-sweep/asked.ts";
import type { SideFaults } from "#app/lib/stack-sweep/axis.ts";

/** An input as it is offered. */
export interface SweepChoice {
  value: string;
  label: string;
}

/** A side of a sweep as it is drawn; SI. */
export interface DrawnAxis {
  label: string;
  dimension: Dimension;
  unit: string;
  from: number;
  to: number;
  log: boolean;
  /** value of the stack */
  own: number;
  /** the site's thresholds that lie on it */
  thresholds: { value: number; label: string }[];
}

/** A curve of an answer over one input; SI. */
export interface DrawnCurve {
  kind: "curve";
  x: DrawnAxis;
  points: { x: number; y: number }[];
  gaps: { from: number; to: number }[];
  curled: { from: number; to: number }[];
  /** answer of the stack itself, where it lies on the axis and has one */
  own: { x: number; y: number } | null;
  limits: { value: number; label: string }[];
}

/** Lines of a map on which the answer is one value, in shares of its axes. */
export interface DrawnLevel {
  value: number;
  /** the limit that it is; null for a level between */
  limit: string | null;
  lines: ContourPoint[][];
}

/** A map of an answer over two inputs; SI. */
export interface DrawnMap {
  kind: "map";
  x: DrawnAxis;
  y: DrawnAxis;
  cells: number;
  /** row by row from below, x running fastest; null where there is none */
  values: (number | null)[];
  /** how each place lies, one character each: see `PlaceState` */
  states: string;
  levels: DrawnLevel[];
  /** outlines of what is curled, and the line at which it begins */
  curled: { outlines: ContourPoint[][]; begins: ContourPoint[][] };
  /** outlines of where the answer means nothing */
  without: ContourPoint[][];
  /** the stack itself in shares, where it lies on the map; `value` null where it has no such answer */
  own: { x: number; y: number; value: number | null } | null;
}

/** What a sweep found, in words and ready to be drawn. */
export interface SweptView {
  /** key of the answer */
  answer: string;
  temperature: string;
  summary: string[];
  /** where the limits are reached, one sentence each */
  crossings: string[];
  /** what is to be minded */
  remarks: string[];
  drawn: DrawnCurve | DrawnMap;
}

/** A sweep as its page and its paper show it. */
export interface SweepView {
  stack: { id: string; name: string; program: string };
  /** with the sides filled in that were left blank */
  asked: SweepAsked;
  inputs: SweepChoice[];
  limits: SweepChoice[];
  /** usual ranges of the inputs chosen, for the fields left blank */
  usual: { x: { from: string; to: string } | null; y: { from: string; to: string } | null };
  faults: {
    x: SideFaults;
    y: SideFaults;
    answer?: string;
    limit?: string;
    own?: string;
    at?: string;
    /** the engine refuses all of it, or nothing is drawn for a reason of no field */
    whole?: string;
  };
  /** null while something is wrong with what was asked */
  swept: SweptView | null;
}
