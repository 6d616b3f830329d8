import type { MistakeState } from "#app/engine/profile/mistakes/mistake.ts";
import type { CurvatureWord } from "#app/engine/profile/azimuths.ts";
import type { StressBudgetLine } from "#app/engine/profile/stress/stress-budget.ts";
import type { ShapeFigure } from "#app/engine/profile/map/shape-figures.ts";
import type { ShownWorking } from "#app/lib/shown-working.ts";

/** A value with its expanded uncertainty, k = 2, SI. */
export interface Expanded {
  value: number;
  uncertainty: number;
}

/** Film stress by both relations, Pa. `full` is null when the wafer has rolled. */
export interface BothStresses {
  stoney: Expanded;
  full: Expanded | null;
  differs: boolean;
  sentence: string;
}

/** One input of the uncertainty budget. */
export interface BudgetRow {
  input: string;
  /** what it adds to the stress, standard uncertainty, Pa */
  contribution: number;
  shared: StressBudgetLine["shared"];
  note: string;
  /** false where nobody stated a tolerance */
  given: boolean;
}

export interface Budget {
  rows: BudgetRow[];
  expandedUncertainty: number;
  coverageFactor: number;
  /** null when they are endless */
  degreesOfFreedom: number | null;
  /** the instruments whose repeatability is in it; empty when it is not */
  tools: string[];
}

/** Curvatures of a shape in all directions, or as much of them as the lines show; 1/m and rad. */
export interface Directions {
  sentence: string;
  mean: Expanded;
  all: {
    word: CurvatureWord;
    /** towards the notch, across it, and twist */
    x: Expanded;
    y: Expanded;
    twist: Expanded;
    major: Expanded;
    minor: Expanded;
    /** of the axis of the larger curvature, from the notch */
    angle: Expanded;
    /** the angle is told at all */
    angleTold: boolean;
  } | null;
}

/** Stress that differs with direction, Pa; x towards the notch. */
export interface DirectionalView {
  x: number;
  y: number;
  shear: number;
  high: number;
  low: number;
  /** of the larger one from the notch, rad */
  angle: number;
}

export interface FigureView {
  name: ShapeFigure["name"];
  /** m */
  value: Expanded;
  definition: string;
  source: string;
}

/** Contours of a height over the wafer for a drawing. */
export interface MapView {
  /** of the drawn disk and of the wafer, m */
  radius: number;
  waferRadius: number;
  /** lowest and highest height, and the distance of two lines, m */
  low: number;
  high: number;
  step: number;
  /** paths in thousandths of the wafer's radius, notch down, device side towards the reader */
  levels: { height: number; path: string }[];
  /** bands between the levels, lowest first: a path of level strips, and its middle height, m */
  bands: { height: number; path: string }[];
}

/** Shape of a wafer as its scans show it. */
export interface ShapeView {
  of: "before the film" | "after the film" | "change by the film";
  figures: FigureView[];
  map: MapView;
  /** left over between measured and fitted, m */
  rms: number;
  remarks: string[];
}

export interface MistakeView {
  number: number;
  name: string;
  state: MistakeState;
  sentence: string;
  remedy: string | null;
  read: string;
  /** the scans that it was found in, where there are several */
  where: string[];
}

/** What the scans of a film on a wafer say. */
export interface FilmAnalysis {
  stress: BothStresses;
  directional: DirectionalView | null;
  budget: Budget;
  /** of the change by the film, of the wafer before it and after it */
  directions: { change: Directions; before: Directions; after: Directions };
  /** why there is no surface, or the shapes */
  shape: { why: string } | { shapes: ShapeView[]; remarks: string[] };
  gravity: string;
  mistakes: MistakeView[];
  /** in the order of the page, each with what it belongs to */
  workings: { of: string; working: ShownWorking }[];
}
