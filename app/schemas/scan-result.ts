import type { LengthUnit } from "./scan.ts";

/** What a scan was computed with, SI where it is a quantity. */
export interface ScanParameters {
  orientation: "100" | "111";
  filmThickness: number;
  filmThicknessTolerance: number | null;
  siliconThickness: number;
  siliconThicknessTolerance: number | null;
  diameter: number;
  edgeExclusion: number;
  positionUnit: LengthUnit;
  heightUnit: LengthUnit;
  decimalMark: "point" | "comma";
}

/** A row of a file that could not be used: counted from 1 as an editor shows it, with what stood there. */
export interface SkippedRow {
  row: number;
  column: "position" | "height";
  text: string;
}

/** How one file was read. */
export interface FileReading {
  rows: number;
  used: number;
  heading: string | null;
  delimiter: string;
  skipped: SkippedRow[];
  skippedInAll: number;
}

/** What came out, SI; `bowChange` is the standard bow over the wafer's diameter. */
export interface ScanResult {
  curvatureChange: number;
  curvatureUncertainty: number;
  bowChange: number;
  bowUncertainty: number;
  stress: number;
  stressUncertainty: number;
  budget: { input: string; share: number }[];
  rms: number;
  quartic: number;
  steep: boolean;
  used: number;
  rejected: number;
  before: FileReading;
  after: FileReading;
  /** thinned for drawing: position and heights, m; the fitted parabola of the difference */
  curve: { x: number; before: number; after: number; difference: number; fitted: number }[];
}
