import type { ColourToken } from "./colour.ts";

/** Line of a series. Series differ by dash and marker as well as by hue, so that black on paper reads the same. */
export type PlotDash = "solid" | "chain" | "dotted" | "long" | "double" | "sparse" | "reference" | "none";
export type PlotMarker = "circle" | "square" | "triangle" | "diamond" | "cross" | "down" | "dash" | "none";

/** Dash lengths and line width, px. */
export const PLOT_DASHES: Readonly<Record<PlotDash, { array: string | undefined; width: number }>> = {
  solid: { array: undefined, width: 2.2 },
  chain: { array: "9 3 2 3", width: 1.6 },
  dotted: { array: "2 2.5", width: 1.8 },
  long: { array: "8 3", width: 1.4 },
  double: { array: "13 3 2 3 2 3", width: 1.6 },
  sparse: { array: "4 4", width: 1.6 },
  reference: { array: "5 4", width: 1 },
  none: { array: undefined, width: 0 },
};

export interface PlotPoint {
  x: number;
  y: number;
}

/** A stretch of the x axis. */
export interface PlotStretch {
  from: number;
  to: number;
}

/** What a series may be by its uncertainty, drawn under it; each run without a gap. */
export interface PlotBand {
  colourToken: ColourToken;
  runs: readonly (readonly { x: number; low: number; high: number }[])[];
}

export interface PlotSeries {
  id: string;
  label: string;
  /** words at the line's end where the label is too long for it: a line may end in the middle of the others */
  endLabel?: string;
  dash: PlotDash;
  marker: PlotMarker;
  colourToken: ColourToken;
  /** In ascending x. A curve simply ends where its quantity has no meaning any more. */
  points: readonly PlotPoint[];
  /** Stretches between two of its points over which it has no value and no line. */
  gaps?: readonly PlotStretch[];
  /** Where markers stand; nowhere by default. */
  markersAt?: readonly number[];
  /** `end`: at the line's right end (default); `along`: quiet words beside the line, for a reference; `none`: beside the chart. */
  labelled?: "end" | "along" | "none";
}

export interface PlotTick {
  value: number;
  text: string;
}

export interface PlotAxis {
  scale: "log" | "linear";
  from: number;
  to: number;
  ticks: readonly PlotTick[];
  /** Unlabelled ticks. */
  minor?: readonly number[];
  title?: string;
  /** The only values that there are, ascending, such as the steps of a flow; the read-out goes from one to the next. */
  stops?: readonly number[];
  /** A value with its unit, for the read-out and the table. */
  format: (value: number) => string;
}

/** A limit as a line across the plot; the first line of its label in ink, the others quiet. */
export interface PlotLimit {
  value: number;
  lines: readonly string[];
}

/**
 * A place of a plot that is pointed out: the value that a series is for, the place where it begins to curl, or a numbered crossing of
 * two of them.
 */
export interface PlotMark extends PlotPoint {
  kind: "own" | "onset" | "crossing";
  colourToken: ColourToken;
  /** of a crossing */
  text?: string;
}

/** A plot as data. The chart on a screen and the drawing on paper are made from the same one. */
export interface Plot {
  x: PlotAxis;
  y: PlotAxis;
  series: readonly PlotSeries[];
  /** Vertical dotted lines. */
  xLimits?: readonly PlotLimit[];
  /** Where the words of these lines stand: at the foot (default), or at the top where the curves fall to the right. */
  xLimitWords?: "foot" | "top";
  /** Horizontal dashed lines in the colour of a stop. */
  yLimits?: readonly PlotLimit[];
  /** Shaded from the left edge; `label` stands right of its line at the top, `inside` left of it. */
  regime?: { upTo: number; label: string; inside: string };
  /** Shaded between two places, each with its words at the top where they fit. */
  shaded?: readonly (PlotStretch & { label: string })[];
  /** The value that the reader has chosen: a dot, a drop line and a mark on the axis. */
  chosen?: PlotPoint;
  /** Stretches of x that were left out, ruled with level lines. */
  leftOut?: readonly PlotStretch[];
  bands?: readonly PlotBand[];
  marks?: readonly PlotMark[];
}

/** Bounds of the plotting area, px. */
export interface PlotFrame {
  left: number;
  right: number;
  top: number;
  bottom: number;
}

/** What turns values into px. */
export interface PlotScales {
  x: (value: number) => number;
  y: (value: number) => number;
}
